using System.Text.Json;
using System.Text.RegularExpressions;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Cli;

/// <summary>Why a command did not do what it was asked: the exit code and the sentences to show.</summary>
internal sealed partial record Failure(int ExitCode, IReadOnlyList<Problem> Problems)
{
    // Of problems alike so many are shown; --json has all.
    private const int MostAlike = 5;

    public static Failure CommandLine(string message) => new(ExitCodes.CommandLine, [new Problem(message)]);

    /// <summary>What an exception means to the user.</summary>
    public static Failure Of(Exception exception) => exception switch
    {
        InputException input => new Failure(ExitCodes.Input, input.Problems),
        OperationCanceledException => new Failure(ExitCodes.Interrupted, [new Problem("stopped; nothing was written")]),
        AggregateException { InnerException: OperationCanceledException stopped } => Of(stopped),
        IOException or UnauthorizedAccessException => new Failure(ExitCodes.ReadOrWrite, [new Problem(exception.Message)]),
        OutOfMemoryException => new Failure(ExitCodes.Input, [new Problem("there is not enough memory for this; ask for fewer cells or a simpler boundary")]),
        _ => new Failure(ExitCodes.OurFault, [new Problem(
            $"this is a fault of the program ({exception.GetType().Name}: {exception.Message}); please report it with the plan file; --debug shows where")]),
    };

    /// <summary>Shows it and returns the exit code.</summary>
    public static int Report(Failure failure, Terminal terminal, bool json)
    {
        if (json)
        {
            terminal.Out.WriteLine(JsonDocumentText.Of(writer => failure.Write(writer)));
        }

        foreach (var alike in failure.Problems.GroupBy(problem => (problem.File, problem.Key, Shape: Shape().Replace(problem.Message, ""))))
        {
            foreach (var problem in alike.Take(MostAlike))
            {
                terminal.Fail(Plain(problem.ToString()));
            }

            if (alike.Count() - MostAlike is > 0 and var more)
            {
                terminal.Fail(Plain(new Problem($"and {more} more like these", alike.Key.File, Key: alike.Key.Key).ToString()));
            }
        }

        return failure.ExitCode;
    }

    /// <summary>What tells apart problems that are wrong for one reason: what is quoted, and numbers.</summary>
    [GeneratedRegex("""'[^']*'|"[^"]*"|[0-9.,]+""")]
    private static partial Regex Shape();

    private void Write(Utf8JsonWriter json)
    {
        json.WriteStartObject();
        json.WriteNumber("format_version", SummaryWriter.FormatVersion);
        json.WriteStartObject("error");
        json.WriteNumber("exit_code", ExitCode);
        json.WriteStartArray("problems");
        foreach (var problem in Problems)
        {
            json.WriteStartObject();
            json.WriteString("message", problem.Message);
            WriteIfKnown(json, "file", problem.File);
            WriteIfKnown(json, "key", problem.Key);
            if (problem.Line is { } line)
            {
                json.WriteNumber("line", line);
            }

            if (problem.Column is { } column)
            {
                json.WriteNumber("column", column);
            }

            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
        json.WriteEndObject();
    }

    private static void WriteIfKnown(Utf8JsonWriter json, string key, string? value)
    {
        if (value is not null)
        {
            json.WriteString(key, value);
        }
    }

    /// <summary>Names out of files may hold anything: no control character reaches the terminal.</summary>
    private static string Plain(string text) => string.Concat(text.Select(c => char.IsControl(c) ? ' ' : c));
}
