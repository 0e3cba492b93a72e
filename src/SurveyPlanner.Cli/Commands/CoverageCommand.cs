using System.CommandLine;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>coverage PLAN [--out DIR]</c>: coverage probability alone. Draws nothing that counts.</summary>
internal static class CoverageCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var command = new Command(
            "coverage",
            """
            Coverage probability of the design, exact and simulated. Draws no layout that counts.

            Example:
              survey-planner coverage survey.toml --out survey-coverage
            """)
        {
            options.Plan, options.Out, options.Force, options.Set, options.Seed, options.Threads, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, stop) =>
        {
            var folder = parsed.GetValue(options.Out);
            var target = folder is null ? null : new OutputTarget(folder, parsed.GetValue(options.Force));
            var quiet = parsed.GetValue(options.Quiet);

            var loaded = LoadedPlan.Read(parsed.GetValue(options.Plan)!, options.SetsOf(parsed));
            var progress = quiet ? null : terminal.Progress("simulating");
            var plan = PlanSurvey.Run(loaded.Design, loaded.Inputs, new RunOptions(options.ThreadsOf(parsed), progress, stop));
            target?.Write([CoverageCsv.Write(plan)!, SummaryWriter.Write(plan, draw: null)], stop);

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
}
