namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>The way back from a projection's plane to its ellipsoid. Boundaries are only ever read, so the way there is not needed.</summary>
internal abstract class PlaneMethod
{
    protected const double RadiansPerDegree = Math.PI / 180;

    /// <summary>
    /// Longitude east of the system's prime meridian and latitude, degrees, from metres east and north of the projection's own origin
    /// (false easting and northing taken off). NaN where the projection has no such place.
    /// </summary>
    public abstract (double Lon, double Lat) Inverse(double x, double y);

    protected static (double Lon, double Lat) Nowhere => (double.NaN, double.NaN);
}
