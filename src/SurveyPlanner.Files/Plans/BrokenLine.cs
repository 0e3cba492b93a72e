using System.Globalization;
using System.Text.RegularExpressions;
using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>
/// What is wrong with a line that is no TOML, in the words of someone who writes a plan and not a parser; and the line as it was
/// probably meant, so that the rest of the file can be read.
/// </summary>
internal static partial class BrokenLine
{
    private const string CurlyQuotes = "“”„‟«»";

    /// <param name="line">The line.</param>
    /// <returns>The sentence, and the mended line: the same line when nobody can tell what was meant.</returns>
    public static (string Complaint, string Mended) Explain(string line)
    {
        if (line.Any(c => char.IsControl(c) && c != '\t'))
        {
            var clean = string.Concat(line.Where(c => !char.IsControl(c) || c == '\t'));
            return ("a control character stands in this line: take it out", clean);
        }

        if (line.TrimStart().StartsWith('['))
        {
            return ExplainHeader(line.Trim());
        }

        var match = KeyAndValue().Match(line);
        if (!match.Success)
        {
            return ("this line is neither a [table] nor key = value", line);
        }

        var (key, mark, value) = (match.Groups["key"].Value, match.Groups["mark"].Value, match.Groups["value"].Value);
        var shown = Quoted.Plain(key);
        if (mark != "=")
        {
            return ($"write {shown} = {Quoted.Plain(value)}: a key and its value are joined by one =", $"{key} = {value}");
        }

        var (complaint, mended) = value.Length == 0
            ? ($"{shown} has no value", "")
            : value[0] is '"' or '\'' or '[' or '{' ? ExplainDelimited(shown, value) : ExplainBare(shown, value);
        return (complaint, mended.Length == 0 ? line : $"{key} = {mended}");
    }

    /// <summary>The key that a line seems to hold, or null.</summary>
    public static string? KeyOf(string line) => FirstWord().Match(line) is { Success: true } match ? match.Value.Trim() : null;

    private static (string Complaint, string Mended) ExplainHeader(string line)
    {
        var name = line.Split('#')[0].Trim().Trim('[', ']').Trim();
        if (name.StartsWith("stratum.", StringComparison.Ordinal))
        {
            var stratum = name["stratum.".Length..].Trim('"', '\'', ' ');
            var header = $"[stratum.{Quoted.Text(stratum)}]";
            return ($"write {Quoted.Plain(header)}: the name of a stratum stands in quotes", header);
        }

        return KeyPath.IsBare(name)
            ? ($"write [{Quoted.Plain(name)}], one bracket on each side, alone on its line", $"[{name}]")
            : ("this table name cannot be read: write it as [layout] or [stratum.\"name\"]", line);
    }

    private static (string Complaint, string Mended) ExplainDelimited(string key, string value)
    {
        var quote = value[0];
        if (quote is '[' or '{')
        {
            var close = quote == '[' ? ']' : '}';
            return value.Contains(close, StringComparison.Ordinal)
                ? ($"this list cannot be read: write {key} = [\"first\", \"second\"]", "")
                : ($"{key}: the closing {close} is missing", value + close);
        }

        var end = value.IndexOf(quote, 1);
        if (end < 0)
        {
            return ($"{key}: the closing {quote} is missing", value + quote);
        }

        return quote == '"' && value.Contains('\\', StringComparison.Ordinal)
            ? ($@"a backslash between double quotes means something else: write {key} = '{Quoted.Plain(value[1..end])}' in single quotes, or / instead of \", $"'{value[1..end]}'")
            : ($"something stands after the closing {quote} of {key}: take it out, or put it behind a #", value[..(end + 1)]);
    }

    private static (string Complaint, string Mended) ExplainBare(string key, string value)
    {
        var bare = value.Split('#')[0].TrimEnd();
        if (bare.Length > 0 && CurlyQuotes.Contains(bare[0], StringComparison.Ordinal))
        {
            return Write(key, Quoted.Text(bare.Trim(CurlyQuotes.ToCharArray())), "straight quotes, not curly ones");
        }

        if (bare.EndsWith('%') && DecimalText.Read(bare[..^1]) is { IsGood: true } percent)
        {
            return Write(key, DecimalText.Write(percent.Good / 100), "a share of 1, not percent");
        }

        if (bare.EndsWith('°') && DecimalText.Read(bare[..^1]) is { IsGood: true } degrees)
        {
            return Write(key, DecimalText.Write(degrees.Good), "degrees as a plain number");
        }

        if (WholeNumber().IsMatch(bare) && !long.TryParse(bare, CultureInfo.InvariantCulture, out _))
        {
            return (string.Create(CultureInfo.InvariantCulture, $"{key}: no whole number beyond {long.MaxValue} is read"), "");
        }

        if (DecimalText.Read(bare) is { IsGood: true } number)
        {
            return Write(key, DecimalText.Write(number.Good), "the number in its plain form");
        }

        if (NumberWithComma().IsMatch(bare))
        {
            return ($"{key}: {DecimalText.Read(bare).Complaint}", bare.Replace(',', '.'));
        }

        return bare.Length > 0 && !bare.AsSpan().ContainsAny("\"'")
            ? Write(key, Quoted.Text(bare), "text stands between quotes")
            : ($"the value of {key} cannot be read: text stands between quotes, a number stands alone", "");
    }

    private static (string Complaint, string Mended) Write(string key, string mended, string why) => ($"write {key} = {Quoted.Plain(mended)}: {why}", mended);

    [GeneratedRegex(@"^\s*(?<key>[^=:\s""'](?:[^=:]*[^=:\s])?)\s*(?<mark>=+|:=?)\s*(?<value>.*?)\s*$")]
    private static partial Regex KeyAndValue();

    [GeneratedRegex("^[+-]?[0-9]+$")]
    private static partial Regex WholeNumber();

    [GeneratedRegex(@"^[+-]?[0-9]+(,[0-9]+)+$")]
    private static partial Regex NumberWithComma();

    [GeneratedRegex(@"^\s*[A-Za-z0-9_-]+")]
    private static partial Regex FirstWord();
}
