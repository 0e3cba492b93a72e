using System.Globalization;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Judges the coverage of a stratum. A place is uneven where its coverage is more than a tenth away from nominal, by more than twice its standard
/// error where it is simulated. The rules: docs/methods/coverage.md.
/// </summary>
internal static class CoverageAdvisor
{
    /// <summary>A tenth from nominal biases an estimate that takes coverage for even by a tenth at most. Common practice, no source.</summary>
    private const double Band = 0.1;

    /// <summary>Unevenness on so small a share of an area moves the estimate by less than a hundredth or so. Common practice, no source.</summary>
    private const double SmallShare = 0.05;

    // Twenty cells or more across the axis in the coarsest grid: enough to tell a trend from cells that differ by chance.
    private const int AxisClasses = 10;

    /// <param name="design">The layout.</param>
    /// <param name="coverage">Its coverage; the advice of it is not looked at.</param>
    /// <param name="distances">Distance of each cell's place from the boundary, metres.</param>
    /// <param name="along">Position of each cell's place along the axis (across the lines), metres.</param>
    public static CoverageAdvice Of(LayoutDesign design, StratumCoverage coverage, ReadOnlySpan<double> distances, ReadOnlySpan<double> along)
    {
        double area = 0, never = 0, uneven = 0, inside = 0, unevenInside = 0;
        for (var i = 0; i < distances.Length; i++)
        {
            var cell = coverage.Cells[i];
            var isUneven = IsUneven(cell, coverage.Nominal);
            area += cell.AreaKm2;
            never += cell.Best == 0 ? cell.AreaKm2 : 0;
            uneven += isUneven ? cell.AreaKm2 : 0;

            if (distances[i] > EdgeReach(design))
            {
                inside += cell.AreaKm2;
                unevenInside += isUneven ? cell.AreaKm2 : 0;
            }
        }

        var finding = CoverageFinding.Even;
        if (uneven > SmallShare * area)
        {
            finding = unevenInside <= SmallShare * inside
                ? CoverageFinding.UnevenAtEdge
                : ChangesAlongAxis(design, coverage, distances, along) ? CoverageFinding.UnevenAlongAxis : CoverageFinding.UnevenInside;
        }

        var sentence = Sentence(finding, design, uneven / area) + Never(coverage, never, area);
        return new CoverageAdvice(finding, uneven / area, never, sentence);
    }

    /// <summary>
    /// How far in the boundary is felt, metres. A place is covered from no farther away than the half-width; but where tracks are kept whole if
    /// they start inside, whether they do is decided up to a track's reach away.
    /// </summary>
    private static double EdgeReach(LayoutDesign design) => design.Crossing == CrossingRule.Keep
        ? design.HalfWidthMetres + (design.SegmentMetres ?? 0) + (Math.Sqrt(2) * (design.SideMetres ?? 0))
        : design.HalfWidthMetres;

    private static bool IsUneven(in CoverageCell cell, double nominal)
    {
        var doubt = cell.Exact is null ? 2 * cell.StandardError : 0;
        return Math.Abs(cell.Best - nominal) - doubt > Band * nominal;
    }

    /// <summary>
    /// Whether, away from the boundary, the mean over all that lies at one height of the axis departs from nominal by more than a tenth, on more than
    /// a small share of the area.
    /// </summary>
    private static bool ChangesAlongAxis(
        LayoutDesign design, StratumCoverage coverage, ReadOnlySpan<double> distances, ReadOnlySpan<double> along)
    {
        var (low, high) = (double.PositiveInfinity, double.NegativeInfinity);
        foreach (var y in along)
        {
            (low, high) = (Math.Min(low, y), Math.Max(high, y));
        }

        var (areas, sums) = (new double[AxisClasses], new double[AxisClasses]);
        for (var i = 0; i < distances.Length; i++)
        {
            if (distances[i] > EdgeReach(design))
            {
                var index = Math.Min((int)((along[i] - low) / Math.Max(high - low, double.Epsilon) * AxisClasses), AxisClasses - 1);
                areas[index] += coverage.Cells[i].AreaKm2;
                sums[index] += coverage.Cells[i].AreaKm2 * coverage.Cells[i].Best;
            }
        }

        var uneven = areas.Where((area, i) => Math.Abs((sums[i] / area) - coverage.Nominal) > Band * coverage.Nominal).Sum();
        return uneven > SmallShare * areas.Sum();
    }

    private static string Sentence(CoverageFinding finding, LayoutDesign design, double unevenShare)
    {
        var (even, uneven) = (Percent(1 - unevenShare), Percent(unevenShare));
        return finding switch
        {
            CoverageFinding.Even => $"Coverage is even: {even} of the area is within a tenth of nominal.",
            CoverageFinding.UnevenAtEdge when design.Edge == EdgeRule.Minus =>
                $"Coverage is uneven at the edge only ({uneven} of the area is more than a tenth from nominal): consider plus sampling (edge = \"plus\"), or weight each detection by its coverage.",
            CoverageFinding.UnevenAtEdge =>
                $"Coverage is uneven at the edge only ({uneven} of the area is more than a tenth from nominal): weight each detection by its coverage.",
            CoverageFinding.UnevenAlongAxis =>
                $"Coverage changes along the axis ({uneven} of the area is more than a tenth from nominal): {EvenAlongAxis(design)} would even it out; otherwise weight each detection by its coverage.",
            CoverageFinding.UnevenInside =>
                $"Coverage is uneven inside the stratum too ({uneven} of the area is more than a tenth from nominal): parallel lines or a point grid would even it out; otherwise weight each detection by its coverage.",
            _ => throw new InvalidOperationException($"unknown finding {finding}"),
        };
    }

    private static string EvenAlongAxis(LayoutDesign design)
        => design.Kind == LayoutKind.Zigzag && design.Turning != ZigzagTurning.AdjustedAngle
            ? "an adjusted-angle zigzag (turning = \"adjusted-angle\") or parallel lines"
            : "parallel lines";

    private static string Never(StratumCoverage coverage, double neverKm2, double areaKm2)
    {
        if (neverKm2 == 0)
        {
            return "";
        }

        var how = coverage.MaxAbsZ is null
            ? string.Create(CultureInfo.InvariantCulture, $"were covered by none of {coverage.Replicates} simulated draws")
            : "can never be covered";
        return string.Create(
            CultureInfo.InvariantCulture,
            $" Places of {neverKm2:0.####} km² in all ({Percent(neverKm2 / areaKm2)} of the area) {how}: the estimator cannot speak for them.");
    }

    private static string Percent(double share) => share is > 0 and < 0.001
        ? "under 0.1 %"
        : string.Create(CultureInfo.InvariantCulture, $"{100 * share:0.#} %");
}
