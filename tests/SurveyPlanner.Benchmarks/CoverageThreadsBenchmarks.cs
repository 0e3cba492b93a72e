using BenchmarkDotNet.Attributes;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Benchmarks;

/// <summary>A whole simulation of 1,000 draws on one thread and on two; coast of 10,000 vertices.</summary>
[SimpleJob(launchCount: 1, warmupCount: 5, iterationCount: 15)]
public class CoverageThreadsBenchmarks
{
    private LayoutGenerator _layout = null!;
    private CellGrid _grid = null!;

    [Params(10_000, 1_000_000)]
    public int Cells { get; set; }

    [Params("Parallel", "Zigzag", "PointGrid")]
    public string Kind { get; set; } = "";

    [Params(1, 2)]
    public int Threads { get; set; }

    [GlobalSetup]
    public void Setup()
    {
        _layout = CoverageScene.Layout(CoverageScene.Island(10_000), Enum.Parse<LayoutKind>(Kind));
        _grid = CoverageScene.Cells(_layout, Cells);
    }

    [Benchmark]
    public object Simulation() => CoverageSimulation.Run(_layout, _grid, 1000, CoverageScene.Seed, 0, Threads, CancellationToken.None);
}
