using CsCheck;
using NetTopologySuite.Geometries;
using NetTopologySuite.Simplify;
using SurveyPlanner.Pages.Maps;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Pages.Tests.Maps;

public class SimplifyTests
{
    // A star-shaped ring with a rough edge.
    private static readonly Gen<Pixel[]> Rings =
        from radii in Gen.Double[20, 60].Array[4, 200]
        select radii.Select((radius, i) => new Pixel(100 + (radius * Math.Cos(2 * Math.PI * i / radii.Length)), 100 + (radius * Math.Sin(2 * Math.PI * i / radii.Length)))).ToArray();

    [Fact]
    public void No_vertex_left_out_is_further_than_half_a_pixel_from_what_is_drawn()
        => Rings.Hold(
            300, seed: 1,
            ring =>
            {
                var simple = RingSimplifier.Simplify(ring);
                Assert.True(ring.All(vertex => Enumerable.Range(0, simple.Length).Min(i => RingSimplifier.DistanceToSegment(vertex, simple[i], simple[(i + 1) % simple.Length])) <= 0.5 + 1e-9));
            });

    /// <summary>Second method: NetTopologySuite's Douglas-Peucker on the two halves between the same anchors.</summary>
    [Fact]
    public void The_same_vertices_stay_as_by_a_second_implementation()
        => Rings.Hold(
            300, seed: 1,
            ring =>
            {
                var far = Array.IndexOf(ring, ring.MaxBy(vertex => vertex.DistanceTo(ring[0])));
                var halves = new[] { ring[..(far + 1)], [.. ring[far..], ring[0]] };
                var expected = halves.SelectMany(half => Second(half).SkipLast(1)).ToArray();
                Assert.True(expected.SequenceEqual(RingSimplifier.Simplify(ring)));
            });

    [Fact]
    public void A_stair_of_tiny_steps_becomes_a_straight_line()
    {
        Pixel[] ring = [.. Enumerable.Range(0, 100).Select(i => new Pixel(i, i % 2 * 0.3)), new Pixel(99, 50), new Pixel(0, 50)];
        Assert.InRange(RingSimplifier.Simplify(ring).Length, 4, 6);
    }

    private static IEnumerable<Pixel> Second(Pixel[] line)
    {
        var geometry = new GeometryFactory().CreateLineString([.. line.Select(p => new Coordinate(p.X, p.Y))]);
        return DouglasPeuckerSimplifier.Simplify(geometry, RingSimplifier.TolerancePixels).Coordinates.Select(c => new Pixel(c.X, c.Y));
    }
}
