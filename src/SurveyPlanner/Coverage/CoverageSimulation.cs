using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>Whole-number counts of a simulation, place by place.</summary>
internal sealed record CoverageCounts(int Replicates, int[] Draws, int[] Times, int[] Starts);

/// <summary>
/// Draws a layout many times and counts what is covered. The result depends on the seed alone, not on the number of threads.
/// </summary>
internal static class CoverageSimulation
{
    /// <param name="generator">The layout.</param>
    /// <param name="grid">The places to look at.</param>
    /// <param name="replicates">Number of draws, at least 1.</param>
    /// <param name="seed">Seed of the survey.</param>
    /// <param name="stratum">Index of the stratum, part of the counter of the random generator.</param>
    /// <param name="threads">Threads to use, at least 1.</param>
    /// <param name="stop">Stops the work; an <see cref="OperationCanceledException"/> follows.</param>
    public static CoverageCounts Run(
        LayoutGenerator generator, CellGrid grid, int replicates, ulong seed, uint stratum, int threads, CancellationToken stop)
    {
        var offsets = new StratifiedOffsets(seed, stratum, replicates, generator.OffsetRanges.Length);
        var workers = Math.Clamp(threads, 1, replicates);
        var counters = new CoverageCounter[workers];
        void Work(int worker)
        {
            // Each worker takes a run of neighbouring draws and first looks at the one before it.
            var (first, end) = ((int)((long)replicates * worker / workers), (int)((long)replicates * (worker + 1) / workers));
            counters[worker] = CountRun(generator, grid, offsets, first, end, stop);
        }

        if (workers == 1)
        {
            Work(0);
        }
        else
        {
            Parallel.For(0, workers, new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = stop }, Work);
        }

        foreach (var other in counters.Skip(1))
        {
            Add(counters[0].Draws, other.Draws);
            Add(counters[0].Times, other.Times);
            Add(counters[0].Starts, other.Starts);
        }

        return new CoverageCounts(replicates, counters[0].Draws, counters[0].Times, counters[0].Starts);
    }

    private static CoverageCounter CountRun(
        LayoutGenerator generator, CellGrid grid, StratifiedOffsets offsets, int first, int end, CancellationToken stop)
    {
        var counter = new CoverageCounter(grid, generator.Stratum.HalfWidthMetres);
        var buffer = new PieceBuffer();
        Span<double> drawn = stackalloc double[generator.OffsetRanges.Length];
        for (var draw = Math.Max(0, first - 1); draw < end; draw++)
        {
            stop.ThrowIfCancellationRequested();
            var random = offsets.Fill(draw, drawn);
            buffer.Clear();
            generator.Realise(drawn, ref random, buffer);
            counter.Count(draw, buffer.Pieces, onlyRemember: draw < first);
        }

        return counter;
    }

    private static void Add(int[] into, int[] other)
    {
        for (var i = 0; i < into.Length; i++)
        {
            into[i] += other[i];
        }
    }
}
