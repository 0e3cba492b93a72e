using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// A shift of datum by three or seven parameters, position-vector convention (EPSG methods 9603 and 9606), to WGS 84.
/// Accuracy of the arithmetic: 1 mm against PROJ; how well the parameters fit the ground is in <paramref name="AccuracyMetres"/>.
/// </summary>
/// <param name="Origin">Where the parameters come from, such as <c>EPSG operation 1314</c>.</param>
/// <param name="X">Shift along the geocentric axes, metres.</param>
/// <param name="Y">Shift, metres.</param>
/// <param name="Z">Shift, metres.</param>
/// <param name="RotationX">Rotation about the axes, arc seconds.</param>
/// <param name="RotationY">Rotation, arc seconds.</param>
/// <param name="RotationZ">Rotation, arc seconds.</param>
/// <param name="ScalePpm">Change of scale, parts in a million.</param>
/// <param name="AccuracyMetres">How far a shifted position may be from the true one.</param>
internal sealed record HelmertShift(
    string Origin, double X, double Y, double Z, double RotationX, double RotationY, double RotationZ, double ScalePpm, double AccuracyMetres)
{
    private const double RadiansPerDegree = Math.PI / 180;

    // The register's areas end at coasts or borders; surveys at sea and files that reach over a border go on.
    private const double MarginDegrees = 2;

    /// <summary>West, south, east, north of the area that the parameters were found in; the whole globe unless given.</summary>
    public (double West, double South, double East, double North) Area { get; init; } = (-180, -90, 180, 90);

    public bool Covers(double lon, double lat)
    {
        var (west, south, east, north) = Area;
        var width = east >= west ? east - west : east + 360 - west;
        var offset = lon - west + MarginDegrees;
        offset -= 360 * Math.Floor(offset / 360);
        return offset <= width + (2 * MarginDegrees) && lat >= south - MarginDegrees && lat <= north + MarginDegrees;
    }

    /// <summary>Degrees on WGS 84 from degrees on an ellipsoid; heights above either are taken as nought.</summary>
    public LonLat Apply(double lon, double lat, Ellipsoid from)
    {
        var (sinLat, cosLat) = Math.SinCos(lat * RadiansPerDegree);
        var (sinLon, cosLon) = Math.SinCos(lon * RadiansPerDegree);
        var normal = from.SemiMajorMetres / Math.Sqrt(1 - (from.EccentricitySquared * sinLat * sinLat));
        var (x, y, z) = (normal * cosLat * cosLon, normal * cosLat * sinLon, normal * (1 - from.EccentricitySquared) * sinLat);
        var scale = 1 + (ScalePpm * 1e-6);
        var (rx, ry, rz) = (Radians(RotationX), Radians(RotationY), Radians(RotationZ));
        var shifted = ToGeodetic(
            X + (scale * (x - (rz * y) + (ry * z))),
            Y + (scale * ((rz * x) + y - (rx * z))),
            Z + (scale * ((-ry * x) + (rx * y) + z)));

        // The longitude stays in the turn that it came in.
        return shifted with { Lon = shifted.Lon + (360 * Math.Round((lon - shifted.Lon) / 360)) };
    }

    private static LonLat ToGeodetic(double x, double y, double z)
    {
        // Heights are a few tens of metres here, so that plain iteration gains three digits a round.
        var e2 = Ellipsoid.Wgs84.EccentricitySquared;
        var p = Math.Sqrt((x * x) + (y * y));
        var latitude = Math.Atan2(z, p * (1 - e2));
        for (var round = 0; round < 5; round++)
        {
            var sin = Math.Sin(latitude);
            var normal = Ellipsoid.Wgs84.SemiMajorMetres / Math.Sqrt(1 - (e2 * sin * sin));
            latitude = Math.Atan2(z + (e2 * normal * sin), p);
        }

        return new LonLat(Math.Atan2(y, x) / RadiansPerDegree, latitude / RadiansPerDegree);
    }

    private static double Radians(double arcSeconds) => arcSeconds / 3600 * RadiansPerDegree;
}
