using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>The coefficient of variation against effort, with the target and the layout as drawn.</summary>
internal static class EffortChart
{
    private const int Samples = 120;

    // The curve climbs without end towards no effort at all: shown up to so many times the precision that matters.
    private const double HighestTimes = 2.5;

    /// <summary>Null where neither a target nor a drawn layout fixes how far the axis must reach.</summary>
    public static Chart? For(SurveyPlan plan, EffortPlan effort)
    {
        var (delivered, required) = (plan.Delivered, effort.Required);
        var reach = 1.6 * Math.Max(delivered?.Effort ?? 0, required?.Effort ?? 0);
        if (!(reach > 0) || !double.IsFinite(reach))
        {
            return null;
        }

        var x = Axis.Covering(EffortWords.Unit(effort, capital: true), 0, reach);
        var highest = 100 * HighestTimes * Math.Max(required?.TargetCv ?? 0, delivered?.Cv ?? 0);
        var points = Enumerable.Range(1, Samples)
            .Select(i => x.Max * i / Samples)
            .Select(at => (X: at, Y: 100 * (effort.CvAt(at)?.Cv ?? double.PositiveInfinity)))
            .Where(point => point.Y <= 2 * highest)
            .ToArray();
        return new Chart(
            "Coefficient of variation against effort",
            EffortWords.Finding(plan, effort) + " The table has the figures.",
            x,
            Axis.Covering("Coefficient of variation of density, %", 0, highest))
        {
            Lines = [new Line("expected", points, [])],
            Levels = required is null ? [] : [new Level(100 * required.TargetCv, "target " + Figures.Percent(required.TargetCv))],
            Dots = delivered is null ? [] : [new Dot(delivered.Effort, 100 * delivered.Cv, "layout as drawn")],
        };
    }
}
