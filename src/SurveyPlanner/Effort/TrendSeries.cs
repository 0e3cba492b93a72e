using MathNet.Numerics.Distributions;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Effort;

/// <summary>One assumed course of abundance: relative abundances and coefficients of variation of the surveys, the first abundance being 1.</summary>
internal sealed record TrendSeries(TrendDesign Design, double Slope, double[] Abundances, double[] Cvs)
{
    /// <summary>Null where abundance would fall to nothing before the last survey.</summary>
    public static TrendSeries? Of(TrendDesign design, double changePerYear, int surveys)
    {
        var isLinear = design.Shape == TrendShape.Linear;
        var slope = isLinear ? changePerYear * design.YearsBetweenSurveys : Math.Log(1 + changePerYear) * design.YearsBetweenSurveys;
        var abundances = Enumerable.Range(0, surveys).Select(i => isLinear ? 1 + (slope * i) : Math.Exp(slope * i)).ToArray();
        if (changePerYear <= -1 || abundances.Any(abundance => abundance <= 0))
        {
            return null;
        }

        var cvs = abundances.Select(abundance => design.FirstCv * design.CvModel switch
        {
            TrendCvModel.Constant => 1,
            TrendCvModel.InverseRootOfAbundance => 1 / Math.Sqrt(abundance),
            TrendCvModel.RootOfAbundance => Math.Sqrt(abundance),
            _ => throw new ArgumentOutOfRangeException(nameof(design)),
        });
        return new TrendSeries(design, slope, abundances, [.. cvs]);
    }

    public int Surveys => Abundances.Length;

    /// <summary>
    /// δ = |b| sqrt(n(n² - 1) / 12 s²), s² the mean variance about the regression: of A in the linear case, of ln A in the exponential one,
    /// ln(1 + cv²). Source: Gerrodette 1987, Ecology 68:1364-1372 (formulas from memory, the mean variances derived again).
    /// </summary>
    public double Noncentrality
    {
        get
        {
            var variance = Design.Shape == TrendShape.Linear
                ? Abundances.Zip(Cvs, (abundance, cv) => Math.Pow(abundance * cv, 2)).Average()
                : Cvs.Average(cv => Math.Log(1 + (cv * cv)));
            var n = (double)Surveys;
            return Math.Abs(Slope) * Math.Sqrt(n * ((n * n) - 1) / (12 * variance));
        }
    }

    /// <summary>Φ(δ - z): the normal form.</summary>
    public double NormalPower => Normal.CDF(0, 1, Noncentrality - StudentQuantile.At(1 - Tail, null));

    /// <summary>The t test with n - 2 degrees of freedom (Link and Hatfield 1990, Gerrodette 1991, from memory); two-sided, both tails count.</summary>
    public double NoncentralTPower
    {
        get
        {
            var (df, delta) = (Surveys - 2, Noncentrality);
            var critical = StudentQuantile.At(1 - Tail, df);
            var expected = 1 - NoncentralT.Cdf(critical, df, delta);
            return Design.OneSided ? expected : expected + NoncentralT.Cdf(-critical, df, delta);
        }
    }

    /// <summary>Share of simulated series whose regression is significant; estimates are log-normal with mean A and the survey's cv.</summary>
    public double SimulatedPower(int replicates)
    {
        var critical = StudentQuantile.At(1 - Tail, Surveys - 2);
        var logSds = Cvs.Select(cv => Math.Sqrt(Math.Log(1 + (cv * cv)))).ToArray();
        var logMeans = Abundances.Select((abundance, i) => Math.Log(abundance) - (logSds[i] * logSds[i] / 2)).ToArray();
        var estimates = new double[Surveys];
        var found = 0;
        for (uint replicate = 0; replicate < replicates; replicate++)
        {
            var random = new PhiloxStream(Design.Seed, RandomPurpose.Trend, (uint)Surveys, replicate);
            for (var i = 0; i < Surveys; i++)
            {
                var logarithm = logMeans[i] + (logSds[i] * random.NextNormal());
                estimates[i] = Design.Shape == TrendShape.Linear ? Math.Exp(logarithm) : logarithm;
            }

            var t = RegressionT(estimates) * (Slope < 0 ? -1 : 1);
            found += t > critical || (!Design.OneSided && t < -critical) ? 1 : 0;
        }

        return (double)found / replicates;
    }

    private double Tail => Design.OneSided ? Design.SignificanceLevel : Design.SignificanceLevel / 2;

    /// <summary>t of the slope of a least-squares line through equally spaced values.</summary>
    private static double RegressionT(double[] values)
    {
        var n = values.Length;
        var middle = (n - 1) / 2.0;
        var mean = values.Sum() / n;
        var (cross, squares) = (0.0, 0.0);
        for (var i = 0; i < n; i++)
        {
            cross += (i - middle) * values[i];
            squares += (values[i] - mean) * (values[i] - mean);
        }

        var spread = n * (((double)n * n) - 1) / 12;
        var slope = cross / spread;
        return slope / Math.Sqrt((squares - (slope * cross)) / (n - 2) / spread);
    }
}
