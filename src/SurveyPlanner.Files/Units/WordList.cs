namespace SurveyPlanner.Files.Units;

/// <summary>Lists of words as a sentence has them.</summary>
internal static class WordList
{
    /// <summary><c>a, b or c</c>.</summary>
    public static string Or(IEnumerable<string> words) => Join(words, " or ");

    /// <summary><c>a, b and c</c>.</summary>
    public static string And(IEnumerable<string> words) => Join(words, " and ");

    private static string Join(IEnumerable<string> words, string last)
    {
        var all = words.ToArray();
        return all.Length < 2 ? string.Concat(all) : string.Join(", ", all[..^1]) + last + all[^1];
    }
}
