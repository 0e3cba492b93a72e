using System.Collections.Immutable;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class LonLatPathTests
{
    private const double HalfWidthMetres = 300;

    [Theory]
    [InlineData(-150.5, 63.1, -50_000, 5_000, 50_000, 5_000)]
    [InlineData(-150.5, 63.1, 40_000, -300_000, -70_000, 350_000)]
    [InlineData(179.9, 78, -200_000, 10_000, 200_000, -30_000)]
    [InlineData(20, 89.9, -300_000, 40_000, 300_000, 41_000)]
    [InlineData(0, -30, -500_000, -500_000, 500_000, 500_000)]
    public void Edges_straight_in_longitude_and_latitude_stay_on_the_transect(double lon, double lat, double fromX, double fromY, double toX, double toY)
    {
        var projection = new AzimuthalEqualArea(new LonLat(lon, lat));
        var piece = Piece(projection, new PlanePoint(fromX, fromY), new PlanePoint(toX, toY));

        var path = LonLatPath.Of(piece, projection, HalfWidthMetres);

        // Second method: walk along the drawn edges in small steps and see, in the plane, how far each place lies from the transect.
        // Most are needed where a line passes near the pole.
        Assert.InRange(path.Length, 3, 400);
        Assert.Equal((piece.Positions[0], piece.Positions[1]), (path[0], path[^1]));
        var (dx, dy) = (toX - fromX, toY - fromY);
        var length = Math.Sqrt((dx * dx) + (dy * dy));
        foreach (var place in AlongEdges(path))
        {
            var plane = projection.Project(place);
            var off = Math.Abs(((plane.X - fromX) * dy) - ((plane.Y - fromY) * dx)) / length;
            Assert.InRange(off, 0, 0.03 * HalfWidthMetres);
        }
    }

    [Fact]
    public void A_short_line_or_one_along_a_meridian_gets_no_vertex_more()
    {
        var projection = new AzimuthalEqualArea(new LonLat(10, 50));

        Assert.Equal(2, LonLatPath.Of(Piece(projection, new PlanePoint(0, 0), new PlanePoint(2000, 100)), projection, 20).Length);
        Assert.Equal(2, LonLatPath.Of(Piece(projection, new PlanePoint(0, -90_000), new PlanePoint(0, 90_000)), projection, HalfWidthMetres).Length);
    }

    [Fact]
    public void A_line_over_the_pole_itself_comes_to_an_end()
    {
        var projection = new AzimuthalEqualArea(new LonLat(0, 90));

        var path = LonLatPath.Of(Piece(projection, new PlanePoint(-50_000, 0), new PlanePoint(50_000, 0)), projection, HalfWidthMetres);

        Assert.InRange(path.Length, 3, 100);
        Assert.True(path.Max(place => place.Lat) > 89.999);
    }

    private static TransectPiece Piece(EqualAreaProjection projection, PlanePoint from, PlanePoint to) =>
        new([from, to], [projection.Unproject(from), projection.Unproject(to)]);

    private static IEnumerable<LonLat> AlongEdges(ImmutableArray<LonLat> path) =>
        from edge in path.Zip(path.Skip(1))
        from step in Enumerable.Range(0, 21)
        let share = step / 20.0
        select new LonLat(
            edge.First.Lon + (share * Longitude.Difference(edge.First.Lon, edge.Second.Lon)),
            edge.First.Lat + (share * (edge.Second.Lat - edge.First.Lat)));
}
