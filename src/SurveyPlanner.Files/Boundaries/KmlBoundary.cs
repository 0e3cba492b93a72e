using System.Xml;
using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Reads polygons from KML (OGC 07-147r2 and 12-007r2), any of its namespaces. Document types are refused, so that no entity is ever
/// expanded, and links are never followed.
/// </summary>
internal static class KmlBoundary
{
    public static RawBoundary Read(byte[] bytes, string source, RepairLog log, string? layer)
    {
        var settings = new XmlReaderSettings
        {
            DtdProcessing = DtdProcessing.Prohibit,
            XmlResolver = null,
            IgnoreComments = true,
            IgnoreProcessingInstructions = true,
            MaxCharactersInDocument = FileBytes.MostBytes,
        };
        try
        {
            using var stream = new MemoryStream(bytes, writable: false);
            using var reader = XmlReader.Create(stream, settings);
            reader.MoveToContent();
            DemandKml(reader.LocalName, source);
            var placemarks = new KmlPlacemarks(source, log, layer);
            placemarks.ReadAll(reader);
            return new RawBoundary(placemarks.Features, Wgs84Degrees.Instance, "the standard, which knows no other for KML", []);
        }
        catch (XmlException error)
        {
            throw new InputException(Fault(error, source));
        }
    }

    private static Problem Fault(XmlException error, string source)
    {
        int? line = error.LineNumber > 0 ? error.LineNumber : null;
        int? column = error.LinePosition > 0 ? error.LinePosition : null;
        var message = error.Message.Contains("DTD", StringComparison.Ordinal)
            ? "the file has a document type (DTD), which is prohibited because it can be used to attack; remove the DOCTYPE line"
            : "this is not well-formed XML, or it is cut short; export the KML again";
        return new Problem(message, source, line, column);
    }

    private static void DemandKml(string root, string source)
    {
        if (root is "kml" or "Document" or "Folder" or "Placemark")
        {
            return;
        }

        var what = root.ToUpperInvariant() switch
        {
            "GPX" => "GPX, which holds tracks and points but no areas",
            "FEATURECOLLECTION" => "GML, which is not read",
            "HTML" => "a web page; perhaps a log-in page was saved instead of the file",
            "SVG" => "a drawing (SVG), which is not read",
            "OSM" => "OpenStreetMap data, which is not read",
            _ => $"XML of the kind {Wording.Quote(root)}, which is not read",
        };
        throw FileBytes.Refusal(source, $"this is {what}; save the boundary as GeoJSON, GeoPackage, shapefile or KML");
    }
}
