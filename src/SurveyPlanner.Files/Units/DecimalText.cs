using System.Globalization;
using System.Text.RegularExpressions;

namespace SurveyPlanner.Files.Units;

/// <summary>Numbers in text: invariant culture, finite, no thousands marks; a comma is refused in words.</summary>
internal static partial class DecimalText
{
    private const NumberStyles Style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint | NumberStyles.AllowExponent;

    public static Parsed<double> Read(string text)
    {
        var trimmed = text.Trim();
        if (trimmed.Contains(','))
        {
            return Parsed.Bad<double>(CommaComplaint(trimmed));
        }

        if (!double.TryParse(trimmed, Style, CultureInfo.InvariantCulture, out var value))
        {
            return Parsed.Bad<double>($"{Quoted.Short(trimmed)} is not a number");
        }

        return double.IsFinite(value)
            ? Parsed.Ok(value)
            : Parsed.Bad<double>($"{Quoted.Short(trimmed)} is no finite number");
    }

    /// <summary>The shortest text that reads back to the same number.</summary>
    public static string Write(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    private static string CommaComplaint(string text)
        => ThousandsMark().IsMatch(text)
            ? $"{Quoted.Short(text)} has a comma: write {text.Replace(",", "", StringComparison.Ordinal)}, or {ReplaceFirstComma(text)} if the comma was the decimal mark"
            : $"{Quoted.Short(text)} has a comma: the decimal mark is a point"
              + (DecimalComma().IsMatch(text) ? $", write {ReplaceFirstComma(text)}" : "");

    private static string ReplaceFirstComma(string text)
    {
        var comma = text.IndexOf(',', StringComparison.Ordinal);
        return text[..comma] + "." + text[(comma + 1)..].Replace(",", "", StringComparison.Ordinal);
    }

    [GeneratedRegex(@"^[+-]?[1-9][0-9]{0,2}(,[0-9]{3})+$")]
    private static partial Regex ThousandsMark();

    [GeneratedRegex(@"^[+-]?[0-9]*,[0-9]+$")]
    private static partial Regex DecimalComma();
}
