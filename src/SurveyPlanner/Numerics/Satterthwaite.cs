namespace SurveyPlanner.Numerics;

/// <summary>
/// Degrees of freedom of a sum of independent variances. Source: Satterthwaite 1946, Biometrics Bulletin 2:110-114 (from memory).
/// </summary>
public static class Satterthwaite
{
    /// <summary>
    /// (Σ s_i²)² / Σ (s_i⁴ / df_i), where s_i is the standard deviation (or coefficient of variation) of part i.
    /// A part without degrees of freedom counts as known for certain. Null when no part has any, or all parts are 0.
    /// </summary>
    public static double? DegreesOfFreedom(IReadOnlyList<(double Cv, double? DegreesOfFreedom)> parts)
    {
        var total = parts.Sum(part => part.Cv * part.Cv);
        var denominator = parts.Sum(part => part.DegreesOfFreedom is { } df ? Math.Pow(part.Cv, 4) / df : 0);
        return denominator > 0 ? total * total / denominator : null;
    }
}
