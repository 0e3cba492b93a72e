using System.CommandLine;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Plans;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>new BOUNDARY</c>: a starter plan beside a boundary file.</summary>
internal static class NewCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var boundary = new Argument<string>("BOUNDARY") { Description = "A boundary file" };
        boundary.Validators.Add(CommonOptions.RefuseOptionAsFile);
        var file = new Option<string?>("--out", "-o") { Description = "Plan file to write; beside the boundary unless given", HelpName = "PLAN.toml" };
        var crs = new Option<string?>("--crs") { Description = "Coordinate system of the file, where it does not say: EPSG:3035", HelpName = "CODE" };
        var layer = new Option<string?>("--layer") { Description = "Layer of the file, where it has several", HelpName = "NAME" };
        var command = new Command(
            "new",
            """
            Writes a commented starter plan beside a boundary file, with defaults that fit it.

            Example:
              survey-planner new sound.geojson
            """)
        {
            boundary, file, crs, layer, options.Force, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, _) =>
        {
            var path = parsed.GetValue(boundary)!;
            if (Path.GetExtension(path).Equals(".toml", StringComparison.OrdinalIgnoreCase) && File.Exists(path))
            {
                throw new InputException(new Problem($"this is a plan already; look at it with: survey-planner check {Usage.Typed(path)}", path));
            }

            var planPath = parsed.GetValue(file) ?? Path.ChangeExtension(path, ".toml");
            if (File.Exists(planPath) && !parsed.GetValue(options.Force))
            {
                throw new IOException($"{planPath} exists already: name another file with --out, or replace it with --force");
            }

            var (system, name) = (parsed.GetValue(crs), parsed.GetValue(layer));
            var read = BoundaryReader.Read(path, new BoundaryOptions { Crs = system, Layer = name });
            var facts = StarterFacts.Of(Path.GetFileNameWithoutExtension(path), read);
            var relative = Path.GetRelativePath(Path.GetDirectoryName(Path.GetFullPath(planPath))!, Path.GetFullPath(path)).Replace('\\', '/');
            var text = StarterPlan.For(relative, facts);
            OneFile.Write(planPath, WithKey(WithKey(text, "layer", name), "crs", system));
            CommandFrame.Tell(terminal, facts.Notices, parsed.GetValue(options.Quiet));
            terminal.Out.WriteLine($"Wrote {planPath}. Read it, then: survey-planner check {Usage.Typed(planPath)}");
            return ExitCodes.Done;
        });
    }

    /// <summary>What the command line had to say about the file, the plan must say too: a line under the boundary's.</summary>
    private static string WithKey(string plan, string key, string? value)
    {
        if (value is null)
        {
            return plan;
        }

        var lines = plan.Split('\n').ToList();
        var boundary = lines.FindIndex(line => line.StartsWith("boundary", StringComparison.Ordinal));
        lines.Insert(boundary + 1, $"{key} = \"{value.Replace("\\", "\\\\", StringComparison.Ordinal).Replace("\"", "\\\"", StringComparison.Ordinal)}\"");
        return string.Join('\n', lines);
    }
}
