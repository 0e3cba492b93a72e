using System.Collections.Immutable;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Pilots;

/// <summary>
/// Detections per unit of effort, with its variance among transects. Units: per kilometre of line, or per visit to a point.
/// </summary>
/// <param name="Estimator">Which variance estimator was used.</param>
/// <param name="Transects">Number of transects.</param>
/// <param name="Effort">Their total effort, kilometres or visits.</param>
/// <param name="Count">Total detections.</param>
/// <param name="Rate">Count / Effort; pooled over strata: the mean of the strata's rates weighted by area.</param>
/// <param name="Variance">Variance of the rate; null with a single transect or without detections: there is nothing to estimate it from.</param>
/// <param name="Cv">Its coefficient of variation; null when the variance is.</param>
/// <param name="DegreesOfFreedom">Degrees of freedom of the variance; pooled over strata: by Satterthwaite; null when the variance is.</param>
/// <param name="Dispersion">
/// Variance-to-mean ratio of the counts adjusted for effort: Σ (n_k - r l_k)² / (r l_k) over K - 1. 1 for counts by chance alone
/// (Poisson), more when animals gather. Pooled: sums over strata. Null when the variance is.
/// </param>
public sealed record EncounterRate(
    EncounterRateEstimator Estimator,
    int Transects,
    double Effort,
    int Count,
    double Rate,
    double? Variance,
    double? Cv,
    double? DegreesOfFreedom,
    double? Dispersion)
{
    /// <summary>The encounter rate of the transects of one stratum, in spatial order; at least one transect.</summary>
    public static EncounterRate Of(ImmutableArray<PilotTransect> transects, EncounterRateEstimator estimator)
    {
        var effort = transects.Sum(transect => transect.Effort);
        var count = transects.Sum(transect => transect.Count);
        var rate = count / effort;
        if (transects.Length < 2 || count == 0)
        {
            return new EncounterRate(estimator, transects.Length, effort, count, rate, null, null, null, null);
        }

        var (variance, df) = estimator.Variance(transects);
        var dispersion = transects.Sum(transect => Math.Pow(transect.Count - (rate * transect.Effort), 2) / (rate * transect.Effort))
            / (transects.Length - 1);
        return new EncounterRate(estimator, transects.Length, effort, count, rate, variance, Math.Sqrt(variance) / rate, df, dispersion);
    }

    /// <summary>
    /// The strata together, each weighted by its share of the area. The variance is known only if that of every stratum with detections is.
    /// </summary>
    public static EncounterRate Pooled(IReadOnlyList<(EncounterRate Rate, double Weight)> strata)
    {
        if (strata.Count == 1)
        {
            return strata[0].Rate;
        }

        var rate = strata.Sum(stratum => stratum.Weight * stratum.Rate.Rate);
        var sampled = strata.Where(stratum => stratum.Rate.Count > 0).ToList();
        var known = sampled.Count > 0 && sampled.All(stratum => stratum.Rate.Variance is not null);
        double? variance = known ? sampled.Sum(stratum => stratum.Weight * stratum.Weight * stratum.Rate.Variance!.Value) : null;
        return new EncounterRate(
            strata[0].Rate.Estimator,
            strata.Sum(stratum => stratum.Rate.Transects),
            strata.Sum(stratum => stratum.Rate.Effort),
            strata.Sum(stratum => stratum.Rate.Count),
            rate,
            variance,
            variance is { } v ? Math.Sqrt(v) / rate : null,
            known ? Satterthwaite.DegreesOfFreedom([.. sampled.Select(Component)]) : null,
            PooledDispersion(sampled.Select(stratum => stratum.Rate)));

        (double Cv, double? DegreesOfFreedom) Component((EncounterRate Rate, double Weight) stratum)
            => (stratum.Weight * Math.Sqrt(stratum.Rate.Variance!.Value), stratum.Rate.DegreesOfFreedom);
    }

    private static double? PooledDispersion(IEnumerable<EncounterRate> rates)
    {
        var known = rates.Where(rate => rate.Dispersion is not null).ToList();
        return known.Count == 0 ? null : known.Sum(rate => rate.Dispersion!.Value * (rate.Transects - 1)) / known.Sum(rate => rate.Transects - 1);
    }
}
