using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>An invented boundary: squares of a tenth of a degree one above the other, each a zone with an attribute.</summary>
internal static class Squares
{
    public const string Field = "km between lines";

    public static Boundary Boundary(params (string Zone, string Value)[] squares)
        => new("squares.geojson", [.. squares.Select((square, i) => Feature(i, square.Zone, square.Value))], "longitude and latitude", []);

    private static BoundaryFeature Feature(int number, string zone, string value)
    {
        var (west, south) = (10.0, 50 + (0.1 * number));
        ImmutableArray<LonLat> ring = [new(west, south), new(west + 0.1, south), new(west + 0.1, south + 0.1), new(west, south + 0.1), new(west, south)];
        var attributes = ImmutableSortedDictionary<string, string>.Empty.Add("zone", zone).Add(Field, value).Add("heading", "400").Add("wide", " 250.5 ");
        return new BoundaryFeature(number + 1, attributes, [new GeographicPolygon(ring, [])]);
    }
}
