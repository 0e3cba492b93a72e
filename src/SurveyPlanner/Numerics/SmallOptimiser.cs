namespace SurveyPlanner.Numerics;

/// <summary>Where a function of one or two parameters is largest.</summary>
/// <param name="Point">The parameters.</param>
/// <param name="Value">The function there.</param>
/// <param name="Information">Its negative second derivatives there, all parameters.</param>
/// <param name="OnBound">Whether a parameter stopped at a bound although the function still rises beyond it.</param>
/// <param name="Converged">Whether it is a maximum within the bounds.</param>
internal sealed record Maximum(double[] Point, double Value, double[,] Information, bool OnBound, bool Converged);

/// <summary>
/// Maximises a smooth function of one or two parameters in a box: damped Newton steps (Levenberg) with derivatives by central differences.
/// Accuracy: parameters to about 1e-6 of their scale, which must be near 1 (take logarithms first). Local: start it well.
/// </summary>
internal static class SmallOptimiser
{
    /// <summary>Balances the error of second differences (h²) against rounding (1e-13 / h² for a value of some hundreds).</summary>
    private const double Step = 5e-4;

    private const int MostIterations = 200;

    /// <summary>What a full Newton step would still gain (twice that); a log-likelihood this close to its maximum is within 1e-4 standard errors of it.</summary>
    private const double NoGain = 1e-8;

    /// <summary>Slope per unit of parameter that counts as flat where no Newton step exists.</summary>
    private const double Flat = 1e-5;

    private const double LongestStep = 1;

    public static Maximum Maximise(Func<double[], double> function, double[] start, double[] lower, double[] upper)
    {
        var point = (double[])start.Clone();
        var value = function(point);
        var damping = 1e-3;
        for (var iteration = 0; iteration < MostIterations; iteration++)
        {
            var (gradient, information) = Derivatives(function, point, lower, upper);
            var held = Held(point, gradient, lower, upper);
            var onBound = held.Any(isHeld => isHeld);
            if (IsMaximum(gradient, information, held))
            {
                return new Maximum(point, value, information, onBound, true);
            }

            (var moved, var newValue, damping) = Improve(function, point, value, gradient, information, held, damping, lower, upper);
            if (newValue <= value)
            {
                return new Maximum(point, value, information, onBound, false);
            }

            (point, value) = (moved, newValue);
        }

        return new Maximum(point, value, Derivatives(function, point, lower, upper).Information, false, false);
    }

    /// <summary>Variances and covariances: the inverse of the information; null when it is not positive definite.</summary>
    public static double[,]? Inverse(double[,] information)
    {
        if (information.GetLength(0) == 1)
        {
            return information[0, 0] > 0 ? new[,] { { 1 / information[0, 0] } } : null;
        }

        var determinant = (information[0, 0] * information[1, 1]) - (information[0, 1] * information[1, 0]);
        return information[0, 0] > 0 && determinant > 0
            ? new[,]
            {
                { information[1, 1] / determinant, -information[0, 1] / determinant },
                { -information[1, 0] / determinant, information[0, 0] / determinant },
            }
            : null;
    }

    /// <summary>Variance of a smooth quantity of the parameters by the delta method.</summary>
    public static double DeltaVariance(Func<double[], double> quantity, Maximum at, double[,] covariance, double[] lower, double[] upper)
    {
        var (gradient, _) = Derivatives(quantity, at.Point, lower, upper);
        var sum = 0.0;
        for (var i = 0; i < gradient.Length; i++)
        {
            for (var j = 0; j < gradient.Length; j++)
            {
                sum += gradient[i] * covariance[i, j] * gradient[j];
            }
        }

        return sum;
    }

    /// <summary>Tries ever shorter steps until one improves the value; gives the point back unimproved when none does.</summary>
    private static (double[] Point, double Value, double Damping) Improve(
        Func<double[], double> function, double[] point, double value, double[] gradient, double[,] information, bool[] held, double damping, double[] lower, double[] upper)
    {
        const double hopeless = 1e12;
        for (; damping < hopeless; damping *= 10)
        {
            if (NewtonStep(gradient, information, held, damping) is not { } step)
            {
                continue;
            }

            var longest = step.Max(Math.Abs);
            var scale = longest > LongestStep ? LongestStep / longest : 1;
            var moved = point.Select((x, i) => Math.Clamp(x + (scale * step[i]), lower[i], upper[i])).ToArray();
            var newValue = function(moved);
            if (newValue > value)
            {
                return (moved, newValue, Math.Max(damping / 10, 1e-9));
            }
        }

        return (point, value, damping);
    }

    private static double[]? NewtonStep(double[] gradient, double[,] information, bool[] held, double damping)
    {
        var n = gradient.Length;
        var system = new double[n, n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
            {
                system[i, j] = held[i] || held[j] ? (i == j ? 1 : 0) : information[i, j];
            }

            system[i, i] += damping * Math.Max(1, Math.Abs(system[i, i]));
        }

        if (Inverse(system) is not { } inverse)
        {
            return null;
        }

        var step = new double[n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
            {
                step[i] += held[i] || held[j] ? 0 : inverse[i, j] * gradient[j];
            }
        }

        return step;
    }

    private static bool IsMaximum(double[] gradient, double[,] information, bool[] held)
    {
        if (Enumerable.Range(0, gradient.Length).All(i => held[i] || Math.Abs(gradient[i]) < Flat))
        {
            return true;
        }

        return NewtonStep(gradient, information, held, 0) is { } step && step.Select((by, i) => by * gradient[i]).Sum() < NoGain;
    }

    private static bool[] Held(double[] point, double[] gradient, double[] lower, double[] upper)
        => [.. point.Select((x, i) => (x <= lower[i] && gradient[i] < 0) || (x >= upper[i] && gradient[i] > 0))];

    /// <summary>
    /// Slope and negative second derivatives. Along a parameter at the edge of the box they are taken two steps inside it, and its slope is
    /// carried back; the others keep their own place, so that a search along an edge sees the edge.
    /// </summary>
    private static (double[] Gradient, double[,] Information) Derivatives(
        Func<double[], double> function, double[] point, double[] lower, double[] upper)
    {
        var n = point.Length;
        var inside = point.Select((x, i) => Math.Clamp(x, lower[i] + (2 * Step), upper[i] - (2 * Step))).ToArray();
        var (gradient, information) = (new double[n], new double[n, n]);
        for (var i = 0; i < n; i++)
        {
            var centre = Moved(point, i, inside[i] - point[i]);
            var (middle, up, down) = (function(centre), function(Moved(centre, i, Step)), function(Moved(centre, i, -Step)));
            information[i, i] = -(up - (2 * middle) + down) / (Step * Step);
            gradient[i] = ((up - down) / (2 * Step)) - (information[i, i] * (point[i] - inside[i]));
        }

        if (n == 2)
        {
            double At(int first, int second) => function(Moved(Moved(inside, 0, first * Step), 1, second * Step));
            information[0, 1] = information[1, 0] = -(At(1, 1) - At(1, -1) - At(-1, 1) + At(-1, -1)) / (4 * Step * Step);
        }

        return (gradient, information);
    }

    private static double[] Moved(double[] point, int index, double by)
    {
        var moved = (double[])point.Clone();
        moved[index] += by;
        return moved;
    }
}
