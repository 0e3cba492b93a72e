using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// The effort of a layout integrated over its random offset: expectation and spread, by the midpoint rule over evenly spread offsets.
/// Effort is total length for lines, number for points. Accuracy: the effort is a piecewise smooth function of the offset, so the error of
/// the mean is of order 1/offsets², far below the spread itself; tested against the closed forms of rectangle, disk and triangle.
/// </summary>
internal static class EffortIntegral
{
    /// <summary>Draws along one offset; along two, this many in all. A prime, so that the lattice below never repeats itself.</summary>
    public const int Draws = 1009;

    // Two offsets: a rank-1 lattice whose generator, the golden section of the number of draws, spreads them evenly over the square.
    private const double GoldenSection = 0.38196601125;

    /// <summary>Sees the pieces of one realisation, in order of visit.</summary>
    public delegate void Look(ReadOnlySpan<Piece> pieces);

    public static EffortSpread Over(LayoutGenerator generator) => Over(generator, out _);

    /// <param name="generator">The layout.</param>
    /// <param name="meanCount">Mean number of transects that lie in the stratum.</param>
    /// <param name="draws">Offsets to try.</param>
    /// <param name="look">Sees the pieces of each.</param>
    public static EffortSpread Over(LayoutGenerator generator, out double meanCount, int draws = Draws, Look? look = null)
    {
        var buffer = new PieceBuffer();
        var offsets = new double[generator.OffsetRanges.Length];
        double sum = 0, squares = 0, smallest = double.PositiveInfinity, largest = 0, count = 0;
        var first = 0.0;
        for (var i = 0; i < draws; i++)
        {
            SetOffsets(offsets, i, draws);
            buffer.Clear();
            var random = new PhiloxStream(0, RandomPurpose.Expectation, 0, (uint)i);
            generator.Realise(offsets, ref random, buffer);
            var effort = generator.Design.IsPoints ? buffer.Count : buffer.TotalLength;
            count += buffer.Transects;
            look?.Invoke(buffer.Pieces);

            // Deviations from the first value keep the digits of a small spread of a large effort.
            first = i == 0 ? effort : first;
            sum += effort - first;
            squares += (effort - first) * (effort - first);
            smallest = Math.Min(smallest, effort);
            largest = Math.Max(largest, effort);
        }

        meanCount = count / draws;
        var mean = sum / draws;
        return new EffortSpread(first + mean, Math.Sqrt(Math.Max(0, (squares / draws) - (mean * mean))), smallest, largest);
    }

    private static void SetOffsets(double[] offsets, int i, int draws)
    {
        var lattice = (long)Math.Round(GoldenSection * draws);
        for (var axis = 0; axis < offsets.Length; axis++)
        {
            offsets[axis] = ((axis == 0 ? i : i * lattice % draws) + 0.5) / draws;
        }
    }
}
