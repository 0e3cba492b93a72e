namespace SurveyPlanner.Numerics;

/// <summary>Random numbers of the usual distributions, all exact (no normal approximations), from a Philox stream.</summary>
internal static class RandomVariates
{
    /// <summary>Above this a Poisson mean is halved, so that the product of uniforms stays far from underflow.</summary>
    private const double LargePoissonMean = 16;

    /// <summary>Standard normal, by Marsaglia's polar method (Marsaglia and Bray 1964).</summary>
    public static double NextNormal(this ref PhiloxStream random)
    {
        while (true)
        {
            var x = (2 * random.NextDouble()) - 1;
            var y = (2 * random.NextDouble()) - 1;
            var square = (x * x) + (y * y);
            if (square is > 0 and < 1)
            {
                return x * Math.Sqrt(-2 * Math.Log(square) / square);
            }
        }
    }

    /// <summary>Gamma with this shape (above 0) and scale 1, by Marsaglia and Tsang 2000.</summary>
    public static double NextGamma(this ref PhiloxStream random, double shape)
    {
        if (shape < 1)
        {
            return random.NextGamma(shape + 1) * Math.Pow(1 - random.NextDouble(), 1 / shape);
        }

        var d = shape - (1.0 / 3);
        var c = 1 / Math.Sqrt(9 * d);
        while (true)
        {
            var x = random.NextNormal();
            var v = Math.Pow(1 + (c * x), 3);
            if (v > 0 && Math.Log(1 - random.NextDouble()) < (0.5 * x * x) + d - (d * v) + (d * Math.Log(v)))
            {
                return d * v;
            }
        }
    }

    /// <summary>Chi-square with these degrees of freedom.</summary>
    public static double NextChiSquare(this ref PhiloxStream random, double degreesOfFreedom) => 2 * random.NextGamma(degreesOfFreedom / 2);

    /// <summary>Poisson with a mean of 0 or more: large means as sums of halves, small ones by multiplying uniforms.</summary>
    public static int NextPoisson(this ref PhiloxStream random, double mean)
    {
        if (mean > LargePoissonMean)
        {
            return random.NextPoisson(mean / 2) + random.NextPoisson(mean / 2);
        }

        var limit = Math.Exp(-mean);
        var product = random.NextDouble();
        var count = 0;
        while (product > limit)
        {
            product *= random.NextDouble();
            count++;
        }

        return count;
    }

    /// <summary>
    /// A count with this mean and variance-to-mean ratio: negative binomial (Poisson with a gamma mean) above 1, Poisson at 1 and below.
    /// </summary>
    public static int NextCount(this ref PhiloxStream random, double mean, double dispersion)
    {
        if (dispersion <= 1 || mean <= 0)
        {
            return random.NextPoisson(mean);
        }

        var shape = mean / (dispersion - 1);
        return random.NextPoisson(random.NextGamma(shape) * (dispersion - 1));
    }

    /// <summary>A distance seen with a detection function, uniform over the strip or the disc before thinning (rejection).</summary>
    public static double NextDistance(this ref PhiloxStream random, Func<double, double> probability, double truncation, bool isPoints)
    {
        while (true)
        {
            var u = random.NextDouble();
            var distance = truncation * (isPoints ? Math.Sqrt(u) : u);
            if (random.NextDouble() < probability(distance))
            {
                return distance;
            }
        }
    }
}
