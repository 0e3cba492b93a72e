using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>Precision against effort, and effort against the target; both with the pilot's band and the layout as drawn.</summary>
internal static class EffortChart
{
    private const int Samples = 160;

    // The curve climbs without end towards no effort at all: shown up to so many times the precision that matters.
    private const double HighestTimes = 2.5;

    // The same of effort towards a CV of 0.
    private const double MostTimes = 3;

    /// <summary>Null where neither a target nor a drawn layout fixes how far the axis must reach.</summary>
    public static Chart? OfEffort(SurveyPlan plan, EffortPlan effort)
    {
        var (delivered, required) = (plan.Delivered, effort.Required);
        var reach = 1.6 * Greatest(plan, effort);
        if (!(reach > 0) || !double.IsFinite(reach))
        {
            return null;
        }

        var x = Axis.Covering(EffortWords.Unit(effort, capital: true), 0, reach);
        var highest = 100 * HighestTimes * Math.Max(required?.TargetCv ?? 0, delivered?.Cv ?? 0);
        var efforts = Steps(x).Where(at => Best(effort, at) <= 2 * highest).ToArray();
        return new Chart(
            "Coefficient of variation against effort",
            EffortWords.Finding(plan, effort) + " The table has the figures.",
            x,
            Axis.Covering("Coefficient of variation of density, %", 0, highest))
        {
            Lines =
            [
                new Line("expected", [.. efforts.Select(at => (at, CvPercent(effort, at)))])
                {
                    Band = [.. efforts.Select(at => (At: at, Band: EffortBand.At(effort, at))).Where(one => one.Band is not null)
                        .Select(one => (one.At, 100 * one.Band!.Value.Lower, 100 * one.Band.Value.Upper))],
                },
            ],
            Levels = required is null ? [] : [new Level(100 * required.TargetCv, Target(required))],
            Dots = delivered is null ? [] : [new Dot(delivered.Effort, 100 * delivered.Cv, "layout as drawn")],
        };
    }

    /// <summary>Null where the curve of the core has no point, or nothing fixes how far the axis must reach.</summary>
    public static Chart? OfTarget(SurveyPlan plan, EffortPlan effort)
    {
        var most = MostTimes * Greatest(plan, effort);
        if (effort.Curves.EffortAgainstTarget.IsEmpty || !(most > 0) || !double.IsFinite(most))
        {
            return null;
        }

        var (delivered, required) = (plan.Delivered, effort.Required);
        var reach = 100 * HighestTimes * Math.Max(required?.TargetCv ?? 0, delivered?.Cv ?? 0);
        var x = Axis.Covering("Coefficient of variation asked for, %", 0, Math.Min(reach, 100));
        var points = Steps(x)
            .Select(percent => (Percent: percent, Effort: effort.Model.EffortFor(percent / 100)))
            .Where(point => point.Effort * (effort.Uncertainty?.Factors.Lower ?? 1) <= 2 * most)
            .Select(point => (point.Percent, Effort: point.Effort!.Value))
            .ToArray();
        return new Chart(
            "Effort against the coefficient of variation asked for",
            EffortWords.TargetFinding(effort) + " The table has the figures.",
            x,
            Axis.Covering(EffortWords.Unit(effort, capital: true), 0, most))
        {
            Lines =
            [
                new Line("expected", [.. points])
                {
                    Band = effort.Uncertainty is { Factors: var factors }
                        ? [.. points.Select(point => (point.Percent, point.Effort * factors.Lower, point.Effort * factors.Upper))]
                        : [],
                },
            ],
            Levels = required is null ? [] : [new Level(100 * required.TargetCv, Target(required), IsUpright: true)],
            Dots = delivered is null ? [] : [new Dot(100 * delivered.Cv, delivered.Effort, "layout as drawn")],
        };
    }

    // Closer together towards 0, where the curves are steep.
    private static IEnumerable<double> Steps(Axis axis) => Enumerable.Range(1, Samples).Select(i => axis.Max * i * i / (Samples * Samples));

    private static double Greatest(SurveyPlan plan, EffortPlan effort)
        => Math.Max(plan.Delivered?.Effort ?? 0, effort.Required?.Planned ?? 0);

    // Where the best of the band is far out of sight, all of it is.
    private static double Best(EffortPlan effort, double at) => EffortBand.At(effort, at) is var (lower, _) ? 100 * lower : CvPercent(effort, at);

    private static double CvPercent(EffortPlan effort, double at) => 100 * (effort.CvAt(at)?.Cv ?? double.PositiveInfinity);

    private static string Target(RequiredEffort required) => "target " + Figures.ChosenPercent(required.TargetCv);
}
