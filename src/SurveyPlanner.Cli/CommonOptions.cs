using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;

namespace SurveyPlanner.Cli;

/// <summary>Options that several commands share. Numbers are read here, in the invariant culture, not by the library.</summary>
internal sealed class CommonOptions
{
    public Argument<string> Plan { get; } = new("PLAN") { Description = "The plan file" };

    public Option<string[]> Set { get; } = new("--set")
    {
        Description = "Override a key: --set layout.spacing=\"4 km\"",
        HelpName = "KEY=VALUE",
        Arity = ArgumentArity.OneOrMore,
        AllowMultipleArgumentsPerToken = false,
    };

    public Option<string?> Seed { get; } = new("--seed") { Description = "Seed of this draw", HelpName = "N" };

    public Option<string?> Threads { get; } = new("--threads") { Description = "Threads to use; changes no result", HelpName = "N" };

    public Option<string?> Out { get; } = new("--out", "-o") { Description = "Folder to write, whole or not at all", HelpName = "DIR" };

    public Option<bool> Force { get; } = new("--force") { Description = "Replace a folder of an earlier run" };

    public Option<bool> Json { get; } = new("--json") { Description = "One JSON document on standard output" };

    public Option<bool> Quiet { get; } = new("--quiet", "-q") { Description = "Only results and errors" };

    public Option<bool> Debug { get; } = new("--debug") { Description = "Show where in the program an error arose" };

    public CommonOptions()
    {
        Plan.Validators.Add(RefuseOptionAsFile);
        Seed.Validators.Add(result => WholeNumber(result, 0, long.MaxValue));
        Threads.Validators.Add(result => WholeNumber(result, 1, 1024));
    }

    /// <summary>Threads asked for, else as many as the machine has.</summary>
    public int ThreadsOf(ParseResult parsed)
        => parsed.GetValue(Threads) is { } text ? int.Parse(text, CultureInfo.InvariantCulture) : Environment.ProcessorCount;

    /// <summary>What <c>--set</c> and <c>--seed</c> say, the seed last.</summary>
    public IReadOnlyList<string> SetsOf(ParseResult parsed)
    {
        var sets = (parsed.GetValue(Set) ?? []).ToList();
        if (parsed.GetValue(Seed) is { } seed)
        {
            sets.Add($"survey.seed={seed}");
        }

        return sets;
    }

    /// <summary>A mistyped option must not pass for a file name.</summary>
    public static void RefuseOptionAsFile(ArgumentResult result)
    {
        var token = result.Tokens.Count > 0 ? result.Tokens[0].Value : "";
        if (token.StartsWith("--", StringComparison.Ordinal))
        {
            result.AddError($"'{token.Split('=')[0]}' is not an option of this command");
        }
    }

    /// <summary>A number with a point for its decimals, within limits.</summary>
    public static void Decimal(OptionResult result, double low, double high)
    {
        var token = result.Tokens.Count > 0 ? result.Tokens[0].Value : "";
        const NumberStyles style = NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint;
        if (!double.TryParse(token, style, CultureInfo.InvariantCulture, out var value) || !(value >= low && value <= high))
        {
            result.AddError(string.Create(
                CultureInfo.InvariantCulture, $"{result.Option.Name} takes a number from {low} to {high}, with a point for the decimals, not '{token}'"));
        }
    }

    public static void WholeNumber(OptionResult result, long low, long high)
    {
        var token = result.Tokens.Count > 0 ? result.Tokens[0].Value : "";
        var isNumber = long.TryParse(token, NumberStyles.None, CultureInfo.InvariantCulture, out var value) && value >= low && value <= high;
        if (!isNumber)
        {
            var name = result.Option.Name;
            result.AddError(string.Create(CultureInfo.InvariantCulture, $"{name} takes a whole number from {low} to {high}, not '{token}'"));
        }
    }
}
