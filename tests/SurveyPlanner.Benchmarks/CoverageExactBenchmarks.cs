using BenchmarkDotNet.Attributes;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Benchmarks;

/// <summary>Exact coverage of all cells, one thread: how it grows with vertices and with cells.</summary>
[ShortRunJob]
public class CoverageExactBenchmarks
{
    private LayoutGenerator _lines = null!;
    private LayoutGenerator _points = null!;
    private CellGrid _linesGrid = null!;
    private CellGrid _pointsGrid = null!;

    /// <summary>Vertices of the coast and cells of the grid.</summary>
    [ParamsSource(nameof(Sizes))]
    public Size Problem { get; set; } = null!;

    public static IEnumerable<Size> Sizes =>
    [
        new(1_000, 1_000_000), new(10_000, 1_000_000), new(100_000, 1_000_000), new(1_000_000, 1_000_000),
        new(100_000, 1_000), new(100_000, 10_000), new(100_000, 100_000),
    ];

    [GlobalSetup]
    public void Setup()
    {
        var island = CoverageScene.Island(Problem.Vertices);
        (_lines, _points) = (CoverageScene.Layout(island, LayoutKind.Parallel), CoverageScene.Layout(island, LayoutKind.PointGrid));
        (_linesGrid, _pointsGrid) = (CoverageScene.Cells(_lines, Problem.Cells), CoverageScene.Cells(_points, Problem.Cells));

        // The first look sorts the edges; that is measured by itself.
        Parallel();
        Point_grid();
    }

    [Benchmark]
    public object Parallel() => ExactCoverage.At(_lines, _linesGrid)!;

    [Benchmark]
    public object Point_grid() => ExactCoverage.At(_points, _pointsGrid)!;

    /// <summary>What comes before: edges sorted along and across the lines and into tiles, and the cells laid and cut.</summary>
    [Benchmark]
    public int Edges_sorted_and_cells_cut()
    {
        var layout = CoverageScene.Layout(_lines.Stratum.Stratum, LayoutKind.Parallel);
        return CoverageScene.Cells(layout, Problem.Cells).Count + layout.Stratum.Region.Tiles.GetHashCode() + layout.Stratum.LinesAcross.GetHashCode();
    }

    public sealed record Size(int Vertices, int Cells)
    {
        public override string ToString() => string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{Vertices:#,0} vertices, {Cells:#,0} cells");
    }
}
