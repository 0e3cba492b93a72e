using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>Where something stands: in the plan file, or in a <c>--set</c> on the command line (which has no lines).</summary>
internal sealed record Place(string File, int? Line = null, int? Column = null)
{
    private const string CommandLine = "--set";

    public static readonly Place Set = new(CommandLine);

    public bool IsSet => File == CommandLine;

    public Problem Problem(string message, string? key = null) => new(message, File, Line, Column, key is null ? null : Quoted.Plain(key));
}
