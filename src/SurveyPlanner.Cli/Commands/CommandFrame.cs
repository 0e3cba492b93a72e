using System.CommandLine;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Cli.Commands;

/// <summary>What every command does alike: options, errors to sentences, Ctrl-C to exit code 130.</summary>
internal static class CommandFrame
{
    /// <summary>Makes the command do its work off the main thread, so that Ctrl-C is answered at once.</summary>
    public static Command Runs(this Command command, CommonOptions options, Terminal terminal, Func<ParseResult, CancellationToken, int> work)
    {
        command.SetAction((parsed, stop) => Task.Run(() => Guarded(parsed, options, terminal, work, stop), CancellationToken.None));
        return command;
    }

    private static int Guarded(
        ParseResult parsed, CommonOptions options, Terminal terminal, Func<ParseResult, CancellationToken, int> work, CancellationToken stop)
    {
        try
        {
            return work(parsed, stop);
        }
#pragma warning disable CA1031 // The top of the program: whatever happens ends as one sentence and an exit code.
        catch (Exception exception)
#pragma warning restore CA1031
        {
            if (parsed.GetValue(options.Debug))
            {
                terminal.Error.WriteLine(exception);
            }

            return Failure.Report(Failure.Of(exception), terminal, parsed.GetValue(options.Json));
        }
    }

    /// <summary>Repairs and warnings, unless they are not wanted.</summary>
    public static void Tell(Terminal terminal, IEnumerable<Notice> notices, bool quiet)
    {
        if (quiet)
        {
            return;
        }

        foreach (var notice in notices)
        {
            var message = notice.Kind == NoticeKind.Repair ? $"repaired: {notice.Message}" : notice.Message;
            terminal.Warn(string.Concat(message.Select(c => char.IsControl(c) ? ' ' : c)));
        }
    }

    /// <summary>What was written and where, if anything was.</summary>
    public static void TellWritten(Terminal terminal, IReadOnlyCollection<OutputFile> files, string? folder)
    {
        if (folder is not null)
        {
            terminal.Out.WriteLine($"Wrote {files.Count} files to {folder}: {string.Join(", ", files.Select(file => file.Name))}");
        }
    }

    /// <summary>A seed that nobody chose must be known, or the draw could not be made again.</summary>
    public static void TellSeed(Terminal terminal, LoadedPlan plan)
    {
        if (plan.SeedFromSystem)
        {
            terminal.Error.WriteLine(FormattableString.Invariant(
                $"The plan gives no seed; this run took {plan.Design.Seed}. To keep it, write seed = {plan.Design.Seed} under [survey]."));
        }
    }
}
