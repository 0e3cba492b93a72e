using System.Buffers;
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
    // So few places are added up sooner than other threads have begun.
    private const int WorthSharing = 1 << 16;

    // Row after row, each with one more than it has places: a run may end behind the last. So every row adds up for itself.
    private readonly Ends[] _ends = Rent(grid.Count + grid.RowY.Length);

    private readonly StripRows _strips = new(grid, halfWidthMetres);
    private RowRuns _now = new(grid.RowY.Length);
    private RowRuns _before = new(grid.RowY.Length);

    /// <summary>Counts one draw, the one that follows in order on that of the last call.</summary>
    /// <param name="pieces">Its pieces.</param>
    /// <param name="onlyRemember">Take it only as the predecessor of the next: a run of draws starts with the one before it.</param>
    public void Count(ReadOnlySpan<Piece> pieces, bool onlyRemember)
    {
        (_now, _before) = (_before, _now);
        _now.Clear();
        foreach (ref readonly var stretch in _strips.Of(pieces))
        {
            var (first, end) = grid.Run(stretch.Row, stretch.Low, stretch.High);
            if (first < end)
            {
                _now.Add(stretch.Row, first + stretch.Row, end + stretch.Row);
            }
        }

        if (onlyRemember)
        {
            return;
        }

        foreach (var row in _now.Rows)
        {
            CountRow(row);
        }

        foreach (var (first, end) in _now.Overlaps)
        {
            _ends[first].Repeats++;
            _ends[end].Repeats--;
        }
    }

    /// <summary>The counts of several counters together, on as many threads. The counters are used up by it.</summary>
    public static CoverageCounts Sum(CoverageCounter[] counters, int replicates)
    {
        var grid = counters[0].Grid;
        var counts = new CoverageCounts(replicates, Unfilled(grid.Count), Unfilled(grid.Count), Unfilled(grid.Count));
        var ends = Array.ConvertAll(counters, counter => counter._ends);
        if (counters.Length == 1 || grid.Count < WorthSharing)
        {
            AddUp(ends, grid, 0, grid.RowY.Length, counts);
        }
        else
        {
            int RowAt(int block) => grid.RowOf((int)((long)grid.Count * block / counters.Length));
            Parallel.For(0, counters.Length, block => AddUp(ends, grid, RowAt(block), RowAt(block + 1), counts));
        }

        foreach (var one in ends)
        {
            // The next stratum's simulation takes it again.
            ArrayPool<Ends>.Shared.Return(one);
        }

        return counts;
    }

    private CellGrid Grid => grid;

    private static Ends[] Rent(int count)
    {
        var ends = ArrayPool<Ends>.Shared.Rent(count);
        ends.AsSpan(0, count).Clear();
        return ends;
    }

    private static int[] Unfilled(int length) => GC.AllocateUninitializedArray<int>(length);

    /// <summary>Adds up some rows of all counters.</summary>
    private static void AddUp(Ends[][] counters, CellGrid grid, int firstRow, int endRow, CoverageCounts counts)
    {
        for (var row = firstRow; row < endRow; row++)
        {
            var sum = default(Ends);
            for (var place = grid.RowStarts[row]; place < grid.RowStarts[row + 1]; place++)
            {
                foreach (var ends in counters)
                {
                    sum = sum.Plus(ends[place + row]);
                }

                (counts.Draws[place], counts.Times[place], counts.Again[place]) = (sum.Draws, sum.Draws + sum.Repeats, sum.Again);
            }
        }
    }

    private void CountRow(int row)
    {
        ref readonly var now = ref _now[row];
        ref readonly var before = ref _before[row];
        while (true)
        {
            _ends[now.First].Draws++;
            _ends[now.End].Draws--;
            while (true)
            {
                var (from, to) = (Larger(now.First, before.First), -Larger(-now.End, -before.End));
                if (from < to)
                {
                    _ends[from].Again++;
                    _ends[to].Again--;
                }

                // The earlier run may reach into the next one of this draw too.
                if (before.Next == 0 || before.End > now.End)
                {
                    break;
                }

                before = ref _before[before.Next];
            }

            if (now.Next == 0)
            {
                return;
            }

            now = ref _now[now.Next];
        }
    }

    /// <summary>The larger of two indices, without a branch, which would be foretold wrongly every other time.</summary>
    private static int Larger(int a, int b) => a + ((b - a) & ~((b - a) >> 31));

    /// <summary>What changes from one place to the next; the three side by side, since they mostly change at the same places.</summary>
    private struct Ends
    {
        public int Draws;
        public int Repeats;
        public int Again;

        public readonly Ends Plus(Ends other)
            => new() { Draws = Draws + other.Draws, Repeats = Repeats + other.Repeats, Again = Again + other.Again };
    }
}
