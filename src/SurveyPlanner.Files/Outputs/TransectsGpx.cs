using System.Collections.Immutable;
using System.Xml;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// <c>transects.gpx</c>: GPX 1.1 for receivers. Each stretch of line as a route to steer by, each line as a track to see on the map,
/// and a waypoint at every place where counting starts or stops. Points are waypoints alone.
/// </summary>
public static class TransectsGpx
{
    private const string Namespace = "http://www.topografix.com/GPX/1/1";

    internal const string Caution =
        "Planned survey transects, WGS 84, bearings true. Not for navigation: check hazards, weather, closed areas and permissions before going.";

    public static OutputFile Write(SurveyPlan plan)
    {
        var field = FieldMarks.Of(plan);
        return new OutputFile(OutputNames.TransectsGpx, XmlText.Write(xml =>
        {
            xml.WriteStartElement("gpx", Namespace);
            xml.WriteAttributeString("version", "1.1");
            xml.WriteAttributeString("creator", "SurveyPlanner");
            xml.WriteStartElement("metadata", Namespace);
            Element(xml, "name", plan.Design.Name);
            Element(xml, "desc", Caution);
            xml.WriteEndElement();
            WriteMarks(xml, field.Marks);
            WriteRoutes(xml, field.Stretches);
            WriteTracks(xml, plan);
            xml.WriteEndElement();
        }));
    }

    private static void WriteMarks(XmlWriter xml, ImmutableArray<FieldMark> marks)
    {
        foreach (var mark in marks)
        {
            StartPosition(xml, "wpt", mark.Position);
            Element(xml, "name", mark.Name);
            Element(xml, "cmt", mark.Description);
            xml.WriteEndElement();
        }
    }

    private static void WriteRoutes(XmlWriter xml, ImmutableArray<FieldStretch> stretches)
    {
        foreach (var stretch in stretches)
        {
            xml.WriteStartElement("rte", Namespace);
            Element(xml, "name", stretch.Name);
            Element(xml, "cmt", stretch.Description);
            foreach (var position in RoutePoints.Of(stretch.Piece.Positions, stretch.Planned.HalfWidthMetres))
            {
                StartPosition(xml, "rtept", position);
                xml.WriteEndElement();
            }

            xml.WriteEndElement();
        }
    }

    private static void WriteTracks(XmlWriter xml, SurveyPlan plan)
    {
        foreach (var planned in PlannedTransect.InOrder(plan).Where(planned => !planned.Transect.IsPoint))
        {
            xml.WriteStartElement("trk", Namespace);
            Element(xml, "name", planned.Transect.Id);
            Element(xml, "cmt", $"{planned.Transect.Id} {planned.StratumName}, {Figures.Fixed(planned.Transect.LengthMetres / 1000, 2)} km");
            foreach (var piece in planned.Transect.Pieces)
            {
                xml.WriteStartElement("trkseg", Namespace);
                foreach (var position in LonLatPath.Of(piece, plan.Region.Projection, planned.HalfWidthMetres))
                {
                    StartPosition(xml, "trkpt", position);
                    xml.WriteEndElement();
                }

                xml.WriteEndElement();
            }

            xml.WriteEndElement();
        }
    }

    private static void StartPosition(XmlWriter xml, string element, LonLat position)
    {
        xml.WriteStartElement(element, Namespace);
        xml.WriteAttributeString("lat", Figures.Degrees(position.Lat));
        xml.WriteAttributeString("lon", Figures.Longitude(position.Lon));
    }

    private static void Element(XmlWriter xml, string name, string text) =>
        xml.WriteElementString(name, Namespace, PlainText.Clean(text));
}
