using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>Positions in degrees and decimal minutes, as navigation equipment shows them: <c>N63 06.000 W150 30.000</c>, to about 2 m.</summary>
internal static class DegreesMinutes
{
    private const int ThousandthsOfMinutePerDegree = 60_000;

    public static string Of(LonLat position)
    {
        // Turned into range after rounding: 179.9999999 is W180, not E180, and -0 is E000.
        var lon = Thousandths(Longitude.Normalise(position.Lon));
        if (lon == 180L * ThousandthsOfMinutePerDegree)
        {
            lon = -lon;
        }

        return $"{Half(Thousandths(position.Lat), 'N', 'S', "D2")} {Half(lon, 'E', 'W', "D3")}";
    }

    private static long Thousandths(double degrees) =>
        (long)Math.Round(degrees * ThousandthsOfMinutePerDegree, MidpointRounding.AwayFromZero);

    /// <summary>From whole thousandths, so that 59.9996 minutes become the next degree and never 60.000.</summary>
    private static string Half(long thousandths, char positive, char negative, string degreeFormat)
    {
        var (degrees, rest) = Math.DivRem(Math.Abs(thousandths), ThousandthsOfMinutePerDegree);
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{(thousandths < 0 ? negative : positive)}{degrees.ToString(degreeFormat, CultureInfo.InvariantCulture)} {rest / 1000:D2}.{rest % 1000:D3}");
    }
}
