using SurveyPlanner.Numerics;

namespace SurveyPlanner.Pilots;

/// <summary>g(x) = 1 - exp(-(x/σ)^-b).</summary>
/// <param name="SigmaMetres">The scale σ.</param>
/// <param name="Shape">The shape b; the larger, the wider the shoulder and the steeper the fall.</param>
public sealed record HazardRateDetection(double SigmaMetres, double Shape) : DetectionFunction
{
    public override DetectionModel Model => DetectionModel.HazardRate;

    public override IReadOnlyList<(string Name, double Value)> Parameters => [("sigma_m", SigmaMetres), ("shape", Shape)];

    public override double ProbabilityAt(double metres) => 1 - Math.Exp(-Math.Pow(metres / SigmaMetres, -Shape));

    /// <summary>w (1 - e^-t) + σ Γ(1 - 1/b, t), t = (w/σ)^-b. An infinite w wants b above 1.</summary>
    public override double EffectiveHalfWidth(double truncationMetres) => Effective(truncationMetres, 1);

    /// <summary>w² (1 - e^-t) + σ² Γ(1 - 2/b, t). An infinite w wants b above 2.</summary>
    public override double EffectiveRadiusSquared(double truncationMetres) => Effective(truncationMetres, 2);

    private double Effective(double truncationMetres, int power)
    {
        var t = Math.Pow(truncationMetres / SigmaMetres, -Shape);
        var inside = double.IsInfinity(truncationMetres) ? 0 : Math.Pow(truncationMetres, power) * (1 - Math.Exp(-t));
        return double.IsInfinity(t) ? inside : inside + (Math.Pow(SigmaMetres, power) * UpperGamma.At(1 - (power / Shape), t));
    }
}
