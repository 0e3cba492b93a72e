using System.Globalization;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>What was found of a stratum's coverage and what to do about it, in plain words. The rules: docs/methods/coverage.md.</summary>
internal static class CoverageSentences
{
    /// <summary>From here on it matters that a place may be covered several times over. A tenth, as everywhere in the advice.</summary>
    private const double OverlapTold = 1.1;

    private const double LowMean = 0.9;

    /// <summary>The finding.</summary>
    /// <param name="finding">The finding.</param>
    /// <param name="design">The layout: what would mend unevenness depends on it.</param>
    /// <param name="coverage">Its coverage.</param>
    /// <param name="sharedLevel">What coverage comes to on average away from the boundary, where that is less than nominal because strips share places; else null.</param>
    /// <param name="unevenShare">Share of the area that is uneven.</param>
    public static string Of(CoverageFinding finding, LayoutDesign design, StratumCoverage coverage, double? sharedLevel, double unevenShare)
    {
        var nominal = sharedLevel is { } level ? $"the {ThreeDigits(level)} that nominal comes to where {Swept(design).ToLowerInvariant()} share places" : "nominal";
        var uneven = $"({Percent(unevenShare)} of the area is more than a tenth from {nominal}{(coverage.IsExact ? "" : ", beyond what chance explains")})";
        const string weight = "weight each detection by its coverage";
        return finding switch
        {
            CoverageFinding.Even when coverage.IsExact => $"Coverage is even: {Percent(1 - unevenShare)} of the area is within a tenth of {nominal}.",
            CoverageFinding.Even =>
                $"Coverage is even as far as {Count(coverage.Replicates)} simulated draws tell: {Percent(1 - unevenShare)} of the area is within a tenth of {nominal}, or no farther from that than chance explains ({Percent(EnoughDraws.StandardErrors * coverage.StandardError / coverage.Nominal)} of nominal).",
            CoverageFinding.UnevenAtEdge => $"Coverage is uneven at the edge only {uneven}: {(EvensEdge(design) is { } how ? $"consider {how}, or " : "")}{weight}.",
            CoverageFinding.UnevenAlongAxis => $"Coverage changes along the axis {uneven}: {Otherwise(EvensInside(design, finding))}{weight}.",
            CoverageFinding.UnevenInside => $"Coverage is uneven inside the stratum too {uneven}: {Otherwise(EvensInside(design, finding))}{weight}.",
            CoverageFinding.TooFewDraws =>
                $"{Count(coverage.Replicates)} simulated draws are too few to tell the coverage of single cells and {(design.IsPoints ? "points" : "transects")}, only its mean over the stratum: {Needed(coverage)}.",
            _ => throw new InvalidOperationException($"unknown finding {finding}"),
        };
    }

    /// <summary>That the mean near the boundary is lower where single cells do not tell; else nothing.</summary>
    /// <param name="finding">The finding.</param>
    /// <param name="coverage">The coverage.</param>
    /// <param name="edgeMean">Mean coverage near the boundary, in parts of that elsewhere.</param>
    /// <param name="reachMetres">How near.</param>
    public static string OfEdgeMean(CoverageFinding finding, StratumCoverage coverage, double edgeMean, double reachMetres)
        => finding == CoverageFinding.Even && !coverage.IsExact && edgeMean < LowMean
            ? $" The mean within {ThreeDigits(reachMetres)} m of the boundary is {Percent(edgeMean)} of that elsewhere, as the edge profile shows."
            : "";

    /// <summary>That places are covered equally often where they are not equally likely to be covered at all, as where legs meet; else nothing.</summary>
    public static string OfEvenTimes(CoverageFinding finding, LayoutDesign design, bool timesAreEven)
        => timesAreEven && (finding is CoverageFinding.UnevenInside or CoverageFinding.UnevenAlongAxis)
            ? $" {Swept(design)} overlap there, and the expected number of times that a place is covered is even: whoever counts each {(design.IsPoints ? "point" : "strip")}'s sightings by themselves needs no weights."
            : "";

    /// <summary>That places are covered several times over, where they are; else nothing.</summary>
    public static string OfOverlap(LayoutDesign design, StratumCoverage coverage)
    {
        var (times, draws) = (0.0, 0.0);
        foreach (var cell in coverage.Cells)
        {
            times += cell.AreaKm2 * cell.ExpectedTimes;
            draws += cell.AreaKm2 * cell.Simulated;
        }

        return times <= OverlapTold * draws ? ""
            : $" {Swept(design)} overlap: a place that is covered is covered {ThreeDigits(times / draws)} times on average, and an animal there may be counted as often.";
    }

