namespace SurveyPlanner.Regions;

/// <summary>
/// Shortest paths on the WGS 84 ellipsoid.
/// Accuracy: 0.1 mm up to 10,000 km; the pairs it cannot do (nearly antipodal) are far longer than any transect.
/// Source: Vincenty 1975, Direct and inverse solutions of geodesics on the ellipsoid, Survey Review 22(176): 88-93.
/// </summary>
public static class Geodesic
{
    private const double RadiansPerDegree = Math.PI / 180;

    /// <summary>Distance in metres and the true bearings at both ends, degrees in [0, 360).</summary>
    /// <exception cref="ArithmeticException">The places are nearly opposite each other on the globe.</exception>
    public static (double Metres, double StartBearing, double EndBearing) Inverse(LonLat from, LonLat to, Ellipsoid? ellipsoid = null)
    {
        var shape = ellipsoid ?? Ellipsoid.Wgs84;
        var (a, b) = (shape.SemiMajorMetres, shape.SemiMinorMetres);
        var f = (a - b) / a;
        var difference = Longitude.Difference(from.Lon, to.Lon) * RadiansPerDegree;
        var (sinU1, cosU1) = Reduced(from.Lat, f);
        var (sinU2, cosU2) = Reduced(to.Lat, f);
        var lambda = difference;
        for (var round = 0; round < 100; round++)
        {
            var (sinLambda, cosLambda) = Math.SinCos(lambda);
            var east = cosU2 * sinLambda;
            var north = (cosU1 * sinU2) - (sinU1 * cosU2 * cosLambda);
            var sinSigma = Math.Sqrt((east * east) + (north * north));
            if (sinSigma == 0)
            {
                return (0, 0, 0);
            }

            var cosSigma = (sinU1 * sinU2) + (cosU1 * cosU2 * cosLambda);
            var sigma = Math.Atan2(sinSigma, cosSigma);
            var sinAlpha = cosU1 * cosU2 * sinLambda / sinSigma;
            var cos2Alpha = 1 - (sinAlpha * sinAlpha);
            var cos2Middle = cos2Alpha == 0 ? 0 : cosSigma - (2 * sinU1 * sinU2 / cos2Alpha);
            var c = f / 16 * cos2Alpha * (4 + (f * (4 - (3 * cos2Alpha))));
            var next = difference + ((1 - c) * f * sinAlpha
                * (sigma + (c * sinSigma * (cos2Middle + (c * cosSigma * (-1 + (2 * cos2Middle * cos2Middle)))))));
            var change = Math.Abs(next - lambda);
            lambda = next;
            if (change < 1e-14)
            {
                var metres = Length(b, ((a * a) - (b * b)) / (b * b) * cos2Alpha, sigma, sinSigma, cosSigma, cos2Middle);
                var end = Math.Atan2(cosU1 * sinLambda, (cosU1 * sinU2 * cosLambda) - (sinU1 * cosU2));
                return (metres, Turn(Math.Atan2(east, north)), Turn(end));
            }
        }

        throw new ArithmeticException("the two places are nearly opposite each other on the globe");
    }

    /// <summary>Length of a path through positions, metres, geodesic from each to the next.</summary>
    public static double PathLength(ReadOnlySpan<LonLat> path)
    {
        var total = 0.0;
        for (var i = 1; i < path.Length; i++)
        {
            total += Inverse(path[i - 1], path[i]).Metres;
        }

        return total;
    }

    private static (double Sin, double Cos) Reduced(double latitudeDegrees, double f)
    {
        var (sin, cos) = Math.SinCos(latitudeDegrees * RadiansPerDegree);
        var up = (1 - f) * sin;
        var norm = Math.Sqrt((up * up) + (cos * cos));
        return (up / norm, cos / norm);
    }

    private static double Length(double b, double u2, double sigma, double sinSigma, double cosSigma, double cos2Middle)
    {
        var bigA = 1 + (u2 / 16384 * (4096 + (u2 * (-768 + (u2 * (320 - (175 * u2)))))));
        var bigB = u2 / 1024 * (256 + (u2 * (-128 + (u2 * (74 - (47 * u2))))));
        var correction = bigB * sinSigma * (cos2Middle + (bigB / 4 * ((cosSigma * (-1 + (2 * cos2Middle * cos2Middle)))
            - (bigB / 6 * cos2Middle * (-3 + (4 * sinSigma * sinSigma)) * (-3 + (4 * cos2Middle * cos2Middle))))));
        return b * bigA * (sigma - correction);
    }

    private static double Turn(double radians)
    {
        var degrees = radians / RadiansPerDegree;
        return degrees < 0 ? degrees + 360 : degrees;
    }
}
