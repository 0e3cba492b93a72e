using System.Collections.Immutable;
using System.Globalization;
using System.Xml;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary><c>transects.kml</c>: OGC KML for globes, a folder a stratum and a placemark a transect, its figures as extended data.</summary>
public static class TransectsKml
{
    private const string Namespace = "http://www.opengis.net/kml/2.2";

    public static OutputFile Write(SurveyPlan plan) => new(OutputNames.TransectsKml, XmlText.Write(xml =>
    {
        xml.WriteStartElement("kml", Namespace);
        xml.WriteStartElement("Document", Namespace);
        Element(xml, "name", plan.Design.Name);
        Element(xml, "description", TransectsGpx.Caution);
        WriteStyle(xml);
        foreach (var stratum in DrawnTransect.All(plan, withCoverage: true).GroupBy(transect => transect.Stratum))
        {
            xml.WriteStartElement("Folder", Namespace);
            Element(xml, "name", stratum.Key);
            foreach (var transect in stratum)
            {
                WritePlacemark(xml, transect);
            }

            xml.WriteEndElement();
        }

        xml.WriteEndElement();
        xml.WriteEndElement();
    }));

    private static void WriteStyle(XmlWriter xml)
    {
        xml.WriteStartElement("Style", Namespace);
        xml.WriteAttributeString("id", "transect");
        xml.WriteStartElement("LineStyle", Namespace);

        // KML writes alpha, blue, green, red. A globe is dark: the light paper of the report's maps is what reads on it.
        Element(xml, "color", "ffeff4f6");
        Element(xml, "width", "2");
        xml.WriteEndElement();
        xml.WriteEndElement();
    }

    private static void WritePlacemark(XmlWriter xml, DrawnTransect transect)
    {
        xml.WriteStartElement("Placemark", Namespace);
        Element(xml, "name", transect.Id);
        Element(xml, "styleUrl", "#transect");
        xml.WriteStartElement("ExtendedData", Namespace);
        Datum(xml, "stratum", transect.Stratum);
        Datum(xml, "order", transect.Order?.ToString(CultureInfo.InvariantCulture));
        Datum(xml, "reserve", transect.Reserve?.ToString(CultureInfo.InvariantCulture));
        Datum(xml, "length_m", transect.LengthMetres is { } length ? Figures.Metres(length) : null);
        Datum(xml, "bearing_deg", transect.BearingDegrees is { } bearing ? Figures.Bearing(bearing) : null);
        Datum(xml, "coverage", transect.Coverage is { } coverage ? Figures.Significant(coverage, 6) : null);
        xml.WriteEndElement();
        WriteGeometry(xml, transect);
        xml.WriteEndElement();
    }

    private static void WriteGeometry(XmlWriter xml, DrawnTransect transect)
    {
        if (transect.Parts.Length > 1)
        {
            xml.WriteStartElement("MultiGeometry", Namespace);
        }

        foreach (var part in transect.Parts)
        {
            xml.WriteStartElement(transect.IsPoint ? "Point" : "LineString", Namespace);
            if (!transect.IsPoint)
            {
                // Along the ground, not through it.
                Element(xml, "tessellate", "1");
            }

            Element(xml, "coordinates", Coordinates(part));
            xml.WriteEndElement();
        }

        if (transect.Parts.Length > 1)
        {
            xml.WriteEndElement();
        }
    }

    private static string Coordinates(ImmutableArray<LonLat> part) =>
        string.Join(' ', part.Select(position => $"{Figures.Degrees(position.Lon)},{Figures.Degrees(position.Lat)}"));

    private static void Datum(XmlWriter xml, string name, string? value)
    {
        if (value is not null)
        {
            xml.WriteStartElement("Data", Namespace);
            xml.WriteAttributeString("name", name);
            Element(xml, "value", value);
            xml.WriteEndElement();
        }
    }

    private static void Element(XmlWriter xml, string name, string text) => xml.WriteElementString(name, Namespace, PlainText.Clean(text));
}
