using System.Globalization;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pages.Maps;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Words;

/// <summary>The sentences that answer first: what the plan comes to, what a picture shows.</summary>
internal static class Sentences
{
    // More strata than this are a list, not a sentence: the tables have them.
    private const int MostStrata = 4;

    /// <summary>A layout kind with what tells it from others of its kind: <c>zigzag, equal-spaced</c>.</summary>
    public static string Kind(LayoutDesign design) => design.Kind switch
    {
        LayoutKind.Zigzag => $"{ChoiceWord.Of(design.Kind)}, {ChoiceWord.Of(design.Turning)}",
        LayoutKind.PointGrid => $"{ChoiceWord.Of(design.Kind)}, {ChoiceWord.Of(design.Grid)}",
        _ => ChoiceWord.Of(design.Kind),
    };

    public static string Seed(SurveyPlan plan) => "seed " + plan.Design.Seed.ToString(CultureInfo.InvariantCulture);

    /// <summary>The answer of the whole report.</summary>
    public static string OfPlan(SurveyPlan plan)
    {
        var coverages = plan.Strata.Select(stratum => stratum.Coverage).OfType<StratumCoverage>().ToArray();
        var sentence = Effort(plan) + $" survey a region of {Figures.Three(plan.Region.AreaKm2)} km²";
        if (coverages.Length == 0)
        {
            return sentence + ".";
        }

        if (coverages.Any(coverage => coverage.Advice is { Finding: CoverageFinding.TooFewDraws } or { NeverCoveredKm2: null }))
        {
            return sentence + "; the simulated draws are too few to tell whether every place has a chance of being covered.";
        }

        var (min, max) = (coverages.Min(c => c.Min), coverages.Max(c => c.Max));
        if (min > 0)
        {
            var (low, high) = (Figures.Three(min), Figures.Three(max));
            return $"{sentence}; every place has a chance of being covered, {(low == high ? "of " + low : $"between {low} and {high}")}.";
        }

        return IsCertain(coverages)
            ? $"{sentence}, but some places can never be covered: no estimate from this survey speaks for them."
            : $"{sentence}; some places were covered by none of the simulated draws, so that their coverage is not known to be above 0.";
    }

    /// <summary>The precision to expect, with the target beside it; null where nothing is known of it.</summary>
    public static string? OfPrecision(SurveyPlan plan)
    {
        if (plan.Delivered is not { } delivered)
        {
            return null;
        }

        var target = plan.Effort?.Required is { } required ? $"; the target is {Figures.ChosenPercent(required.TargetCv)}" : "";
        var open = EffortBand.Of(plan.Effort!, delivered) is var (lower, upper)
            ? $"; the pilot leaves {Figures.Percent(lower)} to {Figures.Percent(upper)} open"
            : "";
        var others = plan.Strata.Where(stratum => stratum.Layout.Design.IsPoints != plan.Effort!.IsPoints).Select(stratum => stratum.Stratum.Name).ToList();
        var where = others.Count == 0 ? "" : $" outside {string.Join(", ", others.Select(name => $"'{name}'"))}";
        return $"It is expected to estimate density{where} with a coefficient of variation of {Figures.Percent(delivered.Cv)}{open}{target}.";
    }

    // A closed form knows that a place can never be covered; a simulation only that it never saw it.
    private static bool IsCertain(IEnumerable<StratumCoverage> coverages)
        => coverages.SelectMany(coverage => coverage.Cells).Any(cell => cell.Exact <= 0);

    private static string Bearing(Layout layout)
        => layout.Design.IsScattered ? "" : $", bearing {Figures.Bearing(layout.BearingDegrees)}° true";

    /// <summary>What a region is.</summary>
    public static string OfRegion(Region region)
    {
        var (parts, holes) = (region.Strata.Sum(stratum => stratum.Shape.PartCount), region.Strata.Sum(stratum => stratum.Shape.HoleCount));
        return $"The region has {Figures.Three(region.AreaKm2)} km² in {Figures.Counted(region.Strata.Length, "stratum", "strata")}, "
            + $"{Figures.Counted(parts, "part", "parts")} and {Figures.Counted(holes, "hole", "holes")}, round {Positions.Rough(region.Projection.Centre)}.";
    }

