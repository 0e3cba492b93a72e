using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// The core's own equal-area projections used to read files. The library's fail at the centre, at the poles and across 180° without a word.
/// </summary>
internal sealed class EqualAreaMethod(EqualAreaProjection projection, double widestMetres) : PlaneMethod
{
    public static EqualAreaMethod Azimuthal(Ellipsoid ellipsoid, double lat0, double lon0)
        => new(new AzimuthalEqualArea(new LonLat(lon0, lat0), ellipsoid), 1.95 * ellipsoid.AuthalicRadiusMetres);

    public static EqualAreaMethod Conic(Ellipsoid ellipsoid, double lat0, double lon0, double lat1, double lat2)
        => new(new ConicEqualArea(new LonLat(lon0, lat0), lat1, lat2, ellipsoid), 3.5 * ellipsoid.AuthalicRadiusMetres);

    public override (double Lon, double Lat) Inverse(double x, double y)
    {
        if (!(Math.Abs(x) <= widestMetres && Math.Abs(y) <= widestMetres))
        {
            return Nowhere;
        }

        // A point that the projection does not map to itself lies outside its image of the globe.
        var position = projection.Unproject(new PlanePoint(x, y));
        var back = projection.Project(position);
        return Math.Abs(back.X - x) < 0.01 && Math.Abs(back.Y - y) < 0.01 ? (position.Lon, position.Lat) : Nowhere;
    }
}
