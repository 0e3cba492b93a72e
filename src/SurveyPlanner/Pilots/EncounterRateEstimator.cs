using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>
/// How the variance of the encounter rate is estimated from a pilot's transects. Source of all three: Fewster and others 2009,
/// Biometrics 65:225-236; formulas from memory, checked by hand arithmetic in the tests.
/// </summary>
public enum EncounterRateEstimator
{
    /// <summary>As if the transects had been placed independently at random.</summary>
    RandomLines,

    /// <summary>Within pairs of neighbouring transects that do not overlap.</summary>
    AdjacentPairs,

    /// <summary>Between each transect and the next.</summary>
    OverlappingPairs,
}

/// <summary>The variance estimators themselves. Add one: a file beside these, a word in the enumeration, a line here.</summary>
internal static class EncounterRateEstimators
{
    /// <summary>Variance of the encounter rate and its degrees of freedom. At least two transects, in spatial order.</summary>
    public static (double Variance, int DegreesOfFreedom) Variance(this EncounterRateEstimator estimator, ImmutableArray<PilotTransect> transects)
        => estimator switch
        {
            EncounterRateEstimator.RandomLines => RandomLines.Variance(transects),
            EncounterRateEstimator.AdjacentPairs => AdjacentPairs.Variance(transects),
            EncounterRateEstimator.OverlappingPairs => OverlappingPairs.Variance(transects),
            _ => throw new ArgumentOutOfRangeException(nameof(estimator)),
        };

    /// <summary>
    /// Degrees of freedom of the chi-square whose spread the variance estimate has under independent normal counts of equal effort. For
    /// overlapping pairs 2(K - 1)² / (3K - 4), from the variance of the mean square successive difference (von Neumann and others 1941, from
    /// memory; held against simulation in the tests): about two thirds of the K - 1 by convention.
    /// </summary>
    public static double ChiSquareDegreesOfFreedom(this EncounterRateEstimator estimator, int transects)
        => estimator switch
        {
            EncounterRateEstimator.RandomLines => transects - 1,
            EncounterRateEstimator.AdjacentPairs => transects - Math.Max(1, transects / 2),
            EncounterRateEstimator.OverlappingPairs => 2.0 * (transects - 1) * (transects - 1) / ((3 * transects) - 4),
            _ => throw new ArgumentOutOfRangeException(nameof(estimator)),
        };
}
