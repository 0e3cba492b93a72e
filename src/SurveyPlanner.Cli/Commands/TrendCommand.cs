using System.CommandLine;
using System.Globalization;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Pages;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>trend PLAN</c>: power to detect a yearly change at the planned precision.</summary>
internal static class TrendCommand
{
    private static readonly double[] Changes = [-0.20, -0.10, -0.05, -0.03, 0.03, 0.05, 0.10, 0.20];

    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var trend = new TrendOptions();
        var page = new Option<string?>("--page") { Description = "Write the answer with its charts as a page", HelpName = "FILE.html" };
        var command = new Command(
            "trend",
            """
            Power to detect a yearly change over the years, at the precision that the plan aims at (target_cv), or else delivers.

            Example:
              survey-planner trend survey.toml --change -0.05 --surveys 10
            """)
        {
            options.Plan, page, trend.Change, trend.Surveys, trend.Cv, trend.CvModel, trend.Shape, trend.Alpha, trend.OneSided, trend.Interval, trend.Power,
            options.Set, options.Seed, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, _) =>
        {
            var loaded = LoadedPlan.Read(parsed.GetValue(options.Plan)!, options.SetsOf(parsed));
            var (cv, source) = FirstCv(loaded, TrendOptions.Number(parsed, trend.Cv));
            var design = trend.Design(parsed, cv, loaded.Design.Seed);
            var surveys = (int)(TrendOptions.Number(parsed, trend.Surveys) ?? 10);
            var asked = TrendOptions.Number(parsed, trend.Change);
            var result = TrendResult.Of(design, source, surveys, TrendOptions.Number(parsed, trend.Power) ?? 0.8, asked is { } one ? [one] : Changes);
            if (parsed.GetValue(page) is { } file)
            {
                var sheet = TrendSheet.Of(loaded.Design.Name, design, source, surveys, result.WantedPower);
                OneFile.Write(file, TrendRenderer.RenderHtml(sheet, DrawnPlan.Version));
            }

            if (parsed.GetValue(options.Json))
            {
                terminal.Out.WriteLine(JsonDocumentText.Of(result.WriteJson));
            }
            else
            {
                result.WriteText(terminal.Out);
            }

            return ExitCodes.Done;
        });
    }

    /// <summary>The precision to count on: what is said, else the plan's target, else what the drawn layout delivers.</summary>
    private static (double Cv, string Source) FirstCv(LoadedPlan loaded, double? given)
    {
        if (given is { } said)
        {
            return (said, "as given");
        }

        if (loaded.Design.Effort.TargetCv is { } target)
        {
            return (target, "the plan's target");
        }

        return PlanSurvey.DrawOnly(loaded.Design, loaded.Inputs).Delivered is { } delivered
            ? (delivered.Cv, string.Create(CultureInfo.InvariantCulture, $"what {delivered.Effort:0.#} {(loaded.Inputs.Pilot?.IsPoints == true ? "points" : "km")} deliver"))
            : throw new InputException(new Problem(
                "the plan gives no precision to reckon with; add [precision] target_cv or a pilot, or say --cv 0.2", loaded.File.Path));
    }
}
