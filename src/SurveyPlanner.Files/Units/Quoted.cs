using System.Globalization;
using System.Text;

namespace SurveyPlanner.Files.Units;

/// <summary>Foreign text made harmless for a message: in double quotes, control characters escaped, cut when long.</summary>
internal static class Quoted
{
    /// <summary>Longer text is cut in a message: the user knows the rest.</summary>
    private const int LongestShown = 60;

    public static string Short(string text)
        => text.Length <= LongestShown ? Text(text) : Text(text[..WholeCharacters(text, LongestShown)] + "…");

    /// <summary>The text as a TOML basic string: quotes, backslashes and control characters escaped.</summary>
    public static string Text(string text)
    {
        var quoted = new StringBuilder(text.Length + 2).Append('"');

        // Half a surrogate pair, which no text file can hold, comes out of the enumeration as U+FFFD.
        foreach (var rune in text.EnumerateRunes())
        {
            quoted.Append(rune.Value switch
            {
                '"' => "\\\"",
                '\\' => @"\\",
                '\n' => "\\n",
                '\r' => "\\r",
                '\t' => "\\t",
                _ when IsInvisible(rune) => "\\u" + rune.Value.ToString("X4", CultureInfo.InvariantCulture),
                _ => rune.ToString(),
            });
        }

        return quoted.Append('"').ToString();
    }

    /// <summary>Control characters, and the marks that turn the direction of writing: either could disguise a message.</summary>
    private static bool IsInvisible(Rune rune)
        => Rune.IsControl(rune) || rune.Value is 0x2028 or 0x2029 or (>= 0x202A and <= 0x202E) or (>= 0x2066 and <= 0x2069);

    private static int WholeCharacters(string text, int length) => char.IsHighSurrogate(text[length - 1]) ? length - 1 : length;
}
