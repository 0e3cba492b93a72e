using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Judges the coverage of a stratum. A place is uneven where its coverage is more than a tenth away from nominal, by more than three standard
/// errors where it is simulated. The rules: docs/methods/coverage.md. The words: <see cref="CoverageSentences"/>.
/// </summary>
internal static class CoverageAdvisor
{
    /// <summary>A tenth from nominal biases an estimate that takes coverage for even by a tenth at most. Common practice, no source.</summary>
    private const double Band = 0.1;

    /// <summary>Unevenness on so small a share of an area moves the estimate by less than a hundredth or so. Common practice, no source.</summary>
    private const double SmallShare = 0.05;

    // Strips that share less than a fiftieth change nominal by as little.
    private const double SharesTold = 1.02;

    // Twenty cells or more across the axis in the coarsest grid: enough to tell a trend from cells that differ by chance.
    private const int AxisClasses = 10;

    /// <param name="design">The layout.</param>
    /// <param name="coverage">Its coverage; the advice of it is not looked at.</param>
    /// <param name="distances">Distance of each cell's place from the boundary, metres.</param>
    /// <param name="along">Position of each cell's place along the axis (across the lines), metres.</param>
    public static CoverageAdvice Of(LayoutDesign design, StratumCoverage coverage, ReadOnlySpan<double> distances, ReadOnlySpan<double> along)
    {
        var (typicalError, reach) = (coverage.StandardError, EdgeReach(design));
        var (level, shares, edgeMean) = Means(coverage, distances, reach);
        double area = 0, undrawn = 0, uneven = 0, inside = 0, unevenInside = 0, unevenTimes = 0;
        for (var i = 0; i < distances.Length; i++)
        {
            var cell = coverage.Cells[i];

            // Where few draws cover a cell, its own standard error is as much a matter of chance as its coverage, and least where no draw does.
            var doubt = cell.Exact is null ? EnoughDraws.StandardErrors * Math.Max(cell.StandardError, typicalError) : 0;
            var isUneven = IsUneven(cell.Best, level, doubt);
            area += cell.AreaKm2;
            undrawn += cell.Best == 0 ? cell.AreaKm2 : 0;
            uneven += isUneven ? cell.AreaKm2 : 0;

            if (distances[i] > reach)
            {
                inside += cell.AreaKm2;
                unevenInside += isUneven ? cell.AreaKm2 : 0;

                // No doubt granted: to be called even, it must be seen to be.
                unevenTimes += IsUneven(cell.ExpectedTimes, coverage.Nominal, doubt: 0) ? cell.AreaKm2 : 0;
            }
        }

        var finding = EnoughDraws.TellCells(coverage) ? CoverageFinding.Even : CoverageFinding.TooFewDraws;
        if (uneven > SmallShare * area)
        {
            finding = unevenInside <= SmallShare * inside
                ? CoverageFinding.UnevenAtEdge
                : ChangesAlongAxis(reach, coverage, distances, along) ? CoverageFinding.UnevenAlongAxis : CoverageFinding.UnevenInside;
        }

        var sentences = CoverageSentences.Of(finding, design, coverage, shares ? level : null, uneven / area)
            + CoverageSentences.OfEdgeMean(finding, coverage, edgeMean, reach)
            + CoverageSentences.OfEvenTimes(finding, design, unevenTimes <= SmallShare * inside)
            + CoverageSentences.OfOverlap(design, coverage)
            + CoverageSentences.OfUndrawn(finding, coverage, undrawn, area);
        double? never = undrawn == 0 || EnoughDraws.TellZero(coverage) ? undrawn : null;
        return new CoverageAdvice(finding, uneven / area, never, sentences);
    }

    /// <summary>
    /// What coverage would be if it were even, whether that is less than nominal because strips share places (then it is what it is on average away
    /// from the boundary, since nominal adds up what each strip covers), and the mean near the boundary in parts of that elsewhere, NaN where either
    /// is missing.
    /// </summary>
    private static (double Level, bool Shares, double EdgeMean) Means(StratumCoverage coverage, ReadOnlySpan<double> distances, double reach)
    {
        double edgeArea = 0, edge = 0, insideArea = 0, inside = 0, times = 0, draws = 0;
        for (var i = 0; i < distances.Length; i++)
        {
            var cell = coverage.Cells[i];
            if (distances[i] <= reach)
            {
                edgeArea += cell.AreaKm2;
                edge += cell.AreaKm2 * cell.Best;
                continue;
            }

            insideArea += cell.AreaKm2;
            inside += cell.AreaKm2 * cell.Best;
            times += cell.AreaKm2 * cell.ExpectedTimes;
            draws += cell.AreaKm2 * cell.Simulated;
        }

        var shares = times > SharesTold * draws && inside < coverage.Nominal * insideArea;
        return (shares ? inside / insideArea : coverage.Nominal, shares, edge / edgeArea / (inside / insideArea));
    }

    /// <summary>
    /// How far in the boundary is felt, metres. A place is covered from no farther away than the half-width; but where tracks are kept whole if
    /// they start inside, whether they do is decided up to a track's reach away.
    /// </summary>
    private static double EdgeReach(LayoutDesign design) => design.Crossing == CrossingRule.Keep
        ? design.HalfWidthMetres + (design.SegmentMetres ?? 0) + (Math.Sqrt(2) * (design.SideMetres ?? 0))
        : design.HalfWidthMetres;

    private static bool IsUneven(double coverage, double nominal, double doubt) => Math.Abs(coverage - nominal) - doubt > Band * nominal;

    /// <summary>
    /// Whether, away from the boundary, the mean over all that lies at one height of the axis departs from the mean over everything by more than a
    /// tenth, on more than a small share of the area.
    /// </summary>
    private static bool ChangesAlongAxis(
        double reach, StratumCoverage coverage, ReadOnlySpan<double> distances, ReadOnlySpan<double> along)
    {
        var (low, high) = (double.PositiveInfinity, double.NegativeInfinity);
        foreach (var y in along)
        {
            (low, high) = (Math.Min(low, y), Math.Max(high, y));
        }

        var (areas, sums) = (new double[AxisClasses], new double[AxisClasses]);
        for (var i = 0; i < distances.Length; i++)
        {
            if (distances[i] > reach)
            {
                var index = Math.Min((int)((along[i] - low) / Math.Max(high - low, double.Epsilon) * AxisClasses), AxisClasses - 1);
                areas[index] += coverage.Cells[i].AreaKm2;
                sums[index] += coverage.Cells[i].AreaKm2 * coverage.Cells[i].Best;
            }
        }

        var mean = sums.Sum() / areas.Sum();
        var uneven = areas.Where((area, i) => Math.Abs((sums[i] / area) - mean) > Band * mean).Sum();
        return uneven > SmallShare * areas.Sum();
    }
}
