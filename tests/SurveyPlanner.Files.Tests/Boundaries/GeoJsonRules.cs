using SurveyPlanner.Files.Boundaries;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>GeoJSON as RFC 7946 and the 2008 form have it, and as it is not.</summary>
public class GeoJsonRules
{
    private const string Square = "10 0, 10.1 0, 10.1 0.1, 10 0.1";

    public static TheoryData<string, string> Refused => new()
    {
        { """{"type":"Polygon","coordinates":[[[0,0],[1,0],[1,1],[0,0]]]""", "cut short" },
        { """{"type":"Polygon","coordinates":[[[0,0],[1,0],[1,1],[0,0]]]} x""", "something follows after the end" },
        { """{"type":"Polygon","coordinates":[[[0,0],[1,0],[1,1],[0,0]]]}{"type":"Polygon"}""", "something follows after the end" },
        { """{"type":"Polygon","type":"Polygon","coordinates":[[[0,0],[1,0],[1,1],[0,0]]]}""", "stands twice" },
        { """{"type":"Polygon","coordinates":[[[0,0],[1,0],[1,-Infinity],[0,0]]]}""", "not JSON" },
        { """{"type":"Polygon","coordinates":[[[0,0],[1,0],["1",1],[0,0]]]}""", "vertex 3: a coordinate must be a number, but a text stands there" },
        { """{"type":"Polygon","coordinates":[[[0,0],[1,0],[1],[0,0]]]}""", "vertex 3: a position must be a list of two numbers" },
        { """{"type":"Polygon","coordinates":[[0,0],[1,0],[1,1],[0,0]]}""", "vertex 1: a position must be a list of two numbers" },
        { """{"type":"Polygon","coordinates":[[[0,0],[01,0],[1,1],[0,0]]]}""", "not JSON" },
        { """{"type":"Polygon","coordinates":[[[0,0],[1,0],[1,1],[0,0],]]}""", "not JSON" },
        { """{'type':'Polygon'}""", "not JSON" },
        { """{"type":"polygon","coordinates":[[[0,0],[1,0],[1,1],[0,0]]]}""", "'polygon'" },
        { """{"type":"Polygon"}""", "no list \"coordinates\"" },
        { """{"type":"FeatureCollection"}""", "no list \"features\"" },
        { """{"type":"FeatureCollection","features":[]}""", "no features at all" },
        { """{"type":"FeatureCollection","features":[{"type":"Polygon","coordinates":[]}]}""", "feature 1: an entry of \"features\" is not" },
        { """{"type":"FeatureCollection","features":[{"type":"Feature","properties":null}]}""", "feature 1: the feature has no member \"geometry\"" },
        { """{"type":"Feature","properties":[],"geometry":{"type":"Polygon","coordinates":[[[0,0],[1,0],[1,1],[0,0]]]}}""", "\"properties\" is a list" },
        { """{"type":"Feature","properties":{"a":"\ud800"},"geometry":{"type":"Polygon","coordinates":[[[0,0],[1,0],[1,1],[0,0]]]}}""", "half a character" },
        { """{"type":"Point","coordinates":[1,2]}""", "only 1 point" },
        { """{"type":"MultiLineString","coordinates":[[[0,0],[1,1]]]}""", "only 1 line" },
        { """{"type":"Polygon","coordinates":[]}""", "no polygon in the file" },
        { """{"type":"Polygon","coordinates":[[]]}""", "nothing with an area" },
        { """{"type":"Polygon","coordinates":[[[0,0],[1,1],[0,0]]]}""", "nothing with an area" },
        { """{"type":"Topology","objects":{}}""", "TopoJSON" },
        { """[1,2]""", "a list where GeoJSON has an object" },
        { """{"type":"Polygon","coordinates":[[[500000,7000000],[510000,7000000],[510000,7010000],[500000,7000000]]]}""", "it looks like metres in a projection" },
        { """{"type":"Polygon","coordinates":[[[0,89],[1,89],[1,91],[0,89]]]}""", "vertex 3: the position 1, 91 is not longitude, latitude" },
        { """{"type":"Polygon","coordinates":[[[1e308,1e308],[-1e308,1e308],[-1e308,-1e308],[1e308,1e308]]]}""", "vertex 1" },
        { """{"type":"Polygon","crs":null,"coordinates":[[[0,0],[1,0],[1,1],[0,0]]]}""", "crs member is null" },
        { """{"type":"Polygon","crs":{"type":"name","properties":{"name":"EPSG:99999"}},"coordinates":[[[0,0],[1,0],[1,1],[0,0]]]}""", "'EPSG:99999', a coordinate system that is not known" },
        { """{"type":"Polygon","crs":{"type":"name"},"coordinates":[[[0,0],[1,0],[1,1],[0,0]]]}""", "of a form that is not known" },
        { """{"type":"Polygon","crs":{"type":"name","properties":{"name":"EPSG:32633"}},"coordinates":[[[10,0],[11,0],[11,1],[10,0]]]}""", "the coordinates look like degrees" },
        { """{"type":"Polygon","crs":{"type":"name","properties":{"name":"EPSG:32633"}},"coordinates":[[[5e7,5e7],[6e7,5e7],[6e7,6e7],[5e7,5e7]]]}""", "lies outside what WGS 84 / UTM zone 33N (EPSG:32633) can hold" },
    };

