using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;
using SurveyPlanner.Cli.Commands;

namespace SurveyPlanner.Cli;

/// <summary>
/// The command <c>survey-planner</c>: parse, run one command, turn whatever happens into one plain sentence and an exit code.
/// </summary>
internal static class Application
{
    /// <summary>Parses and runs. No exception leaves it.</summary>
    public static int Run(IReadOnlyList<string> args, Terminal terminal)
    {
        var root = Root(terminal);
        if (args.Count == 0)
        {
            args = ["--help"];
        }

        // Response files are switched off: a file name may begin with @.
        var parsed = root.Parse(args, new ParserConfiguration { ResponseFileTokenReplacer = null });
        if (parsed.Action is ParseErrorAction)
        {
            return Failure.Report(Failure.CommandLine(Usage.Explain(parsed)), terminal, args.Contains("--json"));
        }

        var configuration = new InvocationConfiguration
        {
            EnableDefaultExceptionHandler = false,
            Output = terminal.Out,
            Error = terminal.Error,
            ProcessTerminationTimeout = TimeSpan.FromSeconds(2),
        };
        try
        {
            return parsed.InvokeAsync(configuration).GetAwaiter().GetResult();
        }
        catch (IOException)
        {
            // Standard output was closed on us (a pipe into head): nobody is left to read what we would say.
            return ExitCodes.ReadOrWrite;
        }
    }

    /// <summary>All commands, for parsing and for the test that holds the docs against the help.</summary>
    public static RootCommand Root(Terminal terminal)
    {
        var root = new RootCommand(
            """
            Plans distance-sampling surveys: randomised lines and points with known coverage.

            Example:
              survey-planner plan sample-regions/sea-ducks-sound/plan.toml --out out
            """);
        root.Options.OfType<HelpOption>().Single().Description = "Show help and usage";
        root.Options.OfType<VersionOption>().Single().Description = "Show the version";
        root.Subcommands.Add(NewCommand.Build(terminal));
        root.Subcommands.Add(CheckCommand.Build(terminal));
        root.Subcommands.Add(PlanCommand.Build(terminal));
        root.Subcommands.Add(LayoutCommand.Build(terminal));
        root.Subcommands.Add(CoverageCommand.Build(terminal));
        root.Subcommands.Add(EffortCommand.Build(terminal));
        root.Subcommands.Add(TrendCommand.Build(terminal));
        root.Subcommands.Add(ReplayCommand.Build(terminal));
        return root;
    }
}
