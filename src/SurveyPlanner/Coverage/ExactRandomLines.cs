using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of k parallel lines at random distances over heights of total length C, exactly. Independent lines: one covers a place p
/// with probability q = |{u in [-w, w] : p + u n in R}| / C, so p is covered with probability 1 - (1 - q)^k. One line in each of k equal bands:
/// 1 - Π (1 - q_j), with q_j the part of that set in band j over C/k.
/// </summary>
internal static class ExactRandomLines
{
    public static double[] At(RandomParallelLines lines, CellGrid grid, CancellationToken stop)
    {
        var (width, extent) = (lines.Stratum.HalfWidthMetres, lines.Ranges.Length);
        AcrossSlices.Probability probability = lines.Design.Placement == LinePlacement.Independent
            ? (crossings, y) => 1 - Math.Pow(1 - (AcrossSlices.Measure(crossings, y - width, y + width) / extent), lines.Count)
            : (crossings, y) => InBands(lines, crossings, y - width, y + width);
        return AcrossSlices.At(lines.Stratum.LinesAcross, grid, probability, stop);
    }

    private static double InBands(RandomParallelLines lines, ReadOnlySpan<double> crossings, double low, double high)
    {
        var band = lines.SpacingMetres;
        var (missed, inBand, current) = (1.0, 0.0, -1.0);
        for (var i = AcrossSlices.FirstAbove(crossings, low); i < crossings.Length && crossings[i] < high; i += 2)
        {
            var (from, to) = (Math.Max(low, crossings[i]), Math.Min(high, crossings[i + 1]));
            var position = lines.Ranges.PositionOf(from);
            for (var left = to - from; left > 0;)
            {
                // The part of the stretch up to the end of the band it is in.
                var index = Math.Floor(position / band);
                var part = Math.Min(left, Math.Max((index + 1) * band - position, 1e-12 * band));
                if (index != current)
                {
                    missed *= 1 - (inBand / band);
                    (inBand, current) = (0, index);
                }

                inBand += part;
                (position, left) = (position + part, left - part);
            }
        }

        return 1 - (missed * (1 - (inBand / band)));
    }
}
