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
                return AtPositions(terminal, loaded, positions, target, run);
            }

            var plan = PlanSurvey.Run(loaded.Design, loaded.Inputs, run);
            target?.Write([CoverageCsv.Write(plan)!, SummaryWriter.Write(plan, draw: null)]);

            CommandFrame.Tell(terminal, plan.Notices, quiet);
            if (parsed.GetValue(options.Json))
            {
                terminal.Out.WriteLine(JsonDocumentText.Of(json => SummaryWriter.WriteTo(json, plan, draw: null)));
            }
            else
            {
                PlanText.WriteCoverage(terminal.Out, plan);
            }

            return ExitCodes.Done;
        });
    }

    /// <summary>The table of positions with their coverage: into the folder, or to standard output.</summary>
    private static int AtPositions(Terminal terminal, LoadedPlan loaded, string path, OutputFolder? target, RunOptions run)
    {
        var table = CoverageAtTable.Read(path);
        var file = table.Write(OutputNames.CoverageAt, PlanSurvey.CoverageAt(loaded.Design, loaded.Inputs, table.Positions, run));
        if (target is null)
        {
            terminal.Out.Write(Encoding.UTF8.GetString(file.Content.Span));
        }
        else
        {
            target.Write([file]);
        }

        return ExitCodes.Done;
    }
}
