using System.Text;

namespace SurveyPlanner.Files.Outputs;

/// <summary>Text of the user's, made fit for files that cannot carry every character.</summary>
internal static class PlainText
{
    /// <summary>
    /// Control characters and line ends become spaces, halves of surrogate pairs and the two non-characters that XML forbids U+FFFD:
    /// receivers stop reading at a control character, and XML allows none.
    /// </summary>
    public static string Clean(string text)
    {
        var clean = new StringBuilder(text.Length);
        foreach (var rune in text.EnumerateRunes())
        {
            var isForbidden = rune.Value is 0xFFFE or 0xFFFF;
            var isBreak = Rune.IsControl(rune) || rune.Value is 0x2028 or 0x2029;
            clean.Append(isForbidden ? "\uFFFD" : isBreak ? " " : rune.ToString());
        }

        return clean.ToString();
    }

    /// <summary>The same text with halves of surrogate pairs replaced by U+FFFD: all that UTF-8 cannot carry.</summary>
    public static string WellFormed(string text) => string.Concat(text.EnumerateRunes().Select(rune => rune.ToString()));
}