    [Theory]
    [MemberData(nameof(Refused))]
    public void What_is_no_GeoJSON_of_a_boundary_is_refused_in_one_sentence(string text, string words)
    {
        var refusal = InMemory.Refusal(text);

        Assert.Contains(words, refusal, StringComparison.Ordinal);
        Assert.StartsWith("made-up.geojson:", refusal, StringComparison.Ordinal);
        Assert.DoesNotContain("\n", refusal, StringComparison.Ordinal);
        Assert.DoesNotContain("Exception", refusal, StringComparison.Ordinal);
    }

    [Fact]
    public void A_fault_in_the_JSON_is_named_by_line_and_column()
    {
        var error = Assert.Throws<InputException>(() => InMemory.Read("{\"type\":\"Polygon\",\r\n \"coordinates\":[[[0,0],[1,NaN]]]}"));

        Assert.Equal((2, 27), (error.Problems[0].Line, error.Problems[0].Column));
    }

    [Fact]
    public void Hostile_text_in_a_message_is_harmless_and_short()
    {
        var refusal = InMemory.Refusal("{\"type\":nul\u001b[31m" + new string('x', 5000) + "}");

        Assert.DoesNotContain('\u001b', refusal);
        Assert.InRange(refusal.Length, 10, 300);
    }

    [Theory]
    [InlineData("{0}")]
    [InlineData("""{{"type":"Feature","properties":null,"geometry":{0}}}""")]
    [InlineData("""{{"geometry":{0},"properties":{{}},"type":"Feature","bbox":[1,2,3,4],"note":{{"deep":[1,2]}}}}""")]
    [InlineData("""{{"features":[{{"type":"Feature","properties":null,"geometry":{0}}}],"name":"x","type":"FeatureCollection"}}""")]
    [InlineData("""{{"type":"GeometryCollection","geometries":[{0}]}}""")]
    [InlineData("""{{"type":"GeometryCollection","geometries":[{{"type":"GeometryCollection","geometries":[{{"type":"Point","coordinates":[1,2]}},{0}]}}]}}""")]
    [InlineData("\uFEFF{0}\r\n")]
    [InlineData(" \n\t{0}")]
    public void Every_form_of_it_is_read(string form)
    {
        var plain = AreaOf.SquareKilometres(InMemory.Read(InMemory.Polygon(Square)));

        Assert.Equal(plain, AreaOf.SquareKilometres(InMemory.Read(string.Format(null, form, InMemory.Polygon(Square)))), 1e-9);
    }

    [Fact]
    public void Heights_and_measures_are_passed_over()
        => Assert.Equal(5, InMemory.Read(InMemory.Polygon("10 0 5, 10.1 0 6 7, 10.1 0.1, 10 0.1 1e9")).Features[0].Polygons[0].Shell.Length);

