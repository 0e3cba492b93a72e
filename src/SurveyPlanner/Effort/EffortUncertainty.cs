namespace SurveyPlanner.Effort;

/// <summary>An interval of effort, or of factors on it.</summary>
public sealed record EffortInterval(double Lower, double Upper)
{
    /// <summary>Both ends times a number.</summary>
    public EffortInterval Times(double factor) => new(Lower * factor, Upper * factor);
}

/// <summary>
/// How far the pilot leaves the required effort open. Factors multiply the effort of any target: 2 means that the truth may ask for twice the
/// estimate.
/// </summary>
/// <param name="Factors">95 % interval, by draws from the confidence distribution of the pilot's figures.</param>
/// <param name="DeltaFactors">The same by the delta method, for comparison.</param>
/// <param name="AssuredFactor">Factor that is enough with the stated assurance; null where none is asked for.</param>
/// <param name="Draws">Number of draws.</param>
/// <param name="Measured">How often such intervals held the truth in simulated pilots like this one; null where b is not from the pilot.</param>
public sealed record EffortUncertainty(
    EffortInterval Factors, EffortInterval DeltaFactors, double? AssuredFactor, int Draws, MeasuredReliability? Measured)
{
    internal static EffortUncertainty Of(EffortBasis basis, EffortDraws draws, EffortModel model, double? assurance)
    {
        var factors = draws.EffortFactors(model);
        return new EffortUncertainty(
            new EffortInterval(Quantile(0.025), Quantile(0.975)),
            EffortDelta.Factors(basis, model),
            assurance is { } share ? Quantile(share) : null,
            factors.Length,
            basis.GivenB is null ? NearestMeasured(basis, model) : null);

        double Quantile(double probability) => factors[Math.Clamp((int)Math.Round((probability * factors.Length) - 0.5), 0, factors.Length - 1)];
    }

    private static MeasuredReliability? NearestMeasured(EffortBasis basis, EffortModel model)
    {
        var (transects, count) = (basis.Sources.Sum(source => source.Transects), basis.Sources.Sum(source => source.Count ?? 0));
        return count == 0 ? null : MeasuredReliability.Nearest(transects, (double)count / transects, model.UnitRateCv2 * model.DetectionsPerEffort);
    }
}
