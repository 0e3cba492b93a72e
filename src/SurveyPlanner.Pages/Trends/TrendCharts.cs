using System.Globalization;
using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Report;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Trends;

/// <summary>Power against years and against the yearly change, as charts and tables.</summary>
internal static class TrendCharts
{
    private const int MostNamed = 4;

    private static readonly Axis PowerAxis = new("Power, %", 0, 100, 20);

    /// <summary>A line a change.</summary>
    public static Chart OfYears(TrendSheet sheet) => new(
        "Power against years",
        TrendWords.YearsFinding(sheet) + " The table has the figures.",
        Axis.Covering("Years from the first survey to the last", 0, sheet.ByYears.SelectMany(row => row).Max(figure => figure?.Years ?? 0)),
        PowerAxis)
    {
        Lines =
        [
            .. sheet.ByYears.Select(row => row.OfType<TrendFigure>().ToArray()).Where(row => row.Length > 1).Select((row, i) => new Line(
                i < MostNamed ? TrendWords.Change(row[0].ChangePerYear) + " a year" : "",
                [.. row.Select(figure => (figure.Years, 100 * figure.Power))])
            {
                Look = Look(i),
            }),
        ],
        Levels = [Wanted(sheet)],
    };

    /// <summary>A line a number of surveys; the changes found with the power asked for as dots.</summary>
    public static Chart OfChange(TrendSheet sheet) => new(
        "Power against the yearly change",
        TrendWords.ChangeFinding(sheet) + " The table has the figures.",
        Axis.Covering("Change a year, %", 100 * Changes(sheet).Min(), 100 * Changes(sheet).Max()),
        PowerAxis)
    {
        Lines =
        [
            .. Enumerable.Range(0, sheet.ByChange[0].Length)
                .Select(column => sheet.ByChange.Select(row => row[column]).OfType<TrendFigure>().ToArray())
                .Where(column => column.Length > 0)
                .OrderByDescending(column => column[0].Surveys == sheet.Surveys)
                .Select((column, i) => new Line(
                    i < MostNamed ? Figures.Counted(column[0].Surveys, "survey", "surveys") : "",
                    [.. column.Select(figure => (100 * figure.ChangePerYear, 100 * figure.Power))])
                {
                    Look = Look(i),
                }),
        ],
        Levels = [Wanted(sheet)],
        Dots =
        [
            .. new[] { sheet.SmallestDecline, sheet.SmallestIncrease }.OfType<TrendFigure>()
                .Select(figure => new Dot(100 * figure.ChangePerYear, 100 * figure.Power, TrendWords.Change(figure.ChangePerYear))),
        ],
    };

    /// <summary>Numbers of surveys down, changes across.</summary>
    public static Table TableOfYears(TrendSheet sheet)
    {
        var rows = sheet.ByYears.Where(row => row.Any(figure => figure is not null)).ToArray();
        return new Table(
            "Power by number of surveys, %",
            [new("Surveys", false), new("Years"), .. rows.Select(row => new Column(TrendWords.Change(row.First(figure => figure is not null)!.ChangePerYear) + " a year"))],
            [
                .. Enumerable.Range(0, rows.Length > 0 ? rows[0].Length : 0)
                    .Select(i => (At: rows.Select(row => row[i]).FirstOrDefault(figure => figure is not null), Figures: rows.Select(row => row[i])))
                    .Where(row => row.At is not null)
                    .Select(row => (string[])
                    [
                        Figures.Count(row.At!.Surveys), row.At.Years.ToString("0.##", CultureInfo.InvariantCulture), .. row.Figures.Select(Power),
                    ]),
            ]);
    }

    /// <summary>Changes down, numbers of surveys across.</summary>
    public static Table TableOfChange(TrendSheet sheet) => new(
        "Power by yearly change, %",
        [
            new("Change a year", false),
            .. Enumerable.Range(0, sheet.ByChange[0].Length).Select(column => new Column(
                Figures.Counted(sheet.ByChange.Select(row => row[column]).First(figure => figure is not null)!.Surveys, "survey", "surveys"))),
        ],
        [
            .. sheet.ByChange.Where(row => row.Any(figure => figure is not null)).Select(row => (string[])
            [
                TrendWords.Change(row.First(figure => figure is not null)!.ChangePerYear), .. row.Select(Power),
            ]),
        ]);

    // A decline that leaves nothing before the last survey has no power, which is not a power of 0.
    private static string Power(TrendFigure? figure) => figure is null ? "nothing left" : Figures.Three(100 * figure.Power);

    private static IEnumerable<double> Changes(TrendSheet sheet) => sheet.ByChange.SelectMany(row => row).OfType<TrendFigure>().Select(figure => figure.ChangePerYear);

    private static Level Wanted(TrendSheet sheet) => new(100 * sheet.WantedPower, "power asked for, " + Figures.ChosenPercent(sheet.WantedPower));

    private static LineLook Look(int place) => place < MostNamed ? (LineLook)place : LineLook.Quiet;
}
