using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>Boundaries across 180° and round a pole. Areas: the closed form for a cap, and the same shape elsewhere on the globe.</summary>
public class RoundTheGlobe
{
    // Area north of 80°: closed form, Snyder 1987 eq. 3-12, computed by AreaOf from a belt of plain degrees.
    private static readonly double CapArea =
        AreaOf.SquareKilometres(InMemory.Read(InMemory.MultiPolygon(["0 80, 90 80, 90 90, 0 90"]))) * 4;

    [Theory]
    [InlineData("179 10, -179 10, -179 11, 179 11", "cross 180°")]
    [InlineData("179 10, 181 10, 181 11, 179 11", "beyond 180°")]
    [InlineData("-181 10, -179 10, -179 11, -181 11", "beyond 180°")]
    public void A_box_across_180_degrees_is_as_large_as_elsewhere(string ring, string told)
    {
        var boundary = InMemory.Read(InMemory.Polygon(ring));
        var elsewhere = InMemory.Read(InMemory.Polygon("9 10, 11 10, 11 11, 9 11"));

        Assert.Equal(AreaOf.SquareKilometres(elsewhere), AreaOf.SquareKilometres(boundary), 1e-6);
        Assert.Contains(told, InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void A_hole_across_180_degrees_stays_in_its_shell()
    {
        var boundary = InMemory.Read(InMemory.Polygon("170 10, -170 10, -170 20, 170 20", "-179 12, 179 12, 179 14, -179 14"));
        var elsewhere = InMemory.Read(InMemory.Polygon("10 10, 30 10, 30 20, 10 20", "19 12, 21 12, 21 14, 19 14"));

        Assert.Equal(AreaOf.SquareKilometres(elsewhere), AreaOf.SquareKilometres(boundary), 1e-6);
    }

    [Theory]
    [InlineData("-180 80, -90 80, 0 80, 90 80")]
    [InlineData("0 80, 90 80, 180 80, 270 80")]
    [InlineData("-180 80, -90 80, 0 80, 90 80, 180 80, 180 90, -180 90")]
    [InlineData("-180 80, 180 80, 180 90, -180 90")]
    [InlineData("90 80, 0 80, -90 80, 180 80 open")]
    public void A_ring_round_the_pole_holds_the_pole_however_it_is_written(string ring)
    {
        var boundary = InMemory.Read(InMemory.Polygon(ring));

        Assert.Equal(1, AreaOf.SquareKilometres(boundary) / CapArea, 1e-6);
        var shell = boundary.Features[0].Polygons[0].Shell;
        Assert.Equal(360, Math.Abs(shell[^1].Lon - shell[0].Lon), 1e-9);
        Assert.Contains("round a pole", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void Sea_round_a_pole_with_land_round_the_pole_as_a_hole_is_a_belt()
    {
        var boundary = InMemory.Read(InMemory.Polygon("-180 -60, -90 -60, 0 -60, 90 -60", "-180 -80, -90 -80, 0 -80, 90 -80"));
        var quarter = InMemory.Read(InMemory.Polygon("0 -80, 90 -80, 90 -60, 0 -60"));

        Assert.Equal(1, AreaOf.SquareKilometres(boundary) / (4 * AreaOf.SquareKilometres(quarter)), 1e-6);
    }

    [Fact]
    public void A_square_round_the_pole_in_a_polar_plane_is_as_large_as_there()
    {
        // EPSG:6931 is equal-area: a million square kilometres stay so.
        const string square = """{"type":"Polygon","crs":{"type":"name","properties":{"name":"EPSG:6931"}},"coordinates":[[[-500000,-500000],[500000,-500000],[500000,500000],[-500000,500000],[-500000,-500000]]]}""";

        Assert.Equal(1, AreaOf.SquareKilometres(InMemory.Read(square)) / 1e6, 1e-6);
    }

    [Fact]
    public void A_square_with_the_pole_on_its_edge_is_as_large_as_in_its_plane()
    {
        const string square = """{"type":"Polygon","crs":{"type":"name","properties":{"name":"EPSG:6931"}},"coordinates":[[[0,-500000],[1000000,-500000],[1000000,500000],[0,500000],[0,-500000]]]}""";

        Assert.Equal(1, AreaOf.SquareKilometres(InMemory.Read(square)) / 1e6, 1e-6);
    }

    [Fact]
    public void An_outline_twice_round_the_globe_is_refused()
        => Assert.Contains("more than once", InMemory.Refusal(InMemory.Polygon("0 80, 120 80, 240 80, 0 81, 120 81, 240 81")), StringComparison.Ordinal);

    [Fact]
    public void The_core_plans_a_region_round_the_pole()
    {
        const string square = """{"type":"Polygon","crs":{"type":"name","properties":{"name":"EPSG:6931"}},"coordinates":[[[-500000,-500000],[500000,-500000],[500000,500000],[-500000,500000],[-500000,-500000]]]}""";
        var region = RegionBuilder.Build(InMemory.Read(square), new RegionDesign(), []);

        Assert.Equal(1, region.AreaKm2 / 1e6, 1e-6);
        Assert.Equal(1, region.GeodesicAreaKm2 / 1e6, 1e-6);
    }
}
