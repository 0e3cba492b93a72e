using System.Collections.Immutable;
using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>The files that a plan names: resolved against its folder and looked for.</summary>
/// <param name="planPath">The plan file.</param>
/// <param name="exists">Whether a file (or a folder that serves as one) exists.</param>
/// <param name="problems">Receives what is missing.</param>
internal sealed class NamedFiles(string planPath, Func<string, bool> exists, List<Problem> problems)
{
    private readonly string folder = Path.GetDirectoryName(planPath) ?? "";

    public string? Resolve(PlanTable table, PlanKey<string> key)
        => table.Text(key) is { } named ? Resolve(table, key, named) : null;

    public ImmutableArray<string> ResolveAll(PlanTable table, PlanKey<ImmutableArray<string>> key)
        => [.. (table.Value(key) ?? []).Select(named => Resolve(table, key, named))];

    private string Resolve(PlanTable table, PlanKey key, string named)
    {
        var path = Path.Combine(folder, named);
        if (!exists(path))
        {
            var place = table.EntryOf(key)!.ValuePlace;
            problems.Add(place.Problem(Missing(named, path), table.Path.Add([key.Name]).ToString()));
        }

        return path;
    }

    private static string Missing(string named, string path)
    {
        var beside = Path.GetDirectoryName(path) is { } parent && Directory.Exists(parent.Length == 0 ? "." : parent)
            ? new DirectoryInfo(parent.Length == 0 ? "." : parent).EnumerateFileSystemInfos().Take(MostNames).Select(entry => entry.Name)
            : [];
        return $"there is no file {Quoted.Short(named)}, looked for at {Quoted.Text(Path.GetFullPath(path))}{Spelling.Hint(Path.GetFileName(named), beside)}";
    }

    /// <summary>In a folder of more files than this a likely name is not searched for long.</summary>
    private const int MostNames = 1000;
}
