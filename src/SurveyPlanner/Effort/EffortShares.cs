using System.Collections.Immutable;

namespace SurveyPlanner.Effort;

/// <summary>Shares of the total effort by stratum.</summary>
internal static class EffortShares
{
    /// <summary>The strata with their shares under the allocation asked for.</summary>
    public static ImmutableArray<StratumModel> Shared(ImmutableArray<StratumModel> strata, EffortDesign design)
    {
        var wanted = strata
            .Select(stratum => design.Allocation switch
            {
                Allocation.Proportional => stratum.Weight,
                Allocation.Equal => 1,
                // Neyman with costs: in proportion to W S / sqrt(c). Source: Cochran 1977, Sampling Techniques, section 5.5 (from memory).
                Allocation.Optimal => stratum.Weight * Math.Sqrt(stratum.UnitVariance / design.CostPerUnit.GetValueOrDefault(stratum.Name, 1)),
                _ => throw new ArgumentOutOfRangeException(nameof(design)),
            })
            .ToImmutableArray();
        var sum = wanted.Sum();
        return [.. strata.Select((stratum, i) => stratum with { Share = wanted[i] / sum })];
    }
}
