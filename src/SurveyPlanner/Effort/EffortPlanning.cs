using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>
/// From a pilot, or from figures given, to the effort for a target precision, and back.
/// Assumptions: the survey meets the same encounter rate and the same spread of counts as the pilot; strata are independent; detection and
/// cluster size are pooled over strata unless asked otherwise; cv² is the sum of its components (delta method).
/// Sources: Buckland and others 2001, Introduction to Distance Sampling, sections 3.6 and 7.2; Fewster and others 2009 (formulas from memory).
/// </summary>
public static class EffortPlanning
{
    private static readonly ImmutableArray<DetectionModel> UsualModels = [DetectionModel.HalfNormal, DetectionModel.HazardRate, DetectionModel.UniformCosine];

    /// <summary>
    /// The effort plan; null when neither a pilot nor an encounter rate nor a target is given and there is nothing to say.
    /// </summary>
    /// <param name="design">Precision asked for, and what is taken as given.</param>
    /// <param name="pilot">The pilot season, if any.</param>
    /// <param name="strata">The strata of the region, at least one.</param>
    /// <param name="seed">Seed of the draws behind intervals and assured effort.</param>
    /// <exception cref="InputException">With every problem of the design and the pilot.</exception>
    public static EffortPlan? For(EffortDesign design, PilotTable? pilot, IReadOnlyList<EffortStratum> strata, ulong seed)
    {
        // What the pilot's strata are wrong about comes first: that none of them is surveyed follows from it.
        var problems = pilot is null ? [] : PilotChecks.Problems(pilot, [.. strata.Select(stratum => stratum.Name)]).ToList();
        problems.AddRange(EffortChecks.Problems(design, pilot, strata));

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
        var figures = pilot is null ? null : Figures(design, pilot, surveyed);
        var basis = EffortBasis.Of(design, figures, surveyed);
        var plan = Assemble(design, figures, basis, EffortDraws.Of(basis, seed));
        return plan with { Advice = [.. basis.Advice, .. EffortAdvice.For(plan, design, strata)] };
    }

    private static EffortPlan Assemble(EffortDesign design, PilotFigures? figures, EffortBasis basis, EffortDraws? draws)
    {
        var chosen = Candidate(design.Allocation, design, basis, draws);
        var model = chosen.Model;
        return new EffortPlan(
            model.IsPoints,
            model.PooledRate,
            figures is null ? null : Density(design, figures, basis),
            figures?.Pooled.Estimator,
            figures is null ? null : EstimatorReason(design, figures.Pooled.Estimator, model.IsPoints),
            figures,
            EffortBasis.B(model, design, figures, basis.GivenB),
            figures is null ? null : basis.PilotCv(design, figures),
            chosen.Uncertainty,
            chosen.Required,
            [.. model.Strata.Select((stratum, i) => Stratum(chosen, stratum, design.TargetCv, i))],
            model.Strata.Length < 2 || chosen.Option is null
                ? []
                : [.. Enum.GetValues<Allocation>().Select(allocation => Candidate(allocation, design, basis, draws).Option!)],
            EffortCurves.Of(model, chosen.Required?.Planned, chosen.Uncertainty?.Factors),
            [],
            model);
    }

    /// <summary>Everything that depends on how effort is shared.</summary>
    private sealed record Shared(EffortModel Model, EffortUncertainty? Uncertainty, RequiredEffort? Required, AllocationOption? Option);

    private static Shared Candidate(Allocation allocation, EffortDesign design, EffortBasis basis, EffortDraws? draws)
    {
        var model = basis.Model.WithShares(EffortShares.Of(basis.Model, allocation, design.CostPerUnit));
        var uncertainty = draws is null ? null : EffortUncertainty.Of(basis, draws, model, design.Assurance);
        var required = design.TargetCv is { } target ? Required(model, target, design.Assurance, uncertainty) : null;
        var option = required is null ? null : AllocationOption.Of(model, allocation, required.Planned, design);
        return new Shared(model, uncertainty, required, option);
    }

    private static RequiredEffort? Required(EffortModel model, double target, double? assurance, EffortUncertainty? uncertainty)
    {
        if (model.EffortFor(target) is not { } exact)
        {
            return null;
        }

        var effort = Whole(exact);
        return new RequiredEffort(
            target,
            effort,
            model.PrecisionAt(effort)!,
            uncertainty?.Factors.Times(exact),
            uncertainty?.DeltaFactors.Times(exact),
            assurance,
            uncertainty?.AssuredFactor is { } factor ? Whole(factor * exact) : null);

        double Whole(double amount) => model.IsPoints ? AllocationOption.Whole(amount) : amount;
    }

    private static StratumEffort Stratum(Shared shared, StratumModel stratum, double? target, int place)
    {
        var share = shared.Option?.Strata[place];
        var rounded = shared.Option is { } option
            ? shared.Model.WithShares([.. option.Strata.Select(one => one.Effort / option.Effort)])
            : shared.Model;
        return new StratumEffort(
            stratum.Name,
            stratum.Rate,
            stratum.Pilot,
            stratum.Share,
            share?.Effort,
            share?.Transects,
            share?.Effort * stratum.Rate,
            shared.Option is null ? null : rounded.OwnCv(rounded.Strata[place], shared.Option.Effort),
            target is { } own ? shared.Model.OwnEffortFor(stratum, own) : null);
    }

    private static PilotFigures Figures(EffortDesign design, PilotTable pilot, List<EffortStratum> surveyed)
    {
        var detection = design.Detection;
        var given = detection.GivenCv is not null || detection.GivenEffectiveWidthMetres is not null;
        var analysis = new PilotAnalysis(
            design.Estimator ?? SuitingEstimator(surveyed),
            detection.TruncationMetres ?? surveyed.Min(stratum => stratum.HalfWidthMetres),
            detection.Models.IsEmpty && !given ? UsualModels : detection.Models,
            detection.ByStratum);
        return PilotFigures.Of(pilot, analysis, surveyed.ToDictionary(stratum => stratum.Name, stratum => stratum.AreaKm2));
    }

    private static PilotDensity? Density(EffortDesign design, PilotFigures figures, EffortBasis basis)
    {
        if ((design.Detection.GivenEffectiveWidthMetres ?? figures.Detection?.Chosen?.EffectiveMetres) is not { } metres)
        {
            return null;
        }

        var km = metres / 1000;
        var clusters = figures.Pooled.Rate / (figures.IsPoints ? Math.PI * km * km : 2 * km);
        return new PilotDensity(clusters, clusters * (basis.ClusterSize?.Mean ?? 1));
    }

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
}
