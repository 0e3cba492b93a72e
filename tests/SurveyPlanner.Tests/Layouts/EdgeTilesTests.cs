using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>Held against looking at every edge.</summary>
public class EdgeTilesTests
{
    [Fact]
    public void The_distance_to_the_boundary_is_that_to_the_nearest_of_all_edges()
    {
        foreach (var stratum in RandomShapes.Sample(100))
        {
            var shape = new FrameShape(stratum.Shape, new TurnedFrame(0));
            foreach (var (x, y) in Places(stratum.Shape, 40))
            {
                var expected = Edges(stratum.Shape).Min(edge => Distance(edge, x, y));
                Assert.Equal(expected, shape.Tiles.Distance(x, y, limit: 1e9), 1e-6);
                Assert.Equal(Math.Min(expected, 700), shape.Tiles.Distance(x, y, limit: 700), 1e-6);
                Assert.InRange(shape.Tiles.Clearance(x, y), 0, expected + 1e-6);
            }
        }
    }

    [Fact]
    public void A_box_yields_every_edge_that_passes_through_it()
    {
        foreach (var stratum in RandomShapes.Sample(100))
        {
            var shape = new FrameShape(stratum.Shape, new TurnedFrame(0));
            foreach (var (x, y) in Places(stratum.Shape, 20))
            {
                var found = new HashSet<int>();
                foreach (var edge in shape.Tiles.In(x - 500, x + 500, y - 500, y + 500))
                {
                    found.Add(edge);
                }

                var near = Edges(stratum.Shape).Select((edge, i) => (edge, i)).Where(one => Distance(one.edge, x, y) < 500).Select(one => one.i);
                Assert.Superset(near.ToHashSet(), found);
            }
        }
    }

    private static IEnumerable<(double X, double Y)> Places(PlaneShape shape, int count)
    {
        var random = new PhiloxStream(1, 99, 0, (uint)shape.VertexCount);
        for (var i = 0; i < count; i++)
        {
            yield return (
                shape.MinX + (random.NextDouble() * (shape.MaxX - shape.MinX)),
                shape.MinY + (random.NextDouble() * (shape.MaxY - shape.MinY)));
        }
    }

    /// <summary>Edges in the order in which a shape keeps them: from each vertex to the next of its ring.</summary>
    private static IEnumerable<(double X0, double Y0, double X1, double Y1)> Edges(PlaneShape shape)
    {
        for (var ring = 0; ring < shape.RingCount; ring++)
        {
            var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
            for (var i = start; i < end; i++)
            {
                var next = i + 1 == end ? start : i + 1;
                yield return (shape.X[i], shape.Y[i], shape.X[next], shape.Y[next]);
            }
        }
    }

    private static double Distance((double X0, double Y0, double X1, double Y1) edge, double x, double y)
        => NetTopologySuite.Algorithm.DistanceComputer.PointToSegment(
            new NetTopologySuite.Geometries.Coordinate(x, y),
            new NetTopologySuite.Geometries.Coordinate(edge.X0, edge.Y0),
            new NetTopologySuite.Geometries.Coordinate(edge.X1, edge.Y1));
}
