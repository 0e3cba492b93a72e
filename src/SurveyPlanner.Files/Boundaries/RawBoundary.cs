using System.Collections.Immutable;
using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>A vertex as the file has it: x is east or longitude, y is north or latitude, in the file's own units.</summary>
internal readonly record struct FilePoint(double X, double Y);

/// <summary>One outline as the file has it: not mended, perhaps not closed.</summary>
/// <param name="Points">Its vertices in file order.</param>
/// <param name="Place">Where it stands, for messages, such as <c>feature 3, part 2, ring 1</c>.</param>
internal sealed record RawRing(IReadOnlyList<FilePoint> Points, string Place);

internal sealed record RawPolygon(RawRing Shell, IReadOnlyList<RawRing> Holes)
{
    /// <summary>The polygons of one feature, each given as its rings, the shell first.</summary>
    public static IReadOnlyList<RawPolygon> From(List<List<List<FilePoint>>> polygons, int feature)
    {
        return [.. polygons.Select((rings, part) => new RawPolygon(Ring(rings, part, 0), [.. Enumerable.Range(1, rings.Count - 1).Select(ring => Ring(rings, part, ring))]))];

        RawRing Ring(List<List<FilePoint>> rings, int part, int ring) => new(rings[ring], Place.Ring(feature, part + 1, polygons.Count, ring + 1));
    }
}

internal sealed record RawFeature(int Number, ImmutableSortedDictionary<string, string> Attributes, IReadOnlyList<RawPolygon> Polygons);

/// <summary>What a format reader hands on: outlines in the file's own coordinates, and what the file says these are.</summary>
/// <param name="Features">Only features that hold polygons, in file order.</param>
/// <param name="System">The coordinate system the file declares; null when it declares none.</param>
/// <param name="SystemOrigin">Where that was found, such as <c>the crs member</c>, or why there is none.</param>
/// <param name="Notices">What the reader has to tell.</param>
internal sealed record RawBoundary(
    IReadOnlyList<RawFeature> Features,
    CoordinateSystem? System,
    string SystemOrigin,
    IReadOnlyList<Notice> Notices)
{
    /// <summary>The format demands this system (KML), or gives it unless something else is said (GeoJSON): then it is a default, not a declaration.</summary>
    public bool SystemIsDefault { get; init; }

    public IEnumerable<RawRing> Rings => Features.SelectMany(feature => feature.Polygons).SelectMany(polygon => polygon.Holes.Prepend(polygon.Shell));
}
