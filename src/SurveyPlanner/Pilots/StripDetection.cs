namespace SurveyPlanner.Pilots;

/// <summary>Everything is seen: g = 1.</summary>
public sealed record StripDetection : DetectionFunction
{
    public override DetectionModel Model => DetectionModel.Strip;

    public override IReadOnlyList<(string Name, double Value)> Parameters => [];

    public override double ProbabilityAt(double metres) => 1;

    public override double EffectiveHalfWidth(double truncationMetres) => truncationMetres;

    public override double EffectiveRadiusSquared(double truncationMetres) => truncationMetres * truncationMetres;
}
