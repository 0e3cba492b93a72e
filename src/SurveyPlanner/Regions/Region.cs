using System.Collections.Immutable;

namespace SurveyPlanner.Regions;

/// <summary>
/// A study region ready to be surveyed: strata as shapes in one equal-area plane.
/// </summary>
/// <param name="Projection">The plane and how to get to it and back.</param>
/// <param name="Strata">The strata in the order of the plan file, else of first appearance in the boundary; at least one.</param>
/// <param name="Exclusions">What was cut out of the strata, for the map; empty when nothing was.</param>
/// <param name="MaxScaleErrorPercent">Largest error of length along any direction anywhere in the region, percent.</param>
/// <param name="MaxConvergenceDegrees">Largest angle between grid north and true north in the region, degrees.</param>
/// <param name="CoordinateSystem">What coordinates the boundary was read in and where that was found.</param>
/// <param name="Notices">Repairs and warnings.</param>
public sealed record Region(
    EqualAreaProjection Projection,
    ImmutableArray<Stratum> Strata,
    PlaneShape Exclusions,
    double MaxScaleErrorPercent,
    double MaxConvergenceDegrees,
    string CoordinateSystem,
    ImmutableArray<Notice> Notices)
{
    /// <summary>Distance kept from the closed areas, metres.</summary>
    public double ExclusionBufferMetres { get; init; }

    /// <summary>Bounding box in degrees.</summary>
    public GeographicExtent Extent => GeographicExtent.Of(Strata.Select(stratum => stratum.Shape), Projection);

    /// <summary>Area of all strata in the plane, square kilometres.</summary>
    public double AreaKm2 => Strata.Sum(stratum => stratum.AreaKm2);

    /// <summary>Area of all strata on the ellipsoid, square kilometres; no projection takes part in it.</summary>
    public double GeodesicAreaKm2 => Strata.Sum(stratum => stratum.GeodesicAreaKm2);
}

/// <summary>
/// A part of the study region that gets its own layout.
/// </summary>
/// <param name="Name">Its name, any characters.</param>
/// <param name="Shape">Its outline in the plane, exclusions already cut out.</param>
/// <param name="GeodesicAreaKm2">Area on the ellipsoid, square kilometres.</param>
/// <param name="Centre">Centroid, in the plane.</param>
/// <param name="CentreLonLat">Centroid, in degrees.</param>
/// <param name="ConvergenceDegrees">At the centre: bearing of grid north, degrees clockwise from true north. True bearing = grid bearing + this.</param>
/// <param name="LongAxisBearing">True bearing of the long side of the narrowest rectangle round the stratum, degrees in [0, 180).</param>
/// <param name="LongAxisKm">Length of that side, kilometres.</param>
/// <param name="ShortAxisKm">Width of that rectangle, kilometres.</param>
/// <param name="Attributes">Attributes that all its features share, for spacing or bearing by attribute.</param>
public sealed record Stratum(
    string Name,
    PlaneShape Shape,
    double GeodesicAreaKm2,
    PlanePoint Centre,
    LonLat CentreLonLat,
    double ConvergenceDegrees,
    double LongAxisBearing,
    double LongAxisKm,
    double ShortAxisKm,
    ImmutableSortedDictionary<string, string> Attributes)
{
    /// <summary>Closed areas with their buffer, in the plane: nobody goes there, not even beyond the stratum's own boundary.</summary>
    public PlaneShape Closed { get; init; } = PlaneShape.Empty;

    /// <summary>Area that was cut out of it as closed, square kilometres.</summary>
    public double ClosedKm2 { get; init; }

    /// <summary>Vertices of its outline in the boundary file, before edges were given more of them for the plane.</summary>
    public int OutlineVertices { get; init; }

    /// <summary>Area in the plane, square kilometres.</summary>
    public double AreaKm2 => Shape.AreaSquareMetres / 1e6;
}