    /// <summary>What the map of transects shows.</summary>
    public static string OfMap(SurveyPlan plan)
    {
        var strata = plan.Strata.Length > MostStrata
            ? $"Its layout has {Effort(plan).TrimEnd(',')}; the table of the layout has the strata one by one"
            : string.Join("; ", plan.Strata.Select(stratum =>
                $"{(plan.Strata.Length == 1 ? "Layout" : stratum.Stratum.Name)}: {Kind(stratum.Layout.Design)}, {Transects(stratum.Layout)}{Bearing(stratum.Layout)}"));
        return $"{OfRegion(plan.Region)} {strata}. The table of transects has their positions.";
    }

    /// <summary>What the map of coverage shows.</summary>
    public static string OfCoverage(IReadOnlyCollection<StratumCoverage> coverages, IReadOnlyList<CoverageClass> classes)
    {
        var even = classes.First(one => one.Index == CoverageClasses.AsPlanned).Share;
        var never = classes.FirstOrDefault(one => one.Index == CoverageClasses.Never);
        var lowest = coverages.MinBy(coverage => coverage.Nominal > 0 ? coverage.Min / coverage.Nominal : double.MaxValue)!;
        var place = lowest.Cells.IsEmpty ? "" : $", at {Positions.Decimal(lowest.Cells.MinBy(cell => cell.Best)!.Position)} (latitude, longitude)";
        var where = (coverages.Count == 1 ? "" : ", in " + lowest.Stratum) + place;
        if (coverages.Any(coverage => coverage.Advice?.Finding == CoverageFinding.TooFewDraws))
        {
            return "The simulated draws are too few to tell coverage cell by cell: most of what differs from cell to cell is chance."
                + (never is null ? "" : $" {Figures.Percent(never.Share)} of the area was covered by none of them (hatched).");
        }

        return $"{Figures.Percent(even)} of the area has a coverage probability within 10 % of nominal. "
            + $"It is lowest, {Figures.Three(lowest.Min)} where nominal is {Figures.Three(lowest.Nominal)}{where}. "
            + (never is null ? "No place is without coverage."
                : $"{Figures.Percent(never.Share)} of the area {(IsCertain(coverages) ? "can never be covered" : "was covered by none of the simulated draws")} (hatched).");
    }

    /// <summary>How much of what a map of simulated coverage shows is the simulation's own noise; null where all coverage is exact.</summary>
    public static string? OfNoise(IReadOnlyCollection<StratumCoverage> coverages)
    {
        var simulated = coverages.Where(coverage => coverage.Cells.Any(cell => cell.Exact is null) && coverage.Nominal > 0).ToArray();
        if (simulated.Length == 0)
        {
            return null;
        }

        var noise = simulated.Max(coverage => coverage.StandardError / coverage.Nominal);
        return $"Simulated coverage has a standard error of about {Figures.Percent(noise)} of nominal in a cell: differences of that size between cells are noise. "
            + "It puts the least and greatest figures too far out, and makes the CV and the areas far from nominal too large. More replicates in [coverage] bring it down.";
    }

    private static string Effort(SurveyPlan plan)
    {
        var lines = plan.Strata.Where(stratum => !stratum.Layout.Design.IsPoints).ToArray();
        var points = plan.Strata.Where(stratum => stratum.Layout.Design.IsPoints).Sum(stratum => stratum.Layout.Transects.Length);
        var texts = new List<string>();
        if (lines.Length > 0)
        {
            var kilometres = lines.Sum(stratum => stratum.Layout.TotalLengthMetres) / 1000;
            texts.Add($"{Figures.Counted(lines.Sum(stratum => stratum.Layout.Transects.Length), "line", "lines")}, {Figures.Three(kilometres)} km in all,");
        }

        if (points > 0 || lines.Length == 0)
        {
            texts.Add(Figures.Counted(points, "point", "points"));
        }

        return string.Join(" and ", texts);
    }

    private static string Transects(Layout layout) => layout.Design.IsPoints
        ? Figures.Counted(layout.Transects.Length, "point", "points")
        : $"{Figures.Counted(layout.Transects.Length, "line", "lines")} of {Figures.Three(layout.TotalLengthMetres / 1000)} km in all";
}
