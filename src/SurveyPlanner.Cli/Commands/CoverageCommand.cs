using System.CommandLine;
using System.Text;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Files.Tables;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>coverage PLAN [--out DIR]</c>: coverage probability alone. Draws nothing that counts.</summary>
internal static class CoverageCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var at = new Option<string?>("--at") { Description = "Coverage at positions: a CSV with columns lon, lat", HelpName = "POINTS.csv" };
        var command = new Command(
            "coverage",
            """
            Coverage probability of the design, exact and simulated. Draws no layout that counts.

            Example:
              survey-planner coverage survey.toml --out survey-coverage
            """)
        {
            options.Plan, at, options.Out, options.Force, options.Set, options.Seed, options.Threads, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, stop) =>
        {
            var folder = parsed.GetValue(options.Out);
            using var target = folder is null ? null : OutputFolder.Reserve(folder, parsed.GetValue(options.Force), stop);
            var quiet = parsed.GetValue(options.Quiet);

            var loaded = LoadedPlan.Read(parsed.GetValue(options.Plan)!, options.SetsOf(parsed));
            var progress = quiet ? null : terminal.Progress("simulating");
            var run = new RunOptions(options.ThreadsOf(parsed), progress, stop);
            if (parsed.GetValue(at) is { } positions)
            {
                return AtPositions(terminal, loaded, positions, target, run, parsed.GetValue(options.Json));
            }

            var plan = PlanSurvey.Run(loaded.Design, loaded.Inputs, run);
            OutputFile[] files = [CoverageCsv.Write(plan)!, SummaryWriter.Write(plan, draw: null)];
            target?.Write(files);

            CommandFrame.Tell(terminal, plan.Notices, quiet);
            if (parsed.GetValue(options.Json))
            {
                terminal.Out.WriteLine(JsonDocumentText.Of(json => SummaryWriter.WriteTo(json, plan, draw: null)));
            }
            else
            {
                PlanText.WriteCoverage(terminal.Out, plan);
                CommandFrame.TellWritten(terminal, files, folder);
            }

            return ExitCodes.Done;
        });
    }

    /// <summary>The table of positions with their coverage: into the folder, or to standard output unless that takes JSON.</summary>
    private static int AtPositions(Terminal terminal, LoadedPlan loaded, string path, OutputFolder? target, RunOptions run, bool json)
    {
        var table = CoverageAtTable.Read(path);
        var coverages = PlanSurvey.CoverageAt(loaded.Design, loaded.Inputs, table.Positions, run);
        var file = table.Write(OutputNames.CoverageAt, coverages);
        target?.Write([file]);
        if (json)
        {
            terminal.Out.WriteLine(JsonDocumentText.Of(writer => SummaryWriter.WriteCoverageAt(writer, coverages)));
        }
        else if (target is null)
        {
            terminal.Out.Write(Encoding.UTF8.GetString(file.Content.Span));
        }
        else
        {
            terminal.Out.WriteLine($"{coverages.Count(one => !one.IsOutside)} of {coverages.Length} positions lie in the region; wrote {Path.Combine(target.Folder, file.Name)}");
        }

        return ExitCodes.Done;
    }
}
