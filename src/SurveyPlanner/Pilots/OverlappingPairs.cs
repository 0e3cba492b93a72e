using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>
/// Each transect against the next, weighted by length: 2K / (L²(K - 1)) Σ [l l'/(l + l')]² (n/l - n'/l')². Suits systematic transects,
/// where a trend across the region would swell the random-lines variance. Degrees of freedom K - 1 by convention.
/// </summary>
internal static class OverlappingPairs
{
    public static (double Variance, int DegreesOfFreedom) Variance(ImmutableArray<PilotTransect> transects)
    {
        var total = transects.Sum(transect => transect.Effort);
        var k = transects.Length;
        var sum = 0.0;
        for (var i = 0; i + 1 < k; i++)
        {
            var (here, next) = (transects[i], transects[i + 1]);
            var weight = here.Effort * next.Effort / (here.Effort + next.Effort);
            sum += Math.Pow(weight * ((here.Count / here.Effort) - (next.Count / next.Effort)), 2);
        }

        return (2.0 * k / (total * total * (k - 1)) * sum, k - 1);
    }
}
