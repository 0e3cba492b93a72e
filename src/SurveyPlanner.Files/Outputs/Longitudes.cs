namespace SurveyPlanner.Files.Outputs;

/// <summary>Turns of the circle.</summary>
internal static class Longitudes
{
    /// <summary>The same meridian in [-180, 180).</summary>
    public static double Normalise(double degrees)
    {
        if (degrees is >= -180 and < 180)
        {
            return degrees;
        }

        var turned = degrees - (360 * Math.Floor((degrees + 180) / 360));

        // Just below -180 the sum rounds up to 180.
        return turned >= 180 ? -180 : turned;
    }

    /// <summary>The shorter way from one meridian to another, in [-180, 180).</summary>
    public static double Difference(double from, double to) => Normalise(to - from);
}
