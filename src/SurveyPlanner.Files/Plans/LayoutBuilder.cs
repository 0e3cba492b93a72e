using System.Collections.Immutable;
using SurveyPlanner.Files.Units;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Plans;

/// <summary>Turns the keys that hold in a stratum into its layout design.</summary>
internal static class LayoutBuilder
{
    /// <summary>What is missing for a design.</summary>
    /// <param name="table">All keys that hold.</param>
    /// <param name="inherited">What <c>[layout]</c> holds, for a stratum; what is missing there already is not said again.</param>
    public static IEnumerable<Problem> Missing(PlanTable table, PlanTable? inherited)
    {
        var kind = table.Value(PlanKeys.Kind);
        return PlanKeys.Of("layout")
            .Where(key => key.Group != KeyGroup.None || key.IsRequired)
            .Where(key => kind is null ? key.Group == KeyGroup.Sizing || (key.Group == KeyGroup.None && key.Kinds == KindFilter.Any) : key.BelongsTo(kind.Value))
            .GroupBy(key => key.Group == KeyGroup.None ? key.Name : key.Group.ToString())
            .Select(question => Missing(table, inherited, [.. question]))
            .OfType<Problem>();
    }

    /// <param name="table">All keys that hold, none of them missing or unreadable.</param>
    public static LayoutDesign Build(PlanTable table)
    {
        var kind = table.Value(PlanKeys.Kind)!.Value;
        var design = new LayoutDesign(kind, new Sizing.Precision(), new Bearing.ShortAxis(), HalfWidthMetres: 0);
        foreach (var key in PlanKeys.Of("layout").Where(key => key.BelongsTo(kind)))
        {
            if ((table.EntryOf(key)?.Value ?? key.Default) is { } value)
            {
                design = key.Apply(value, design);
            }
        }

        return design;
    }

    /// <summary>The problem that none of these keys, which answer one question, is given; null when one is.</summary>
    private static Problem? Missing(PlanTable table, PlanTable? inherited, PlanKey[] keys)
    {
        // A key of the same group that does not suit the kind has been reported as such.
        bool Answers(PlanTable candidate) => candidate.Entries.Keys.Any(key => keys.Contains(key) || (key.Group != KeyGroup.None && key.Group == keys[0].Group));
        if (Answers(table) || (inherited is not null && !Answers(inherited)))
        {
            return null;
        }

        var others = keys.Length > 1 ? $" (or one of {string.Join(", ", keys[1..].Select(key => key.Name))})" : "";
        var why = inherited is null ? "is missing" : "is missing: what [layout] says does not suit the kind of this stratum";
        var place = table.EntryOf(PlanKeys.Kind)?.KeyPlace ?? table.Place;
        return place.Problem(
            $"{why}: write {keys[0].Name} = {keys[0].Example}{others} under [{Quoted.Plain(table.Path.ToString())}]", table.Path.Add([keys[0].Name]).ToString());
    }
}
