using System.Xml;
using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Reads polygons from KML (OGC 07-147r2 and 12-007r2), any of its namespaces. Document types are refused, so that no entity is ever
/// expanded, and links are never followed.
/// </summary>
internal static class KmlBoundary
{
    /// <summary>Reads one KML file, or all of a KMZ as if they were one.</summary>
    public static RawBoundary Read(IReadOnlyList<byte[]> files, string source, RepairLog log, string? layer)
    {
        var placemarks = new KmlPlacemarks(source, log, layer);
        foreach (var file in files)
        {
            Read(file, source, placemarks);
        }

        placemarks.DemandSome();
        if (placemarks.HasLinks)
        {
            log.Warn("the file links to further files; links are not followed, so what stands elsewhere was not read");
        }

        return new RawBoundary(placemarks.Features, Wgs84Degrees.Instance, "the standard, which knows no other for KML", []);
    }

    private static void Read(byte[] bytes, string source, KmlPlacemarks placemarks)
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
            placemarks.ReadAll(reader);
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
