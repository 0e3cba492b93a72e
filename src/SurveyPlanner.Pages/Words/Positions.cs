using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Words;

/// <summary>Positions as the pages show them: decimal degrees, and degrees with decimal minutes as GPS units and charts have them.</summary>
internal static class Positions
{
    // 5 decimals of a degree are 1.1 m; 3 decimals of a minute are 1.9 m: finer than a survey receiver.
    private const int DegreeDecimals = 5;
    private const int MinuteDecimals = 3;

    /// <summary>Latitude, longitude in signed decimal degrees.</summary>
    public static string Decimal(LonLat position)
        => $"{Figures.Fixed(position.Lat, DegreeDecimals)}, {Figures.Fixed(Normal(position.Lon), DegreeDecimals)}";

    /// <summary>Latitude and longitude in degrees and decimal minutes with hemisphere letters.</summary>
    public static string Minutes(LonLat position)
        => $"{Minutes(position.Lat, 2, 'N', 'S')} {Minutes(Normal(position.Lon), 3, 'E', 'W')}";

    /// <summary>A position in words to a tenth of a degree: <c>60.3° N 21.0° E</c>.</summary>
    public static string Rough(LonLat position)
        => $"{Figures.Fixed(Math.Abs(position.Lat), 1)}° {(position.Lat < 0 ? 'S' : 'N')} "
            + $"{Figures.Fixed(Math.Abs(Normal(position.Lon)), 1)}° {(Normal(position.Lon) < 0 ? 'W' : 'E')}";

    /// <summary>Longitude in (-180, 180]: 180° is called east.</summary>
    public static double Normal(double lon)
    {
        var turned = Longitude.Normalise(lon);
        return turned == -180 ? 180 : turned;
    }

    private static string Minutes(double degrees, int width, char positive, char negative)
    {
        // Rounded once, in the smallest unit shown: 59.9996 minutes carry into the degree.
        var perDegree = 60 * (long)Math.Pow(10, MinuteDecimals);
        var units = (long)Math.Round(Math.Abs(degrees) * perDegree);
        var whole = (units / perDegree).ToString("D" + width, CultureInfo.InvariantCulture);
        var minutes = (units % perDegree / Math.Pow(10, MinuteDecimals)).ToString("00.000", CultureInfo.InvariantCulture);
        return $"{whole}°{minutes}′ {(degrees < 0 ? negative : positive)}";
    }
}
