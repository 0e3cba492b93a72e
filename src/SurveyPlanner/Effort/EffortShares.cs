using System.Collections.Immutable;

namespace SurveyPlanner.Effort;

/// <summary>Shares of the total effort by stratum.</summary>
internal static class EffortShares
{
    /// <summary>Shares under an allocation, in the order of the strata, summing to 1. Costs are per unit of effort, by stratum, 1 where not given.</summary>
    public static ImmutableArray<double> Of(EffortModel model, Allocation allocation, IReadOnlyDictionary<string, double> costs)
    {
        var wanted = allocation switch
        {
            Allocation.Proportional => [.. model.Strata.Select(stratum => stratum.Weight)],
            Allocation.Equal => [.. model.Strata.Select(_ => 1.0)],
            Allocation.Optimal => Optimal(model, [.. model.Strata.Select(stratum => costs.GetValueOrDefault(stratum.Name, 1))]),
            _ => throw new ArgumentOutOfRangeException(nameof(allocation)),
        };
        var sum = wanted.Sum();
        return [.. wanted.Select(share => share / sum)];
    }

    /// <summary>
    /// Least variance for the cost. The variance is Σ A_h / L_h + B / Σ r_h L_h, A_h = w_h² (c_h + d_h) r_h and B the pooled part times R².
    /// Without B this is Neyman's L_h in proportion to sqrt(A_h / cost_h) (Cochran 1977, Sampling Techniques, sections 5.5 to 5.9, from memory).
    /// With B each stratum is worth its detections too: L_h in proportion to sqrt(A_h / (cost_h - m r_h)), where m makes
    /// m (Σ r_h L_h)² = B; found by bisection (own derivation, Lagrange multipliers).
    /// </summary>
    private static double[] Optimal(EffortModel model, double[] costs)
    {
        var strata = model.Strata;
        var a = strata.Select(stratum => stratum.Weight * stratum.Weight * (stratum.Dispersion + (stratum.OwnDetectionPart ?? 0)) * stratum.Rate).ToArray();
        var b = ((model.DetectionPart ?? 0) + (model.ClusterPart ?? 0)) * model.PooledRate * model.PooledRate;
        var (low, high) = (0.0, strata.Select((stratum, i) => costs[i] / stratum.Rate).Min());
        const int halvings = 200;
        for (var i = 0; i < halvings && b > 0; i++)
        {
            var middle = (low + high) / 2;
            var detections = Efforts(middle).Select((effort, h) => effort * strata[h].Rate).Sum();
            (low, high) = middle * detections * detections < b ? (middle, high) : (low, middle);
        }

        return Efforts(low);

        double[] Efforts(double m) => [.. a.Select((variance, h) => Math.Sqrt(variance / (costs[h] - (m * strata[h].Rate))))];
    }
}
