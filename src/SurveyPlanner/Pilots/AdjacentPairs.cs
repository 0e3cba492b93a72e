using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>
/// Neighbouring transects taken two by two as small strata: (1/L²) Σ_h K_h/(K_h - 1) Σ (n - r_h l)². With an odd number the last stratum
/// holds three (our convention). Degrees of freedom: transects less strata.
/// </summary>
internal static class AdjacentPairs
{
    public static (double Variance, int DegreesOfFreedom) Variance(ImmutableArray<PilotTransect> transects)
    {
        var total = transects.Sum(transect => transect.Effort);
        var groups = Math.Max(1, transects.Length / 2);
        var sum = 0.0;
        for (var h = 0; h < groups; h++)
        {
            var end = h == groups - 1 ? transects.Length : (2 * h) + 2;
            var group = transects[(2 * h)..end];
            sum += group.Length / (group.Length - 1.0) * RandomLines.SquaredResiduals(group);
        }

        return (sum / (total * total), transects.Length - groups);
    }
}
