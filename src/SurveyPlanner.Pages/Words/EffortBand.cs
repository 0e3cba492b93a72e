using SurveyPlanner.Effort;

namespace SurveyPlanner.Pages.Words;

/// <summary>The precision that the pilot leaves open at an effort.</summary>
internal static class EffortBand
{
    /// <summary>
    /// Ends of the 95 % band of the coefficient of variation; null without a pilot. If the truth asks for twice the effort, an effort does what half of it
    /// would: the band is the curve itself, moved along the axis.
    /// </summary>
    public static (double Lower, double Upper)? At(EffortPlan effort, double amount)
        => effort.Uncertainty is { Factors: var factors } && effort.CvAt(amount / factors.Lower) is { } best && effort.CvAt(amount / factors.Upper) is { } worst
            ? (best.Cv, worst.Cv)
            : null;

    /// <summary>The same for what efforts deliver that are shared otherwise than planned.</summary>
    public static (double Lower, double Upper)? Of(EffortPlan effort, EffortPrecision precision) => At(effort, effort.EffortAsPlanned(precision));
}
