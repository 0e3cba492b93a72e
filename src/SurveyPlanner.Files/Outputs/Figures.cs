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

    /// <summary>Beyond this, units of the last decimal are no longer counted exactly by a double.</summary>
    private const double MostUnits = 1e15;

    /// <summary>Powers of ten that a double holds exactly, so that results are the same on every system.</summary>
    private static readonly double[] Powers =
    [
        1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19, 1e20, 1e21, 1e22,
    ];

    /// <summary>Rounded to a number of decimals, halves away from zero.</summary>
    /// <exception cref="InvalidOperationException">The value is not finite, which is a fault of this program.</exception>
    public static string Fixed(double value, int decimals)
    {
        if (!double.IsFinite(value))
        {
            throw new InvalidOperationException("A figure to be written is not a number.");
        }

        if (decimals < Powers.Length && value * Powers[decimals] is > -MostUnits and < MostUnits)
        {
            return InUnits((long)Math.Round(value * Powers[decimals], MidpointRounding.AwayFromZero), decimals);
        }

        var text = value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        var trimmed = decimals > 0 ? text.TrimEnd('0').TrimEnd('.') : text;
        return trimmed is "-0" ? "0" : trimmed;
    }

    /// <summary>Rounded to a number of significant digits; whole digits are never rounded away, and below 1e-22 fewer are kept.</summary>
    public static string Significant(double value, int digits)
    {
        // Not by a logarithm: those differ in the last bit between systems.
        var (size, exponent) = (Math.Abs(value), 0);
        for (; exponent < Powers.Length - 1 && size >= Powers[exponent + 1]; exponent++)
        {
        }

        for (; size is > 0 and < 1 && exponent > 1 - Powers.Length && size * Powers[-exponent] < 1; exponent--)
        {
        }

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
        var text = Fixed(Regions.Longitude.Normalise(value), decimals);
        return text == "180" ? "-180" : text;
    }

    /// <summary>A whole number of units of the last decimal, needless zeros left out.</summary>
    private static string InUnits(long units, int decimals)
    {
        while (decimals > 0 && units % 10 == 0)
        {
            (units, decimals) = (units / 10, decimals - 1);
        }

        Span<char> text = stackalloc char[48];
        var start = text.Length;
        var rest = Math.Abs(units);
        for (var place = 0; place <= decimals || rest > 0; place++)
        {
            if (place > 0 && place == decimals)
            {
                text[--start] = '.';
            }

            text[--start] = (char)('0' + (rest % 10));
            rest /= 10;
        }

        if (units < 0)
        {
            text[--start] = '-';
        }

        return new string(text[start..]);
    }
}
