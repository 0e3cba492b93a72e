using System.Text.Json;
using NetTopologySuite.Features;
using NetTopologySuite.IO.Converters;
using SurveyPlanner.Files.Boundaries;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>Our GeoJSON reader against NetTopologySuite's, on the clean regions: the same positions in the same number, feature by feature.</summary>
public class SecondReader
{
    private static readonly JsonSerializerOptions Options = new() { Converters = { new GeoJsonConverterFactory() } };

    [Theory]
    [InlineData("inland_county_polygon")]
    [InlineData("island_iceland")]
    [InlineData("lake_caspian_with_islands")]
    [InlineData("marine_archipelago_sea")]
    [InlineData("polar_svalbard")]
    [InlineData("strata_maine_counties")]
    public void Both_find_the_same_positions(string region)
    {
        var path = ReferenceFiles.Region(region + ".geojson");
        var theirs = JsonSerializer.Deserialize<FeatureCollection>(File.ReadAllBytes(path), Options)!;

        var ours = BoundaryReader.Read(path);

        Assert.Equal(theirs.Count, ours.Features.Length);
        for (var i = 0; i < theirs.Count; i++)
        {
            var expected = theirs[i].Geometry.Coordinates.Select(coordinate => (coordinate.X, coordinate.Y)).Order();
            var found = ours.Features[i].Polygons.SelectMany(polygon => polygon.Holes.Prepend(polygon.Shell)).SelectMany(ring => ring).Select(position => (position.Lon, position.Lat)).Order();
            Assert.Equal(expected, found);
        }
    }
}
