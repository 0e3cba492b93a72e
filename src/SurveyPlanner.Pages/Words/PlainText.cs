using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;

namespace SurveyPlanner.Pages.Words;

/// <summary>
/// Makes text of unknown origin harmless. Markup is escaped by the renderer; what is left are characters that no page or SVG may hold
/// (control characters are not XML) or that turn the reading direction of what follows.
/// </summary>
internal static partial class PlainText
{
    /// <summary>
    /// Goes over a rendered page: character references of forbidden characters become U+FFFD, line breaks a space,
    /// the other ones beyond ASCII the characters they stand for (a third of the bytes). What a user typed as <c>&amp;#1;</c> has its ampersand escaped and is not touched.
    /// </summary>
    public static string SettleReferences(string html) => Reference().Replace(html, match =>
    {
        var code = int.Parse(match.ValueSpan[3..^1], NumberStyles.HexNumber, CultureInfo.InvariantCulture);
        return code switch
        {
            '\t' or '\n' or '\r' => " ",
            _ when IsForbidden(code) => "\uFFFD",
            < 128 => match.Value,
            _ => char.ConvertFromUtf32(code),
        };
    });

    /// <summary>
    /// At most so many characters, with an ellipsis where text was left out: two thirds of the way, since names that begin alike mostly
    /// differ at their end. Never cuts a character in two.
    /// </summary>
    public static string Shorten(string text, int most)
    {
        var elements = new StringInfo(text);
        if (elements.LengthInTextElements <= most)
        {
            return text;
        }

        var tail = (most - 1) / 3;
        var head = elements.SubstringByTextElements(0, most - 1 - tail);
        return head + "…" + (tail == 0 ? "" : elements.SubstringByTextElements(elements.LengthInTextElements - tail));
    }

    /// <summary>The text in pieces between which a line may be broken: one of no space for long would stretch a table beyond the page.</summary>
    public static IReadOnlyList<string> Pieces(string text)
    {
        if (text.Length <= LongestRun)
        {
            return [text];
        }

        var pieces = new List<string>();
        var (piece, run) = (new StringBuilder(), 0);
        var elements = StringInfo.GetTextElementEnumerator(text);
        while (elements.MoveNext())
        {
            var element = elements.GetTextElement();
            run = string.IsNullOrWhiteSpace(element) ? 0 : run + 1;
            if (run > LongestRun)
            {
                pieces.Add(piece.ToString());
                piece.Clear();
                run = 1;
            }

            piece.Append(element);
        }

        return [.. pieces, piece.ToString()];
    }

    /// <summary>Longer than nearly all words of nearly all languages.</summary>
    private const int LongestRun = 24;

    private static bool IsForbidden(int code) => code
        is < 0x20
        or (>= 0x7f and <= 0x9f)
        or (>= 0xd800 and <= 0xdfff)
        or 0xfffe or 0xffff or 0xfeff
        or 0x061c or 0x200e or 0x200f
        or (>= 0x202a and <= 0x202e)
        or (>= 0x2066 and <= 0x2069)
        or 0x2028 or 0x2029;

    [GeneratedRegex("&#x[0-9A-F]{1,6};", RegexOptions.CultureInvariant)]
    private static partial Regex Reference();
}
