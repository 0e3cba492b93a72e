using System.Globalization;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// Numbers as text for every output: invariant culture, no exponent, no minus zero, no needless zeros, and never NaN.
/// The same text is a JSON number, an XML decimal and a CSV cell.
/// </summary>
internal static class Figures
{
    /// <summary>Decimals of a longitude or latitude: about 1 cm on the ground.</summary>
    private const int PositionDecimals = 7;

    /// <summary>Rounded to a number of decimals.</summary>
    /// <exception cref="InvalidOperationException">The value is not finite, which is a fault of this program.</exception>
    public static string Fixed(double value, int decimals)
    {
        if (!double.IsFinite(value))
        {
            throw new InvalidOperationException("A figure to be written is not a number.");
        }

        var text = value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        if (decimals > 0)
        {
            text = text.TrimEnd('0').TrimEnd('.');
        }

        return text is "-0" ? "0" : text;
    }

    /// <summary>Rounded to a number of significant digits; whole digits are never rounded away.</summary>
    public static string Significant(double value, int digits)
    {
        if (value == 0 || !double.IsFinite(value))
        {
            return Fixed(value, 0);
        }

        // The exponent after rounding, read from the text: logarithms differ in the last bit between systems.
        var scientific = value.ToString("E" + (digits - 1).ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        var exponent = int.Parse(scientific.AsSpan(scientific.IndexOf('E', StringComparison.Ordinal) + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        return Fixed(value, Math.Max(0, digits - 1 - exponent));
    }

    /// <summary>An area: 12 significant digits, so that sums can be checked to 1e-9 and better.</summary>
    public static string Area(double value) => Significant(value, 12);

    /// <summary>Metres to the millimetre.</summary>
    public static string Metres(double value) => Fixed(value, 3);

    /// <summary>Metres given as kilometres, to the millimetre.</summary>
    public static string KilometresOf(double metres) => Fixed(metres / 1000, 6);

    /// <summary>A bearing to 1e-6 degrees; what rounds up to a full turn is 0.</summary>
    public static string Bearing(double degrees, double fullTurn = 360)
    {
        var text = Fixed(degrees, 6);
        return text == Fixed(fullTurn, 0) ? "0" : text;
    }

    /// <summary>A latitude, or a longitude that has been brought into range already.</summary>
    public static string Degrees(double value) => Fixed(value, PositionDecimals);

    /// <summary>A longitude of a single position, in [-180, 180) also after rounding.</summary>
    public static string Longitude(double value, int decimals = PositionDecimals)
    {
        var text = Fixed(Longitudes.Normalise(value), decimals);
        return text == "180" ? "-180" : text;
    }
}
