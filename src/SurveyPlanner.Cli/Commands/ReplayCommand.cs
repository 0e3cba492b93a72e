using System.CommandLine;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Files.Records;

namespace SurveyPlanner.Cli.Commands;

/// <summary><c>replay RECORD</c>: makes the layout again from its record and proves it the same.</summary>
internal static class ReplayCommand
{
    public static Command Build(Terminal terminal)
    {
        var options = new CommonOptions();
        var record = new Argument<string>("RECORD") { Description = "The record.json of a folder" };
        record.Validators.Add(CommonOptions.RefuseOptionAsFile);
        var inputs = new Option<string?>("--inputs") { Description = "Folder that holds the input files", HelpName = "DIR" };
        var command = new Command(
            "replay",
            """
            Makes a layout again from its record and proves it the same, byte for byte.

            Example:
              survey-planner replay survey-2027/record.json
            """)
        {
            record, inputs, options.Out, options.Force, options.Threads, options.Json, options.Quiet, options.Debug,
        };
        return command.Runs(options, terminal, (parsed, stop) =>
        {
            var folder = parsed.GetValue(options.Out);
            using var target = folder is null ? null : OutputFolder.Reserve(folder, parsed.GetValue(options.Force), stop);

            var file = parsed.GetValue(record)!;
            var recorded = RecordReader.Read(file);
            var loaded = LoadedPlan.FromRecord(recorded, Replay.FindInputs(recorded, file, parsed.GetValue(inputs)));
            var plan = MakeAgain(recorded, loaded, new RunOptions(options.ThreadsOf(parsed), Stop: stop));
            var draw = recorded.Draw ?? new DrawNumber(1, 1, 1);
            var withReport = recorded.Outputs.Any(output => output.Name == OutputNames.Report);
            var files = DrawnPlan.Files(plan, loaded, draw, folder ?? Path.GetDirectoryName(Path.GetFullPath(file))!, withReport);
            var result = Replay.Compare(recorded, plan, files);
            target?.Write(files);

            var json = parsed.GetValue(options.Json);
            var code = Say(result, recorded, terminal, json);
            if (!json)
            {
                CommandFrame.TellWritten(terminal, files, folder);
            }

            return code;
        });
    }

    private static SurveyPlan MakeAgain(SurveyRecord recorded, LoadedPlan loaded, RunOptions options)
        => recorded.Outputs.Any(output => output.Name == OutputNames.Coverage)
            ? PlanSurvey.Run(loaded.Design, loaded.Inputs, options)
            : PlanSurvey.DrawOnly(loaded.Design, loaded.Inputs);

    private static int Say(ReplayResult result, SurveyRecord recorded, Terminal terminal, bool json)
    {
        if (json)
        {
            terminal.Out.WriteLine(JsonDocumentText.Of(writer =>
            {
                writer.WriteStartObject();
                writer.WriteNumber("format_version", SummaryWriter.FormatVersion);
                writer.WriteBoolean("same_layout", result.IsSameLayout);
                writer.WriteString("layout_sha256", result.LayoutSha256);
                writer.WriteStartArray("changed_files");
                foreach (var name in result.ChangedOutputs)
                {
                    writer.WriteStringValue(name);
                }

                writer.WriteEndArray();
                writer.WriteEndObject();
            }));
        }

        if (!result.IsSameLayout)
        {
            terminal.Fail(
                $"the layout made again differs from the recorded one, although plan and inputs are the same; it was made by version {recorded.Run.ProgramVersion} on {recorded.Run.Runtime}, this is version {DrawnPlan.Version}");
            return ExitCodes.Input;
        }

        if (!json)
        {
            terminal.Out.WriteLine($"The layout is the same, to the last digit (SHA-256 {result.LayoutSha256[..16]}…).");
            terminal.Out.WriteLine(result.ChangedOutputs.Length == 0
                ? $"All {recorded.Outputs.Length} files recorded come out the same, byte for byte."
                : $"These files come out different: {string.Join(", ", result.ChangedOutputs)}.");
        }

        return ExitCodes.Done;
    }
}
