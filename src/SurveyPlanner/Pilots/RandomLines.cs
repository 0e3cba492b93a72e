using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>
/// The design-based variance for transects placed independently at random: K / (L²(K - 1)) Σ l²(n/l - r)², with K - 1 degrees of freedom.
/// Under systematic transects and a trend across them it is far too large.
/// </summary>
internal static class RandomLines
{
    public static (double Variance, int DegreesOfFreedom) Variance(ImmutableArray<PilotTransect> transects)
    {
        var total = transects.Sum(transect => transect.Effort);
        var k = transects.Length;
        return (k / (total * total * (k - 1.0)) * SquaredResiduals(transects), k - 1);
    }

    /// <summary>Σ l²(n/l - r)² = Σ (n - r l)², r the rate of these transects together.</summary>
    public static double SquaredResiduals(IReadOnlyList<PilotTransect> transects)
    {
        var rate = transects.Sum(transect => (double)transect.Count) / transects.Sum(transect => transect.Effort);
        return transects.Sum(transect => Math.Pow(transect.Count - (rate * transect.Effort), 2));
    }
}
