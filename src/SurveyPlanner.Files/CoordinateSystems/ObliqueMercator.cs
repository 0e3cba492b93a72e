using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// Hotine oblique Mercator projection. Accuracy: 1 mm against PROJ within 15° of the centre; beyond 45° it answers NaN.
/// Source: Snyder 1987, USGS Professional Paper 1395, pp. 73-75 (alternate B); EPSG methods 9812 (origin where the initial line meets the
/// equator of its sphere) and 9815 (origin at the centre). Own code because the library's is off by hundreds of kilometres.
/// </summary>
internal sealed class ObliqueMercator : PlaneMethod
{
    private readonly double _e2;
    private readonly double _a;
    private readonly double _b;
    private readonly double _h;
    private readonly double _gamma0;
    private readonly double _lon0;
    private readonly double _gamma;
    private readonly double _uCentre;
    private readonly double _uShift;

    public ObliqueMercator(Ellipsoid ellipsoid, double lat0, double lon0, double azimuth, double gamma, double scale, bool originAtCentre)
    {
        _e2 = ellipsoid.EccentricitySquared;
        var (sin, cos) = Math.SinCos(lat0 * RadiansPerDegree);
        var w = 1 - (_e2 * sin * sin);
        _b = Math.Sqrt(1 + (_e2 * Math.Pow(cos, 4) / (1 - _e2)));
        _a = ellipsoid.SemiMajorMetres * _b * scale * Math.Sqrt(1 - _e2) / w;
        var d = Math.Max(1, _b * Math.Sqrt(1 - _e2) / (cos * Math.Sqrt(w)));
        var root = Math.Sqrt((d * d) - 1) * Math.Sign(lat0);
        var f = d + root;
        var tangent = ConformalLatitude.Tangent(Math.Tan(lat0 * RadiansPerDegree), _e2);
        _h = f * Math.Pow(1 / (tangent + Math.Sqrt(1 + (tangent * tangent))), _b);
        var alpha = azimuth * RadiansPerDegree;
        _gamma0 = Math.Asin(Math.Sin(alpha) / d);
        _gamma = gamma * RadiansPerDegree;
        // For an azimuth of 90° the sine is 1, and rounding must not carry it beyond.
        var sine = Math.Clamp((f - (1 / f)) / 2 * Math.Tan(_gamma0), -1, 1);
        _lon0 = lon0 - (Math.Asin(sine) / _b / RadiansPerDegree);
        _uCentre = _a / _b * Math.Atan2(root, Math.Cos(alpha));
        _uShift = originAtCentre ? _uCentre : 0;
    }

    public override (double Lon, double Lat) Inverse(double x, double y)
    {
        var (sinGamma, cosGamma) = Math.SinCos(_gamma);
        var v = (x * cosGamma) - (y * sinGamma);
        var u = (y * cosGamma) + (x * sinGamma) + _uShift;
        var along = _b * u / _a;
        if (!(Math.Abs(v * _b / _a) <= Math.PI / 4 && Math.Abs(along - (_b * _uCentre / _a)) <= Math.PI / 4))
        {
            return Nowhere;
        }

        var (sinh, cosh) = (Math.Sinh(-_b * v / _a), Math.Cosh(_b * v / _a));
        var (sinGamma0, cosGamma0) = Math.SinCos(_gamma0);
        var (sinAlong, cosAlong) = Math.SinCos(along);
        var sinLatitude = ((sinAlong * cosGamma0) + (sinh * sinGamma0)) / cosh;
        var t = Math.Pow(_h / Math.Sqrt((1 + sinLatitude) / (1 - sinLatitude)), 1 / _b);
        var latitude = ConformalLatitude.ToGeodetic(((1 / t) - t) / 2, _e2);
        var longitude = _lon0 - (Math.Atan2((sinh * cosGamma0) - (sinAlong * sinGamma0), cosAlong) / _b / RadiansPerDegree);
        return (longitude, latitude / RadiansPerDegree);
    }
}
