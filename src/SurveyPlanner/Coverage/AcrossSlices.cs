using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// For each place of a grid, the stretches of the line across through it (x fixed, y free) that lie inside a shape.
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
        var (looks, result) = (new Looks(across, grid), new double[grid.Count]);
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            stop.ThrowIfCancellationRequested();
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                result[i] = probability(looks.At(i), grid.RowY[row]);
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

    /// <summary>Crossings of the line across through each place. Places in the middle of one column of cells share one look.</summary>
    private sealed class Looks(FrameShape across, CellGrid grid)
    {
        private readonly Dictionary<int, double[]> _ofColumns = [];
        private double[] _crossings = new double[64];

        public ReadOnlySpan<double> At(int place)
        {
            var x = grid.X[place];
            var isInMiddle = grid.Cells is { } cells && x == cells.ColumnX(cells.Columns[place]);
            if (isInMiddle && _ofColumns.TryGetValue(grid.Cells!.Columns[place], out var known))
            {
                return known;
            }

            var count = across.CrossingsAt(x, ref _crossings);
            if (isInMiddle)
            {
                _ofColumns.Add(grid.Cells!.Columns[place], _crossings[..count]);
            }

            return _crossings.AsSpan(0, count);
        }
    }
}
