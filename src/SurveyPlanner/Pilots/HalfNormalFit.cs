using SurveyPlanner.Numerics;

namespace SurveyPlanner.Pilots;

/// <summary>
/// The half-normal needs only the mean of x²: its likelihood is that of an exponential family, and the estimate makes the model's mean of x²
/// equal to the sample's. Var(σ̂) = σ⁶ / (n var(x²)), cv²(μ̂) = (E x²)² / (n var(x²)), derived for this program.
/// </summary>
internal static class HalfNormalFit
{
    /// <summary>σ may reach this many truncation distances; g at the truncation distance is then 0.995, as good as a strip.</summary>
    private const double WidestSigma = 10;

    /// <summary>A truncation distance of two σ, an ordinary one, where no distances say better.</summary>
    private const double OrdinaryTruncationInSigma = 2;

    /// <summary>Distances beyond this many σ weigh less than rounding.</summary>
    private const double Farthest = 9.5;

    public static DetectionFit Fit(DistanceSample data)
    {
        var n = data.Distances.Length;
        var meanSquare = data.Distances.Sum(x => x * x) / n;
        var (sigma, onBound) = Sigma(meanSquare, data.Truncation, data.IsPoints);
        var (mean, variance) = Moments(sigma, data.Truncation, data.IsPoints);
        var function = new HalfNormalDetection(sigma);
        return new DetectionFit(
            DetectionModel.HalfNormal,
            onBound ? FitStatus.OnBound : FitStatus.Converged,
            onBound ? DetectionFit.FlatMeaning : "Converged.",
            n,
            function,
            [new FittedParameter("sigma_m", sigma, onBound ? null : Math.Pow(sigma, 3) / Math.Sqrt(n * variance))],
            data.LogLikelihood(function),
            data.IsPoints ? function.EffectiveRadius(data.Truncation) : function.EffectiveHalfWidth(data.Truncation),
            onBound ? null : mean / Math.Sqrt(n * variance))
        {
            IsFlat = onBound,
        };
    }

    /// <summary>n cv² by theory at an ordinary truncation distance: 0.73 for lines, 1.71 for points.</summary>
    internal static double OrdinaryPart(bool isPoints)
    {
        var (mean, variance) = Moments(1 / OrdinaryTruncationInSigma, 1, isPoints);
        return mean * mean / variance;
    }

    /// <summary>σ at which the model's mean of x² is the one seen, by Newton steps in 1/σ², in which the mean falls smoothly.</summary>
    internal static (double Sigma, bool OnBound) Sigma(double meanSquare, double truncation, bool isPoints)
    {
        var least = double.IsInfinity(truncation) ? 0 : 1 / Math.Pow(WidestSigma * truncation, 2);
        if (least > 0 && Moments(WidestSigma * truncation, truncation, isPoints).Mean <= meanSquare)
        {
            return (WidestSigma * truncation, true);
        }

        var inverse = (isPoints ? 2 : 1) / meanSquare;
        for (var i = 0; i < 100; i++)
        {
            var (mean, variance) = Moments(1 / Math.Sqrt(inverse), truncation, isPoints);

            // d mean / d(1/σ²) = -var / 2; never below the bound, and at most halving, so that a far first guess stays in range.
            var next = Math.Max(Math.Max(inverse + (2 * (mean - meanSquare) / variance), least), inverse / 4);
            var done = Math.Abs(next - inverse) <= 1e-15 * inverse;
            inverse = next;
            if (done)
            {
                break;
            }
        }

        return (1 / Math.Sqrt(inverse), false);
    }

    /// <summary>Mean and variance of x² under the model truncated at w.</summary>
    internal static (double Mean, double Variance) Moments(double sigma, double truncation, bool isPoints)
    {
        var end = Math.Min(truncation / sigma, Farthest);
        var (total, second, fourth) = (0.0, 0.0, 0.0);
        foreach (var (place, weight) in Quadrature.UnitRule)
        {
            var z = end * place;
            var density = weight * Math.Exp(-z * z / 2) * (isPoints ? z : 1);
            total += density;
            second += density * z * z;
            fourth += density * z * z * z * z;
        }

        var s2 = sigma * sigma;
        var mean = second / total;
        return (mean * s2, ((fourth / total) - (mean * mean)) * s2 * s2);
    }
}
