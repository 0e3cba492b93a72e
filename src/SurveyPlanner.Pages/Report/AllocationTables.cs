using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>The ways to share effort among strata, side by side.</summary>
internal static class AllocationTables
{
    /// <summary>What each choice costs and buys.</summary>
    public static Table OfOptions(EffortPlan effort, Allocation chosen)
    {
        var hasCosts = effort.Allocations.Any(option => option.Cost is not null);
        return new Table(
            "What each way of sharing costs and buys",
            [
                new("Allocation", false), new("Required, " + EffortWords.Unit(effort)), new("In whole transects, " + EffortWords.Unit(effort)), new("Expected detections"), new("CV, %"),
                .. hasCosts ? [new Column("Cost")] : Array.Empty<Column>(), new("Remark", false),
            ],
            [
                .. effort.Allocations.Select(option => (string[])
                [
                    ChoiceWord.Of(option.Allocation),
                    EffortWords.Number(option.RequiredEffort, effort),
                    EffortWords.Number(option.Effort, effort),
                    Figures.Three(option.Precision.ExpectedDetections),
                    Figures.Three(100 * option.Precision.Cv),
                    .. hasCosts ? [Money(option.Cost)] : Array.Empty<string>(),
                    option.Allocation == chosen ? "planned" : "",
                ]),
            ]);
    }

    /// <summary>Who gets what under each.</summary>
    public static Table OfStrata(EffortPlan effort) => new(
        $"Effort of each stratum in whole transects, {EffortWords.Unit(effort)}" + (effort.IsPoints ? "" : " (lines)"),
        [new("Stratum", false), .. effort.Allocations.Select(option => new Column(ChoiceWord.Of(option.Allocation)))],
        [
            .. effort.Allocations[0].Strata.Select((stratum, i) => (string[])
            [
                stratum.Name,
                .. effort.Allocations.Select(option => option.Strata[i]).Select(share =>
                    EffortWords.Number(share.Effort, effort) + (share.Transects is { } lines && !effort.IsPoints ? $" ({Figures.Count(lines)})" : "")),
            ]),
        ]);

    // Money is exact to the unit, unlike measured figures.
    private static string Money(double? cost) => cost is { } amount && Math.Abs(amount) < long.MaxValue ? Figures.Count((long)Math.Round(amount)) : Figures.None;
}
