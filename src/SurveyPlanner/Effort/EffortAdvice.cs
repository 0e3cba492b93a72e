using System.Globalization;

namespace SurveyPlanner.Effort;

/// <summary>The sentences that go with an effort plan.</summary>
internal static class EffortAdvice
{
    // From memory.
    private const string Minima = "Buckland and others 2001, Introduction to Distance Sampling, section 7.2";
    private const string Replicates = "Thomas, Williams and Sandilands 2007, Journal of Cetacean Research and Management 9:1-13";

    // The lower end of what that advises.
    private const int FewestTransects = 10;

    // Visits a point from which on a plan of visits is no plan of points.
    private const double SomeRevisits = 1.05;

    // More strata with too few transects than this are told together.
    private const int MostNamed = 4;

    public static IEnumerable<Advice> For(EffortPlan plan, EffortDesign design, IReadOnlyList<EffortStratum> strata)
        => Open(plan).Concat(Basis(plan, design, strata)).Concat(Pilot(plan)).Concat(Detection(plan, design)).Concat(Numbers(plan, design));

    /// <summary>First what matters most: how far the pilot leaves the effort open.</summary>
    private static IEnumerable<Advice> Open(EffortPlan plan)
    {
        if (plan.Required is not { } required)
        {
            yield break;
        }

        if (required.Interval is not { } interval)
        {
            if (required.Assurance is not null)
            {
                yield return new Advice(
                    "An assurance is asked for, but without a pilot nothing is known of how uncertain the encounter rate is; the plain estimate is planned for.");
            }

            yield break;
        }

        var unit = plan.IsPoints ? "points" : "km";
        var assured = required.AssuredEffort is { } effort
            ? FormattableString.Invariant($"; {Figure(effort)} {unit} are enough with an assurance of {required.Assurance:0.##}")
            : "";
        yield return new Advice(
            FormattableString.Invariant(
                $"The pilot leaves the effort open: the truth may ask for anything from {Figure(interval.Lower)} to {Figure(interval.Upper)} {unit} (95 % interval){assured}."),
            "Simulated draws")
        { RepeatsFigures = true };
        if (plan.Uncertainty?.Measured is { } measured)
        {
            yield return new Advice(Reliability(measured), "Study of simulated pilots") { RepeatsFigures = true };
        }
    }

    private static IEnumerable<Advice> Basis(EffortPlan plan, EffortDesign design, IReadOnlyList<EffortStratum> strata)
    {
        var left = strata.Where(stratum => stratum.IsPoints != plan.IsPoints).Select(stratum => $"'{stratum.Name}'").ToList();
        if (left.Count > 0)
        {
            yield return new Advice(
                $"These figures are for strata surveyed {(plan.IsPoints ? "at points" : "along lines")} only; {string.Join(", ", left)} {(left.Count == 1 ? "is" : "are")} left out.");
        }

        if (plan.Required is null && design.TargetCv is { } target)
        {
            yield return new Advice(FormattableString.Invariant(
                $"No effort reaches a coefficient of variation of {target:0.###}: detection, taken as given, already has {plan.Model.FixedCv:0.###}, which more effort does not lower."));
        }

        if (plan.IsPoints && plan.B.Origin != BOrigin.Pilot)
        {
            yield return new Advice(
                "The rule of thumb for b was made for lines; at points the same precision needs more detections (with a half-normal detection function 0.5 to 1.5 more on b), so give b from a pilot of points if you can.",
                "Arithmetic of half-normal theory");
        }
    }

    private static IEnumerable<Advice> Pilot(EffortPlan plan)
    {
        if (plan.Pilot is not { } pilot)
        {
            yield break;
        }

        if (pilot.Pooled.Transects == 1)
        {
            yield return new Advice(
                "The pilot has one transect, and one transect has no variance: its encounter rate is used, b comes from elsewhere. Two or more transects, better ten, would give both.");
        }
        else if (pilot.Pooled.Transects < 10)
        {
            yield return new Advice(
                $"The pilot has only {pilot.Pooled.Transects} transects, so its variance is itself uncertain; take the effort as a rough figure.");
        }

        if (plan.Model.Strata.Length > 1 && pilot.Strata is [{ Stratum.Length: 0 }])
        {
            yield return new Advice(
                $"The pilot names no strata, so its one encounter rate is taken for all {plan.Model.Strata.Length}; a column stratum in its table would give each its own.");
        }

        var visits = pilot.Pooled.Effort / pilot.Pooled.Transects;
        if (pilot.IsPoints && visits > SomeRevisits)
        {
            var planned = plan.Required is { } required
                ? FormattableString.Invariant($": {Figure(required.Planned)} visits are about {Math.Ceiling(required.Planned / visits):0} points")
                : "";
            yield return new Advice(FormattableString.Invariant(
                $"The pilot visited its points {visits:0.#} times on average, and what is counted here as points are visits to points visited as often{planned}. As many visits to more points, fewer to each, give at least that precision."));
        }

        if (pilot.BeyondTruncation > 0)
        {
            yield return new Advice(FormattableString.Invariant(
                $"{pilot.BeyondTruncation} of {pilot.BeyondTruncation + pilot.Pooled.Count} detections of the pilot lie beyond the truncation distance of {pilot.TruncationMetres:0.###} m and were left out."));
        }
    }