    [Fact]
    public void Attributes_come_as_text_and_null_ones_are_left_out()
    {
        var boundary = InMemory.Read("""{"type":"Feature","id":7,"properties":{"name":"Ås <b>","n":1.50,"yes":true,"none":null,"list":[1, 2]},"geometry":""" + InMemory.Polygon(Square) + "}");

        Assert.Equal([("id", "7"), ("list", "[1, 2]"), ("n", "1.50"), ("name", "Ås <b>"), ("yes", "true")], boundary.Features[0].Attributes.Select(pair => (pair.Key, pair.Value)));
    }

    [Fact]
    public void Features_keep_their_number_when_others_are_left_out()
    {
        var boundary = InMemory.Read(InMemory.Collection(InMemory.Feature("null"), InMemory.Feature("""{"type":"Point","coordinates":[1,2]}"""), InMemory.Feature(InMemory.Polygon(Square))));

        Assert.Equal(3, boundary.Features[0].Number);
        Assert.Contains("null or empty (feature 1)", InMemory.Told(boundary), StringComparison.Ordinal);
        Assert.Contains("points or lines, which bound no area (feature 2)", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("EPSG:4326")]
    [InlineData("urn:ogc:def:crs:OGC:1.3:CRS84")]
    [InlineData("urn:ogc:def:crs:EPSG::4326")]
    [InlineData("urn:ogc:def:crs:EPSG:6.18:4326")]
    [InlineData("http://www.opengis.net/def/crs/OGC/1.3/CRS84")]
    [InlineData("https://www.opengis.net/def/crs/EPSG/0/4326")]
    [InlineData("OGC:CRS84")]
    [InlineData("urn:ogc:def:crs:EPSG::4269")]
    public void Longitude_stays_first_whatever_the_2008_crs_member_says(string name)
    {
        var boundary = InMemory.Read("""{"type":"Polygon","crs":{"type":"name","properties":{"name":"NAME"}},"coordinates":[[[10,50],[11,50],[11,51],[10,50]]]}""".Replace("NAME", name, StringComparison.Ordinal));

        Assert.Equal(10, boundary.Features[0].Polygons[0].Shell[0].Lon);
        Assert.Contains("crs member", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void The_users_system_is_taken_for_a_file_of_plain_numbers()
    {
        // EPSG:32633, the unit square of a hundred kilometres round 15° E, 50° N as PROJ has it: x 450000..550000.
        var boundary = InMemory.Read(InMemory.Polygon("450000 5500000, 550000 5500000, 550000 5600000, 450000 5600000"), options: new BoundaryOptions { Crs = "EPSG:32633" });

        // Transverse Mercator stretches areas by its squared scale, 0.9996² at the middle; 1.00003² at the edge.
        Assert.InRange(AreaOf.SquareKilometres(boundary), 10000 / (0.99965 * 0.99965), 10000 / (0.99959 * 0.99959));
    }

    [Fact]
    public void The_users_system_may_not_contradict_the_file()
    {
        const string file = """{"type":"Polygon","crs":{"type":"name","properties":{"name":"EPSG:32633"}},"coordinates":[[[450000,5500000],[550000,5500000],[550000,5600000],[450000,5500000]]]}""";

        Assert.Contains("says WGS 84 / UTM zone 32N", InMemory.Refusal(file, options: new BoundaryOptions { Crs = "EPSG:32632" }), StringComparison.Ordinal);
        Assert.NotNull(InMemory.Read(file, options: new BoundaryOptions { Crs = "EPSG:25833" }));
    }

    [Theory]
    [InlineData("EPSG:99999")]
    [InlineData("UTM 33")]
    [InlineData("")]
    [InlineData("http://192.0.2.1/crs")]
    public void An_unknown_system_of_the_user_is_refused(string crs)
        => Assert.Contains("region.crs: the coordinate system", InMemory.Refusal(InMemory.Polygon(Square), options: new BoundaryOptions { Crs = crs }), StringComparison.Ordinal);

    [Fact]
    public void A_missing_file_is_one_sentence()
        => Assert.Equal("gone.geojson: there is no such boundary file; correct its name or path", Assert.Throws<InputException>(() => BoundaryReader.Read("/nowhere/gone.geojson")).Message);
}
