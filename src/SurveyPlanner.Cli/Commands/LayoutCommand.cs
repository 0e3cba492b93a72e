using System.CommandLine;
using System.Globalization;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pages;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>layout PLAN [--out DIR]</c>: the drawn transects alone.</summary>
internal static class LayoutCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var bearings = new Option<bool>("--try-bearings") { Description = "Table what other bearings would bring; draws nothing" };
        var every = new Option<string?>("--every") { Description = "Step between the bearings tried, degrees (15)", HelpName = "DEGREES" };
        every.Validators.Add(result => CommonOptions.Decimal(result, 0.1, 180));
        var chart = new Option<string?>("--chart") { Description = "Draw that table as SVG", HelpName = "FILE.svg" };
        var command = new Command(
            "layout",
            """
            Draws the layout: transects as GeoJSON, GPX and CSV, without coverage or report.

            Example:
              survey-planner layout survey.toml --out survey-lines
            """)
        {
            options.Plan, bearings, every, chart, options.Out, options.Force, options.Set, options.Seed, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, stop) =>
        {
            var folder = parsed.GetValue(options.Out);
            using var target = folder is null ? null : OutputFolder.Reserve(folder, parsed.GetValue(options.Force), stop);

            var loaded = LoadedPlan.Read(parsed.GetValue(options.Plan)!, options.SetsOf(parsed));
            if (parsed.GetValue(bearings))
            {
                var step = parsed.GetValue(every) is { } text ? double.Parse(text, CultureInfo.InvariantCulture) : 15;
                var trials = PlanSurvey.TryBearings(loaded.Design, loaded.Inputs, step, new RunOptions(Stop: stop));
                return Bearings(terminal, trials, parsed.GetValue(chart), parsed.GetValue(options.Json));
            }

            CommandFrame.TellSeed(terminal, loaded);
            var plan = PlanSurvey.DrawOnly(loaded.Design, loaded.Inputs);
            using var draws = DrawnPlan.Count(plan, loaded);
            var files = folder is null ? [] : DrawnPlan.Files(plan, loaded, draws.Number, folder, withReport: false);
            target?.Write(files);
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
                CommandFrame.TellWritten(terminal, files, folder);
            }

            return ExitCodes.Done;
        });
    }

    private static int Bearings(Terminal terminal, IReadOnlyList<StratumBearings> trials, string? chart, bool json)
    {
        if (chart is not null)
        {
            OneFile.Write(chart, BearingsRenderer.RenderSvg(trials));
        }

        if (json)
        {
            terminal.Out.WriteLine(JsonDocumentText.Of(writer => BearingsText.WriteJson(writer, trials)));
        }
        else
        {
            BearingsText.Write(terminal.Out, trials);
        }

        return ExitCodes.Done;
    }
}
