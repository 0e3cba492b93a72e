using System.Collections.Immutable;
using System.Text.Json;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>Reads lines drawn on a map (a coast, a depth contour) from GeoJSON in degrees: every LineString and MultiLineString in the file.</summary>
public static class LineFile
{
    private const long MaxBytes = 64 * 1024 * 1024;

    /// <param name="path">The file.</param>
    /// <param name="files">The files of the run.</param>
    /// <exception cref="InputException">The file is missing, is no GeoJSON in degrees, or holds no line.</exception>
    public static ImmutableArray<ImmutableArray<LonLat>> Read(string path, InputFiles files)
    {
        if (!File.Exists(path) || new FileInfo(path).Length > MaxBytes)
        {
            throw Refusal(path, File.Exists(path) ? "is too large for a line to take a bearing from; simplify it" : "there is no file of this name");
        }

        var lines = ImmutableArray.CreateBuilder<ImmutableArray<LonLat>>();
        try
        {
            using var document = JsonDocument.Parse(files.Bytes(path));
            Collect(document.RootElement, lines, path);
        }
        catch (JsonException fault)
        {
            throw new InputException(new Problem(
                "is not GeoJSON; draw the line in a GIS program and save it as GeoJSON in longitude and latitude", path, (int?)fault.LineNumber + 1));
        }

        return lines.Count > 0
            ? lines.ToImmutable()
            : throw Refusal(path, "holds no line; draw one in a GIS program and save it as GeoJSON (LineString)");
    }

    private static void Collect(JsonElement element, ImmutableArray<ImmutableArray<LonLat>>.Builder lines, string path)
    {
        if (element.ValueKind != JsonValueKind.Object)
        {
            return;
        }

        foreach (var member in element.EnumerateObject().Where(member => member.Name is "features" or "geometries" or "geometry"))
        {
            IEnumerable<JsonElement> children = member.Value.ValueKind == JsonValueKind.Array ? member.Value.EnumerateArray() : [member.Value];
            foreach (var child in children)
            {
                Collect(child, lines, path);
            }
        }

        var type = element.TryGetProperty("type", out var name) && name.ValueKind == JsonValueKind.String ? name.GetString() : null;
        if (type is "LineString" or "MultiLineString" && element.TryGetProperty("coordinates", out var coordinates))
        {
            IEnumerable<JsonElement> parts = type == "LineString" ? [coordinates] : Items(coordinates, path);
            lines.AddRange(parts.Select(part => Items(part, path).Select(position => Position(position, path)).ToImmutableArray()).Where(line => line.Length > 1));
        }
    }

    private static JsonElement.ArrayEnumerator Items(JsonElement element, string path)
        => element.ValueKind == JsonValueKind.Array ? element.EnumerateArray() : throw Refusal(path, "has coordinates that are not a list");

    private static LonLat Position(JsonElement element, string path)
    {
        var numbers = Items(element, path).ToList();
        return numbers.Count >= 2
            && numbers[0].ValueKind == JsonValueKind.Number && numbers[0].TryGetDouble(out var lon) && Math.Abs(lon) <= 360
            && numbers[1].ValueKind == JsonValueKind.Number && numbers[1].TryGetDouble(out var lat) && Math.Abs(lat) <= 90
                ? new LonLat(lon, lat)
                : throw Refusal(path, $"has a position that is not longitude, latitude in degrees: {PlainText.Clean(element.GetRawText()[..Math.Min(40, element.GetRawText().Length)])}");
    }

    private static InputException Refusal(string path, string message) => new(new Problem(message, path, Key: "layout.bearing"));
}
