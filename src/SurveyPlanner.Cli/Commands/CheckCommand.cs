using System.CommandLine;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Pages;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>check PLAN</c>: what was understood, so that a wrong file is noticed at a glance.</summary>
internal static class CheckCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var map = new Option<string?>("--map") { Description = "Draw the region as SVG", HelpName = "FILE.svg" };
        var command = new Command(
            "check",
            """
            Reads everything, reports each problem and each repair, writes nothing.

            Example:
              survey-planner check survey.toml
            """)
        {
            options.Plan, map, options.Set, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, _) =>
        {
            var loaded = LoadedPlan.Read(parsed.GetValue(options.Plan)!, options.SetsOf(parsed));
            var plan = PlanSurvey.DrawOnly(loaded.Design, loaded.Inputs);
            if (parsed.GetValue(map) is { } file)
            {
                OneFile.Write(file, MapRenderer.RenderSvg(plan.Region, plan.Design.Name));
            }

            CommandFrame.Tell(terminal, plan.Notices, parsed.GetValue(options.Quiet));
            if (parsed.GetValue(options.Json))
            {
                terminal.Out.WriteLine(JsonDocumentText.Of(json => SummaryWriter.WriteCheck(json, plan.Region, plan.Notices)));
            }
            else
            {
                CheckText.Write(terminal.Out, plan);
            }

            return ExitCodes.Done;
        });
    }
}
