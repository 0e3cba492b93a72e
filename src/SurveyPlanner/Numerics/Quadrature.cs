using MathNet.Numerics.Integration;

namespace SurveyPlanner.Numerics;

/// <summary>Integrals of smooth functions by 64-point Gauss-Legendre quadrature, exact to rounding for integrands as smooth as ours.</summary>
internal static class Quadrature
{
    private const int Nodes = 64;
    private static readonly double[] Positions = new GaussLegendreRule(-1, 1, Nodes).Abscissas;
    private static readonly double[] Weights = new GaussLegendreRule(-1, 1, Nodes).Weights;

    /// <summary>∫ from one end to the other.</summary>
    public static double Integrate(Func<double, double> integrand, double from, double to)
    {
        var (middle, half) = ((from + to) / 2, (to - from) / 2);
        var sum = 0.0;
        for (var i = 0; i < Nodes; i++)
        {
            sum += Weights[i] * integrand(middle + (half * Positions[i]));
        }

        return half * sum;
    }
}
