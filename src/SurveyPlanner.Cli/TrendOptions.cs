using System.CommandLine;
using System.Globalization;
using SurveyPlanner.Effort;

namespace SurveyPlanner.Cli;

/// <summary>Options of <c>trend</c>. Fractions are fractions: 0.05, not 5.</summary>
internal sealed class TrendOptions
{
    private static readonly Dictionary<string, TrendCvModel> Models = new()
    {
        ["constant"] = TrendCvModel.Constant,
        ["inverse-root"] = TrendCvModel.InverseRootOfAbundance,
        ["root"] = TrendCvModel.RootOfAbundance,
    };

    private static readonly Dictionary<string, TrendShape> Shapes = new()
    {
        ["exponential"] = TrendShape.Exponential,
        ["linear"] = TrendShape.Linear,
    };

    public Option<string?> Change { get; } = Fraction("--change", "Yearly change to look for: -0.05 is a decline of 5 %", -0.99, 10);

    public Option<string?> Surveys { get; } = Fraction("--surveys", "Number of surveys (10)", TrendPower.FewestSurveys, TrendPower.MostSurveys, whole: true);

    public Option<string?> Cv { get; } = Fraction("--cv", "CV of one survey; the plan's unless given", 1e-6, 2);

    public Option<string?> CvModel { get; } = Choice("--cv-model", "How the CV follows abundance: constant, inverse-root, root", Models.Keys);

    public Option<string?> Shape { get; } = Choice("--shape", "How abundance changes: exponential, linear", Shapes.Keys);

    public Option<string?> Alpha { get; } = Fraction("--alpha", "Significance level of the test (0.05)", 1e-6, 0.49);

    public Option<bool> OneSided { get; } = new("--one-sided") { Description = "Test for a change in the expected direction only" };

    public Option<string?> Interval { get; } = Fraction("--interval", "Years from one survey to the next (1)", 0.01, 100);

    public Option<string?> Power { get; } = Fraction("--power", "Power asked for (0.8)", 0.05, 0.999);

    public TrendDesign Design(ParseResult parsed, double firstCv, ulong seed) => new(
        firstCv,
        parsed.GetValue(Shape) is { } shape ? Shapes[shape] : TrendShape.Exponential,
        parsed.GetValue(CvModel) is { } model ? Models[model] : TrendCvModel.Constant,
        Number(parsed, Alpha) ?? 0.05,
        parsed.GetValue(OneSided),
        Number(parsed, Interval) ?? 1,
        seed);

    public static double? Number(ParseResult parsed, Option<string?> option)
        => parsed.GetValue(option) is { } text ? double.Parse(text, CultureInfo.InvariantCulture) : null;

    private static Option<string?> Fraction(string name, string description, double low, double high, bool whole = false)
    {
        var option = new Option<string?>(name) { Description = description, HelpName = whole ? "N" : "X" };
        if (whole)
        {
            option.Validators.Add(result => CommonOptions.WholeNumber(result, (long)low, (long)high));
        }
        else
        {
            option.Validators.Add(result => CommonOptions.Decimal(result, low, high));
        }

        return option;
    }

    private static Option<string?> Choice(string name, string description, IEnumerable<string> words)
    {
        var option = new Option<string?>(name) { Description = description, HelpName = "WORD" };
        option.Validators.Add(result =>
        {
            var token = result.Tokens.Count > 0 ? result.Tokens[0].Value : "";
            if (!words.Contains(token))
            {
                result.AddError($"{name} takes one of {string.Join(", ", words)}, not '{token}'");
            }
        });
        return option;
    }
}
