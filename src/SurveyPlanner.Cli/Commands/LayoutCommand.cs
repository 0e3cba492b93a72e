using System.CommandLine;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>layout PLAN [--out DIR]</c>: the drawn transects alone.</summary>
internal static class LayoutCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var command = new Command(
            "layout",
            """
            Draws the layout: transects as GeoJSON, GPX and CSV, without coverage or report.

            Example:
              survey-planner layout survey.toml --out survey-lines
            """)
        {
            options.Plan, options.Out, options.Force, options.Set, options.Seed, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, stop) =>
        {
            var folder = parsed.GetValue(options.Out);
            var target = folder is null ? null : new OutputTarget(folder, parsed.GetValue(options.Force));

            var loaded = LoadedPlan.Read(parsed.GetValue(options.Plan)!, options.SetsOf(parsed));
            CommandFrame.TellSeed(terminal, loaded);
            var plan = PlanSurvey.DrawOnly(loaded.Design, loaded.Inputs);
            using var draws = DrawnPlan.Count(plan, loaded);
            target?.Write(DrawnPlan.Files(plan, loaded, draws.Number, folder!, withReport: false), stop);

            draws.Keep();
            CommandFrame.Tell(terminal, plan.Notices, parsed.GetValue(options.Quiet));
            if (parsed.GetValue(options.Json))
            {
                terminal.Out.WriteLine(JsonDocumentText.Of(json => SummaryWriter.WriteTo(json, plan, draws.Number.Number)));
            }
            else
            {
                PlanText.Write(terminal.Out, plan, draws.Number);
                PlanText.WriteTransects(terminal.Out, plan);
            }

            return ExitCodes.Done;
        });
    }
}
