using SurveyPlanner.Files.Boundaries;

namespace SurveyPlanner.Files.Tests.Boundaries;

public class BoundarySetTests
{
    [Fact]
    public void Each_of_several_files_is_a_stratum_named_by_it()
    {
        var set = BoundarySet.Read(
            [ReferenceData.Path("regions", "inland_county_polygon.geojson"), ReferenceData.Path("regions", "island_iceland.geojson")], [], null);
        Assert.Equal(BoundarySet.FileField, set.StratumField);
        Assert.Equal(
            ["inland_county_polygon", "island_iceland"], set.Boundary.Features.Select(feature => feature.Attributes[BoundarySet.FileField]));
        Assert.Equal([1, 2], set.Boundary.Features.Select(feature => feature.Number));
    }

    [Fact]
    public void One_file_stays_as_it_is()
    {
        var set = BoundarySet.Read([ReferenceData.Path("regions", "island_iceland.geojson")], [], null);
        Assert.Null(set.StratumField);
        Assert.False(set.Boundary.Features[0].Attributes.ContainsKey(BoundarySet.FileField));
    }
}
