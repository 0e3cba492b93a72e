using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>Whole-number counts of a simulation, place by place.</summary>
/// <param name="Replicates">Number of draws.</param>
/// <param name="Draws">Draws that covered the place at least once.</param>
/// <param name="Times">Times the place was covered, over all draws.</param>
/// <param name="Again">Draws that covered the place as their neighbour before did; the neighbour before the first is the last.</param>
internal sealed record CoverageCounts(int Replicates, int[] Draws, int[] Times, int[] Again)
{
    /// <summary>Share of draws that covered a place.</summary>
    public double Probability(int place) => (double)Draws[place] / Replicates;

    /// <summary>Mean number of times that a draw covered it.</summary>
    public double ExpectedTimes(int place) => (double)Times[place] / Replicates;

    /// <summary>
    /// Standard error of <see cref="Probability"/>, from differences between draws with neighbouring offsets: the square root of how often the place
    /// came newly under cover, over the number of draws. On the large side (proof in docs/methods/coverage.md); never below what one unseen
    /// change could hide.
    /// </summary>
    public double StandardError(int place) => Math.Sqrt(Math.Max(1, Draws[place] - Again[place])) / Replicates;
}

/// <summary>
/// Draws a layout many times and counts what is covered. The result depends on the seed alone, not on the number of threads.
/// </summary>
internal static class CoverageSimulation
{
    // Draws between two reports of progress: some microseconds each on ordinary regions.
    private const int DrawsPerReport = 16;

    private const int ShortestRun = 16;

    /// <param name="generator">The layout.</param>
    /// <param name="grid">The places to look at.</param>
    /// <param name="replicates">Number of draws, at least 1.</param>
    /// <param name="seed">Seed of the survey.</param>
    /// <param name="stratum">Index of the stratum, part of the counter of the random generator.</param>
    /// <param name="threads">Threads to use, at least 1.</param>
    /// <param name="stop">Stops the work; an <see cref="OperationCanceledException"/> follows.</param>
    /// <param name="progress">Told the share of draws done.</param>
    public static CoverageCounts Run(
        LayoutGenerator generator,
        CellGrid grid,
        int replicates,
        ulong seed,
        uint stratum,
        int threads,
        CancellationToken stop,
        ProgressPart? progress = null)
    {
        var offsets = new StratifiedOffsets(seed, stratum, replicates, generator.OffsetRanges.Length);
        var workers = Math.Clamp(threads, 1, replicates);
        var runs = RunsOfDraws(replicates, workers);
        var counters = new CoverageCounter[workers];
        var next = -1;
        void Report(int draws) => progress?.Add((double)draws / replicates);
        void Work(int worker)
        {
            var counter = counters[worker] = new CoverageCounter(grid, generator.Stratum.HalfWidthMetres);
            var buffer = new PieceBuffer();
            for (int run; (run = Interlocked.Increment(ref next)) < runs.Count;)
            {
                CountRun(generator, counter, buffer, offsets, runs[run].First, runs[run].End, Report, stop);
            }
        }

        if (workers == 1)
        {
            Work(0);
        }
        else
        {
            Parallel.For(0, workers, new ParallelOptions { MaxDegreeOfParallelism = workers, CancellationToken = stop }, Work);
        }

        progress?.Finish();
        return CoverageCounter.Sum(counters, replicates);
    }

    /// <summary>
    /// Draws shared out in runs, the first long and the last short: draws differ in what they meet, so that equal shares would leave threads waiting.
    /// Each run costs a draw more.
    /// </summary>
    private static List<(int First, int End)> RunsOfDraws(int draws, int workers)
    {
        var runs = new List<(int First, int End)>();
        for (var first = 0; first < draws;)
        {
            var length = workers == 1 ? draws : Math.Max((draws - first) / (2 * workers), ShortestRun);
            runs.Add((first, Math.Min(first + length, draws)));
            first = runs[^1].End;
        }

        return runs;
    }

    /// <summary>Counts neighbouring draws, from the first to before the end.</summary>
    private static void CountRun(
        LayoutGenerator generator,
        CoverageCounter counter,
        PieceBuffer buffer,
        StratifiedOffsets offsets,
        int first,
        int end,
        Action<int> report,
        CancellationToken stop)
    {
        var drawn = new double[generator.OffsetRanges.Length];
        void Draw(int draw, bool onlyRemember)
        {
            var random = offsets.Fill(draw, drawn);
            buffer.Clear();
            generator.Realise(drawn, ref random, buffer);
            counter.Count(buffer.Pieces, onlyRemember);
        }

        // The neighbour before the first: the range of the offset is a circle, so that of the very first is the last.
        Draw(first == 0 ? offsets.Draws - 1 : first - 1, onlyRemember: true);
        for (var draw = first; draw < end; draw++)
        {
            stop.ThrowIfCancellationRequested();
            Draw(draw, onlyRemember: false);
            var done = draw - first + 1;
            if (done % DrawsPerReport == 0 || draw == end - 1)
            {
                report(done % DrawsPerReport == 0 ? DrawsPerReport : done % DrawsPerReport);
            }
        }
    }
}