    /// <summary>What is known of places that no draw covered, or none can; nothing where there are none.</summary>
    /// <param name="finding">The finding: where the draws are too few it has said so.</param>
    /// <param name="coverage">The coverage.</param>
    /// <param name="undrawnKm2">Area of those places.</param>
    /// <param name="areaKm2">Area of all.</param>
    public static string OfUndrawn(CoverageFinding finding, StratumCoverage coverage, double undrawnKm2, double areaKm2)
    {
        if (undrawnKm2 == 0 || finding == CoverageFinding.TooFewDraws)
        {
            return "";
        }

        var places = $"places of {ThreeDigits(undrawnKm2)} km² in all ({Percent(undrawnKm2 / areaKm2)} of the area)";
        const string mute = "the estimator cannot speak for them";
        if (coverage.IsExact)
        {
            return $" P{places[1..]} can never be covered: {mute}.";
        }

        return EnoughDraws.TellZero(coverage)
            ? $" None of {Count(coverage.Replicates)} simulated draws covered {places}, so that coverage there is under {Math.Ceiling(100 * EnoughDraws.MostWithoutDraw(coverage) / coverage.Nominal)} % of nominal, if not 0: {mute}."
            : $" None of {Count(coverage.Replicates)} simulated draws covered {places}, which may be chance: {Needed(coverage)}.";
    }

    private static string Needed(StratumCoverage coverage)
    {
        // Two digits, upwards: it is no exact figure.
        var draws = EnoughDraws.Needed(coverage);
        var unit = Math.Pow(10, Math.Max(0, Math.Floor(Math.Log10(draws)) - 1));
        var needed = $"about {Count(Math.Ceiling(draws / unit) * unit)} would tell";
        return draws <= CoverageDesign.MostReplicates
            ? needed + " (replicates in [coverage])"
            : $"{needed}, more than the {Count(CoverageDesign.MostReplicates)} that replicates in [coverage] can ask for";
    }

    private static string? EvensEdge(LayoutDesign design)
    {
        const string clip = "cutting what crosses the boundary (crossing = \"clip\")";
        const string plus = "plus sampling (edge = \"plus\")";
        return (design.Crossing, design.Edge) switch
        {
            (CrossingRule.Keep, EdgeRule.Minus) => $"{clip} together with {plus}",
            (CrossingRule.Keep, _) => clip,
            (_, EdgeRule.Minus) => plus,
            _ => null,
        };
    }

    /// <summary>What makes a design uneven away from the boundary, the other way round; null where nothing in it should.</summary>
    private static string? EvensInside(LayoutDesign design, CoverageFinding finding)
    {
        var ways = new List<string>();
        if (design.MinLengthMetres > 0)
        {
            ways.Add("a smaller min_length");
        }

        if (design.Crossing == CrossingRule.Keep)
        {
            ways.Add("cutting what crosses the boundary (crossing = \"clip\")");
        }

        // Its angle evens out what changes along the axis, not what strips share where legs meet.
        if (design.Kind == LayoutKind.Zigzag && design.Turning != ZigzagTurning.AdjustedAngle && finding == CoverageFinding.UnevenAlongAxis)
        {
            ways.Add("an adjusted-angle zigzag (turning = \"adjusted-angle\")");
        }

        if (design.Kind is LayoutKind.Zigzag or LayoutKind.RandomParallel)
        {
            ways.Add("parallel lines (kind = \"parallel\")");
        }

        return ways.Count == 0 ? null : string.Join(" or ", ways);
    }

    private static string Otherwise(string? evensOut) => evensOut is null ? "" : $"{evensOut} would even it out; otherwise ";

    private static string Swept(LayoutDesign design) => design.IsPoints ? "Disks" : "Strips";

    private static string Percent(double share) => share is > 0 and < 0.001
        ? "under 0.1 %"
        : string.Create(CultureInfo.InvariantCulture, $"{100 * share:0.#} %");

    private static string Count(double count) => count.ToString("#,0", CultureInfo.InvariantCulture);

    private static string ThreeDigits(double value)
    {
        var unit = Math.Pow(10, Math.Floor(Math.Log10(value)) - 2);
        return (Math.Round(value / unit) * unit).ToString("#,0.########", CultureInfo.InvariantCulture);
    }
}
