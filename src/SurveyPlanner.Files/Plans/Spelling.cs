namespace SurveyPlanner.Files.Plans;

/// <summary>The nearest right spelling of a word that is none.</summary>
public static class Spelling
{
    /// <summary>The candidate that was probably meant, or null when none is near.</summary>
    public static string? Nearest(string word, IEnumerable<string> candidates)
    {
        var plain = Plain(word);
        var ranked = candidates
            .Select(candidate => (Candidate: candidate, Distance: Distance(plain, Plain(candidate))))
            .OrderBy(pair => pair.Distance)
            .ThenBy(pair => pair.Candidate, StringComparer.Ordinal)
            .ToArray();
        if (ranked.Length == 0)
        {
            return null;
        }

        // A third of the letters may be wrong: "zigzga", "half_widht"; two words that share less are different words.
        var (best, distance) = ranked[0];
        if (distance <= Math.Max(1, Math.Max(plain.Length, best.Length) / 3))
        {
            return best;
        }

        // "width" for "half_width", "grid" for "point-grid": a whole word of it, and of no other but its own longer forms (half_width_field).
        var containing = ranked
            .Where(pair => plain.Length >= 2 && Plain(pair.Candidate).Split('_').Contains(plain))
            .Select(pair => pair.Candidate)
            .OrderBy(candidate => candidate.Length)
            .ToArray();
        return containing.Length > 0 && containing.All(candidate => candidate.StartsWith(containing[0], StringComparison.Ordinal)) ? containing[0] : null;
    }

    /// <summary><c>: did you mean "x"?</c>, or nothing.</summary>
    public static string Hint(string word, IEnumerable<string> candidates)
        => Nearest(word, candidates) is { } nearest ? $": did you mean {nearest}?" : "";

    /// <summary>
    /// Optimal string alignment distance: the least number of letters to insert, delete, replace, or neighbours to swap
    /// (Damerau 1964; Levenshtein 1966), no substring edited twice.
    /// </summary>
    public static int Distance(string a, string b)
    {
        const int LongestCompared = 64;
        (a, b) = (a[..Math.Min(a.Length, LongestCompared)], b[..Math.Min(b.Length, LongestCompared)]);
        var cost = new int[a.Length + 1, b.Length + 1];
        for (var i = 0; i <= a.Length; i++)
        {
            for (var j = 0; j <= b.Length; j++)
            {
                if (i == 0 || j == 0)
                {
                    cost[i, j] = i + j;
                    continue;
                }

                var replaced = cost[i - 1, j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
                cost[i, j] = Math.Min(replaced, 1 + Math.Min(cost[i - 1, j], cost[i, j - 1]));
                if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1])
                {
                    cost[i, j] = Math.Min(cost[i, j], cost[i - 2, j - 2] + 1);
                }
            }
        }

        return cost[a.Length, b.Length];
    }

    private static string Plain(string word) => word.ToLowerInvariant().Replace('-', '_').Replace(' ', '_');
}
