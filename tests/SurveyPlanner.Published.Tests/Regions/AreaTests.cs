using System.Collections.Immutable;
using System.Globalization;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Published.Tests.Regions;

/// <summary>
/// Areas of public-domain boundaries (Natural Earth, US Census) with edges straight in longitude and latitude, as RFC 7946 says, computed with
/// GeographicLib on densified edges and matched to GDAL in EPSG:6933: tests/reference-data/regions/areas.tsv.
/// </summary>
public class AreaTests
{
    public static TheoryData<string> Files => [.. Rows().Select(row => row.File).Distinct()];

    [Theory]
    [MemberData(nameof(Files))]
    public void Plane_and_geodesic_area_agree_with_the_reference(string file)
    {
        var boundary = BoundaryReader.Read(ReferenceData.Path("regions", file + ".geojson"), new BoundaryOptions());
        foreach (var row in Rows().Where(row => row.File == file))
        {
            var one = boundary with { Features = [boundary.Features[row.Feature]] };
            var region = RegionBuilder.Build(one, new RegionDesign(), []);
            Assert.InRange(region.AreaKm2 / row.Km2, 1 - 1e-6, 1 + 1e-6);
            Assert.InRange(region.GeodesicAreaKm2 / row.Km2, 1 - 1e-6, 1 + 1e-6);
        }

        var whole = RegionBuilder.Build(boundary, new RegionDesign(), []);
        var total = Rows().Where(row => row.File == file).Sum(row => row.Km2);
        Assert.InRange(whole.AreaKm2 / total, 1 - 1e-6, 1 + 1e-6);
        Assert.InRange(whole.GeodesicAreaKm2 / whole.AreaKm2, 1 - 1e-6, 1 + 1e-6);
    }

    private static ImmutableArray<(string File, int Feature, double Km2)> Rows() =>
    [
        .. File.ReadLines(ReferenceData.Path("regions", "areas.tsv"))
            .Skip(1)
            .Select(line => line.Split('\t'))
            .Select(cells => (
                cells[0], int.Parse(cells[1], CultureInfo.InvariantCulture), double.Parse(cells[3], CultureInfo.InvariantCulture))),
    ];
}
