using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Counts, over simulated draws in the order of their offsets, how often each place is covered: once for every draw that covers it at all,
/// every time it is covered, and how often it comes newly under cover from one draw to the next (which gives the standard error).
/// One counter for each thread; counts are whole numbers, so adding counters up gives the same result in any order.
/// </summary>
internal sealed class CoverageCounter(CellGrid grid, double halfWidthMetres)
{
    private const int Never = int.MinValue;

    private readonly int[] _lastDraw = Filled(grid.Count);

    /// <summary>Draws that covered the place at least once.</summary>
    public int[] Draws { get; } = new int[grid.Count];

    /// <summary>Times the place was covered, over all draws.</summary>
    public int[] Times { get; } = new int[grid.Count];

    /// <summary>Draws that covered the place where the draw before had not.</summary>
    public int[] Starts { get; } = new int[grid.Count];

    /// <summary>Counts one draw. Draws come in ascending order without gaps within a run of them.</summary>
    /// <param name="draw">Number of the draw.</param>
    /// <param name="pieces">Its pieces.</param>
    /// <param name="onlyRemember">Take it only as the predecessor of the next: a run starts with the draw before it.</param>
    public void Count(int draw, ReadOnlySpan<Piece> pieces, bool onlyRemember)
    {
        foreach (ref readonly var piece in pieces)
        {
            var strip = new Strip(piece, halfWidthMetres);
            for (var row = grid.FirstRowFrom(strip.LowY); row < grid.RowY.Length; row++)
            {
                var y = grid.RowY[row];
                if (y > strip.HighY)
                {
                    break;
                }

                if (strip.RangeAt(y, out var low, out var high))
                {
                    var (first, end) = grid.Run(row, low, high);
                    Mark(draw, first, end, onlyRemember);
                }
            }
        }
    }

    private void Mark(int draw, int first, int end, bool onlyRemember)
    {
        if (onlyRemember)
        {
            _lastDraw.AsSpan(first, end - first).Fill(draw);
            return;
        }

        var (last, draws, times, starts) = (_lastDraw, Draws, Times, Starts);
        for (var i = first; i < end; i++)
        {
            times[i]++;
            var before = last[i];
            if (before != draw)
            {
                last[i] = draw;
                draws[i]++;
                starts[i] += before == draw - 1 ? 0 : 1;
            }
        }
    }

    private static int[] Filled(int length)
    {
        var values = new int[length];
        Array.Fill(values, Never);
        return values;
    }
}
