using System.Globalization;

namespace SurveyPlanner.Files.Outputs;

/// <summary>Names that old receivers can hold, each given once: at most 6 characters of A-Z, 0-9 and hyphen.</summary>
/// <param name="fallback">Letter of the names that are made up when neither the wish nor the wish without hyphens can be had.</param>
internal sealed class ShortNames(char fallback)
{
    public const int MaxLength = 6;

    private readonly HashSet<string> _taken = [];
    private int _next = 1;

    public string Take(string wish)
    {
        foreach (var name in new[] { wish, wish.Replace("-", "", StringComparison.Ordinal) })
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
}
