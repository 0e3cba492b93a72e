using System.Collections.Immutable;
using System.Text;
using System.Xml.Linq;
using System.Xml.Schema;
using NetTopologySuite.IO;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class TransectsGpxTests
{
    private static readonly XNamespace Gpx = "http://www.topografix.com/GPX/1/1";

    [Fact]
    public void The_file_is_valid_against_the_schema()
    {
        Assert.Empty(SchemaTrouble(TestPlans.TwoStrata()));
        Assert.Empty(SchemaTrouble(TestPlans.OneStratum(TestPlans.Centre)));
        Assert.Empty(SchemaTrouble(TestPlans.OneStratum(new LonLat(180, 0), TestPlans.Line("F1", 1, 90, TestPlans.Path(180, 0.00001, -179, 1)))));
    }

    [Fact]
    public void The_schema_does_find_faults() =>
        Assert.NotEmpty(SchemaTrouble(Text(TestPlans.TwoStrata()).Replace("lon=\"-150.6\"", "lon=\"180\"", StringComparison.Ordinal)));

    [Fact]
    public void Another_reader_finds_waypoints_routes_and_tracks()
    {
        var file = GpxFile.Parse(Text(TestPlans.TwoStrata()), new GpxReaderSettings());

        Assert.Equal(["A001S", "A001E", "A002AS", "A002AE", "A002BS", "A002BE", "B001", "B002"], file.Waypoints.Select(waypoint => waypoint.Name));
        Assert.Equal(["A001", "A002A", "A002B"], file.Routes.Select(route => route.Name));
        Assert.All(file.Routes, route => Assert.Equal(2, route.Waypoints.Count));
        Assert.Equal(["A001", "A002"], file.Tracks.Select(track => track.Name));
        Assert.Equal([1, 2], file.Tracks.Select(track => track.Segments.Length));
        Assert.Equal(63.2, file.Waypoints[1].Latitude.Value, 1e-9);
        Assert.Equal(-150.6, file.Waypoints[1].Longitude.Value, 1e-9);
    }

    [Fact]
    public void Comments_say_which_end_of_what_and_the_bearing_in_three_digits()
    {
        var comments = XDocument.Parse(Text(TestPlans.TwoStrata())).Root!.Elements(Gpx + "wpt").Select(wpt => wpt.Element(Gpx + "cmt")!.Value).ToList();

        Assert.Equal("A001 Inner bay, start, bearing 000 true", comments[0]);
        Assert.Equal("A002 part 1 of 2 Inner bay, start, bearing 180 true", comments[2]);
        Assert.Equal("A002 part 2 of 2 Inner bay, end", comments[5]);
        Assert.Equal("B001 =2+3,\"Høy\" <b>&  ]]>, point", comments[6]);
    }

    [Fact]
    public void A_longitude_of_180_is_written_as_minus_180()
    {
        var plan = TestPlans.OneStratum(new LonLat(180, 0), TestPlans.Line("F1", 1, 90, TestPlans.Path(180, 0, 181, 0)));

        Assert.Contains("lon=\"-180\"", Text(plan), StringComparison.Ordinal);
        Assert.Contains("lon=\"-179\"", Text(plan), StringComparison.Ordinal);
    }

    [Fact]
    public void A_straight_line_with_many_vertices_is_a_route_of_two_points_and_a_track_of_all()
    {
        // Straight in the plane, 40 km, drawn with 401 vertices.
        var projection = new AzimuthalEqualArea(TestPlans.Centre);
        ImmutableArray<LonLat> path = [.. Enumerable.Range(0, 401).Select(i => projection.Unproject(new PlanePoint((i * 100) - 20_000, 9000)))];
        var root = XDocument.Parse(Text(TestPlans.OneStratum(TestPlans.Centre, TestPlans.Line("L1", 1, 90, path)))).Root!;

        Assert.Equal(2, root.Element(Gpx + "rte")!.Elements(Gpx + "rtept").Count());
        Assert.Equal(401, root.Descendants(Gpx + "trkpt").Count());
    }

    [Fact]
    public void A_line_with_bends_keeps_them_in_its_route()
    {
        var bent = TestPlans.Path(-150.6, 63.0, -150.5, 63.0, -150.5, 63.1);
        var root = XDocument.Parse(Text(TestPlans.OneStratum(TestPlans.Centre, TestPlans.Line("L1", 1, 90, bent)))).Root!;

        Assert.Equal(3, root.Descendants(Gpx + "rtept").Count());
    }

    [Fact]
    public void A_long_parallel_of_latitude_keeps_enough_points_to_stay_within_ten_metres_of_it()
    {
        // From 20°E to 30°E along 60°N the great circle runs 7.6 km north of the parallel (second method below: its sagitta on the sphere).
        ImmutableArray<LonLat> path = [.. Enumerable.Range(0, 1001).Select(i => new LonLat(20 + (i * 0.01), 60))];

        var route = RoutePoints.Of(path, halfWidthMetres: 200);

        Assert.InRange(route.Length, 20, RoutePoints.MaxCount);
        Assert.Equal((path[0], path[^1]), (route[0], route[^1]));
        foreach (var (from, to) in route.Zip(route.Skip(1)))
        {
            var half = (to.Lon - from.Lon) / 2 * Math.PI / 180;
            var top = Math.Atan(Math.Tan(Math.PI / 3) / Math.Cos(half)) * 180 / Math.PI;
            Assert.InRange((top - 60) * 111_195, 0, 10.5);
        }
    }

    [Fact]
    public void A_route_never_has_more_than_250_points()
    {
        // A saw of 1,000 teeth of about 1 km: every vertex matters.
        ImmutableArray<LonLat> saw = [.. Enumerable.Range(0, 1000).Select(i => new LonLat(i * 0.01, i % 2 * 0.01))];

        Assert.InRange(RoutePoints.Of(saw, halfWidthMetres: 20).Length, 2, 250);
        Assert.Empty(SchemaTrouble(TestPlans.OneStratum(new LonLat(5, 0), TestPlans.Line("SAW", 1, 90, saw))));
    }

    [Fact]
    public void Names_are_unique_and_short_even_for_long_ids_many_pieces_and_look_alikes()
    {
        var pieces = Enumerable.Range(0, 60).Select(i => TestPlans.Path(0, i * 0.1, 0.01, i * 0.1)).ToArray();
        var plan = TestPlans.Plan(
            new LonLat(0, 3),
            TestPlans.Lines("lines", TestPlans.Line("ABC-01", 1, 90, pieces), TestPlans.Line("ABCDEF", 2, 90, pieces[0]), TestPlans.Line("T1", 3, 90, pieces[1])),
            TestPlans.Points("points", TestPlans.Point("T1S", 4, 0, 0), TestPlans.Point("W00001", 5, 0, 0)));

        Assert.Empty(SchemaTrouble(plan));
        var root = XDocument.Parse(Text(plan)).Root!;
        Assert.All(root.Descendants(Gpx + "name").Where(name => name.Parent!.Name != Gpx + "metadata"), name => Assert.Matches("^[A-Z0-9-]{1,6}$", name.Value));
        Assert.Equal(126, root.Elements(Gpx + "wpt").Select(wpt => wpt.Element(Gpx + "name")!.Value).Distinct().Count());
    }

    [Fact]
    public void Pieces_of_a_line_with_a_long_id_lose_the_zeros_that_fill_up_its_number()
    {
        var pieces = new[] { TestPlans.Path(0, 1, 0.01, 1), TestPlans.Path(0.02, 1, 0.03, 1) };
        var root = XDocument.Parse(Text(TestPlans.OneStratum(new LonLat(0, 1), TestPlans.Line("T0012", 1, 90, pieces)))).Root!;

        Assert.Equal(["T12AS", "T12AE", "T12BS", "T12BE"], root.Elements(Gpx + "wpt").Select(wpt => wpt.Element(Gpx + "name")!.Value));
        Assert.Equal(["T0012A", "T0012B"], root.Elements(Gpx + "rte").Select(rte => rte.Element(Gpx + "name")!.Value));
    }

    [Fact]
    public void Every_text_of_unicode_makes_a_well_formed_file()
    {
        var everything = string.Concat(Enumerable.Range(0, 0x10000).Select(code => (char)code));
        var plan = TestPlans.Plan(TestPlans.Centre, TestPlans.Points(everything, TestPlans.Point("P1", 1, 0, 0)));

        Assert.Empty(SchemaTrouble(plan));
    }

    private static string Text(SurveyPlan plan) => Encoding.UTF8.GetString(TransectsGpx.Write(plan).Content.Span);

    private static List<string> SchemaTrouble(SurveyPlan plan) => SchemaTrouble(Text(plan));

    private static List<string> SchemaTrouble(string text)
    {
        var troubles = new List<string>();
        var schemas = new XmlSchemaSet();
        schemas.Add(null, Path.Combine(AppContext.BaseDirectory, "reference-data", "schema", "gpx11-subset.xsd"));
        XDocument.Parse(text, LoadOptions.PreserveWhitespace).Validate(schemas, (_, trouble) => troubles.Add(trouble.Message));
        return troubles;
    }
}
