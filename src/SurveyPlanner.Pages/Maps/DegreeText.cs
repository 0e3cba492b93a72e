using System.Globalization;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Maps;

/// <summary>Degrees at the lines of a graticule: <c>60°30′ N</c>, <c>180°</c>, <c>0°</c>.</summary>
internal static class DegreeText
{
    /// <param name="lon">Degrees east, any turn of the circle.</param>
    /// <param name="step">Distance between lines, degrees: fixes how fine the text is.</param>
    public static string Longitude(double lon, double step)
    {
        var normal = Positions.Normal(Math.Round(lon * 600) / 600);
        return Text(Math.Abs(normal), step) + (normal is 0 or 180 ? "" : normal < 0 ? " W" : " E");
    }

    public static string Latitude(double lat, double step)
        => Text(Math.Abs(lat), step) + (Math.Abs(lat) < 1e-9 ? "" : lat < 0 ? " S" : " N");

    private static string Text(double degrees, double step)
    {
        var tenthMinutes = (long)Math.Round(degrees * 600);
        var whole = (tenthMinutes / 600).ToString(CultureInfo.InvariantCulture) + "°";
        if (step >= 1 - 1e-9)
        {
            return whole;
        }

        var minutes = tenthMinutes % 600 / 10.0;
        return whole + minutes.ToString(step * 60 < 1 - 1e-9 ? "00.0" : "00", CultureInfo.InvariantCulture) + "′";
    }
}
