using System.Globalization;
using System.Text.RegularExpressions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>Names that old receivers can hold, each given once: at most 6 characters of A-Z, 0-9 and hyphen.</summary>
/// <param name="fallback">Letter of the names that are made up when no shorter form of the wish can be had.</param>
internal sealed partial class ShortNames(char fallback)
{
    public const int MaxLength = 6;

    private readonly HashSet<string> _taken = [];
    private int _next = 1;

    /// <summary>The wish itself; without hyphens; without the zeros that fill up its numbers (T0012AS, T12AS); or a made-up name.</summary>
    public string Take(string wish)
    {
        var bare = wish.Replace("-", "", StringComparison.Ordinal);
        foreach (var name in new[] { wish, bare, FillingZeros().Replace(bare, "") })
        {
            if (name.Length <= MaxLength && _taken.Add(name))
            {
                return name;
            }
        }

        while (true)
        {
            var name = fallback + (_next++).ToString("D5", CultureInfo.InvariantCulture);
            if (_taken.Add(name))
            {
                return name;
            }
        }
    }

    [GeneratedRegex("(?<![0-9])0+(?=[0-9])")]
    private static partial Regex FillingZeros();
}
