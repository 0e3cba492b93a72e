namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// The latitude that makes the ellipsoid conformal to a sphere, which all conformal projections share. Angles in radians.
/// Source: Karney 2011, Transverse Mercator with an accuracy of a few nanometers, J. Geod. 85, eqs. 7-9 and 19-21.
/// </summary>
internal static class ConformalLatitude
{
    /// <summary>Tangent of the conformal latitude from that of the geodetic one.</summary>
    public static double Tangent(double tan, double eccentricitySquared)
    {
        var e = Math.Sqrt(eccentricitySquared);
        var secant = Math.Sqrt(1 + (tan * tan));
        var sigma = Math.Sinh(e * Math.Atanh(e * tan / secant));
        return (tan * Math.Sqrt(1 + (sigma * sigma))) - (sigma * secant);
    }

    /// <summary>Geodetic latitude from the tangent of the conformal one: Newton's method, which gains all digits in three rounds.</summary>
    public static double ToGeodetic(double conformalTangent, double eccentricitySquared)
    {
        if (double.IsInfinity(conformalTangent))
        {
            return Math.CopySign(Math.PI / 2, conformalTangent);
        }

        var tan = conformalTangent / (1 - eccentricitySquared);
        for (var round = 0; round < 5; round++)
        {
            var reached = Tangent(tan, eccentricitySquared);
            tan += (conformalTangent - reached) / Math.Sqrt(1 + (reached * reached))
                * (1 + ((1 - eccentricitySquared) * tan * tan)) / ((1 - eccentricitySquared) * Math.Sqrt(1 + (tan * tan)));
        }

        return Math.Atan(tan);
    }
}
