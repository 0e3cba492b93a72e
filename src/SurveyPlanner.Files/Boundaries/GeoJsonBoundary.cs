using System.Text.Json;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Reads polygons from GeoJSON (RFC 7946), and honours the <c>crs</c> member of the 2008 form when it is a name. Strict about JSON, tolerant
/// where the RFC is: winding, foreign members, null geometries, order of members.
/// Own code on System.Text.Json: the library's reader passes 1e400, repeated keys and unknown systems without a word.
/// </summary>
internal static class GeoJsonBoundary
{
    // Deeper nesting than any GeoJSON needs is an attack on the stack.
    private const int MostLevels = 64;

    public static RawBoundary Read(byte[] bytes, string source, RepairLog log)
    {
        var text = FileBytes.ToUtf8(bytes, source, log);
        using var document = Parse(text, source);
        var root = document.RootElement;
        var objects = new GeoJsonObjects(source);
        var type = objects.RootType(root);
        var (system, origin) = GeoJsonCrs.Read(root, source, log);
        var geometries = new GeoJsonGeometries(source, log, system);
        var features = new List<RawFeature>();
        var number = 0;
        foreach (var (element, isFeature) in objects.Features(root, type))
        {
            number++;
            var geometry = isFeature ? objects.Geometry(element, number) : element;
            geometries.CheckCrs(element, number, isRoot: type != "FeatureCollection");
            var polygons = geometries.Polygons(geometry, number);
            if (polygons.Count > 0)
            {
                features.Add(new RawFeature(number, isFeature ? objects.Attributes(element, number) : GeoJsonObjects.None, polygons));
            }
        }

        if (features.Count == 0)
        {
            throw FileBytes.Refusal(source, geometries.NoPolygonsSentence(number));
        }

        return new RawBoundary(features, system, origin, []) { SystemIsDefault = system is not null && origin == GeoJsonCrs.Default };
    }

    private static JsonDocument Parse(ReadOnlyMemory<byte> text, string source)
    {
        if (text.Span.Trim(" \t\r\n\0"u8).IsEmpty)
        {
            throw FileBytes.Refusal(source, "the file is empty; export the boundary again");
        }

        try
        {
            return JsonDocument.Parse(text, new JsonDocumentOptions { MaxDepth = MostLevels, AllowDuplicateProperties = false });
        }
        catch (JsonException error)
        {
            throw new InputException(SyntaxProblem(error, text.Span, source));
        }
    }

    private static Problem SyntaxProblem(JsonException error, ReadOnlySpan<byte> text, string source)
    {
        int? line = error.LineNumber is { } zeroBased ? (int)zeroBased + 1 : null;
        int? column = error.BytePositionInLine is { } position ? (int)position + 1 : null;
        var message = error.Message switch
        {
            var m when m.Contains("maximum configured depth", StringComparison.Ordinal) => $"the JSON is nested more than {MostLevels} levels deep, which no boundary needs",
            var m when m.Contains("Duplicate", StringComparison.OrdinalIgnoreCase) => $"a member stands twice in one JSON object; keep one of them ({FirstSentence(m)})",
            var m when m.Contains("after a single JSON value", StringComparison.Ordinal)
                => "something follows after the end of the JSON; the file must hold one GeoJSON object only, not one a line",
            _ when ReachesEnd(text, error) => "the file ends in the middle of the JSON, so it is cut short; export or copy it again",
            var m => $"this is not JSON: {FirstSentence(m)}; export the file again",
        };
        return new Problem(message, source, line, column);
    }

    private static bool ReachesEnd(ReadOnlySpan<byte> text, JsonException error)
    {
        if (error.LineNumber is not { } line || error.BytePositionInLine is not { } position)
        {
            return false;
        }

        var end = FileBytes.LineAndColumn(text, text.Length);
        return line + 1 == end.Line && position + 1 >= end.Column;
    }

    private static string FirstSentence(string message)
    {
        // The library's sentence may quote a stretch of the file.
        var end = message.IndexOf(". ", StringComparison.Ordinal);
        return Wording.Harmless((end < 0 ? message : message[..end]).TrimEnd('.'), longest: 100);
    }
}
