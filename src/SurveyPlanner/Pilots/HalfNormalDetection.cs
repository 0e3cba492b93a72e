using MathNet.Numerics;

namespace SurveyPlanner.Pilots;

/// <summary>g(x) = exp(-x² / 2σ²).</summary>
/// <param name="SigmaMetres">The scale σ.</param>
public sealed record HalfNormalDetection(double SigmaMetres) : DetectionFunction
{
    public override DetectionModel Model => DetectionModel.HalfNormal;

    public override IReadOnlyList<(string Name, double Value)> Parameters => [("sigma_m", SigmaMetres)];

    public override double ProbabilityAt(double metres) => Math.Exp(-metres * metres / (2 * SigmaMetres * SigmaMetres));

    /// <summary>σ √(π/2) erf(w / σ√2).</summary>
    public override double EffectiveHalfWidth(double truncationMetres)
        => SigmaMetres * Math.Sqrt(Math.PI / 2) * SpecialFunctions.Erf(truncationMetres / (SigmaMetres * Math.Sqrt(2)));

    /// <summary>2σ² (1 - exp(-w² / 2σ²)).</summary>
    public override double EffectiveRadiusSquared(double truncationMetres)
        => 2 * SigmaMetres * SigmaMetres * -ExponentialMinusOne(-truncationMetres * truncationMetres / (2 * SigmaMetres * SigmaMetres));

    /// <summary>e^x - 1 without loss near 0.</summary>
    private static double ExponentialMinusOne(double x) => x < -1 ? Math.Exp(x) - 1 : 2 * Math.Sinh(x / 2) * Math.Exp(x / 2);
}
