namespace SurveyPlanner.Files.Plans;

/// <summary>
/// The plan in one fixed form: every key with the value that holds, defaults included, in base units, sorted. Two files that mean the
/// same give the same text, whatever their order, comments and units. It is TOML and reads back to itself.
/// The seed is left out: another seed is another draw under the same plan.
/// </summary>
internal static class CanonicalPlan
{
    public static string Write(PlanTables tables, PlanTable layout, IEnumerable<PlanTable> strata, string surveyName)
    {
        var lines = new List<string> { Line(new KeyPath(["survey"]), PlanKeys.Name, surveyName) };
        foreach (var key in PlanKeys.All.Where(key => key.Table is not ("layout" or "stratum") && key != PlanKeys.Seed && key != PlanKeys.Name))
        {
            AddLine(lines, tables[key.Table], key);
        }

        foreach (var table in strata.Prepend(layout))
        {
            foreach (var key in PlanKeys.Of(table.Path.Segments[0]).Where(key => key.BelongsTo(table.Value(PlanKeys.Kind)!.Value)))
            {
                AddLine(lines, table, key);
            }
        }

        lines.Sort(StringComparer.Ordinal);
        return string.Join('\n', lines) + '\n';
    }

    private static void AddLine(List<string> lines, PlanTable table, PlanKey key)
    {
        if (table.EntryOf(key)?.Value is { } value)
        {
            lines.Add(Line(table.Path, key, value));
        }
        else if (key.DefaultText is { } text && !IsIdle(table, key))
        {
            lines.Add($"{table.Path.Add([key.Name])} = {text}");
        }
    }

    /// <summary>Keys that say something about another key, and nothing where that is absent.</summary>
    private static bool IsIdle(PlanTable table, PlanKey key)
        => (key == PlanKeys.ExclusionBuffer && !table.Has(PlanKeys.Exclusions))
           || (key == PlanKeys.ClusterSizeSd && !table.Has(PlanKeys.ClusterSize));

    private static string Line(KeyPath table, PlanKey key, object value) => $"{table.Add([key.Name])} = {key.Write(value)}";
}
