using System.Collections.Immutable;
using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>Settings to tables: finds the key each belongs to and reads its value; what is unknown is reported with the nearest right spelling.</summary>
internal sealed class TableBuilder(List<Problem> problems)
{
    private const string Stratum = "stratum";
    private readonly Dictionary<KeyPath, Place> places = [];
    private readonly Dictionary<KeyPath, Dictionary<PlanKey, Entry>> entries = [];
    private readonly HashSet<KeyPath> refused = [];

    public PlanTables Build(PlanSyntax syntax, IReadOnlyList<Setting> settings, string file)
    {
        foreach (var header in syntax.Tables)
        {
            Open(header.Path, header.Place);
        }

        foreach (var setting in settings)
        {
            Add(setting);
        }

        var tables = places.Select(pair => new PlanTable(
            pair.Key,
            pair.Value,
            entries.TryGetValue(pair.Key, out var found) ? found.ToImmutableDictionary() : ImmutableDictionary<PlanKey, Entry>.Empty)).ToArray();
        return new PlanTables(
            tables.Where(table => table.Path.Segments.Length == 1).ToImmutableDictionary(table => table.Path.Segments[0], StringComparer.Ordinal),
            tables.Where(table => table.Path.Segments.Length == 2).ToImmutableSortedDictionary(table => table.Path.Segments[1], table => table, StringComparer.Ordinal),
            new Place(file, syntax.LastLine, 1));
    }

    /// <summary>Whether a table may stand in a plan file; says once why not.</summary>
    private bool Open(KeyPath path, Place place)
    {
        if (places.ContainsKey(path))
        {
            return true;
        }

        if (refused.Contains(path))
        {
            return false;
        }

        if (TableComplaint(path.Segments) is { } complaint)
        {
            refused.Add(path);
            problems.Add(place.Problem(complaint, path.ToString()));
            return false;
        }

        places.Add(path, place);
        return true;
    }

    private static string? TableComplaint(ImmutableArray<string> segments)
    {
        if (segments[0] == Stratum)
        {
            return segments.Length switch
            {
                1 => null,
                2 => string.IsNullOrWhiteSpace(segments[1]) ? "a stratum needs a name: write [stratum.\"inner bay\"]" : null,
                _ => $"a name with a dot stands in quotes: write [stratum.{Quoted.Short(string.Join('.', segments[1..]))}]",
            };
        }

        if (segments.Length > 1)
        {
            return PlanKeys.Tables.Contains(segments[0])
                ? $"[{KeyPath.Segment(segments[0])}] has no tables in it; the keys of a stratum stand in [stratum.\"name\"]"
                : $"there is no table of this name{TableHint(segments[0])}";
        }

        return PlanKeys.Tables.Contains(segments[0]) ? null : $"there is no table of this name{TableHint(segments[0])}";
    }

    private static string TableHint(string name)
        => Spelling.Nearest(name, PlanKeys.Tables.Append(Stratum)) is { } nearest
            ? $": did you mean [{(nearest == Stratum ? "stratum.\"name\"" : nearest)}]?"
            : $"; the tables are {WordList.And(PlanKeys.Tables.Append("stratum.\"name\""))}";

    private void Add(Setting setting)
    {
        var segments = setting.Path.Segments;
        if (segments.Length == 1 && setting.Value is SettingValue.Unreadable)
        {
            return;
        }

        if (segments.Length == 1)
        {
            problems.Add(setting.KeyPlace.Problem(OutsideTables(segments[0]), setting.Path.ToString()));
            return;
        }

        if (segments is [Stratum, _])
        {
            problems.Add(setting.KeyPlace.Problem("the keys of a stratum stand under its name: write [stratum.\"inner bay\"] above them", setting.Path.ToString()));
            return;
        }

        var table = setting.Path.Parent;
        if (!Open(table, setting.KeyPlace))
        {
            return;
        }

        if (PlanKeys.Find(segments[0], segments[^1]) is not { } key)
        {
            if (setting.Value is SettingValue.Unreadable)
            {
                return;
            }

            problems.Add(setting.KeyPlace.Problem(UnknownKey(segments[0], segments[^1]), setting.Path.ToString()));
            return;
        }

        if (!entries.TryGetValue(table, out var known))
        {
            entries.Add(table, known = []);
        }

        known.Add(key, Read(setting, key, table));
    }

    private Entry Read(Setting setting, PlanKey key, KeyPath table)
    {
        if (setting.Value is SettingValue.Unreadable)
        {
            return new Entry(null, setting.KeyPlace, setting.ValuePlace);
        }

        var asText = setting.KeyPlace.IsSet && key.IsText && setting.Value is not (SettingValue.Text or SettingValue.List);
        var value = asText ? new SettingValue.Text(setting.Value.Raw, setting.Value.Raw) : setting.Value;
        var parsed = key.Read(value, key.SampleIn(table));
        if (parsed.Complaint is { } complaint)
        {
            problems.Add(setting.ValuePlace.Problem(complaint, setting.Path.ToString()));
        }

        return new Entry(parsed.Value, setting.KeyPlace, setting.ValuePlace);
    }

    private static string OutsideTables(string name)
    {
        var homes = PlanKeys.All.Where(key => key.Name == name).Select(key => $"[{key.Table}]").ToArray();
        return homes.Length > 0
            ? $"stands above the first table: write it under {WordList.Or(homes)}"
            : PlanKeys.Tables.Contains(name) || name == Stratum
                ? $"is a table and no key: write [{name}] on a line of its own and its keys below"
                : $"there is no key of this name above the first table{Spelling.Hint(name, PlanKeys.All.Select(key => $"{key.Table}.{key.Name}"))}";
    }

    private static string UnknownKey(string table, string name)
    {
        if (PlanKeys.ReservedTables.Contains(table))
        {
            return $"[{table}] takes no keys yet: take this one out";
        }

        var shown = table == Stratum ? "[stratum.\"name\"]" : $"[{table}]";
        if (Spelling.Nearest(name, PlanKeys.Of(table).Select(key => key.Name)) is { } nearest)
        {
            return $"there is no key of this name in {shown}: did you mean {nearest}?";
        }

        var homes = PlanKeys.All.Where(key => key.Name == name).Select(key => $"[{key.Table}]").ToArray();
        return homes.Length > 0
            ? $"belongs under {WordList.Or(homes)}, not {shown}"
            : $"there is no key of this name in {shown}; its keys are {WordList.And(PlanKeys.Of(table).Select(key => key.Name))}";
    }
}
