using BenchmarkDotNet.Attributes;
using NetTopologySuite;
using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Prepared;
using NetTopologySuite.Operation.Buffer;
using NetTopologySuite.Operation.Overlay;
using NetTopologySuite.Operation.OverlayNG;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Benchmarks;

/// <summary>
/// One simulated draw (mean of a run of 1,000) on a coast of 10,000 vertices with 10,000 cells, one thread; and the same work done by general
/// overlay: all lines clipped as one, buffered with flat ends, every cell's place asked for in the prepared result.
/// </summary>
[SimpleJob(launchCount: 1, warmupCount: 5, iterationCount: 40)]
[MinColumn, MedianColumn]
public class CoverageSimulationBenchmarks
{
    private const int Vertices = 10_000;
    private const int Cells = 10_000;
    private const int Draws = 1000;

    private Scene _parallel = null!;
    private Scene _zigzag = null!;
    private Scene _points = null!;
    private GeometryFactory _factory = null!;
    private Polygon _island = null!;
    private Point[] _places = null!;
    private int _draw;

    [GlobalSetup]
    public void Setup()
    {
        var island = CoverageScene.Island(Vertices);
        (_parallel, _zigzag, _points) = (Make(LayoutKind.Parallel), Make(LayoutKind.Zigzag), Make(LayoutKind.PointGrid));
        _factory = new NtsGeometryServices(GeometryOverlay.NG).CreateGeometryFactory();
        var (frame, shape, grid) = (_parallel.Layout.Stratum.Frame, island.Shape, _parallel.Grid);
        Coordinate Turned(double x, double y)
        {
            var place = frame.ToFrame(x, y);
            return new Coordinate(place.X, place.Y);
        }

        var ring = Enumerable.Range(0, Vertices + 1).Select(i => Turned(shape.X[i % Vertices], shape.Y[i % Vertices]));
        _island = _factory.CreatePolygon([.. ring]);
        _places = new Point[grid.Count];
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                _places[i] = _factory.CreatePoint(new Coordinate(grid.X[i], grid.RowY[row]));
            }
        }

        Scene Make(LayoutKind kind)
        {
            var layout = CoverageScene.Layout(island, kind);
            return new Scene(layout, CoverageScene.Cells(layout, Cells));
        }
    }

    [Benchmark(Baseline = true)]
    public int General_overlay_parallel()
    {
        var region = _parallel.Layout.Stratum.Region;
        var offset = (_draw++ % Draws + 0.5) / Draws;
        var lines = new List<LineString>();
        for (var y = region.MinY + (offset * CoverageScene.SpacingMetres); y < region.MaxY; y += CoverageScene.SpacingMetres)
        {
            lines.Add(_factory.CreateLineString([new Coordinate(region.MinX - 1, y), new Coordinate(region.MaxX + 1, y)]));
        }

        var clipped = OverlayNGRobust.Overlay(_factory.CreateMultiLineString([.. lines]), _island, SpatialFunction.Intersection);
        var strips = BufferOp.Buffer(clipped, CoverageScene.HalfWidthMetres, new BufferParameters(8, EndCapStyle.Flat));
        var prepared = PreparedGeometryFactory.Prepare(strips);
        return _places.Count(prepared.Contains);
    }

    [Benchmark(OperationsPerInvoke = Draws)]
    public object Parallel() => Simulate(_parallel);

    [Benchmark(OperationsPerInvoke = Draws)]
    public object Zigzag() => Simulate(_zigzag);

    [Benchmark(OperationsPerInvoke = Draws)]
    public object Point_grid() => Simulate(_points);

    private static CoverageCounts Simulate(Scene scene)
        => CoverageSimulation.Run(scene.Layout, scene.Grid, Draws, CoverageScene.Seed, 0, threads: 1, CancellationToken.None);

    private sealed record Scene(LayoutGenerator Layout, CellGrid Grid);
}
