using System.Collections.Immutable;

namespace SurveyPlanner.Files.Plans;

/// <summary>Reads plan files strictly. See docs/plan-file.md for the keys.</summary>
public static class PlanFileReader
{
    /// <summary>A plan of a thousand strata has about 100 kB.</summary>
    private const int MostKilobytes = 512;

    /// <summary>A file with more is wrong as a whole; the others are counted, not listed.</summary>
    private const int MostProblems = 200;

    /// <summary>Reads a plan file and looks whether the files it names exist.</summary>
    /// <param name="path">The plan file.</param>
    /// <param name="sets">Overrides of the command line, such as <c>layout.spacing=4 km</c>; they count more than the file.</param>
    /// <param name="files">The files of the run; unless given, of this reading alone.</param>
    /// <exception cref="InputException">Everything that is wrong with the file and the overrides.</exception>
    /// <exception cref="IOException">The file is there and cannot be read.</exception>
    public static PlanFile Read(string path, IEnumerable<string> sets, InputFiles? files = null)
        => Understand(TextFile.Read(path, "plan file", MostKilobytes, files ?? new InputFiles()), path, sets, path => File.Exists(path) || Directory.Exists(path));

    /// <summary>Reads the text of a plan file without touching the disk: the files it names are not looked for.</summary>
    /// <param name="text">The text.</param>
    /// <param name="path">What to call the file in messages, and where its relative paths start from.</param>
    /// <param name="sets">Overrides, as for <see cref="Read"/>.</param>
    /// <exception cref="InputException">Everything that is wrong with the text and the overrides.</exception>
    public static PlanFile Parse(string text, string path, IEnumerable<string> sets) => Understand(text, path, sets, _ => true);

    private static PlanFile Understand(string text, string path, IEnumerable<string> sets, Func<string, bool> exists)
    {
        var problems = new List<Problem>();
        var overrides = SetOverrides.Read(sets, problems);
        if (new TomlReader(path, problems).Read(text) is not { } syntax)
        {
            throw Refusal(problems);
        }

        var tables = new TableBuilder(problems).Build(syntax, SetOverrides.Apply(overrides, syntax.Settings), path);
        var layers = new LayoutLayers(problems);
        var layout = layers.Lay(null, tables["layout"]);
        var strata = tables.Strata.ToImmutableSortedDictionary(pair => pair.Key, pair => layers.Lay(layout, pair.Value), StringComparer.Ordinal);
        problems.AddRange(LayoutBuilder.Missing(layout, null).Concat(strata.Values.SelectMany(stratum => LayoutBuilder.Missing(stratum, layout))));
        problems.AddRange(PlanRules.Check(tables, layout, [.. strata.Values]));
        var files = new NamedFiles(path, exists, problems);
        var region = tables["region"];
        var boundaries = files.ResolveAll(region, PlanKeys.Boundary);
        var exclusions = files.ResolveAll(region, PlanKeys.Exclusions);
        var transects = files.Resolve(tables["pilot"], PlanKeys.Transects);
        var detections = files.Resolve(tables["pilot"], PlanKeys.Detections);
        if (problems.Count > 0)
        {
            throw Refusal(problems);
        }

        var name = tables["survey"].Text(PlanKeys.Name) ?? Path.GetFileNameWithoutExtension(path);
        return new PlanFile(
            path,
            DesignBuilder.Build(tables, layout, strata, name),
            tables["survey"].Has(PlanKeys.Seed),
            boundaries,
            region.Value(PlanKeys.Layer) ?? [],
            region.Text(PlanKeys.Crs),
            exclusions,
            transects,
            detections,
            CanonicalPlan.Write(tables, layout, strata.Values, name),
            text);
    }

    /// <summary>In the order of the file, what the command line said last.</summary>
    private static InputException Refusal(List<Problem> problems)
    {
        var ordered = problems.OrderBy(problem => problem.Line ?? int.MaxValue).ThenBy(problem => problem.Column ?? 0).ToList();
        if (ordered.Count > MostProblems)
        {
            var last = ordered[MostProblems];
            ordered[MostProblems] = last with { Message = $"and {ordered.Count - MostProblems} more problems from here on", Key = null };
            ordered.RemoveRange(MostProblems + 1, ordered.Count - MostProblems - 1);
        }

        return new InputException(ordered);
    }
}
