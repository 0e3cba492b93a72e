using System.Collections.Immutable;

namespace SurveyPlanner.Files.Plans;

/// <summary>A key's value as read; null when it could not be (that has been said).</summary>
internal sealed record Entry(object? Value, Place KeyPlace, Place ValuePlace);

/// <summary>One table of the plan file with the keys it holds.</summary>
/// <param name="Path">Its name.</param>
/// <param name="Place">Where it begins; for a table that is absent, where it could be added.</param>
/// <param name="Entries">Its keys.</param>
internal sealed record PlanTable(KeyPath Path, Place Place, ImmutableDictionary<PlanKey, Entry> Entries)
{
    /// <summary>Whether the key stands in it, read well or not.</summary>
    public bool Has(PlanKey key) => Entries.ContainsKey(key);

    public Entry? EntryOf(PlanKey key) => Entries.GetValueOrDefault(key);

    /// <summary>The value of a key, else its default, else null.</summary>
    public T? Text<T>(PlanKey<T> key)
        where T : class
        => (T?)(Has(key) ? Entries[key].Value : key.Default);

    /// <summary>The value of a key, else its default, else null.</summary>
    public T? Value<T>(PlanKey<T> key)
        where T : struct
        => (T?)(Has(key) ? Entries[key].Value : key.Default);

    /// <summary>A problem with a key of this table.</summary>
    public Problem ProblemAt(PlanKey key, string message)
        => (EntryOf(key)?.KeyPlace ?? Place).Problem(message, Path.Add([key.Name]).ToString());
}

/// <summary>All tables of a plan file, every key known and read.</summary>
internal sealed record PlanTables(
    ImmutableDictionary<string, PlanTable> Tables,
    ImmutableSortedDictionary<string, PlanTable> Strata,
    Place End)
{
    /// <summary>A table by name; an empty one when the file has none.</summary>
    public PlanTable this[string name]
        => Tables.GetValueOrDefault(name) ?? new PlanTable(new KeyPath([name]), End, ImmutableDictionary<PlanKey, Entry>.Empty);
}
