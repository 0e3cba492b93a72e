using System.CommandLine;
using SurveyPlanner.Files.Plans;

namespace SurveyPlanner.Cli;

/// <summary>Says in one sentence what is wrong with a command line.</summary>
internal static class Usage
{
    public static string Explain(ParseResult parsed)
    {
        var command = parsed.CommandResult.Command;
        var name = command is RootCommand ? "survey-planner" : $"survey-planner {command.Name}";
        var unknown = parsed.UnmatchedTokens.OrderBy(token => token.StartsWith('-') ? 0 : 1).FirstOrDefault();
        if (unknown is not null)
        {
            return Unknown(unknown, command, name);
        }

        var message = parsed.Errors.Count > 0 ? parsed.Errors[0].Message.TrimEnd('.') : "the command line is incomplete";
        return $"{message}; see {name} --help";
    }

    /// <summary>A file name as a shell takes it: in quotes where it has a space or a mark that means something to one.</summary>
    public static string Typed(string path) => path.All(c => char.IsLetterOrDigit(c) || "._-/\\:+@".Contains(c, StringComparison.Ordinal)) ? path : $"\"{path}\"";

    private static string Unknown(string token, Command command, string name)
    {
        var isOption = token.StartsWith('-');
        var written = token.Split('=')[0];
        var known = isOption ? Options(command) : command.Subcommands.Select(sub => sub.Name);
        var what = isOption ? "option" : command is RootCommand ? "command" : "argument";
        var hint = Spelling.Nearest(written, known) is { } nearest ? $"; did you mean '{nearest}'?" : "";
        return $"{name} has no {what} '{written}'{hint}{(hint.Length == 0 ? $"; see {name} --help" : "")}";
    }

    private static IEnumerable<string> Options(Command command)
        => command.Options.Concat(command.Parents.OfType<Command>().SelectMany(parent => parent.Options)).Select(option => option.Name);
}
