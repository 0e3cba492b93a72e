using System.CommandLine;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>plan PLAN --out DIR</c>: the whole job.</summary>
internal static class PlanCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var command = new Command(
            "plan",
            """
            The whole job: layout, coverage, effort, field files, report and record in one folder.

            Example:
              survey-planner plan survey.toml --out survey-2027
            """)
        {
            options.Plan, options.Out, options.Force, options.Set, options.Seed, options.Threads, options.Json, options.Quiet, options.Debug,
        };
        options.Out.Required = true;
        return command.Runs(options, terminal, (parsed, stop) =>
        {
            var folder = parsed.GetRequiredValue(options.Out)!;
            using var target = OutputFolder.Reserve(folder, parsed.GetValue(options.Force), stop);
            var quiet = parsed.GetValue(options.Quiet);
            var loaded = LoadedPlan.Read(parsed.GetValue(options.Plan)!, options.SetsOf(parsed));
            CommandFrame.TellSeed(terminal, loaded);
            var progress = quiet ? null : terminal.Progress("simulating");
            var plan = PlanSurvey.Run(loaded.Design, loaded.Inputs, new RunOptions(options.ThreadsOf(parsed), progress, stop));
            using var draws = DrawnPlan.Count(plan, loaded);
            var files = DrawnPlan.Files(plan, loaded, draws.Number, folder, withReport: true);
            target.Write(files);
            draws.Keep();

            CommandFrame.Tell(terminal, plan.Notices, quiet);
            if (parsed.GetValue(options.Json))
            {
                terminal.Out.WriteLine(JsonDocumentText.Of(json => SummaryWriter.WriteTo(json, plan, draws.Number.Number)));
            }
            else
            {
                PlanText.Write(terminal.Out, plan, draws.Number);
                terminal.Out.WriteLine($"Wrote {files.Length} files to {folder}; begin with {Path.Combine(folder, OutputNames.Report)}");
            }

            return ExitCodes.Done;
        });
    }
}
