using BenchmarkDotNet.Attributes;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Benchmarks;

/// <summary>A whole simulation on one thread and on two; coast of 10,000 vertices.</summary>
[SimpleJob(launchCount: 1, warmupCount: 5, iterationCount: 40)]
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

    [Params(1, 2)]
    public int Threads { get; set; }

    [GlobalSetup]
    public void Setup()
    {
        _layout = CoverageScene.Layout(CoverageScene.Island(10_000), Enum.Parse<LayoutKind>(Kind));
        _grid = CoverageScene.Cells(_layout, Problem.Cells);
    }

    [Benchmark]
    public object Simulation() => CoverageSimulation.Run(_layout, _grid, Problem.Draws, CoverageScene.Seed, 0, Threads, CancellationToken.None);

    public sealed record Size(int Cells, int Draws)
    {
        public override string ToString() => string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{Cells:#,0} cells, {Draws:#,0} draws");
    }
}
