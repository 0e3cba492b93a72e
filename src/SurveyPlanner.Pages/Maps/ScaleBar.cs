using System.Globalization;

namespace SurveyPlanner.Pages.Maps;

/// <summary>A scale bar in round numbers: <paramref name="Segments"/> equal pieces, alternately dark and light.</summary>
/// <param name="SegmentPixels">Length of a piece on the drawing.</param>
/// <param name="Segments">Number of pieces.</param>
/// <param name="Labels">Text at the ends of pieces: piece boundary counted from 0, text.</param>
public sealed record ScaleBar(double SegmentPixels, int Segments, IReadOnlyList<(int At, string Text)> Labels)
{
    /// <summary>Metres in an international nautical mile (First International Extraordinary Hydrographic Conference, Monaco 1929).</summary>
    public const double MetresPerNauticalMile = 1852;

    private const double LongestPixels = 240;

    /// <summary>The longest round bar that fits, in kilometres (metres where that is clearer) or nautical miles.</summary>
    public static ScaleBar For(double metresPerPixel, bool nauticalMiles)
    {
        var most = LongestPixels * metresPerPixel;
        var (unit, name) = nauticalMiles ? (MetresPerNauticalMile, "nmi") : most < 1000 ? (1.0, "m") : (1000.0, "km");
        var power = Math.Pow(10, Math.Floor(Math.Log10(most / unit)));
        var (length, segments) = (most / unit / power) switch
        {
            >= 5 => (5 * power, 5),
            >= 2 => (2 * power, 4),
            _ => (power, 5),
        };
        return new ScaleBar(
            length / segments * unit / metresPerPixel,
            segments,
            [(0, "0"), (segments / 2, Round(length / segments * (segments / 2))), (segments, Round(length) + " " + name)]);
    }

    private static string Round(double value) => value.ToString("0.######", CultureInfo.InvariantCulture);
}