    private static IEnumerable<Advice> Detection(EffortPlan plan, EffortDesign design)
    {
        if (plan.B.Origin == BOrigin.Pilot && plan.B.DetectionPart is null && plan.Model.FixedCv is null)
        {
            var part = plan.IsPoints ? "1 to 2.6" : "0.5 to 1.1";
            yield return new Advice(
                $"No detection function is planned for: the figures hold only if everything out to the half-width is seen. If one will be fitted, expect about {part} more on b.",
                "Arithmetic of half-normal theory");
        }

        if (plan.Model.RateIncludesDetection && design.Detection.GivenCv is not null)
        {
            yield return new Advice("b covers detection already, so the coefficient of variation given for detection is not added to it.");
        }
    }

    private static IEnumerable<Advice> Numbers(EffortPlan plan, EffortDesign design)
    {
        if (plan.Required is not { } required)
        {
            yield break;
        }

        var (low, high) = plan.IsPoints ? (75, 100) : (60, 80);
        var detections = plan.Strata.Sum(stratum => stratum.ExpectedDetections) ?? required.Precision.ExpectedDetections;
        var effort = plan.Strata.Sum(stratum => stratum.Effort) ?? required.Planned;
        var unit = plan.IsPoints ? "points" : "lines";
        if (detections < high)
        {
            yield return new Advice(
                FormattableString.Invariant(
                    $"The {Figure(effort)} {(plan.IsPoints ? "points" : "km")} planned bring about {detections:0} detections; at least {low} to {high} are advised {(plan.IsPoints ? "at points" : "along lines")} to fit a detection function."),
                Minima);
        }

        // What is planned already has the least number of transects; what is told is where the target alone would ask for fewer.
        var few = plan.Model.Strata
            .Where(stratum => stratum.TransectEffort is not null)
            .Select(stratum => (stratum.Name, Transects: required.Planned * stratum.Share / stratum.TransectEffort!.Value))
            .Where(stratum => stratum.Transects < FewestTransects - 0.5)
            .ToList();
        if (few.Count > MostNamed)
        {
            yield return new Advice(
                FormattableString.Invariant(
                    $"In {few.Count} of {plan.Model.Strata.Length} strata the target alone would ask for fewer than {FewestTransects} {unit} each, in '{few.MinBy(stratum => stratum.Transects).Name}' for about {few.Min(stratum => stratum.Transects):0.#}; at least 10 to 20 in each stratum are advised, and the table plans for at least {design.MinLines} (min_lines)."),
                Replicates);
            yield break;
        }

        foreach (var (name, transects) in few)
        {
            yield return new Advice(
                FormattableString.Invariant(
                    $"In stratum '{name}' the target alone would ask for about {transects:0.#} {unit}; at least 10 to 20 in each stratum are advised, and the table plans for at least {design.MinLines} (min_lines)."),
                Replicates);
        }
    }

    private static string Reliability(MeasuredReliability measured)
    {
        var each = FormattableString.Invariant($"{measured.DetectionsPerTransect:0} detection{(measured.DetectionsPerTransect == 1 ? "" : "s")} on each");
        var spread = measured.Dispersion == 1 ? "as variable as chance" : FormattableString.Invariant($"{measured.Dispersion:0} times as variable as chance");
        return FormattableString.Invariant($"Of simulated pilots of {measured.Transects} transects with {each} and counts {spread}, ")
            + FormattableString.Invariant($"the nearest to this one that were tried, {100 * measured.Coverage:0} % gave an interval that held the truth, ")
            + FormattableString.Invariant($"and {100 * measured.Assured:0} % an effort assured at 0.8 that was enough.");
    }

    private static string Figure(double value)
        => value.ToString(value >= 100 ? "0" : value >= 10 ? "0.#" : "0.##", CultureInfo.InvariantCulture);
}
