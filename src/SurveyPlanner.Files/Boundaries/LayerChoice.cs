namespace SurveyPlanner.Files.Boundaries;

/// <summary>Finds the layer that the user names, in the same way for every format that has layers.</summary>
internal static class LayerChoice
{
    /// <summary>The one item whose name is the layer's, case apart; refuses with the names there are.</summary>
    public static T Of<T>(IReadOnlyList<T> items, string layer, Func<T, string?> nameOf, string source, string what)
    {
        var found = items.Where(item => string.Equals(nameOf(item), layer, StringComparison.OrdinalIgnoreCase)).ToList();
        var exact = found.Where(item => nameOf(item) == layer).ToList();
        return (found.Count, exact.Count) switch
        {
            (1, _) => found[0],
            (_, 1) => exact[0],
            (0, _) => throw FileBytes.Refusal(source, $"there is no {what} {Wording.Quote(layer)} in it; there is: {Listed(items.Select(nameOf)!)}", "region.layer"),
            _ => throw FileBytes.Refusal(source, $"several of its {what}s are called {Wording.Quote(layer)}; rename them, or save the boundary alone", "region.layer"),
        };
    }

    public static string Listed(IEnumerable<string> names)
    {
        const int shown = 10;
        var all = names.Select(Wording.Quote).ToList();
        return string.Join(", ", all.Take(shown)) + (all.Count > shown ? $" and {all.Count - shown} more" : "");
    }
}
