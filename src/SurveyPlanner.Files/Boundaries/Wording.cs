using System.Globalization;
using System.Text;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>Numbers and names for sentences, invariant culture.</summary>
internal static class Wording
{
    public static string Length(double metres) => metres switch
    {
        double.PositiveInfinity => "a world",
        >= 1000 => Invariant($"{metres / 1000:0.##} km"),
        >= 1 => Invariant($"{metres:0.#} m"),
        _ => Invariant($"{metres * 1000:0.##} mm"),
    };

    public static string Area(double squareMetres) => squareMetres switch
    {
        >= 1e4 => Invariant($"{squareMetres / 1e6:0.######} km²"),
        >= 0.1 => Invariant($"{squareMetres:0.#} m²"),
        > 0 => "less than 0.1 m²",
        _ => "0 m²",
    };

    public static string SignedArea(double squareMetres) => squareMetres switch
    {
        > 0 => "+" + Area(squareMetres),
        < 0 => "-" + Area(-squareMetres),
        _ => Area(0),
    };

    /// <summary>A position as longitude and latitude, about 100 m sharp: enough to find it on a map.</summary>
    public static string Position(double lon, double lat) => Invariant($"longitude {lon:0.###}, latitude {lat:0.###}");

    public static string Number(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    /// <summary>Text from a file, made harmless for a terminal: no control characters, at most 60 characters.</summary>
    public static string Quote(string text) => $"'{Harmless(text, longest: 60)}'";

    /// <summary>Text without control characters, cut to a length.</summary>
    public static string Harmless(string text, int longest)
    {
        var safe = new StringBuilder();
        foreach (var rune in text.EnumerateRunes().Take(longest))
        {
            safe.Append(Rune.IsControl(rune) ? "?" : rune.ToString());
        }

        return safe.Append(text.Length > longest ? "…" : "").ToString();
    }

    public static string Count(int number, string one, string many) => Invariant($"{number} {(number == 1 ? one : many)}");

    private static string Invariant(FormattableString text) => FormattableString.Invariant(text);
}
