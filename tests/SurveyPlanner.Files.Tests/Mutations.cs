using CsCheck;

namespace SurveyPlanner.Files.Tests;

/// <summary>Damage that happens to text files, by hand or by accident.</summary>
internal static class Mutations
{
    private static readonly string[] Nasty =
    [
        "\"", "'", "\"\"\"", "'''", "[", "]", "[[", "]]", "{", "}", "=", "==", ",", ".", "#", "\\", "\n", "\r", "\r\n", "\t", "\0", "\u001B[31m", "\u202E", "\uFEFF",
        "\uD800", "💥", "é", "-", "0", "007", "1e999", "nan", "inf", "-1", "1,5", "9223372036854775808", "true", "1979-05-27", "[stratum.x]\n", "[layout]\n", "spacing = 5\n",
        "x.y.z = 1\n", "a = {b = [1, {c = 2}]}\n", " ", "",
    ];

    /// <summary>The text with one to four pieces of it cut out, doubled, moved or overwritten.</summary>
    public static Gen<string> Of(string text)
        => Gen.Select(Gen.Int[0, 3], Gen.Int[0, text.Length], Gen.Int[0, 40], Gen.Int[0, Nasty.Length - 1].Select(i => Nasty[i]), Gen.Int[0, text.Length])
            .Array[1, 4]
            .Select(steps => steps.Aggregate(text, (current, step) => Apply(current, step.Item1, step.Item2, step.Item3, step.Item4, step.Item5)));

    private static string Apply(string text, int what, int at, int length, string nasty, int to)
    {
        at = Math.Min(at, text.Length);
        length = Math.Min(length, text.Length - at);
        var (piece, rest) = (text.Substring(at, length), text.Remove(at, length));
        return what switch
        {
            0 => rest,
            1 => rest.Insert(at, nasty),
            2 => text.Insert(Math.Min(to, text.Length), piece),
            _ => rest.Insert(Math.Min(to, rest.Length), piece),
        };
    }
}
