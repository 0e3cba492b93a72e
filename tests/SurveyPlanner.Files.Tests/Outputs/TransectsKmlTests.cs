using System.Xml.Linq;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class TransectsKmlTests
{
    // OGC 12-007r2 (KML 2.3) keeps this namespace.
    private static readonly XNamespace Kml = "http://www.opengis.net/kml/2.2";

    [Fact]
    public void Strata_are_folders_and_transects_placemarks_with_their_figures()
    {
        var folders = Read(TestPlans.TwoStrata()).Descendants(Kml + "Folder").ToList();

        Assert.Equal(["Inner bay", "=2+3,\"Høy\" <b>&  ]]>"], folders.Select(folder => folder.Element(Kml + "name")!.Value));
        var line = folders[0].Elements(Kml + "Placemark").First();
        Assert.Equal("A001", line.Element(Kml + "name")!.Value);
        Assert.Equal(
            ["stratum=Inner bay", "order=1", "length_m=22289.457", "bearing_deg=0", "coverage=0.125"],
            line.Descendants(Kml + "Data").Select(datum => $"{datum.Attribute("name")!.Value}={datum.Value}"));
        Assert.Equal("-150.6,63 -150.6,63.2", line.Descendants(Kml + "coordinates").Single().Value);
        Assert.Equal("1", line.Descendants(Kml + "tessellate").Single().Value);
        Assert.Equal("-150.4,63.05", folders[1].Descendants(Kml + "Point").First().Value);
    }

    [Fact]
    public void A_cut_line_is_a_multi_geometry_and_nothing_crosses_180()
    {
        Assert.Equal(2, Read(TestPlans.TwoStrata()).Descendants(Kml + "MultiGeometry").Single().Elements(Kml + "LineString").Count());

        var plan = TestPlans.OneStratum(new LonLat(180, -18), TestPlans.Line("F1", 1, 90, TestPlans.Path(179.99, -18, -179.99, -17.999)));
        Assert.Equal(
            ["179.99,-18 180,-17.9995", "-180,-17.9995 -179.99,-17.999"],
            Read(plan).Descendants(Kml + "coordinates").Select(coordinates => coordinates.Value));
    }

    [Fact]
    public void Every_text_of_unicode_makes_a_well_formed_file()
    {
        var everything = string.Concat(Enumerable.Range(0, 0x10000).Select(code => (char)code));

        Assert.NotNull(Read(TestPlans.Plan(TestPlans.Centre, TestPlans.Points(everything, TestPlans.Point("P1", 1, 0, 0)))));
    }

    private static XElement Read(SurveyPlan plan)
    {
        using var stream = new MemoryStream(TransectsKml.Write(plan).Content.ToArray());
        return XDocument.Load(stream).Root!;
    }
}
