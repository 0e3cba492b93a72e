using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pilots;
using SurveyPlanner.Regions;

namespace SurveyPlanner;

/// <summary>What a plan is made from, already read: no file is opened from here on.</summary>
/// <param name="Boundary">The boundary of the region.</param>
/// <param name="Exclusions">Areas to be cut out of it.</param>
/// <param name="Pilot">The pilot season, if any.</param>
public sealed record SurveyInputs(Boundary Boundary, ImmutableArray<Boundary> Exclusions, PilotTable? Pilot);

/// <summary>How a plan is computed; none of it changes the result.</summary>
/// <param name="Threads">Threads for simulation.</param>
/// <param name="Progress">Told the share of the simulation that is done, 0 to 1.</param>
/// <param name="Stop">Stops the work.</param>
public sealed record RunOptions(int Threads = 1, IProgress<double>? Progress = null, CancellationToken Stop = default);

/// <summary>
/// START HERE: the whole job on one screen.
/// <code>
/// boundary + plan ─> Region ─> Layout ─> Coverage ─┐
///     pilot counts ─> Pilot ─> Effort ─────────────┴─> SurveyPlan
/// </code>
/// One way, no steps back; every arrow is an immutable value; everything random comes from the seed in the design.
/// </summary>
public static class PlanSurvey
{
    /// <summary>The whole plan.</summary>
    /// <exception cref="InputException">The input, or the design it asks for, cannot work.</exception>
    /// <exception cref="OperationCanceledException">Stopped from outside.</exception>
    public static SurveyPlan Run(SurveyDesign design, SurveyInputs inputs, RunOptions options)
    {
        var region = ReadRegion(design, inputs);
        var effort = PlanEffort(design, region, inputs.Pilot);
        var generators = Prepare(design, region, effort);
        var layouts = LayoutDrawer.Draw(generators, region.Projection, design.Seed);
        var coverage = ComputeCoverage(design, region, generators, layouts, options);
        var strata = region.Strata.Select((stratum, i) => new StratumPlan(stratum, layouts[i], coverage[i]));
        return new SurveyPlan(design, region, [.. strata], effort, Notices(design, region, inputs.Pilot, layouts));
    }

    /// <summary>The plan without coverage: region, effort and the drawn layout.</summary>
    public static SurveyPlan DrawOnly(SurveyDesign design, SurveyInputs inputs)
    {
        var region = ReadRegion(design, inputs);
        var effort = PlanEffort(design, region, inputs.Pilot);
        var layouts = LayoutDrawer.Draw(Prepare(design, region, effort), region.Projection, design.Seed);
        var strata = region.Strata.Select((stratum, i) => new StratumPlan(stratum, layouts[i], Coverage: null));
        return new SurveyPlan(design, region, [.. strata], effort, Notices(design, region, inputs.Pilot, layouts));
    }

    /// <summary>The region alone, as the boundary and the plan describe it.</summary>
    public static Region ReadRegion(SurveyDesign design, SurveyInputs inputs)
    {
        var region = RegionBuilder.Build(
            inputs.Boundary,
            new RegionDesign(design.StratumField, design.Strata, design.Projection, design.ExclusionBufferMetres),
            inputs.Exclusions);
        RefuseUnknownStrata(design, region);
        return region;
    }

    /// <summary>Effort and precision alone; null where the plan neither has a pilot nor gives an encounter rate.</summary>
    public static EffortPlan? PlanEffort(SurveyDesign design, Region region, PilotTable? pilot)
    {
        var strata = region.Strata.Select(stratum =>
        {
            var layout = LayoutFields.Fill(design.LayoutOf(stratum.Name), stratum);
            return new EffortStratum(stratum.Name, stratum.AreaKm2, layout.IsPoints, layout.HalfWidthMetres, layout.IsSystematic, LayoutKinds.MeanLineLength(stratum, layout) / 1000);
        });
        return EffortPlanning.For(design.Effort, pilot, [.. strata], design.Seed);
    }

    /// <summary>
    /// Coverage probability at given positions, of the detections of a finished survey say; nothing is drawn that counts.
    /// Exact where the layout has a closed form, and simulated at exactly these positions. Results in the order of the positions;
    /// a position outside the region is marked so.
    /// </summary>
    /// <exception cref="InputException">The input, or the design it asks for, cannot work.</exception>
    /// <exception cref="OperationCanceledException">Stopped from outside.</exception>
    public static ImmutableArray<PositionCoverage> CoverageAt(
        SurveyDesign design, SurveyInputs inputs, IReadOnlyList<LonLat> positions, RunOptions options)
    {
        var region = ReadRegion(design, inputs);
        var generators = Prepare(design, region, PlanEffort(design, region, inputs.Pilot));
        var calculator = new CoverageCalculator(design.Coverage, design.Seed, options.Threads, options.Stop);
        return CoverageAtPositions.Of(positions, region.Projection, generators, calculator, options.Progress);
    }

