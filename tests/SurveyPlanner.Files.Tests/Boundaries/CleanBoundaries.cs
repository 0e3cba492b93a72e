using SurveyPlanner.Files.Boundaries;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>The public-domain regions; areas from areas.tsv beside them (GeographicLib and GDAL).</summary>
public class CleanBoundaries
{
    [Theory]
    [InlineData("antimeridian_fiji", 1, 44, 0)]
    [InlineData("inland_county_polygon", 1, 1, 0)]
    [InlineData("island_iceland", 1, 1, 0)]
    [InlineData("lake_caspian_with_islands", 1, 1, 11)]
    [InlineData("marine_archipelago_sea", 1, 1, 42)]
    [InlineData("polar_svalbard", 1, 21, 0)]
    [InlineData("strata_maine_counties", 16, 24, 0)]
    public void A_clean_file_is_read_whole_and_without_a_notice(string region, int features, int parts, int holes)
    {
        var boundary = BoundaryReader.Read(ReferenceFiles.Region(region + ".geojson"));

        Assert.Empty(boundary.Notices);
        Assert.Equal(features, boundary.Features.Length);
        var polygons = boundary.Features.SelectMany(feature => feature.Polygons).ToList();
        Assert.Equal((parts, holes), (polygons.Count, polygons.Sum(polygon => polygon.Holes.Length)));
        Assert.Equal(1, AreaOf.SquareKilometres(boundary) / Expected(region), 1e-9);
    }

    [Fact]
    public void A_region_across_180_degrees_lies_in_one_turn_of_longitude()
    {
        var longitudes = BoundaryReader.Read(ReferenceFiles.Region("antimeridian_fiji.geojson"))
            .Features.SelectMany(feature => feature.Polygons).SelectMany(polygon => polygon.Shell).Select(position => position.Lon).ToList();

        Assert.True(longitudes.Max() - longitudes.Min() < 8, $"{longitudes.Min()} to {longitudes.Max()}");
    }

    private static double Expected(string region)
        => File.ReadLines(ReferenceFiles.Region("areas.tsv")).Skip(1).Select(line => line.Split('\t'))
            .Where(cells => cells[0] == region)
            .Sum(cells => double.Parse(cells[3], System.Globalization.CultureInfo.InvariantCulture));
}
