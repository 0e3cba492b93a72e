using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>The tables of what effort buys.</summary>
internal static class EffortTables
{
    /// <summary>The effort that the target asks for, with all that is known of how sure it is.</summary>
    public static Table OfRequired(SurveyPlan plan, EffortPlan effort, RequiredEffort required)
    {
        var rows = new List<string[]>();
        if (required is { AssuredEffort: { } assured, Assurance: { } assurance })
        {
            rows.Add(Expected(effort, $"Enough with an assurance of {Figures.ChosenPercent(assurance)}", effort.CvAt(assured)));
        }

        rows.Add(Expected(effort, "Plain estimate", required.Precision));
        AddInterval("95\u00a0% interval of the effort that the truth asks for", required.Interval);
        AddInterval("The same by the delta method, for comparison", required.DeltaInterval);
        if (InWholeTransects(plan, effort) is { } whole)
        {
            rows.Add(Expected(effort, $"Planned, in whole transects, at least {plan.Design.Effort.MinLines} a stratum", whole));
        }

        if (plan.Delivered is { } delivered)
        {
            rows.Add(Expected(effort, "Layout as drawn", delivered));
        }

        return new Table(
            $"Effort for a coefficient of variation of {Figures.ChosenPercent(required.TargetCv)}",
            [new("Figure", false), new(EffortWords.Unit(effort, capital: true)), new("Expected CV, %"), new("Expected detections")],
            rows);

        void AddInterval(string name, EffortInterval? interval)
        {
            if (interval is not null)
            {
                rows.Add([name, EffortWords.Range(interval, effort), "", ""]);
            }
        }
    }

    private static EffortPrecision? InWholeTransects(SurveyPlan plan, EffortPlan effort) => effort.Strata switch
    {
        [{ Transects: not null, Effort: { } whole }] => effort.CvAt(whole),
        _ => effort.Allocations.FirstOrDefault(option => option.Allocation == plan.Design.Effort.Allocation && option.Strata.All(share => share.Transects is not null))?.Precision,
    };

    private static string[] Expected(EffortPlan effort, string name, EffortPrecision? precision) =>
        [name, EffortWords.Number(precision?.Effort, effort), Figures.Three(100 * precision?.Cv), Figures.Three(precision?.ExpectedDetections)];

    /// <summary>The curve at the ticks of its axis, at the effort required and at the effort drawn.</summary>
    public static Table OfCurve(SurveyPlan plan, EffortPlan effort, Axis axis) => new(
        "Precision by effort",
        [new(EffortWords.Unit(effort, capital: true), false), new("Expected CV, %"), new("95\u00a0% band of the pilot, %"), new("Expected detections"), new("Remark", false)],
        [
            .. axis.Ticks.Select(tick => (Precision: effort.CvAt(tick), Remark: ""))
                .Append((Precision: effort.CvAt(effort.Required?.Effort ?? 0), Remark: "plain estimate for the target"))
                .Append((Precision: effort.CvAt(effort.Required?.AssuredEffort ?? 0), Remark: "with the assurance asked for"))
                .Append((Precision: plan.Delivered, Remark: "layout as drawn"))
                .Where(row => row.Precision is not null)
                .OrderBy(row => row.Precision!.Effort)
                .Select(row => (string[])
                [
                    EffortWords.Number(row.Precision!.Effort, effort), Figures.Three(100 * row.Precision.Cv), Band(effort, row.Precision),
                    Figures.Three(row.Precision.ExpectedDetections), row.Remark,
                ]),
        ]);

    private static string Band(EffortPlan effort, EffortPrecision precision)
        => EffortBand.Of(effort, precision) is var (lower, upper) ? $"{Figures.Three(100 * lower)} to {Figures.Three(100 * upper)}" : Figures.None;

    public static Table OfTargets(EffortPlan effort) => new(
        "Effort by target",
        [new("CV asked for, %", false), new(EffortWords.Unit(effort, capital: true)), new("95\u00a0% interval of the pilot")],
        [
            .. effort.Curves.EffortAgainstTarget.Select(point => (string[])
            [
                Figures.Three(100 * point.TargetCv),
                EffortWords.Number(point.Effort, effort),
                point.Interval is { } interval ? EffortWords.Range(interval, effort) : Figures.None,
            ]),
        ]);

    public static Table OfStrata(EffortPlan effort) => new(
        "Effort by stratum",
        [
            new("Stratum", false), new(RateHeading(effort.IsPoints)), new("Share of effort, %"), new(EffortWords.Unit(effort, capital: true)),
            .. Lines(effort, [new Column("Lines")]), new("Expected detections"), new("CV of its own density, %"), new($"For the target in it alone, {EffortWords.Unit(effort)}"),
        ],
        [
            .. effort.Strata.Select(stratum => (string[])
            [
                stratum.Name,
                Figures.Three(stratum.EncounterRate),
                Figures.Three(100 * stratum.Share),
                EffortWords.Number(stratum.Effort, effort),
                .. Lines(effort, [stratum.Transects is { } lines ? Figures.Count(lines) : Figures.None]),
                Figures.Three(stratum.ExpectedDetections),
                Figures.Three(100 * stratum.Cv),
                EffortWords.Number(stratum.EffortForOwnTarget, effort),
            ]),
        ]);

    /// <summary>The heading of an encounter rate.</summary>
    public static string RateHeading(bool isPoints) => isPoints ? "Detections per visit" : "Detections per km";

    // Points are their own effort; lines are counted beside it.
    private static T[] Lines<T>(EffortPlan effort, T[] cells) => effort.IsPoints ? [] : cells;
}
