using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Counts, over simulated draws in the order of their offsets, how often each place is covered: once for every draw that covers it at all,
/// every time it is covered, and how often a draw covers it that the draw before covered too (which gives the standard error).
/// One counter for each thread; counts are whole numbers, so adding counters up gives the same result in any order.
/// </summary>
/// <remarks>
/// A run of places is counted at its two ends only: one more from its first place on, one less from its end on. Summing up along the places at
/// the very end gives the counts, so that the work of a draw grows with the rows that its strips meet, not with the places that they cover.
/// </remarks>
internal sealed class CoverageCounter(CellGrid grid, double halfWidthMetres)
{
    private readonly int[] _draws = new int[grid.Count + 1];
    private readonly int[] _times = new int[grid.Count + 1];
    private readonly int[] _again = new int[grid.Count + 1];
    private RowRuns _now = new(grid.RowY.Length);
    private RowRuns _before = new(grid.RowY.Length);

    /// <summary>Counts one draw, the one that follows in order on that of the last call.</summary>
    /// <param name="pieces">Its pieces.</param>
    /// <param name="onlyRemember">Take it only as the predecessor of the next: a run of draws starts with the one before it.</param>
    public void Count(ReadOnlySpan<Piece> pieces, bool onlyRemember)
    {
        (_now, _before) = (_before, _now);
        _now.Clear();
        foreach (ref readonly var piece in pieces)
        {
            Cover(new Strip(piece, halfWidthMetres), onlyRemember);
        }

        if (!onlyRemember)
        {
            foreach (var row in _now.Rows)
            {
                CountRow(row);
            }
        }
    }

    /// <summary>The counts of several counters together.</summary>
    public static CoverageCounts Sum(IReadOnlyList<CoverageCounter> counters, int replicates)
    {
        int[] Added(Func<CoverageCounter, int[]> ends)
        {
            var total = ends(counters[0]);
            foreach (var counter in counters.Skip(1))
            {
                Add(total, ends(counter));
            }

            var running = 0;
            for (var i = 0; i < total.Length; i++)
            {
                total[i] = running += total[i];
            }

            return total;
        }

        return new CoverageCounts(replicates, Added(one => one._draws), Added(one => one._times), Added(one => one._again));
    }

    private void Cover(in Strip strip, bool onlyRemember)
    {
        for (var row = grid.FirstRowFrom(strip.LowY); row < grid.RowY.Length; row++)
        {
            var y = grid.RowY[row];
            if (y > strip.HighY)
            {
                return;
            }

            strip.RangeAt(y, out var low, out var high);
            var (first, end) = grid.Run(row, low, high);
            if (first >= end)
            {
                continue;
            }

            _now.Add(row, first, end);
            if (!onlyRemember)
            {
                CountRun(_times, first, end);
            }
        }
    }

    private void CountRow(int row)
    {
        var before = _before.FirstOf(row);
        for (var run = _now.FirstOf(row); run != 0; run = _now[run].Next)
        {
            var (first, end) = (_now[run].First, _now[run].End);
            CountRun(_draws, first, end);
            while (before != 0)
            {
                ref readonly var earlier = ref _before[before];
                var (from, to) = (Math.Max(first, earlier.First), Math.Min(end, earlier.End));
                if (from < to)
                {
                    CountRun(_again, from, to);
                }

                // The earlier run may reach into the next one of this draw too.
                if (earlier.End > end)
                {
                    break;
                }

                before = earlier.Next;
            }
        }
    }

    private static void CountRun(int[] ends, int first, int end)
    {
        ends[first]++;
        ends[end]--;
    }

    private static void Add(int[] into, int[] other)
    {
        for (var i = 0; i < into.Length; i++)
        {
            into[i] += other[i];
        }
    }
}
