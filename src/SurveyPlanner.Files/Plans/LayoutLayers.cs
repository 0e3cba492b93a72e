using System.Collections.Immutable;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Plans;

/// <summary>
/// Lays a stratum's own keys over the common ones. What is inherited and does not suit the stratum's kind is left behind; what stands
/// in the table itself and does not suit is a problem.
/// </summary>
internal sealed class LayoutLayers(List<Problem> problems)
{
    /// <summary>The keys that hold in a table.</summary>
    /// <param name="inherited">What holds without it; null for <c>[layout]</c> itself.</param>
    /// <param name="own">The table.</param>
    public PlanTable Lay(PlanTable? inherited, PlanTable own)
    {
        var kindEntry = own.EntryOf(PlanKeys.Kind) ?? inherited?.EntryOf(PlanKeys.Kind);
        var kind = kindEntry?.Value as LayoutKind?;
        var entries = own.Entries.ToBuilder();
        foreach (var (key, entry) in own.Entries)
        {
            if (kind is not { } known || key.BelongsTo(known))
            {
                continue;
            }

            // A kind tried out by --set: what the file says for the other kind is then no mistake.
            if (kindEntry!.KeyPlace.IsSet && !entry.KeyPlace.IsSet)
            {
                entries.Remove(key);
                Carry(key, entry, known, entries);
            }
            else
            {
                problems.Add(own.ProblemAt(key, Misplaced(key, known)));
            }
        }

        ReportContradictions(own with { Entries = entries.ToImmutable() }, kind);
        if (inherited is not null)
        {
            Inherit(inherited, own, kind, entries);
        }

        return own with { Entries = entries.ToImmutable() };
    }

    private static void Inherit(PlanTable inherited, PlanTable own, LayoutKind? kind, ImmutableDictionary<PlanKey, Entry>.Builder entries)
    {
        foreach (var (key, entry) in inherited.Entries)
        {
            var isAnswered = own.Has(key) || (key.Group != KeyGroup.None && own.Entries.Keys.Any(other => other.Group == key.Group));
            if (isAnswered)
            {
                continue;
            }

            if (kind is not { } known || key.BelongsTo(known))
            {
                entries[key] = entry;
            }
            else
            {
                Carry(key, entry, known, entries);
            }
        }
    }

    /// <summary>A half-width serves points as their radius, and the other way round; nothing else crosses over.</summary>
    private static void Carry(PlanKey key, Entry entry, LayoutKind kind, ImmutableDictionary<PlanKey, Entry>.Builder entries)
    {
        if (key.Group == KeyGroup.Reach)
        {
            entries.TryAdd(PlanKeys.ReachOf(kind), entry);
        }
    }

    private void ReportContradictions(PlanTable table, LayoutKind? kind)
    {
        // One that does not belong to the kind has been told already.
        var answers = table.Entries.Where(pair => pair.Key.Group != KeyGroup.None && (kind is null || pair.Key.BelongsTo(kind.Value)));
        foreach (var group in answers.GroupBy(pair => pair.Key.Group))
        {
            var ordered = group.OrderBy(pair => pair.Value.KeyPlace.Line).ThenBy(pair => pair.Value.KeyPlace.Column).ThenBy(pair => pair.Key.Name, StringComparer.Ordinal).ToArray();
            foreach (var (key, _) in ordered.Skip(1))
            {
                problems.Add(table.ProblemAt(key, $"{ordered[0].Key.Name} is given as well and answers the same question: keep one of them"));
            }
        }
    }

    private static string Misplaced(PlanKey key, LayoutKind kind)
    {
        var remedy = key.Group == KeyGroup.Reach
            ? $"write {PlanKeys.ReachOf(kind).Name} instead"
            : "take it out, or write it under the stratum it is for";
        return $"belongs to {key.Kinds!.Words}, and the kind here is {ChoiceWord.Of(kind)}: {remedy}";
    }
}
