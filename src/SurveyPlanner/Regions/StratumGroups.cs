using System.Collections.Immutable;

namespace SurveyPlanner.Regions;

/// <summary>The features of a boundary that make up one stratum.</summary>
internal sealed record StratumGroup(string Name, ImmutableArray<BoundaryFeature> Features)
{
    /// <summary>Attributes that all features of the stratum have with the same value.</summary>
    public ImmutableSortedDictionary<string, string> SharedAttributes => Features[0].Attributes
        .Where(pair => Features.All(feature => feature.Attributes.TryGetValue(pair.Key, out var value) && value == pair.Value))
        .ToImmutableSortedDictionary();
}

/// <summary>Sorts the features of a boundary into strata.</summary>
internal static class StratumGroups
{
    public static IReadOnlyList<StratumGroup> From(Boundary boundary, RegionDesign design)
    {
        if (design.StratumField is not { } field)
        {
            return design.Strata.IsDefaultOrEmpty
                ? [new StratumGroup(RegionBuilder.SingleStratumName, boundary.Features)]
                : throw new InputException(new Problem(
                    $"names strata, but no attribute to find them by; add stratum_field, one of: {Listed(Fields(boundary))}", Key: "region.strata"));
        }

        RefuseFeaturesWithout(field, boundary);
        var groups = boundary.Features
            .GroupBy(feature => feature.Attributes[field])
            .Select(group => new StratumGroup(group.Key, [.. group]))
            .ToList();
        return design.Strata.IsDefaultOrEmpty ? groups : [.. design.Strata.Select(name => Find(name, groups, boundary))];
    }

    private static void RefuseFeaturesWithout(string field, Boundary boundary)
    {
        var without = boundary.Features.Where(feature => !feature.Attributes.TryGetValue(field, out var value) || value.Length == 0).ToList();
        if (without.Count == boundary.Features.Length)
        {
            throw new InputException(new Problem(
                $"no feature of {boundary.Source} has an attribute '{field}'; it has: {Listed(Fields(boundary))}", Key: "region.stratum_field"));
        }

        if (without.Count > 0)
        {
            throw new InputException(without.Select(feature => new Problem(
                $"has no attribute '{field}', so it belongs to no stratum; fill it in, or leave the feature out of the file",
                boundary.Source,
                Key: $"feature {feature.Number}")));
        }
    }

    private static StratumGroup Find(string name, List<StratumGroup> groups, Boundary boundary)
        => groups.Find(group => group.Name == name)
            ?? throw new InputException(new Problem(
                $"{boundary.Source} holds no stratum '{name}'; it holds: {Listed(groups.Select(group => group.Name))}", Key: "region.strata"));

    private static IEnumerable<string> Fields(Boundary boundary)
        => boundary.Features.SelectMany(feature => feature.Attributes.Keys).Distinct().Order(StringComparer.Ordinal);

    private static string Listed(IEnumerable<string> names)
    {
        const int shown = 20;
        var all = names.ToList();
        var text = all.Count == 0 ? "none" : string.Join(", ", all.Take(shown).Select(name => $"'{name}'"));
        return all.Count > shown ? $"{text} and {all.Count - shown} more" : text;
    }
}
