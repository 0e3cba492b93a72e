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
        foreach (var character in text)
        {
            quoted.Append(character switch
            {
                '"' => "\\\"",
                '\\' => @"\\",
                '\n' => "\\n",
                '\r' => "\\r",
                '\t' => "\\t",
                _ when IsInvisible(character) => "\\u" + ((int)character).ToString("X4", CultureInfo.InvariantCulture),
                _ => character.ToString(),
            });
        }

        return quoted.Append('"').ToString();
    }

    /// <summary>Control characters, and the marks that turn the direction of writing: either could disguise a message.</summary>
    private static bool IsInvisible(char character)
        => char.IsControl(character) || character is '\u2028' or '\u2029' or (>= '\u202A' and <= '\u202E') or (>= '\u2066' and <= '\u2069');

    private static int WholeCharacters(string text, int length) => char.IsHighSurrogate(text[length - 1]) ? length - 1 : length;
}
