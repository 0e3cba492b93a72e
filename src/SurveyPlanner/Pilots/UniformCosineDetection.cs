using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>
/// g(x) = (1 + Σ a_j cos(jπx/w)) / (1 + Σ a_j), for distances up to w. With one or two terms it falls everywhere and stays above 0 exactly when
/// a_1 is at least 4 |a_2| and 1 - a_1 + a_2 is at least 0 (from its derivative).
/// </summary>
/// <param name="TruncationMetres">w, part of the model.</param>
/// <param name="Coefficients">a_1, a_2, …</param>
public sealed record UniformCosineDetection(double TruncationMetres, ImmutableArray<double> Coefficients) : DetectionFunction
{
    public override DetectionModel Model => DetectionModel.UniformCosine;

    public override IReadOnlyList<(string Name, double Value)> Parameters => [.. Coefficients.Select((a, j) => ($"a{j + 1}", a))];

    public override double ProbabilityAt(double metres)
    {
        var sum = 1.0;
        for (var j = 0; j < Coefficients.Length; j++)
        {
            sum += Coefficients[j] * Math.Cos((j + 1) * Math.PI * metres / TruncationMetres);
        }

        return sum / Scale;
    }

    /// <summary>w / (1 + Σ a_j).</summary>
    /// <exception cref="ArgumentOutOfRangeException">Another truncation distance than the model's own.</exception>
    public override double EffectiveHalfWidth(double truncationMetres) => Own(truncationMetres) / Scale;

    /// <summary>w² [1 + 2 Σ a_j ((-1)^j - 1) / (jπ)²] / (1 + Σ a_j).</summary>
    /// <exception cref="ArgumentOutOfRangeException">Another truncation distance than the model's own.</exception>
    public override double EffectiveRadiusSquared(double truncationMetres)
    {
        var w = Own(truncationMetres);
        var sum = 1.0;
        for (var j = 1; j <= Coefficients.Length; j++)
        {
            sum += 2 * Coefficients[j - 1] * ((j % 2 == 0 ? 1 : -1) - 1) / (j * Math.PI * j * Math.PI);
        }

        return w * w * sum / Scale;
    }

    private double Scale => 1 + Coefficients.Sum();

    private double Own(double truncationMetres)
        => truncationMetres == TruncationMetres ? TruncationMetres : throw new ArgumentOutOfRangeException(nameof(truncationMetres));
}
