using System.Globalization;
using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Trends;

/// <summary>The sentences of the page on trends.</summary>
internal static class TrendWords
{
    public static string Answer(TrendSheet sheet)
        => $"{Figures.Counted(sheet.Surveys, "survey", "surveys")} over {Years(sheet.Surveys, sheet.Design)} find, with a power of {Figures.ChosenPercent(sheet.WantedPower)}, "
            + $"a decline of {Size(sheet.SmallestDecline)} and an increase of {Size(sheet.SmallestIncrease)}; smaller changes are likely to go unseen.";

    public static string Programme(TrendSheet sheet)
    {
        var design = sheet.Design;
        var course = design.Shape == TrendShape.Linear
            ? "abundance changes by the same share of the first year's abundance every year, and is regressed on time"
            : "abundance changes by the same share of what is left every year, and its logarithm is regressed on time";
        var precision = design.CvModel switch
        {
            TrendCvModel.Constant => "the same at any abundance",
            TrendCvModel.InverseRootOfAbundance => "growing as the animals become fewer, in proportion to 1/√abundance",
            TrendCvModel.RootOfAbundance => "falling as the animals become fewer, in proportion to √abundance",
            _ => throw new ArgumentOutOfRangeException(nameof(sheet)),
        };
        return $"The first survey has a coefficient of variation of {Figures.Percent(design.FirstCv)} ({sheet.CvSource}), {precision}. "
            + $"A survey {Every(design.YearsBetweenSurveys)}; {course}; "
            + $"{(design.OneSided ? "one" : "two")}-sided t test at a significance level of {Figures.ChosenPercent(design.SignificanceLevel)}.";
    }

    public static string Method(TrendDesign design) => design.IsExact
        ? "Power by the noncentral t, exact for this model (Gerrodette 1987, Ecology 68:1364–1372; Link and Hatfield 1990, Ecology 71:1217–1220)."
        : $"Power by {Figures.Count(TrendPower.Replicates)} simulated series a figure, standard error at most 0.4\u00a0%; differences of that size are noise.";

    /// <summary>What the chart against years shows: the first of the changes, and when it is found.</summary>
    public static string YearsFinding(TrendSheet sheet) => string.Join(" ", sheet.ByYears.Select(row =>
    {
        var known = row.OfType<TrendFigure>().ToArray();
        var change = known.Length > 0 ? Change(known[0].ChangePerYear) + " a year" : "";
        return known.FirstOrDefault(figure => figure.Power >= sheet.WantedPower) is { } found
            ? $"{change} is found with a power of {Figures.ChosenPercent(sheet.WantedPower)} by {Figures.Counted(found.Surveys, "survey", "surveys")} over {Counted(found.Years, "year", "years")}."
            : known.Length > 0 ? $"{change} is not found with that power within {Counted(known[^1].Years, "year", "years")}{(known.Length < row.Length ? ", after which nothing is left" : "")}." : "";
    }).Where(sentence => sentence.Length > 0));

    /// <summary>What the chart against the change shows.</summary>
    public static string ChangeFinding(TrendSheet sheet)
        => $"With {Figures.Counted(sheet.Surveys, "survey", "surveys")} the smallest decline found with a power of {Figures.ChosenPercent(sheet.WantedPower)} is {Size(sheet.SmallestDecline)}, "
            + $"the smallest increase {Size(sheet.SmallestIncrease)}.";

    /// <summary>A change a year in per cent with its sign.</summary>
    public static string Change(double perYear) => (100 * perYear).ToString("+0.##;−0.##;0", CultureInfo.InvariantCulture) + "\u00a0%";

    private static string Size(TrendFigure? figure)
        => figure is null ? "no size that can be found" : Figures.Percent(Math.Abs(figure.ChangePerYear)) + " a year";

    private static string Every(double years) => years == 1 ? "every year" : $"every {Counted(years, "year", "years")}";

    private static string Years(int surveys, TrendDesign design) => Counted((surveys - 1) * design.YearsBetweenSurveys, "year", "years");

    private static string Counted(double number, string one, string many)
        => number.ToString("0.##", CultureInfo.InvariantCulture) + "\u00a0" + (number == 1 ? one : many);
}
