using System.Globalization;
using System.Text;

namespace SurveyPlanner.Files.Units;

/// <summary>Foreign text made harmless for a message: control characters escaped, cut when long.</summary>
internal static class Quoted
{
    /// <summary>Longer text is cut in a message: the user knows the rest.</summary>
    private const int LongestShown = 60;

    /// <summary>The text as a TOML basic string: quotes, backslashes and control characters escaped.</summary>
    public static string Text(string text) => $"\"{Escape(text, quotesToo: true)}\"";

    /// <summary>The beginning of a text, in quotes.</summary>
    public static string Short(string text) => Text(Cut(text));

    /// <summary>The beginning of a text without quotes, such as a key.</summary>
    public static string Plain(string text) => Escape(Cut(text), quotesToo: false);

    private static string Cut(string text)
    {
        if (text.Length <= LongestShown)
        {
            return text;
        }

        var whole = char.IsHighSurrogate(text[LongestShown - 1]) ? LongestShown - 1 : LongestShown;
        return text[..whole] + "…";
    }

    private static string Escape(string text, bool quotesToo)
    {
        var escaped = new StringBuilder(text.Length);

        // Half a surrogate pair, which no text file can hold, comes out of the enumeration as U+FFFD.
        foreach (var rune in text.EnumerateRunes())
        {
            escaped.Append(rune.Value switch
            {
                '"' when quotesToo => "\\\"",
                '\\' when quotesToo => @"\\",
                '\n' => "\\n",
                '\r' => "\\r",
                '\t' => "\\t",
                _ when IsInvisible(rune) => "\\u" + rune.Value.ToString("X4", CultureInfo.InvariantCulture),
                _ => rune.ToString(),
            });
        }

        return escaped.ToString();
    }

    /// <summary>Control characters, and the marks that turn the direction of writing: either could disguise a message.</summary>
    private static bool IsInvisible(Rune rune)
        => Rune.IsControl(rune) || rune.Value is 0x2028 or 0x2029 or (>= 0x202A and <= 0x202E) or (>= 0x2066 and <= 0x2069);
}
