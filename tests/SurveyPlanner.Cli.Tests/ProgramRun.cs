namespace SurveyPlanner.Cli.Tests;

/// <summary>One run of the program inside the test process: the same entry the executable has, its streams kept as text.</summary>
internal sealed record ProgramRun(int ExitCode, string Out, string Error)
{
    public static ProgramRun Of(params string[] args)
    {
        using var output = new StringWriter();
        using var error = new StringWriter();
        var code = Application.Run(args, new Terminal(output, error, ErrorIsTerminal: false));
        return new ProgramRun(code, output.ToString(), error.ToString());
    }
}

/// <summary>A folder of its own for one test, gone afterwards.</summary>
internal sealed class Workspace : IDisposable
{
    public string Folder { get; } = Directory.CreateTempSubdirectory("survey-planner-").FullName;

    public string At(string name) => Path.Combine(Folder, name);

    /// <summary>Writes a plan for a boundary file and returns its path.</summary>
    public string Plan(string boundary, string layout, string more = "", string name = "plan.toml")
    {
        var path = At(name);
        File.WriteAllText(path, $"""
            [survey]
            name = "test"
            seed = 7

            [region]
            boundary = "{boundary.Replace('\\', '/')}"

            [layout]
            {layout}

            {more}
            """);
        return path;
    }

    /// <summary>A copy of the sample regions, so that a run leaves nothing in the repository.</summary>
    public void CopySamples()
    {
        var from = Path.Combine(ReferenceData.Root, "sample-regions");
        foreach (var file in Directory.EnumerateFiles(from, "*", SearchOption.AllDirectories).Where(file => !file.EndsWith(".draws.jsonl", StringComparison.Ordinal)))
        {
            var to = Path.Combine(At("sample-regions"), Path.GetRelativePath(from, file));
            Directory.CreateDirectory(Path.GetDirectoryName(to)!);
            File.Copy(file, to);
        }
    }

    public void Dispose() => Directory.Delete(Folder, recursive: true);
}
