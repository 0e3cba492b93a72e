using System.Collections.Immutable;
using System.Runtime.CompilerServices;
using System.Text.Json;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Tests.Fixtures;

/// <summary>Boundaries for the tests of pages: the reference ones, read without the checks of the program's own reader, and boxes.</summary>
internal static class SampleBoundary
{
    /// <param name="file">Name of a file of tests/reference-data/regions, without its ending.</param>
    public static Boundary Read(string file)
    {
        using var document = JsonDocument.Parse(File.ReadAllText(Path.Combine(ReferenceData(), "regions", file + ".geojson")));
        return Of([.. document.RootElement.GetProperty("features").EnumerateArray().Select((feature, i) => new BoundaryFeature(
            i + 1,
            feature.GetProperty("properties").EnumerateObject().ToImmutableSortedDictionary(p => p.Name, p => p.Value.ToString()),
            [.. Polygons(feature.GetProperty("geometry"))]))]);
    }

    /// <summary>Features given as rectangles in degrees, with the attribute <c>name</c>.</summary>
    public static Boundary Boxes(params (string Name, double West, double South, double East, double North)[] boxes) => Of([.. boxes.Select((box, i) => new BoundaryFeature(
        i + 1, ImmutableSortedDictionary<string, string>.Empty.Add("name", box.Name), [Box(box.West, box.South, box.East, box.North)]))]);

    private static Boundary Of(ImmutableArray<BoundaryFeature> features)
        => new("sample.geojson", features, "longitude and latitude on WGS 84, as RFC 7946 says", []);

    private static GeographicPolygon Box(double west, double south, double east, double north)
        => new([new(west, south), new(east, south), new(east, north), new(west, north), new(west, south)], []);

    private static IEnumerable<GeographicPolygon> Polygons(JsonElement geometry)
    {
        var coordinates = geometry.GetProperty("coordinates");
        return geometry.GetProperty("type").GetString() == "Polygon" ? [Polygon(coordinates)] : coordinates.EnumerateArray().Select(Polygon);
    }

    private static GeographicPolygon Polygon(JsonElement rings)
    {
        ImmutableArray<ImmutableArray<LonLat>> all =
            [.. rings.EnumerateArray().Select(ring => ring.EnumerateArray().Select(p => new LonLat(p[0].GetDouble(), p[1].GetDouble())).ToImmutableArray())];
        return new GeographicPolygon(all[0], all[1..]);
    }

    private static string ReferenceData([CallerFilePath] string here = "")
        => Path.GetFullPath(Path.Combine(Path.GetDirectoryName(here)!, "..", "..", "reference-data"));
}
