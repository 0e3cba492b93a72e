using System.Globalization;
using System.Text.RegularExpressions;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// One angle as people and receivers write it: decimal degrees (<c>62.7276</c>), degrees with decimal minutes (<c>N63 06.000</c>,
/// <c>63°06.000'N</c>) or degrees, minutes and seconds. The hemisphere is a letter or a sign, never both.
/// </summary>
internal static partial class AngleText
{
    /// <summary>Degrees, north and east positive; null with the reason when the text is no angle of this kind.</summary>
    public static double? Parse(string text, bool isLatitude, out string fault)
    {
        fault = $"{Wording.Quote(text)} is no {(isLatitude ? "latitude" : "longitude")}; write decimal degrees such as -150.25, or degrees and minutes such as {(isLatitude ? "N63 06.000" : "W150 15.000")}";
        if (double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var plain) && double.IsFinite(plain))
        {
            return plain;
        }

        var (letter, rest) = Hemisphere(text.Trim());
        var match = Pattern().Match(rest + " ");
        if (!match.Success)
        {
            return null;
        }

        if (letter.Length > 0 && (isLatitude ? letter is not ("N" or "S") : letter is not ("E" or "W")))
        {
            fault = $"{Wording.Quote(text)} has the letter {letter}, which does not belong to a {(isLatitude ? "latitude" : "longitude")}; the columns may be swapped";
            return null;
        }

        var isNegative = match.Groups["sign"].Value == "-";
        if (letter.Length > 0 && match.Groups["sign"].Length > 0)
        {
            fault = $"{Wording.Quote(text)} has both a sign and a letter; keep one of them";
            return null;
        }

        return Degrees(match) is { } degrees ? (isNegative || letter is "S" or "W" ? -degrees : degrees) : null;
    }

    /// <summary>The letter before or after the numbers, and the rest.</summary>
    private static (string Letter, string Numbers) Hemisphere(string text) => text switch
    {
        [var first, ..] when IsHemisphere(first) => (first.ToString().ToUpperInvariant(), text[1..].TrimStart()),
        [.., var last] when IsHemisphere(last) => (last.ToString().ToUpperInvariant(), text[..^1].TrimEnd()),
        _ => ("", text),
    };

    private static bool IsHemisphere(char c) => "NSEWnsew".Contains(c, StringComparison.Ordinal);

    private static double? Degrees(Match match)
    {
        var (first, second, third) = (match.Groups["degrees"].Value, match.Groups["minutes"].Value, match.Groups["seconds"].Value);

        // Only the last number may have decimals: 63.5 06.2 would mean two things.
        if ((second.Length > 0 && first.Contains('.', StringComparison.Ordinal)) || (third.Length > 0 && second.Contains('.', StringComparison.Ordinal)))
        {
            return null;
        }

        var (minutes, seconds) = (Number(second), Number(third));
        return minutes < 60 && seconds < 60 ? Number(first) + (minutes / 60) + (seconds / 3600) : null;
    }

    private static double Number(string text) => text.Length == 0 ? 0 : double.Parse(text, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture);

    // Numbers must be parted by a mark or a space; the space that ends the text stands for the last mark.
    [GeneratedRegex(
        """^(?<sign>[+-])?(?<degrees>\d{1,3}(\.\d+)?)(\s*°\s*|\s+)((?<minutes>\d{1,2}(\.\d+)?)(\s*['′]\s*|\s+)((?<seconds>\d{1,2}(\.\d+)?)\s*("|″|'')?\s*)?)?$""",
        RegexOptions.CultureInvariant,
        matchTimeoutMilliseconds: 1000)]
    private static partial Regex Pattern();
}
