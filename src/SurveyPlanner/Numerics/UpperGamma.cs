using MathNet.Numerics;

namespace SurveyPlanner.Numerics;

/// <summary>
/// The upper incomplete gamma function Γ(s, t) = ∫_t^∞ y^(s-1) e^-y dy for any real s, where library versions want s above 0.
/// Accuracy: 1e-13 relative for s in [-1, 1], t from 0 up, held in the tests. References: the continued fraction is DLMF 8.9.2.
/// </summary>
internal static class UpperGamma
{
    /// <summary>Below exp(-38) a growing exponential adds nothing to a double.</summary>
    private const double Negligible = 38;

    /// <summary>Γ(s, t); t is 0 or more, and above 0 when s is not.</summary>
    public static double At(double s, double t)
        => t >= 1 ? ContinuedFraction(s, t) : t == 0 ? SpecialFunctions.Gamma(s) : ContinuedFraction(s, 1) + UpToOne(s, t);

    /// <summary>∫_t^1 with y = e^u, which is smooth in u whatever the sign of s.</summary>
    private static double UpToOne(double s, double t)
    {
        var from = s > 0 ? Math.Max(Math.Log(t), -Negligible / s) : Math.Log(t);
        return Quadrature.Integrate(u => Math.Exp((s * u) - Math.Exp(u)), from, 0);
    }

    /// <summary>Lentz's method.</summary>
    private static double ContinuedFraction(double s, double t)
    {
        const double tiny = 1e-300;
        const int mostSteps = 500;
        var b = t + 1 - s;
        var c = 1 / tiny;
        var d = 1 / b;
        var fraction = d;
        for (var i = 1; i <= mostSteps; i++)
        {
            var a = -i * (i - s);
            b += 2;
            d = 1 / NotZero((a * d) + b);
            c = NotZero(b + (a / c));
            fraction *= d * c;
            if (Math.Abs((d * c) - 1) < 1e-16)
            {
                break;
            }
        }

        return Math.Exp(-t + (s * Math.Log(t))) * fraction;

        static double NotZero(double value) => Math.Abs(value) < tiny ? tiny : value;
    }
}
