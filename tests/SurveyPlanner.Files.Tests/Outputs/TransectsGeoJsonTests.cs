using System.Text;
using System.Text.Json;
using NetTopologySuite.Features;
using NetTopologySuite.Geometries;
using NetTopologySuite.IO.Converters;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class TransectsGeoJsonTests
{
    private static readonly JsonSerializerOptions NetTopologySuiteOptions = new() { Converters = { new GeoJsonConverterFactory() } };

    [Fact]
    public void Another_reader_finds_every_transect_with_its_geometry_and_properties()
    {
        var features = ReadByNetTopologySuite(TestPlans.TwoStrata());

        Assert.Equal(4, features.Count);
        var line = Assert.IsType<LineString>(features[0].Geometry);
        Assert.Equal([new Coordinate(-150.6, 63.0), new Coordinate(-150.6, 63.2)], line.Coordinates);
        Assert.Equal(2, Assert.IsType<MultiLineString>(features[1].Geometry).NumGeometries);
        Assert.Equal(new Coordinate(-150.4, 63.05), Assert.IsType<Point>(features[2].Geometry).Coordinate);
        var attributes = features[0].Attributes;
        Assert.Equal("A001", attributes["id"]);
        Assert.Equal("Inner bay", attributes["stratum"]);
        Assert.Equal(1, Convert.ToInt32(attributes["order"], null));
        Assert.Equal(22289.457, Convert.ToDouble(attributes["length_m"], null), 1e-9);
        Assert.Equal(0.0, Convert.ToDouble(attributes["bearing_deg"], null));
        Assert.Equal(TestPlans.HostileName, features[2].Attributes["stratum"]);
    }

    [Fact]
    public void What_does_not_apply_to_a_point_is_left_out()
    {
        using var document = Parse(TestPlans.TwoStrata());
        var properties = document.RootElement.GetProperty("features")[2].GetProperty("properties");

        Assert.Equal(["id", "stratum", "order"], properties.EnumerateObject().Select(property => property.Name));
    }

    [Fact]
    public void Coverage_along_a_line_is_given_where_it_is_known()
    {
        using var document = Parse(TestPlans.TwoStrata());
        var properties = document.RootElement.GetProperty("features").EnumerateArray().Select(feature => feature.GetProperty("properties")).ToArray();

        Assert.Equal(0.125, properties[0].GetProperty("coverage").GetDouble());
        Assert.All(properties[1..], one => Assert.False(one.TryGetProperty("coverage", out _)));
    }

    [Fact]
    public void The_layouts_own_bytes_are_the_file_without_coverage()
    {
        var plan = TestPlans.TwoStrata();
        var bare = plan with { Strata = [.. plan.Strata.Select(stratum => stratum with { Coverage = null })] };

        Assert.Equal(Text(TransectsGeoJson.LayoutBytes(plan)), Text(TransectsGeoJson.Write(bare).Content));
        Assert.NotEqual(Text(TransectsGeoJson.LayoutBytes(plan)), Text(TransectsGeoJson.Write(plan).Content));
    }

    [Fact]
    public void A_line_across_180_becomes_a_multi_line_and_the_box_reaches_over_it()
    {
        var plan = TestPlans.OneStratum(new LonLat(180, -18), TestPlans.Line("F1", 1, 90, TestPlans.Path(179.99, -18, -179.99, -17.999)));

        using var document = Parse(plan);

        var root = document.RootElement;
        Assert.Equal("[179.99,-18,-179.99,-17.999]", root.GetProperty("bbox").GetRawText());
        var geometry = root.GetProperty("features")[0].GetProperty("geometry");
        Assert.Equal("MultiLineString", geometry.GetProperty("type").GetString());
        Assert.Equal("[[[179.99,-18],[180,-17.9995]],[[-180,-17.9995],[-179.99,-17.999]]]", geometry.GetProperty("coordinates").GetRawText());
    }

    [Fact]
    public void Members_are_only_those_RFC_7946_defines_and_no_crs()
    {
        using var document = Parse(TestPlans.TwoStrata());

        Assert.Equal(["type", "bbox", "features"], document.RootElement.EnumerateObject().Select(member => member.Name));
        Assert.All(document.RootElement.GetProperty("features").EnumerateArray(), feature =>
            Assert.Equal(["type", "id", "geometry", "properties"], feature.EnumerateObject().Select(member => member.Name)));
    }

    [Fact]
    public void Every_coordinate_has_at_most_seven_decimals_and_none_is_minus_zero()
    {
        var plan = TestPlans.OneStratum(
            new LonLat(0, 0), TestPlans.Line("Z1", 1, 0, TestPlans.Path(-0.00000001, -0.0, 1.0 / 3, 2.0 / 3, 1e-6, 1e-9)));

        using var document = Parse(plan);

        var coordinates = document.RootElement.GetProperty("features")[0].GetProperty("geometry").GetProperty("coordinates").GetRawText();
        Assert.Equal("[[0,0],[0.3333333,0.6666667],[0.000001,0]]", coordinates);
    }

    [Fact]
    public void A_survey_that_drew_nothing_is_an_empty_collection_without_a_box()
    {
        Assert.Equal(
            "{\"type\":\"FeatureCollection\",\"features\":[\n]}\n",
            Text(TransectsGeoJson.Write(TestPlans.OneStratum(TestPlans.Centre)).Content));
        Assert.Empty(ReadByNetTopologySuite(TestPlans.OneStratum(TestPlans.Centre)));
    }

    [Fact]
    public void Half_a_surrogate_pair_in_a_name_does_not_stop_the_writing()
    {
        var plan = TestPlans.Plan(TestPlans.Centre, TestPlans.Points("bad\uD800name", TestPlans.Point("P1", 1, 0, 0)));

        using var document = Parse(plan);

        Assert.Equal("bad\uFFFDname", document.RootElement.GetProperty("features")[0].GetProperty("properties").GetProperty("stratum").GetString());
    }

    private static FeatureCollection ReadByNetTopologySuite(SurveyPlan plan) =>
        JsonSerializer.Deserialize<FeatureCollection>(TransectsGeoJson.Write(plan).Content.Span, NetTopologySuiteOptions)!;

    private static JsonDocument Parse(SurveyPlan plan) => JsonDocument.Parse(TransectsGeoJson.Write(plan).Content);

    private static string Text(ReadOnlyMemory<byte> bytes) => Encoding.UTF8.GetString(bytes.Span);
}
