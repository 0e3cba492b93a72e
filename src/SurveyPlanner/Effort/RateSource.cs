using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>What is known of one encounter rate and how well.</summary>
/// <param name="Rate">Detections per unit of effort.</param>
/// <param name="Dispersion">Variance-to-mean ratio of counts under the variance estimator in use.</param>
/// <param name="DegreesOfFreedom">How well the dispersion is known, as those of a chi-square; null when it was given for certain.</param>
/// <param name="Count">Detections behind the rate; null when it was given for certain.</param>
/// <param name="Transects">Transects behind the rate; 0 when it was given for certain.</param>
internal sealed record RateSource(double Rate, double Dispersion, double? DegreesOfFreedom, int? Count, int Transects)
{
    /// <summary>From transects with a variance. A variance of 0 is replaced by that of Poisson counts.</summary>
    public static RateSource Of(EncounterRate rate)
        => new(
            rate.Rate,
            rate.Variance > 0 ? rate.Variance.Value * rate.Effort / rate.Rate : 1,
            rate.Estimator.ChiSquareDegreesOfFreedom(rate.Transects),
            rate.Count,
            rate.Transects);

    /// <summary>
    /// Degrees of freedom of the chi-square that the estimated dispersion follows nearly, given the rate. Counts more variable than chance have
    /// heavier tails than the normal: 2/df' = 2/df + (c - 1)²/(c n), the second term by the delta method for negative binomial counts (own
    /// derivation: variance of ln c less what it shares with ln r).
    /// </summary>
    public double? EffectiveDegreesOfFreedom
        => DegreesOfFreedom is { } df
            ? 2 / ((2 / df) + (Dispersion > 1 && Count > 0 ? Math.Pow(Dispersion - 1, 2) / (Dispersion * Count.Value) : 0))
            : null;

    /// <summary>
    /// A rate and dispersion from the confidence distribution that the pilot leaves: c' = c df' / χ²(df'), and the rate as if n / c events
    /// of a Poisson process had been seen, gamma with shape n / c + 1/2. The two are drawn apart: what ties them under negative binomial
    /// counts is already in df'. Drawing the rate with c' instead of c assures a little less with few, overdispersed counts (docs/methods/effort.md).
    /// </summary>
    public (double Rate, double Dispersion) Draw(ref PhiloxStream random)
    {
        var dispersion = EffectiveDegreesOfFreedom is { } df ? Dispersion * df / random.NextChiSquare(df) : Dispersion;
        var events = Count / Dispersion;
        return (events > 0 ? Rate * random.NextGamma(events.Value + 0.5) / events.Value : Rate, dispersion);
    }
}
