using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// For each place of a grid, the stretches of the line across through it (x fixed, y free) that lie inside a shape: a look that places one above
/// the other share.
/// </summary>
internal static class AcrossSlices
{
    /// <summary>Given the heights at which the line across crosses the boundary (ascending, inside from each even one to the next) and the place's height.</summary>
    public delegate double Probability(ReadOnlySpan<double> crossings, double y);

    /// <param name="across">The shape with x and y swapped.</param>
    /// <param name="grid">The places.</param>
    /// <param name="probability">What to make of each.</param>
    /// <param name="stop">Stops the work.</param>
    public static double[] At(FrameShape across, CellGrid grid, Probability probability, CancellationToken stop)
    {
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
                result[order[i]] = probability(crossings.AsSpan(0, count), y[order[i]]);
            }
        }

        return result;
    }

    /// <summary>Index of the first stretch that ends above a height.</summary>
    public static int FirstAbove(ReadOnlySpan<double> crossings, double low)
    {
        var first = crossings.BinarySearch(low);
        return (first < 0 ? ~first : first) & ~1;
    }

    /// <summary>Length of the stretches between two heights.</summary>
    public static double Measure(ReadOnlySpan<double> crossings, double low, double high)
    {
        var total = 0.0;
        for (var i = FirstAbove(crossings, low); i < crossings.Length && crossings[i] < high; i += 2)
        {
            total += Math.Max(0, Math.Min(high, crossings[i + 1]) - Math.Max(low, crossings[i]));
        }

        return total;
    }

    /// <summary>Length of the union of the stretches between two heights once each is wrapped round a circle of the given length.</summary>
    public static double MeasureModulo(ReadOnlySpan<double> crossings, double low, double high, double period)
    {
        var wrapped = new List<(double Low, double High)>();
        for (var i = FirstAbove(crossings, low); i < crossings.Length && crossings[i] < high; i += 2)
        {
            var (from, to) = (Math.Max(low, crossings[i]) - low, Math.Min(high, crossings[i + 1]) - low);
            if (to - from >= period)
            {
                return period;
            }

            var start = from - (Math.Floor(from / period) * period);
            var end = start + to - from;
            wrapped.Add((start, Math.Min(end, period)));
            if (end > period)
            {
                wrapped.Add((0, end - period));
            }
        }

        wrapped.Sort();
        var (total, reached) = (0.0, 0.0);
        foreach (var (first, last) in wrapped)
        {
            total += Math.Max(0, last - Math.Max(first, reached));
            reached = Math.Max(reached, last);
        }

        return total;
    }
}
