using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>
/// From a pilot, or from figures given, to the effort for a target precision, and back.
/// Assumptions: the survey meets the same encounter rate and the same spread of counts as the pilot; strata are independent; detection and
/// cluster size are pooled over strata; cv² is the sum of its components (delta method).
/// Sources: Buckland and others 2001, Introduction to Distance Sampling, sections 3.6 and 7.2; Fewster and others 2009 (formulas from memory).
/// </summary>
public static class EffortPlanning
{
    /// <summary>
    /// The effort plan; null when neither a pilot nor an encounter rate nor a target is given and there is nothing to say.
    /// </summary>
    /// <param name="design">Precision asked for, and what is taken as given.</param>
    /// <param name="pilot">The pilot season, if any.</param>
    /// <param name="strata">The strata of the region, at least one.</param>
    /// <exception cref="InputException">With every problem of the design and the pilot.</exception>
    public static EffortPlan? For(EffortDesign design, PilotTable? pilot, IReadOnlyList<EffortStratum> strata)
    {
        var problems = EffortChecks.Problems(design, pilot, strata).ToList();
        if (pilot is not null)
        {
            problems.AddRange(PilotChecks.Problems(pilot, [.. strata.Select(stratum => stratum.Name)]));
        }

        if (problems.Count > 0)
        {
            throw new InputException(problems);
        }

        if (pilot is null && design.GivenEncounterRate is null)
        {
            return null;
        }

        var isPoints = pilot?.IsPoints ?? strata[0].IsPoints;
        var surveyed = strata.Where(stratum => stratum.IsPoints == isPoints).ToList();
        var estimator = design.Estimator ?? SuitingEstimator(surveyed);
        var figures = pilot is null ? null : Figures(design, pilot, surveyed, estimator);
        var basis = EffortBasis.Of(design, figures, surveyed);
        return Assemble(design, figures, basis, strata, estimator);
    }

    private static EffortPlan Assemble(
        EffortDesign design, PilotFigures? figures, EffortBasis basis, IReadOnlyList<EffortStratum> strata, EncounterRateEstimator estimator)
    {
        var model = basis.Model;
        var required = design.TargetCv is { } target ? Required(model, target) : null;
        var plan = new EffortPlan(
            model.IsPoints,
            model.PooledRate,
            figures is null ? null : estimator,
            figures is null ? null : EstimatorReason(design, estimator, model.IsPoints),
            figures,
            basis.B,
            figures is null ? null : basis.PilotCv(design, figures),
            required,
            [.. model.Strata.Select(stratum => Stratum(model, stratum, design.TargetCv, required?.Effort))],
            [],
            model);
        return plan with { Advice = [.. basis.Advice, .. EffortAdvice.For(plan, design, strata)] };
    }

    private static PilotFigures Figures(
        EffortDesign design, PilotTable pilot, List<EffortStratum> surveyed, EncounterRateEstimator estimator)
        => PilotFigures.Of(
            pilot,
            estimator,
            design.Detection.TruncationMetres ?? surveyed.Min(stratum => stratum.HalfWidthMetres),
            surveyed.ToDictionary(stratum => stratum.Name, stratum => stratum.AreaKm2));

    private static EncounterRateEstimator SuitingEstimator(List<EffortStratum> surveyed)
        => surveyed.All(stratum => stratum.IsSystematic && !stratum.IsPoints)
            ? EncounterRateEstimator.OverlappingPairs
            : EncounterRateEstimator.RandomLines;

    private static string EstimatorReason(EffortDesign design, EncounterRateEstimator estimator, bool isPoints)
        => (design.Estimator, estimator, isPoints) switch
        {
            (not null, _, _) => "Chosen in the plan.",
            (_, EncounterRateEstimator.OverlappingPairs, _) =>
                "Systematic lines: comparing each line with the next keeps a trend across the region out of the variance.",
            (_, _, true) => "Points have no single order along which neighbours could be compared, so they are treated as placed at random.",
            _ => "The lines are not placed systematically, so they are treated as placed at random.",
        };

    private static RequiredEffort? Required(EffortModel model, double target)
    {
        if (model.EffortFor(target) is not { } exact)
        {
            return null;
        }

        // Points are whole; the small allowance keeps an exact whole number from being pushed up by rounding error.
        var effort = model.IsPoints ? Math.Ceiling(exact - (1e-9 * exact)) : exact;
        return new RequiredEffort(target, effort, model.PrecisionAt(effort)!);
    }

    private static StratumEffort Stratum(EffortModel model, StratumModel stratum, double? target, double? total)
        => new(
            stratum.Name,
            stratum.Rate,
            stratum.Pilot,
            stratum.Share,
            total * stratum.Share,
            total * stratum.Share * stratum.Rate,
            total is { } effort && stratum.Share > 0 ? model.OwnCv(stratum, effort) : null,
            target is { } own ? model.OwnEffortFor(stratum, own) : null);
}
