using System.Collections.Immutable;
using System.Runtime.CompilerServices;
using System.Text.Json;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Tests.Fixtures;

/// <summary>Regions for the tests of pages, read from the reference boundaries without the checks that the program's own reader does.</summary>
internal static class SampleRegion
{
    /// <param name="file">Name of a file of tests/reference-data/regions, without its ending.</param>
    /// <param name="stratumField">Attribute that names the strata; null for one stratum.</param>
    public static Region Read(string file, string? stratumField = null)
    {
        using var document = JsonDocument.Parse(File.ReadAllText(Path.Combine(ReferenceData(), "regions", file + ".geojson")));
        var features = document.RootElement.GetProperty("features").EnumerateArray().Select((feature, i) => new BoundaryFeature(
            i + 1,
            feature.GetProperty("properties").EnumerateObject().ToImmutableSortedDictionary(p => p.Name, p => p.Value.ToString()),
            [.. Polygons(feature.GetProperty("geometry"))]));
        return Build(stratumField, [.. features]);
    }

    /// <summary>Strata given as rectangles in degrees: west, south, east, north.</summary>
    public static Region Boxes(params (string Name, double West, double South, double East, double North)[] strata) => Build("name", [.. strata.Select((box, i) => new BoundaryFeature(
        i + 1, ImmutableSortedDictionary<string, string>.Empty.Add("name", box.Name), [Box(box.West, box.South, box.East, box.North)]))]);

    /// <summary>A rectangle in degrees with one closed to survey within it.</summary>
    public static Region WithExclusion() => RegionBuilder.Build(
        BoundaryOf([new(1, ImmutableSortedDictionary<string, string>.Empty, [Box(20, 60, 22, 61)])]),
        new RegionDesign(),
        [BoundaryOf([new(1, ImmutableSortedDictionary<string, string>.Empty, [Box(20.6, 60.3, 21, 60.5)])])]);

    private static Region Build(string? stratumField, ImmutableArray<BoundaryFeature> features)
        => RegionBuilder.Build(BoundaryOf(features), new RegionDesign(stratumField, []), []);

    private static Boundary BoundaryOf(ImmutableArray<BoundaryFeature> features)
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
