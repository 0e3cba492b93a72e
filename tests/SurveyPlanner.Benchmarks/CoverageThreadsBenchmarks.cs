using BenchmarkDotNet.Attributes;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Benchmarks;

/// <summary>
/// A whole simulation on one thread and on two; and two simulations on one thread each, at once, which share nothing: what the machine gives two
/// threads at best, virtual cores being shared with whom one does not see. Coast of 10,000 vertices.
/// </summary>
[SimpleJob(launchCount: 1, warmupCount: 5, iterationCount: 20)]
[MinColumn, MedianColumn]
public class CoverageThreadsBenchmarks
{
    private LayoutGenerator _layout = null!;
    private CellGrid _grid = null!;

    /// <summary>Cells of the grid and draws of the simulation.</summary>
    [ParamsSource(nameof(Sizes))]
    public Size Problem { get; set; } = null!;

    public static IEnumerable<Size> Sizes => [new(10_000, 1000), new(10_000, 10_000), new(1_000_000, 1000)];

    [Params("Parallel", "Zigzag", "PointGrid")]
    public string Kind { get; set; } = "";

    [GlobalSetup]
    public void Setup()
    {
        _layout = CoverageScene.Layout(CoverageScene.Island(10_000), Enum.Parse<LayoutKind>(Kind));
        _grid = CoverageScene.Cells(_layout, Problem.Cells);
    }

    [Benchmark(Baseline = true)]
    public object One_thread() => Simulate(1);

    [Benchmark]
    public object Two_threads() => Simulate(2);

    [Benchmark]
    public void Two_simulations_at_once() => Parallel.Invoke(() => Simulate(1), () => Simulate(1));

    private CoverageCounts Simulate(int threads)
        => CoverageSimulation.Run(_layout, _grid, Problem.Draws, CoverageScene.Seed, 0, threads, CancellationToken.None);

    public sealed record Size(int Cells, int Draws)
    {
        public override string ToString() => string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{Cells:#,0} cells, {Draws:#,0} draws");
    }
}
