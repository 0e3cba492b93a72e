namespace SurveyPlanner.Regions;

/// <summary>
/// An equal-area map projection of the WGS 84 ellipsoid, centred on a region.
/// Accuracy: see each projection; held to 1 mm against PROJ in the tests.
/// </summary>
public abstract class EqualAreaProjection
{
    /// <summary>The published name of the method, such as <c>Lambert azimuthal equal-area</c>.</summary>
    public abstract string Method { get; }

    /// <summary>The projection as WKT 2 (ISO 19162), which GIS programs read.</summary>
    public abstract string Wkt { get; }

    /// <summary>Where the plane's origin lies.</summary>
    public abstract LonLat Centre { get; }

    /// <summary>Degrees to metres.</summary>
    public abstract PlanePoint Project(LonLat position);

    /// <summary>Metres to degrees; longitude in [-180, 180).</summary>
    public abstract LonLat Unproject(PlanePoint point);
}