    /// <summary>
    /// For each stratum, in the region's order, what its layout would be like along other bearings; nothing is drawn that counts.
    /// Bearings at which it cannot work carry the reason.
    /// </summary>
    /// <param name="design">The plan.</param>
    /// <param name="inputs">What it is made from.</param>
    /// <param name="everyDegrees">Step from one bearing to the next; from 0 to below 180.</param>
    /// <param name="options">Only the stop is used, and the progress told.</param>
    /// <exception cref="InputException">The input cannot work, whatever the bearing.</exception>
    /// <exception cref="OperationCanceledException">Stopped from outside.</exception>
    public static ImmutableArray<StratumBearings> TryBearings(
        SurveyDesign design, SurveyInputs inputs, double everyDegrees, RunOptions options)
    {
        var region = ReadRegion(design, inputs);
        var effort = PlanEffort(design, region, inputs.Pilot);
        return
        [
            .. region.Strata.Select((stratum, i) => new StratumBearings(
                stratum.Name,
                BearingTrials.Of(
                    stratum,
                    LayoutFor(design, stratum, effort),
                    everyDegrees,
                    ProgressPart.Of(options.Progress, i, region.Strata.Length) is { } part ? part.Add : null,
                    options.Stop))),
        ];
    }

    private static ImmutableArray<LayoutGenerator> Prepare(SurveyDesign design, Region region, EffortPlan? effort)
        => [.. region.Strata.Select(stratum => LayoutKinds.Prepare(stratum, LayoutFor(design, stratum, effort)))];

    /// <summary>The layout asked for in a stratum, what comes from the boundary and from the target precision filled in.</summary>
    private static LayoutDesign LayoutFor(SurveyDesign design, Stratum stratum, EffortPlan? effort)
        => Sized(LayoutFields.Fill(design.LayoutOf(stratum.Name), stratum), stratum.Name, effort);

    /// <summary>Turns <c>size_from = "precision"</c> into the length or number that the target asks of this stratum.</summary>
    private static LayoutDesign Sized(LayoutDesign layout, string stratum, EffortPlan? effort)
    {
        if (layout.Sizing is not Sizing.Precision)
        {
            return layout;
        }

        if (effort?.Strata.FirstOrDefault(one => one.Name == stratum)?.Effort is not { } required || required <= 0)
        {
            throw new InputException(new Problem(
                $"stratum '{stratum}' is to be sized from precision, but no required effort can be computed for it; give [precision] target_cv and a pilot (or pilot.encounter_rate) that covers it",
                Key: "layout.size_from"));
        }

        Sizing sizing = layout.IsPoints ? new Sizing.Number((int)Math.Ceiling(required)) : new Sizing.TotalLength(required * 1000);
        return layout with { Sizing = sizing };
    }

    private static ImmutableArray<StratumCoverage> ComputeCoverage(
        SurveyDesign design, Region region, ImmutableArray<LayoutGenerator> generators, ImmutableArray<Layout> layouts, RunOptions options)
    {
        var sizes = CellSizes.For(region.Strata, design.Coverage);
        var calculator = new CoverageCalculator(design.Coverage, design.Seed, options.Threads, options.Stop);
        return
        [
            .. generators.Select((generator, i) => calculator.OfStratum(
                generator, layouts[i], region.Projection, sizes[i], (uint)i, ProgressPart.Of(options.Progress, i, generators.Length))),
        ];
    }

    private static void RefuseUnknownStrata(SurveyDesign design, Region region)
    {
        var known = region.Strata.Select(stratum => stratum.Name).ToHashSet();
        var unknown = design.StratumLayouts.Keys.Where(name => !known.Contains(name)).ToList();
        if (unknown.Count > 0)
        {
            throw new InputException(unknown.Select(name => new Problem(
                $"the region has no stratum '{name}'; it has: {string.Join(", ", region.Strata.Take(20).Select(stratum => $"'{stratum.Name}'"))}",
                Key: $"stratum.\"{name}\"")));
        }
    }

    private static ImmutableArray<Notice> Notices(SurveyDesign design, Region region, PilotTable? pilot, ImmutableArray<Layout> layouts)
        => [.. region.Notices, .. pilot?.Notices ?? [], .. SharedAmount(design, layouts), .. layouts.SelectMany(layout => layout.Notices)];

    /// <summary>An amount under [layout] is meant for each stratum; with several of them the sum surprises.</summary>
    private static IEnumerable<Notice> SharedAmount(SurveyDesign design, ImmutableArray<Layout> layouts)
    {
        var sharing = layouts.Count(layout => !design.StratumLayouts.ContainsKey(layout.Stratum));
        var amount = design.Layout.Sizing switch
        {
            Sizing.TotalLength length => FormattableString.Invariant($"total_length = \"{length.Metres / 1000:0.###} km\""),
            Sizing.Number number => FormattableString.Invariant($"{(design.Layout.IsPoints ? "points" : "lines")} = {number.Count}"),
            _ => null,
        };
        if (amount is not null && sharing > 1)
        {
            yield return new Notice(
                NoticeKind.Warning,
                $"{amount} under [layout] holds in each of {sharing} strata, {sharing} times that in all; give each stratum its own under [stratum.\"name\"] if the sum was meant");
        }
    }
}
