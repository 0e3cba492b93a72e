using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>The sentences of the section on effort.</summary>
internal static class EffortWords
{
    public static string Unit(EffortPlan effort, bool capital = false) => (effort.IsPoints, capital) switch
    {
        (true, true) => "Points, one visit each",
        (true, false) => "points",
        (false, true) => "Length of line, km",
        _ => "km",
    };

    /// <summary>First what was asked, then what the layout gives.</summary>
    public static string Answer(SurveyPlan plan, EffortPlan effort)
    {
        var asked = effort.Required is { } required
            ? $"A coefficient of variation of {Figures.Percent(required.TargetCv)} needs about {Amount(required.Effort, effort)}. "
            : "";
        return asked + (plan.Delivered is { } delivered
            ? $"The layout as drawn has {Amount(delivered.Effort, effort)} and is expected to deliver {Figures.Percent(delivered.Cv)}, from about {Figures.Three(delivered.ExpectedDetections)} detections."
            : "No layout drawn here is surveyed the way the pilot was, so nothing can be said of what it delivers.");
    }

    /// <summary>What the chart shows.</summary>
    public static string Finding(SurveyPlan plan, EffortPlan effort)
    {
        var target = effort.Required is { } required
            ? $"{Amount(required.Effort, effort)} reach a coefficient of variation of {Figures.Percent(required.TargetCv)}"
            : null;
        var drawn = plan.Delivered is { } delivered ? $"the {Amount(delivered.Effort, effort)} drawn give {Figures.Percent(delivered.Cv)}" : null;
        var sentence = string.Join("; ", new[] { target, drawn }.OfType<string>()) + ".";
        return char.ToUpperInvariant(sentence[0]) + sentence[1..];
    }

    private static string Amount(double amount, EffortPlan effort)
        => effort.IsPoints ? Figures.Counted((long)Math.Ceiling(amount), "point", "points") : Figures.Three(amount) + "\u00a0km";
}
