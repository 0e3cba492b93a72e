using System.Globalization;
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

    /// <summary>What the target asks for, as honestly as the pilot allows: the assured effort first, then how far the pilot leaves it open.</summary>
    public static string Answer(EffortPlan effort)
    {
        if (effort.Required is not { } required)
        {
            return $"The plan names no target, or none that effort can reach: at {Rate(effort)} these figures say what each effort gives.";
        }

        var target = $"a coefficient of variation of {Figures.ChosenPercent(required.TargetCv)}";
        var plain = Amount(required.Effort, effort);
        if (required.Interval is not { } interval)
        {
            return $"About {plain} reach {target}; there is no pilot to say how sure that is.";
        }

        var open = $"the pilot itself leaves anything from {Range(interval, effort)} {Unit(effort)} open (95\u00a0% interval)";
        return required is { AssuredEffort: { } assured, Assurance: { } assurance }
            ? $"{Amount(assured, effort)} reach {target} with an assurance of {Figures.ChosenPercent(assurance)}; the plain estimate is {plain}, and {open}."
            : $"About {plain} reach {target} by the plain estimate; {open}.";
    }

    /// <summary>What the layout as drawn gives, beside what is planned for.</summary>
    public static string OfDrawn(SurveyPlan plan, EffortPlan effort)
    {
        if (plan.Delivered is not { } delivered)
        {
            return "No transect was drawn in one of the strata that the pilot speaks for, so nothing can be said of what the layout delivers for them together.";
        }

        var open = EffortBand.Of(effort, delivered) is var (lower, upper)
            ? $" (the pilot leaves {Figures.Percent(lower)} to {Figures.Percent(upper)} open)"
            : "";
        var gives = $"The layout as drawn has {Amount(delivered.Effort, effort)} and is expected to deliver {Figures.Percent(delivered.Cv)}{open}, "
            + $"from about {Figures.Three(delivered.ExpectedDetections)} detections.";
        return effort.Required is { } required ? $"{gives} That is {Verdict(effort.EffortAsPlanned(delivered), required)}." : gives;
    }

    // What is drawn counts by what it delivers, which is less than its length says where strata have other shares than planned.
    private static string Verdict(double drawn, RequiredEffort required) => required switch
    {
        _ when drawn < (1 - 1e-9) * required.Effort => "less than the plain estimate asks for",
        { AssuredEffort: { } assured } when drawn < assured => "more than the plain estimate, but not enough for the assurance asked for",
        { Interval: { } interval } when drawn > interval.Upper => "more than all that the interval leaves open",
        { AssuredEffort: not null } => "enough for the assurance asked for",
        _ => "at least the plain estimate",
    };

    /// <summary>How such intervals did where the truth was known; null where that was not measured.</summary>
    public static string? OfReliability(EffortPlan effort)
    {
        if (effort.Uncertainty?.Measured is not { } measured)
        {
            return null;
        }

        var pilots = $"{Figures.Count(MeasuredReliability.Pilots)} simulated pilots of {measured.Transects} transects with {Plain(measured.DetectionsPerTransect)} {(measured.DetectionsPerTransect == 1 ? "detection" : "detections")} on each "
            + $"and counts {(measured.Dispersion == 1 ? "" : Plain(measured.Dispersion) + " times ")}as variable as chance, the nearest to this one that were tried";
        var found = $"How far to trust that: of {pilots}, {Figures.Percent(measured.Coverage)} gave a 95\u00a0% interval that held the truth";
        return effort.Required?.AssuredEffort is null
            ? found + "."
            : $"{found}, and {Figures.Percent(measured.Assured)} an effort assured at 80\u00a0% that was enough.";
    }

    /// <summary>What the chart of precision against effort shows.</summary>
    public static string Finding(SurveyPlan plan, EffortPlan effort)
    {
        var target = effort.Required is { } required
            ? $"{Amount(required.Effort, effort)} reach a CV of {Figures.ChosenPercent(required.TargetCv)}" + (required is { AssuredEffort: { } assured, Assurance: { } assurance }
                ? $"; with the pilot's uncertainty, {Amount(assured, effort)} are needed to be {Figures.ChosenPercent(assurance)} sure"
                : "")
            : null;
        var drawn = plan.Delivered is { } delivered ? $"the {Amount(delivered.Effort, effort)} drawn give {Figures.Percent(delivered.Cv)}" : null;
        var sentence = string.Join("; ", new[] { target, drawn }.OfType<string>()) + ".";
        return char.ToUpperInvariant(sentence[0]) + sentence[1..];
    }

    /// <summary>What the chart of effort against the target shows: what the next step of precision costs.</summary>
    public static string TargetFinding(EffortPlan effort)
    {
        if (effort.Required is not { } required)
        {
            return "Twice the precision costs four times the effort.";
        }

        var (finer, now) = (required.TargetCv / 2, effort.Model.EffortFor(required.TargetCv));
        return effort.Model.EffortFor(finer) is { } more
            ? $"Halving the CV from {Figures.ChosenPercent(required.TargetCv)} to {Figures.ChosenPercent(finer)} takes {Figures.Three(more / now)} times the effort, {Amount(more, effort)}."
            : $"No effort halves the CV to {Figures.ChosenPercent(finer)}: detection, taken as given, stays as it is.";
    }

    /// <summary>What sharing the effort otherwise would change; the ways are those of <see cref="EffortPlan.Allocations"/>.</summary>
    public static string OfAllocations(EffortPlan effort, Allocation chosen)
    {
        if (effort.Allocations.All(option => option.Strata.SequenceEqual(effort.Allocations[0].Strata)))
        {
            return $"Effort is shared by {ChoiceWord.Of(chosen)} allocation; in whole transects, and with the least number of them in each stratum, all three ways come to the same.";
        }

        var planned = effort.Allocations.Single(option => option.Allocation == chosen);
        var (least, word) = planned.Cost is null
            ? (effort.Allocations.MinBy(option => option.RequiredEffort)!, "effort")
            : (effort.Allocations.MinBy(option => option.Cost)!, "cost");
        var (of, to) = planned.Cost is null ? (planned.RequiredEffort, least.RequiredEffort) : (planned.Cost.Value, least.Cost!.Value);
        return least.Allocation == chosen || to >= of
            ? $"Effort is shared by {ChoiceWord.Of(chosen)} allocation, and of the three ways it reaches the target with the least {word}."
            : $"Effort is shared by {ChoiceWord.Of(chosen)} allocation; {ChoiceWord.Of(least.Allocation)} allocation would reach the target with {Figures.Percent(1 - (to / of))} less {word}.";
    }

    /// <summary>Kilometres of line or points, with the unit.</summary>
    public static string Amount(double amount, EffortPlan effort)
        => effort.IsPoints ? Figures.Counted(Whole(amount), "point", "points") : Figures.Three(amount) + "\u00a0km";

    /// <summary>The same without the unit.</summary>
    public static string Number(double? amount, EffortPlan effort)
        => effort.IsPoints && amount is { } points ? Figures.Count(Whole(points)) : Figures.Three(amount);

    /// <summary>Both ends, without the unit.</summary>
    public static string Range(EffortInterval interval, EffortPlan effort) => $"{Number(interval.Lower, effort)} to {Number(interval.Upper, effort)}";

    // There is no half a point; the small allowance keeps a whole number from being pushed up by rounding error.
    private static long Whole(double points) => (long)Math.Min(Math.Ceiling(points - (1e-9 * points)), 1e15);

    private static string Plain(double chosen) => chosen.ToString("0.##", CultureInfo.InvariantCulture);

    private static string Rate(EffortPlan effort)
        => $"{Figures.Three(effort.EncounterRate)} detections a {(effort.IsPoints ? "visit" : "kilometre")}";
}
