using SurveyPlanner.Numerics;

namespace SurveyPlanner.Tests.Numerics;

/// <summary>Means and variances of 50,000 draws with seed 7 within 5 standard errors of the textbook values.</summary>
public class RandomVariatesTests
{
    private const int Draws = 50_000;

    [Fact]
    public void Normal() => Check((ref PhiloxStream random) => random.NextNormal(), 0, 1, 3);

    [Theory]
    [InlineData(0.3)]
    [InlineData(4.5)]
    public void Gamma(double shape) => Check((ref PhiloxStream random) => random.NextGamma(shape), shape, shape, 3 + (6 / shape));

    [Theory]
    [InlineData(0.4)]
    [InlineData(7)]
    [InlineData(50)]
    public void Poisson(double mean) => Check((ref PhiloxStream random) => random.NextPoisson(mean), mean, mean, 3 + (1 / mean));

    /// <summary>Negative binomial with mean 12 and size 3: variance 60 = mean times 5.</summary>
    [Fact]
    public void Overdispersed_counts() => Check((ref PhiloxStream random) => random.NextCount(12, 5), 12, 60, 3 + (6 / 3.0) + (1 / 60.0));

    private delegate double Draw(ref PhiloxStream random);

    private static void Check(Draw draw, double mean, double variance, double kurtosis)
    {
        var random = new PhiloxStream(7, 1000, 0, 0);
        var (sum, squares) = (0.0, 0.0);
        for (var i = 0; i < Draws; i++)
        {
            var deviation = draw(ref random) - mean;
            sum += deviation;
            squares += deviation * deviation;
        }

        Assert.Equal(0, sum / Draws, 5 * Math.Sqrt(variance / Draws));
        Assert.Equal(variance, squares / Draws, 5 * variance * Math.Sqrt((kurtosis - 1) / Draws));
    }
}
