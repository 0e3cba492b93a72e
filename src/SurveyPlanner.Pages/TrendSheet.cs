using System.Collections.Immutable;
using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Charts;

namespace SurveyPlanner.Pages;

/// <summary>What a page on trends shows: the core's figures, already computed.</summary>
/// <param name="Title">Name of the survey; any characters.</param>
/// <param name="Design">The programme.</param>
/// <param name="CvSource">Where its coefficient of variation comes from: <c>the plan's target</c>.</param>
/// <param name="Surveys">Number of surveys planned.</param>
/// <param name="WantedPower">Power asked for, 0 to 1.</param>
/// <param name="ByYears">Powers of a few changes (outer) over many numbers of surveys (inner), as <see cref="TrendPower.Table"/> gives them.</param>
/// <param name="ByChange">Powers of many changes (outer, ascending) for a few numbers of surveys (inner).</param>
/// <param name="SmallestDecline">Smallest decline that the surveys planned find with the power asked for; null where none is.</param>
/// <param name="SmallestIncrease">Smallest increase.</param>
public sealed record TrendSheet(
    string Title,
    TrendDesign Design,
    string CvSource,
    int Surveys,
    double WantedPower,
    ImmutableArray<ImmutableArray<TrendFigure?>> ByYears,
    ImmutableArray<ImmutableArray<TrendFigure?>> ByChange,
    TrendFigure? SmallestDecline,
    TrendFigure? SmallestIncrease)
{
    private const int MostCounts = 20;
    private const int LeastReach = 10;

    private static readonly double[] UsualChanges = [-0.03, -0.05, -0.10, -0.20];

    /// <summary>
    /// The figures of a programme: the given changes (declines of 3, 5, 10 and 20 % unless given) over half as many surveys again as planned, and changes
    /// up to twice the smallest found. Simulated models take some 200 powers, each of 20,000 series.
    /// </summary>
    /// <exception cref="InputException">The programme makes no sense, or there are fewer than 3 surveys.</exception>
    public static TrendSheet Of(string title, TrendDesign design, string cvSource, int surveys, double wantedPower, IReadOnlyCollection<double>? changes = null)
    {
        var (decline, increase) = (TrendPower.SmallestChange(design, surveys, wantedPower, decline: true), TrendPower.SmallestChange(design, surveys, wantedPower, decline: false));
        var reach = Math.Min(2 * Math.Max(-(decline?.ChangePerYear ?? 0), increase?.ChangePerYear ?? 0), 1);
        var most = Math.Max(LeastReach, surveys * 3 / 2);
        var step = Math.Max(1, (most - TrendPower.FewestSurveys) / MostCounts);
        int[] counts = [.. Enumerable.Range(0, ((most - TrendPower.FewestSurveys) / step) + 1).Select(i => TrendPower.FewestSurveys + (i * step))];
        int[] few = [.. new[] { surveys / 2, surveys, surveys * 3 / 2 }.Select(count => Math.Max(count, TrendPower.FewestSurveys)).Distinct()];
        var axis = Axis.Covering("", 0, reach);
        var each = 2 * (int)Math.Round(axis.Max / axis.Step);
        return new TrendSheet(
            title,
            design,
            cvSource,
            surveys,
            wantedPower,
            TrendPower.Table(design, changes ?? UsualChanges, counts),
            TrendPower.Table(design, Enumerable.Range(-each, (2 * each) + 1).Select(i => i * axis.Step / 2), few),
            decline,
            increase);
    }
}
