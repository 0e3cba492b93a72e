using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// Polar stereographic projection, by a scale at the pole or by the parallel of true scale. Accuracy: 1 mm against PROJ.
/// Source: Snyder 1987, USGS Professional Paper 1395, pp. 160-163. Own code because the library has none.
/// </summary>
internal sealed class PolarStereographic : PlaneMethod
{
    private readonly double _e2;
    private readonly double _lon0;
    private readonly int _pole;
    private readonly double _metresPerT;

    private PolarStereographic(Ellipsoid ellipsoid, bool north, double lon0, double metresPerT)
        => (_e2, _pole, _lon0, _metresPerT) = (ellipsoid.EccentricitySquared, north ? 1 : -1, lon0, metresPerT);

    public static PolarStereographic ByScale(Ellipsoid ellipsoid, bool north, double lon0, double scale)
    {
        var e = Math.Sqrt(ellipsoid.EccentricitySquared);
        var flattened = Math.Sqrt(Math.Pow(1 + e, 1 + e) * Math.Pow(1 - e, 1 - e));
        return new PolarStereographic(ellipsoid, north, lon0, 2 * ellipsoid.SemiMajorMetres * scale / flattened);
    }

    public static PolarStereographic ByParallel(Ellipsoid ellipsoid, double parallel, double lon0)
    {
        if (Math.Abs(parallel) > 89.9999999)
        {
            return ByScale(ellipsoid, parallel > 0, lon0, 1);
        }

        var latitude = Math.Abs(parallel) * RadiansPerDegree;
        var tangent = ConformalLatitude.Tangent(Math.Tan(latitude), ellipsoid.EccentricitySquared);
        var t = 1 / (tangent + Math.Sqrt(1 + (tangent * tangent)));
        return new PolarStereographic(ellipsoid, parallel > 0, lon0, ellipsoid.SemiMajorMetres * ellipsoid.ParallelRadius(latitude) / t);
    }

    public override (double Lon, double Lat) Inverse(double x, double y)
    {
        // Snyder's t is exp(-isometric latitude).
        var t = Math.Sqrt((x * x) + (y * y)) / _metresPerT;
        if (!(t <= 1))
        {
            // Beyond the equator no one keeps a boundary in this projection.
            return Nowhere;
        }

        var latitude = ConformalLatitude.ToGeodetic(((1 / t) - t) / 2, _e2);
        var longitude = t == 0 ? 0 : Math.Atan2(x, -_pole * y);
        return (_lon0 + (longitude / RadiansPerDegree), _pole * latitude / RadiansPerDegree);
    }
}
