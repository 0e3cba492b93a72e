using System.Text;
using SurveyPlanner.Files.Boundaries;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>KML, CSV, zip archives and what is only recognised.</summary>
public class OtherFormats
{
    private const string Ring = "10,0 10.1,0 10.1,0.1 10,0.1 10,0";

    private static readonly double SquareArea = AreaOf.SquareKilometres(InMemory.Read(InMemory.Polygon("10 0, 10.1 0, 10.1 0.1, 10 0.1")));

    [Theory]
    [InlineData("""<kml xmlns="http://www.opengis.net/kml/2.2"><Placemark>{0}</Placemark></kml>""")]
    [InlineData("""<kml xmlns="http://earth.google.com/kml/2.1"><Document><Folder><Folder><Placemark>{0}</Placemark></Folder></Folder></Document></kml>""")]
    [InlineData("""<kml><Document><Placemark><MultiGeometry><MultiGeometry><Point><coordinates>1,2</coordinates></Point>{0}</MultiGeometry></MultiGeometry></Placemark></Document></kml>""")]
    [InlineData("""<?xml version="1.0" encoding="UTF-8"?><k:kml xmlns:k="http://www.opengis.net/kml/2.2"><k:Placemark>{0}</k:Placemark></k:kml>""")]
    [InlineData("""<!-- note --><kml><Placemark><Style><PolyStyle><fill>0</fill></PolyStyle></Style>{0}<description><![CDATA[<table>]]></description></Placemark></kml>""")]
    public void KML_of_every_shape_is_read(string form)
    {
        var polygon = $"<Polygon><tessellate>1</tessellate><outerBoundaryIs><LinearRing><coordinates>\n {Ring} \n</coordinates></LinearRing></outerBoundaryIs></Polygon>";

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(InMemory.Read(string.Format(null, form, polygon), "x.kml")), 1e-9);
    }

    [Theory]
    [InlineData("10,0,5 10.1,0,5 10.1,0.1,5 10,0.1,5 10,0,5")]
    [InlineData("10,0\n10.1,0\r\n10.1,0.1\t10,0.1 10,0")]
    [InlineData("10, 0, 0 10.1, 0, 0 10.1, 0.1, 0 10, 0.1, 0 10, 0, 0")]
    [InlineData("10.0000,0 1.01E1,0 10.1,1e-1 +10,0.1 10,-0")]
    public void KML_coordinates_of_every_shape_are_read(string coordinates)
        => Assert.Equal(SquareArea, AreaOf.SquareKilometres(InMemory.Read(Kml($"<outerBoundaryIs><LinearRing><coordinates>{coordinates}</coordinates></LinearRing></outerBoundaryIs>"), "x.kml")), 1e-9);

    [Fact]
    public void KML_holes_are_read_one_or_several_in_a_boundary()
    {
        const string hole = "<LinearRing><coordinates>10.02,0.02 10.04,0.02 10.04,0.04 10.02,0.02</coordinates></LinearRing>";
        const string other = "<LinearRing><coordinates>10.06,0.06 10.08,0.06 10.08,0.08 10.06,0.06</coordinates></LinearRing>";
        var outer = $"<outerBoundaryIs><LinearRing><coordinates>{Ring}</coordinates></LinearRing></outerBoundaryIs>";
        var apart = InMemory.Read(Kml($"{outer}<innerBoundaryIs>{hole}</innerBoundaryIs><innerBoundaryIs>{other}</innerBoundaryIs>"), "x.kml");
        var together = InMemory.Read(Kml($"<innerBoundaryIs>{hole}{other}</innerBoundaryIs>{outer}"), "x.kml");

        Assert.Equal(0.96 * SquareArea, AreaOf.SquareKilometres(apart), 1e-5 * SquareArea);
        Assert.Equal(AreaOf.SquareKilometres(apart), AreaOf.SquareKilometres(together), 1e-9);
    }

    [Fact]
    public void KML_attributes_are_name_folder_and_extended_data()
    {
        var polygon = $"<Polygon><outerBoundaryIs><LinearRing><coordinates>{Ring}</coordinates></LinearRing></outerBoundaryIs></Polygon>";
        var boundary = InMemory.Read(
            $"<kml><Document><name>doc</name><Folder><name>bays &amp; sounds</name><Placemark><name> A </name><ExtendedData><Data name=\"zone\"><value>inner</value></Data><SchemaData><SimpleData name=\"n\">7</SimpleData></SchemaData></ExtendedData>{polygon}</Placemark></Folder></Document></kml>",
            "x.kml");

        Assert.Equal([("folder", "bays & sounds"), ("n", "7"), ("name", "A"), ("zone", "inner")], boundary.Features[0].Attributes.Select(pair => (pair.Key, pair.Value)));
    }

    [Fact]
    public void A_KML_folder_can_be_chosen_as_layer()
    {
        string Placemark(string x) => $"<Placemark><Polygon><outerBoundaryIs><LinearRing><coordinates>{Ring.Replace("10", x, StringComparison.Ordinal)}</coordinates></LinearRing></outerBoundaryIs></Polygon></Placemark>";
        var kml = $"<kml><Document><Folder><name>a</name>{Placemark("20")}</Folder><Folder><name>b</name>{Placemark("30")}</Folder></Document></kml>";

        Assert.Equal(2, InMemory.Read(kml, "x.kml").Features.Length);
        Assert.Equal(30, InMemory.Read(kml, "x.kml", new BoundaryOptions { Layer = "B" }).Features.Single().Polygons[0].Shell[0].Lon);
        Assert.Contains("its folders are: 'a', 'b'", InMemory.Refusal(kml, "x.kml", new BoundaryOptions { Layer = "c" }), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("<kml><Placemark><LineString><coordinates>1,2 3,4</coordinates></LineString></Placemark></kml>", "only 1 line")]
    [InlineData("<kml><Placemark><Point><coordinates>1,2</coordinates></Point></Placemark></kml>", "only 1 point")]
    [InlineData("<kml></kml>", "no features at all")]
    [InlineData("<kml><Placemark>", "cut short")]
    [InlineData("<gpx version=\"1.1\"></gpx>", "GPX")]
    [InlineData("<html><body>Log in</body></html>", "a web page")]
    [InlineData("<gml:FeatureCollection xmlns:gml=\"http://www.opengis.net/gml\"/>", "GML")]
    [InlineData("<kml><Placemark><Polygon><outerBoundaryIs><LinearRing><coordinates>10;0 11;0 11;1</coordinates></LinearRing></outerBoundaryIs></Polygon></Placemark></kml>", "must be written longitude,latitude")]
    [InlineData("<kml><Placemark><Polygon><outerBoundaryIs><LinearRing><coordinates>62,7,10,1 62,8,10,2</coordinates></LinearRing></outerBoundaryIs></Polygon></Placemark></kml>", "must be written longitude,latitude")]
    [InlineData("<kml><Placemark><Polygon><outerBoundaryIs><LinearRing><coordinates>62,-152 63,-152 63,-151</coordinates></LinearRing></outerBoundaryIs></Polygon></Placemark></kml>", "swapped")]
    [InlineData("<kml><Placemark><Polygon></Polygon></Placemark></kml>", "no outer boundary")]
    [InlineData("<!DOCTYPE kml SYSTEM \"file:///etc/hostname\"><kml/>", "prohibited")]
    public void KML_that_is_no_boundary_is_refused(string kml, string words) => Assert.Contains(words, InMemory.Refusal(kml, "x.kml"), StringComparison.Ordinal);

    [Fact]
    public void KML_nested_without_end_is_refused_in_a_sentence()
        => Assert.Contains("nested more than", InMemory.Refusal("<kml>" + string.Concat(Enumerable.Repeat("<Folder>", 200_000)), "x.kml"), StringComparison.Ordinal);

    [Fact]
    public void KML_links_are_not_followed_and_that_is_told()
    {
        var kml = Kml($"<outerBoundaryIs><LinearRing><coordinates>{Ring}</coordinates></LinearRing></outerBoundaryIs>")
            .Replace("<kml>", "<kml><Document><NetworkLink><Link><href>http://192.0.2.1/x.kml</href></Link></NetworkLink>", StringComparison.Ordinal).Replace("</kml>", "</Document></kml>", StringComparison.Ordinal);

        Assert.Contains("links are not followed", InMemory.Told(InMemory.Read(kml, "x.kml")), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("lat,lon\n0,10\n0,10.1\n0.1,10.1\n0.1,10\n")]
    [InlineData("Latitude,Longitude,note\r\n0,10,a\r\n0,10.1,b\r\n0.1,10.1,\"c, d\"\r\n0.1,10,e\r\n")]
    [InlineData("lon;lat\n10;0\n10,1;0\n10,1;0,1\n10;0,1\n")]
    [InlineData("lat\tlon\n0\t10\n0\t10.1\n0.1\t10.1\n0.1\t10\n")]
    [InlineData("lat,lon\nN00 00.000,E010 00.000\nN00 00.000,E010 06.000\nN00 06.000,E010 06.000\nN00 06.000,E010 00.000\n")]
    [InlineData("lat,lon\n0°00.0'N,10°00.0'E\n0°00.0'N,10°06.0'E\n0°06.0'N,10°06.0'E\n0°06.0'N,10°00.0'E\n")]
    [InlineData("lat,lon\n0 0.0,10 0.0\n0 0.0,10 6.0\n0 6.0,10 6.0\n0 6.0,10 0.0\n")]
    [InlineData("lat,lon\n\"0°00'00\"\"N\",\"10°00'00\"\"E\"\n\"0°00'00\"\"N\",\"10°06'00\"\"E\"\n\"0°06'00\"\"N\",\"10°06'00\"\"E\"\n\"0°06'00\"\"N\",\"10°00'00\"\"E\"\n")]
    [InlineData("lat;lon\nN0 0,0;E10 0,0\nN0 0,0;E10 6,0\nN0 6,0;E10 6,0\nN0 6,0;E10 0,0\n")]
    [InlineData("\uFEFFLAT,LNG\r0,10\r0,10.1\r0.1,10.1\r0.1,10\r")]
    public void A_list_of_vertices_is_read_in_every_notation(string csv)
        => Assert.Equal(SquareArea, AreaOf.SquareKilometres(InMemory.Read(csv, "x.csv")), 1e-9);

    [Theory]
    [InlineData("N63 06.000", 63.1)]
    [InlineData("63 06.000 S", -63.1)]
    [InlineData("-63.1", -63.1)]
    [InlineData("63° 6′ 0″ N", 63.1)]
    [InlineData("n63°06'00''", 63.1)]
    [InlineData("63°", 63.0)]
    [InlineData("S63.1", -63.1)]
    [InlineData("-63 06.0", -63.1)]
    public void Latitudes_are_read_as_receivers_write_them(string text, double degrees)
        => Assert.Equal(degrees, AngleText.Parse(text, isLatitude: true, out _)!.Value, 1e-12);

    [Theory]
    [InlineData("E63 06.000")]
    [InlineData("-N63.1")]
    [InlineData("N63.1 S")]
    [InlineData("63 60.0")]
    [InlineData("63.5 06.0")]
    [InlineData("6306.000N")]
    [InlineData("63,1")]
    [InlineData("NaN")]
    [InlineData("1e999")]
    [InlineData("")]
    [InlineData("sixty")]
    public void What_is_no_latitude_is_not_read_as_one(string text) => Assert.Null(AngleText.Parse(text, isLatitude: true, out _));

    [Theory]
    [InlineData("lat,lon\n62,727602,-152,999333\n", "the line has 4 cells where the heading has 2; if commas are decimal marks")]
    [InlineData("lat,lon\n0,10\n0\n", "3: the line has 1 cells where the heading has 2; the line may be cut short")]
    [InlineData("0,10\n0,10.1\n", "the first line must name the columns")]
    [InlineData("lat,latitude,lon\n0,0,10\n", "two columns could be the latitude")]
    [InlineData("lat,lon\n0,10\n0,10.1\n\n1,20\n1,20.1\n", "4: this line is empty; if it parts two outlines")]
    [InlineData("lat,lon\nx,10\n0,y\n", "2: 'x' is no latitude")]
    [InlineData("lat,lon\n", "no vertices")]
    [InlineData("lat,lon\n\"0,10\n", "quotation mark")]
    [InlineData("x,y\n500000,7000000\n510000,7000000\n510000,7010000\n", "does not say its coordinate system")]
    [InlineData("part,lat,lon\na,0,10\nb,0,10\na,1,10\n", "do not stand together")]
    [InlineData("lat,lon,ring\n0,10,2\n0,11,2\n1,11,2\n", "numbered 1, 2, 3")]
    [InlineData("lat,lon\nE10 0.0,N0 0.0\n", "the columns may be swapped")]
    public void A_list_of_vertices_with_faults_is_refused_by_its_lines(string csv, string words) => Assert.Contains(words, InMemory.Refusal(csv, "x.csv"), StringComparison.Ordinal);

    [Fact]
    public void A_list_of_vertices_can_hold_parts_with_holes_and_attributes()
    {
        var boundary = InMemory.Read(
            "zone,part,ring,lat,lon\nA,1,1,0,10\nA,1,1,0,10.1\nA,1,1,0.1,10.1\nA,1,1,0.1,10\nA,1,2,0.02,10.02\nA,1,2,0.02,10.04\nA,1,2,0.04,10.04\nB,2,1,5,10\nB,2,1,5,11\nB,2,1,6,11\n",
            "x.csv");

        Assert.Equal(["A", "B"], boundary.Features.Select(feature => feature.Attributes["zone"]));
        Assert.Single(boundary.Features[0].Polygons[0].Holes);
        Assert.Contains("10 vertices in 3 outlines", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void A_list_of_eastings_and_northings_is_read_in_the_users_system()
        => Assert.NotNull(InMemory.Read("easting,northing\n450000,5500000\n550000,5500000\n550000,5600000\n", "x.csv", new BoundaryOptions { Crs = "EPSG:32633" }));

    [Fact]
    public void An_archive_may_hold_GeoJSON_or_KML_and_what_its_maker_added()
    {
        var geoJson = Encoding.UTF8.GetBytes(InMemory.Polygon("10 0, 10.1 0, 10.1 0.1, 10 0.1"));

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(InMemory.Read(InMemory.Zip(("__MACOSX/._a.geojson", [1]), ("dir/", []), ("dir/a.GeoJSON", geoJson), ("readme.txt", [65])), "x.zip")), 1e-9);
        Assert.Contains("'a', 'b'; say which with layer", InMemory.Refusal(InMemory.Zip(("a.geojson", geoJson), ("b.geojson", geoJson)), "x.zip"), StringComparison.Ordinal);
        Assert.Equal(SquareArea, AreaOf.SquareKilometres(InMemory.Read(InMemory.Zip(("a.geojson", geoJson), ("b.geojson", [1])), "x.zip", new BoundaryOptions { Layer = "a" })), 1e-9);
    }

    [Fact]
    public void An_archive_of_several_shapefiles_asks_which_and_finds_names_in_any_case()
    {
        using var members = new ZipMembers(File.ReadAllBytes(ReferenceFiles.Dirty("shp_latin1_with_cpg.zip")), "x.zip");
        var files = members.Names.Select(name => (Extension: Path.GetExtension(name), Content: members.Read(name))).ToList();
        var both = InMemory.Zip([.. files.Select(file => ("North" + file.Extension.ToUpperInvariant(), file.Content)), .. files.Select(file => ("south" + file.Extension, file.Content))]);

        Assert.Contains("'North', 'south'; say which with layer", InMemory.Refusal(both, "x.zip"), StringComparison.Ordinal);
        Assert.Equal("Réserve de Ségur, Zürich, Ñandú", InMemory.Read(both, "x.zip", new BoundaryOptions { Layer = "north" }).Features[0].Attributes["name"]);
        Assert.Contains("there is no file 'east' in it; there is: 'North', 'south'", InMemory.Refusal(both, "x.zip", new BoundaryOptions { Layer = "east" }), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("../x.shp")]
    [InlineData("/etc/x.shp")]
    [InlineData("a/../../x.shp")]
    [InlineData("..\\x.shp")]
    [InlineData("C:x.shp")]
    public void An_archive_that_leads_out_of_itself_is_refused(string name)
        => Assert.Contains("leads out of the archive", InMemory.Refusal(InMemory.Zip((name, [1])), "x.zip"), StringComparison.Ordinal);

    [Fact]
    public void An_archive_that_unpacks_to_far_more_is_refused_unopened()
        => Assert.Contains("more than 100 times its size", InMemory.Refusal(InMemory.Zip(("a.kml", new byte[50_000_000])), "x.kmz"), StringComparison.Ordinal);

    [Fact]
    public void An_archive_of_thousands_of_files_is_refused()
        => Assert.Contains("3000 files", InMemory.Refusal(InMemory.Zip([.. Enumerable.Range(0, 3000).Select(i => ($"{i}.txt", Array.Empty<byte>()))]), "x.zip"), StringComparison.Ordinal);

    [Theory]
    [InlineData("fgb\u0003fgb", "x.fgb", "FlatGeobuf")]
    [InlineData("PAR1xxxx", "x.parquet", "Parquet")]
    [InlineData("%PDF-1.4", "x.pdf", "PDF")]
    [InlineData("POLYGON((0 0,1 0,1 1,0 0))", "x.wkt", "well-known text")]
    [InlineData("!table\n!version 300", "x.tab", "MapInfo")]
    [InlineData("\u0003\u0001\u0002", "x.dbf", "only one file of a shapefile")]
    [InlineData("GEOGCS[]", "x.prj", "only one file of a shapefile")]
    [InlineData("\u0001\u0002\u0003\u0004", "x.bin", "not known")]
    [InlineData("", "x.csv", "empty")]
    [InlineData("   \n", "x.geojson", "empty")]
    [InlineData("hello", "x.shp", "does not begin like a shapefile")]
    [InlineData("hello", "x.txt", "the first line must name the columns")]
    public void Other_formats_are_named(string content, string name, string words) => Assert.Contains(words, InMemory.Refusal(content, name), StringComparison.Ordinal);

    [Fact]
    public void A_format_without_layers_refuses_a_layer()
        => Assert.Contains("no layers", InMemory.Refusal(InMemory.Polygon("0 0, 1 0, 1 1"), options: new BoundaryOptions { Layer = "x" }), StringComparison.Ordinal);

    private static string Kml(string polygon) => $"<kml><Placemark><Polygon>{polygon}</Polygon></Placemark></kml>";
}
