using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pilots;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Tests.Fixtures;

/// <summary>Plans for the tests of pages, made by the core.</summary>
internal static class SamplePlan
{
    public static readonly ReportContext Context = new("archipelago.toml", "draw 1 of 1", "0.1.0");

    /// <summary>Lines by boat on a sea with islands as holes, without a pilot.</summary>
    public static readonly SurveyPlan Archipelago = Of(SampleBoundary.Read("marine_archipelago_sea"), Parallel(10_000));

    /// <summary>Two strata with an area closed to survey, a zigzag and points, and an invented pilot of lines in the first.</summary>
    public static readonly SurveyPlan WithPilot = Of(
        SampleBoundary.Boxes(("outer", 20, 60, 21, 61), ("inner", 21, 60, 22, 61)),
        Parallel(8000),
        stratumField: "name",
        stratumLayouts: [("inner", Zigzag(12_000))],
        exclusions: SampleBoundary.Boxes(("closed", 20.6, 60.3, 21.2, 60.5)),
        pilot: InventedPilot("outer", "inner"));

    /// <summary>Two strata of lines, an invented pilot with distances and clusters, costs, and an assurance: all that a report can tell of lines.</summary>
    public static readonly SurveyPlan WithDistances = Of(
        SampleBoundary.Boxes(("outer", 20, 60, 21, 61), ("inner", 21, 60, 22, 61)),
        Parallel(8000),
        stratumField: "name",
        effort: InventedEffort with { CostPerUnit = ImmutableSortedDictionary<string, double>.Empty.Add("outer", 120).Add("inner", 300) },
        pilot: InventedPilotWithDistances(isPoints: false, "outer", "inner"));

    /// <summary>The same at points, in one stratum.</summary>
    public static readonly SurveyPlan AtPoints = Of(
        SampleBoundary.Boxes(("all", 20, 60, 21, 61)), Grid(9000, radiusMetres: 400), effort: InventedEffort, pilot: InventedPilotWithDistances(isPoints: true, ""));

    /// <summary>A target of 20 % to be reached with 80 % assurance.</summary>
    public static EffortDesign InventedEffort => EffortDesign.None with { TargetCv = 0.2, Assurance = 0.8 };

    public static LayoutDesign Parallel(double spacingMetres, double bearing = 20)
        => new(LayoutKind.Parallel, new Sizing.Spacing(spacingMetres), new Bearing.Degrees(bearing), 600);

    public static LayoutDesign Zigzag(double spacingMetres)
        => new(LayoutKind.Zigzag, new Sizing.Spacing(spacingMetres), new Bearing.ShortAxis(), 600);

    public static LayoutDesign Grid(double spacingMetres, double radiusMetres = 1000)
        => new(LayoutKind.PointGrid, new Sizing.Spacing(spacingMetres), new Bearing.Degrees(30), radiusMetres, Grid: GridShape.Triangular);

    public static SurveyPlan Of(
        Boundary boundary,
        LayoutDesign layout,
        string? stratumField = null,
        IEnumerable<(string Stratum, LayoutDesign Layout)>? stratumLayouts = null,
        Boundary? exclusions = null,
        PilotTable? pilot = null,
        int cells = 2000,
        string name = "Archipelago, sea ducks by boat",
        EffortDesign? effort = null)
    {
        var design = new SurveyDesign(
            name,
            20270401,
            stratumField,
            [],
            layout,
            (stratumLayouts ?? []).ToImmutableSortedDictionary(pair => pair.Stratum, pair => pair.Layout),
            effort ?? EffortDesign.None with { TargetCv = pilot is null ? null : 0.2 },
            new CoverageDesign(cells, Replicates: 200));
        return PlanSurvey.Run(design, new SurveyInputs(boundary, exclusions is null ? [] : [exclusions], pilot), new RunOptions());
    }

    /// <summary>Invented: sixteen transects a stratum, counts that differ more than chance alone would have it, half-normal distances, small clusters.</summary>
    public static PilotTable InventedPilotWithDistances(bool isPoints, params string[] strata)
    {
        int[] counts = [3, 0, 5, 2, 8, 1, 0, 4, 6, 2, 3, 1, 7, 0, 2, 4];
        ImmutableArray<PilotTransect> transects =
            [.. from stratum in strata from i in Enumerable.Range(0, counts.Length) select new PilotTransect(stratum, $"{stratum}-{i}", isPoints ? 1 : 8 + (i % 3), counts[i])];
        var ids = transects.SelectMany(transect => Enumerable.Repeat(transect.Id, transect.Count)).ToArray();
        var scale = isPoints ? 150 : 200;

        // Quantiles of the half-normal (at points of the Rayleigh) distribution, spread over the transects.
        var detections = ids.Select((id, i) =>
        {
            var share = (((i * 37) % ids.Length) + 0.5) / ids.Length * 0.9;
            var metres = isPoints ? scale * Math.Sqrt(-2 * Math.Log(1 - share)) : scale * MathNet.Numerics.Distributions.Normal.InvCDF(0, 1, 0.5 + (share / 2));
            return new PilotDetection(id, metres, 1 + (i % 4));
        });
        return new PilotTable(isPoints, transects, [.. detections]);
    }

    // Invented: twelve lines a stratum, counts that differ more than chance alone would have it.
    private static PilotTable InventedPilot(params string[] strata)
    {
        int[] counts = [3, 0, 5, 2, 8, 1, 0, 4, 6, 2, 3, 1];
        return new PilotTable(
            IsPoints: false,
            [.. from stratum in strata from i in Enumerable.Range(0, counts.Length) select new PilotTransect(stratum, $"{stratum}-{i}", 8 + (i % 3), counts[i])],
            []);
    }
}
