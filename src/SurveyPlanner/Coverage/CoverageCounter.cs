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

    // One more than there are places: a run may end behind the last.
    private readonly Ends[] _ends = Rent(grid.Count + 1);

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
                _now.Add(stretch.Row, first, end);
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
        var ends = counters[0]._ends;
        var places = counters[0].Places;
        var counts = new CoverageCounts(replicates, Unfilled(places), Unfilled(places), Unfilled(places));
        var blocks = places < WorthSharing ? 1 : counters.Length;
        int Start(int block) => (int)((long)places * block / blocks);

        // Each thread adds up a block of places; then it knows from what to go on in the next.
        var before = new Ends[blocks + 1];
        if (counters.Length > 1)
        {
            ForEach(blocks, block => before[block + 1] = AddUp(counters, Start(block), Start(block + 1)));
        }

        for (var block = 1; block < blocks; block++)
        {
            before[block] = before[block].Plus(before[block - 1]);
        }

        ForEach(blocks, block => WriteCounts(ends, before[block], Start(block), Start(block + 1), counts));
        foreach (var counter in counters)
        {
            // The next stratum's simulation takes it again.
            ArrayPool<Ends>.Shared.Return(counter._ends);
        }

        return counts;
    }

    private int Places => grid.Count;

    private static Ends[] Rent(int count)
    {
        var ends = ArrayPool<Ends>.Shared.Rent(count);
        ends.AsSpan(0, count).Clear();
        return ends;
    }

    private static int[] Unfilled(int length) => GC.AllocateUninitializedArray<int>(length);

    private static void ForEach(int blocks, Action<int> work)
    {
        if (blocks == 1)
        {
            work(0);
        }
        else
        {
            Parallel.For(0, blocks, work);
        }
    }

    /// <summary>Adds all counters to the first one, for some places. Returns the sum of those.</summary>
    private static Ends AddUp(CoverageCounter[] counters, int start, int end)
    {
        var (total, ends) = (default(Ends), counters[0]._ends);
        for (var i = start; i < end; i++)
        {
            for (var other = 1; other < counters.Length; other++)
            {
                ends[i] = ends[i].Plus(counters[other]._ends[i]);
            }

            total = total.Plus(ends[i]);
        }

        return total;
    }

    private static void WriteCounts(Ends[] ends, Ends sum, int start, int end, CoverageCounts counts)
    {
        for (var i = start; i < end; i++)
        {
            sum = sum.Plus(ends[i]);
            (counts.Draws[i], counts.Times[i], counts.Again[i]) = (sum.Draws, sum.Draws + sum.Repeats, sum.Again);
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
