namespace SurveyPlanner.Regions;

/// <summary>
/// Area on the ellipsoid inside rings whose edges are straight in longitude and latitude. No projection takes part.
/// Accuracy: 1e-12 relative for edges up to a degree (Gauss-Legendre with five nodes). Rings may go round a pole.
/// Method: Green's theorem with the area between a parallel and the nearer pole, R² (1 − sin authalic latitude) per radian of longitude.
/// </summary>
internal static class EllipsoidArea
{
    private const double RadiansPerDegree = Math.PI / 180;

    private static readonly (double Node, double Weight)[] Gauss =
    [
        (0.5, 64.0 / 225),
        (0.5 - (Math.Sqrt(5 - (2 * Math.Sqrt(10.0 / 7))) / 6), (322 + (13 * Math.Sqrt(70))) / 1800),
        (0.5 + (Math.Sqrt(5 - (2 * Math.Sqrt(10.0 / 7))) / 6), (322 + (13 * Math.Sqrt(70))) / 1800),
        (0.5 - (Math.Sqrt(5 + (2 * Math.Sqrt(10.0 / 7))) / 6), (322 - (13 * Math.Sqrt(70))) / 1800),
        (0.5 + (Math.Sqrt(5 + (2 * Math.Sqrt(10.0 / 7))) / 6), (322 - (13 * Math.Sqrt(70))) / 1800),
    ];

    /// <summary>Square metres inside one ring (closed or not), always positive.</summary>
    public static double OfRing(IReadOnlyList<LonLat> ring)
    {
        var ellipsoid = Ellipsoid.Wgs84;
        var north = ring.Sum(position => position.Lat) >= 0 ? 1 : -1;
        var total = 0.0;
        for (var i = 0; i < ring.Count; i++)
        {
            var (from, to) = (ring[i], ring[(i + 1) % ring.Count]);
            var east = Longitude.Difference(from.Lon, to.Lon) * RadiansPerDegree;
            if (east == 0)
            {
                continue;
            }

            var mean = 0.0;
            foreach (var (node, weight) in Gauss)
            {
                var latitude = (from.Lat + (node * (to.Lat - from.Lat))) * RadiansPerDegree;
                mean += weight * (north - (ellipsoid.Q(Math.Sin(latitude)) / ellipsoid.QPole));
            }

            total += east * mean;
        }

        return Math.Abs(total) * ellipsoid.AuthalicRadiusMetres * ellipsoid.AuthalicRadiusMetres;
    }

    /// <summary>Square metres on the ellipsoid of a shape in the plane of a projection.</summary>
    public static double Of(PlaneShape shape, EqualAreaProjection projection)
    {
        var total = 0.0;
        for (var part = 0; part < shape.PartCount; part++)
        {
            for (var ring = shape.PartStarts[part]; ring < shape.PartStarts[part + 1]; ring++)
            {
                var positions = new LonLat[shape.RingStarts[ring + 1] - shape.RingStarts[ring]];
                for (var i = 0; i < positions.Length; i++)
                {
                    var vertex = shape.RingStarts[ring] + i;
                    positions[i] = projection.Unproject(new PlanePoint(shape.X[vertex], shape.Y[vertex]));
                }

                total += ring == shape.PartStarts[part] ? OfRing(positions) : -OfRing(positions);
            }
        }

        return total;
    }
}
