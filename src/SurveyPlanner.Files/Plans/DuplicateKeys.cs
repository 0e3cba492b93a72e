using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>Keys and tables that stand twice: the first counts, the others are reported.</summary>
internal static class DuplicateKeys
{
    public static PlanSyntax Remove(PlanSyntax syntax, List<Problem> problems)
    {
        var settings = new Dictionary<KeyPath, Setting>();
        foreach (var setting in syntax.Settings)
        {
            if (!settings.TryAdd(setting.Path, setting))
            {
                var first = settings[setting.Path].KeyPlace.Line;
                problems.Add(setting.KeyPlace.Problem($"given twice, first on line {first}: keep one", setting.Path.ToString()));
            }
        }

        var tables = new Dictionary<KeyPath, TableHeader>();
        foreach (var table in syntax.Tables)
        {
            if (!tables.TryAdd(table.Path, table))
            {
                var first = tables[table.Path].Place.Line;
                problems.Add(table.Place.Problem($"[{Quoted.Plain(table.Path.ToString())}] stands twice, first on line {first}: join the two", table.Path.ToString()));
            }
        }

        return syntax with { Settings = [.. settings.Values], Tables = [.. tables.Values] };
    }
}
