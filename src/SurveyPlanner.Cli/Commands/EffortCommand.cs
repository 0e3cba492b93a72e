using System.CommandLine;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>effort PLAN</c>: how much effort the target precision needs.</summary>
internal static class EffortCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var command = new Command(
            "effort",
            """
            Effort that the target precision needs, from the pilot or from figures given.

            Example:
              survey-planner effort survey.toml
            """)
        {
            options.Plan, options.Set, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, _) =>
        {
            var loaded = LoadedPlan.Read(parsed.GetValue(options.Plan)!, options.SetsOf(parsed));
            var region = PlanSurvey.ReadRegion(loaded.Design, loaded.Inputs);
            var effort = PlanSurvey.PlanEffort(loaded.Design, region, loaded.Inputs.Pilot)
                ?? throw new InputException(new Problem(
                    "the plan says nothing of effort; add [pilot] transects = \"pilot.csv\", or pilot.encounter_rate and precision.b",
                    loaded.File.Path));
            CommandFrame.Tell(terminal, region.Notices, parsed.GetValue(options.Quiet));
            if (parsed.GetValue(options.Json))
            {
                terminal.Out.WriteLine(JsonDocumentText.Of(json => SummaryWriter.WriteEffortDocument(json, effort, loaded.Design.Effort.Allocation)));
            }
            else
            {
                EffortText.Write(terminal.Out, effort);
            }

            return ExitCodes.Done;
        });
    }
}
