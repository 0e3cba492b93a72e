using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of systematic parallel lines, exactly: a place p is covered by the line at offset u across it when the foot of the
/// perpendicular from p lies where lines may lie and |u| is at most the half-width w. So the expected number of covering lines is
/// |{u in [-w, w] : p + u n in R}| / d, and where strips overlap (2w > d) the probability is the measure of that set modulo d, over d.
/// R is where lines may lie; stretches that are dropped as too short are no part of it. Derivation: docs/methods/layouts.md.
/// </summary>
internal static class ExactParallelLines
{
    public static double[] At(ParallelLines lines, CellGrid grid, CancellationToken stop)
    {
        var across = lines.Stratum.LinesAcross;
        var (x, y) = (grid.X.AsSpan().ToArray(), new double[grid.Count]);
        var order = new int[grid.Count];
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            y.AsSpan(grid.RowStarts[row]..grid.RowStarts[row + 1]).Fill(grid.RowY[row]);
        }

        for (var i = 0; i < order.Length; i++)
        {
            order[i] = i;
        }

        // Places one above the other share one look across the lines.
        Array.Sort(x, order);
        var result = new double[grid.Count];
        var crossings = new double[64];
        for (var i = 0; i < order.Length;)
        {
            stop.ThrowIfCancellationRequested();
            var count = across.CrossingsAt(x[i], ref crossings);
            var column = x[i];
            for (; i < order.Length && x[i] == column; i++)
            {
                result[order[i]] = Probability(crossings.AsSpan(0, count), y[order[i]], lines.Stratum.HalfWidthMetres, lines.SpacingMetres);
            }
        }

        return result;
    }

    /// <summary>Share of offsets that cover the place at height y between the crossings.</summary>
    private static double Probability(ReadOnlySpan<double> crossings, double y, double halfWidth, double spacing)
    {
        var (low, high) = (y - halfWidth, y + halfWidth);

        // The first stretch that ends above the window's lower edge.
        var first = crossings.BinarySearch(low);
        first = (first < 0 ? ~first : first) & ~1;
        var overlapping = 2 * halfWidth > spacing;
        var stretches = overlapping ? new List<(double Low, double High)>() : null;
        var total = 0.0;
        for (var i = first; i < crossings.Length && crossings[i] < high; i += 2)
        {
            var (from, to) = (Math.Max(low, crossings[i]), Math.Min(high, crossings[i + 1]));
            if (to <= from)
            {
                continue;
            }

            total += to - from;
            stretches?.Add((from - low, to - low));
        }

        return (stretches is null ? total : MeasureModulo(stretches, spacing)) / spacing;
    }

    /// <summary>Length of the union of stretches once each is wrapped round a circle of the given length.</summary>
    private static double MeasureModulo(List<(double Low, double High)> stretches, double spacing)
    {
        var wrapped = new List<(double Low, double High)>();
        foreach (var (low, high) in stretches)
        {
            if (high - low >= spacing)
            {
                return spacing;
            }

            var start = low - (Math.Floor(low / spacing) * spacing);
            var end = start + high - low;
            wrapped.Add((start, Math.Min(end, spacing)));
            if (end > spacing)
            {
                wrapped.Add((0, end - spacing));
            }
        }

        wrapped.Sort();
        var (total, reached) = (0.0, 0.0);
        foreach (var (low, high) in wrapped)
        {
            total += Math.Max(0, high - Math.Max(low, reached));
            reached = Math.Max(reached, high);
        }

        return total;
    }
}
