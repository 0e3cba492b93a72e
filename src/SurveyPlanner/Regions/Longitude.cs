namespace SurveyPlanner.Regions;

/// <summary>Turns of the circle: every longitude names the same meridian again after 360°.</summary>
public static class Longitude
{
    /// <summary>The same meridian in [-180, 180), degrees.</summary>
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

    /// <summary>The shorter way from one meridian to another, degrees east in [-180, 180).</summary>
    public static double Difference(double from, double to) => Normalise(to - from);

    /// <summary>Degrees east of a meridian, in [-180, 180). 180 and -180 give the same digits, so that a region cut there closes again.</summary>
    internal static double From(double meridian, double longitude) => Normalise(Normalise(longitude) - meridian);
}
