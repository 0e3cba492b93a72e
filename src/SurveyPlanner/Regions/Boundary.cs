using System.Collections.Immutable;

namespace SurveyPlanner.Regions;

/// <summary>A position on the WGS 84 ellipsoid, degrees; longitude may be any turn of the circle.</summary>
public readonly record struct LonLat(double Lon, double Lat);

/// <summary>A position in the region's equal-area plane, metres east and north of its centre.</summary>
public readonly record struct PlanePoint(double X, double Y);

/// <summary>
/// One polygon of a boundary file in degrees. Rings are closed (first equals last); edges are straight in longitude and latitude.
/// </summary>
public sealed record GeographicPolygon(ImmutableArray<LonLat> Shell, ImmutableArray<ImmutableArray<LonLat>> Holes);

/// <summary>One feature of a boundary file: its number in the file (from 1), its attributes as text, its polygons.</summary>
public sealed record BoundaryFeature(
    int Number,
    ImmutableSortedDictionary<string, string> Attributes,
    ImmutableArray<GeographicPolygon> Polygons);

/// <summary>
/// A boundary file as understood: everything in degrees on WGS 84, whatever the file held.
/// </summary>
/// <param name="Source">The file as the user named it, for messages.</param>
/// <param name="Features">Its features in file order.</param>
/// <param name="CoordinateSystem">What coordinates the file was read in and where that was found, in words.</param>
/// <param name="Notices">Repairs and warnings made while reading.</param>
public sealed record Boundary(
    string Source,
    ImmutableArray<BoundaryFeature> Features,
    string CoordinateSystem,
    ImmutableArray<Notice> Notices);
