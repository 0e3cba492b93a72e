using MathNet.Numerics.Distributions;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Tests.Numerics;

public class NoncentralTTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(2.5)]
    [InlineData(8)]
    [InlineData(300)]
    public void Without_shift_it_is_Students_t(double df)
    {
        foreach (var t in new[] { -6, -1.5, 0, 0.3, 2.1, 9 })
        {
            Assert.Equal(StudentT.CDF(0, 1, df, t), NoncentralT.Cdf(t, df, 0), 1e-10);
        }
    }

    /// <summary>The normal limit differs by about t² φ / (4 df), below 2e-6 here.</summary>
    [Theory]
    [InlineData(0, 0.5)]
    [InlineData(3, 2.2)]
    [InlineData(4, 4.5)]
    public void With_many_degrees_of_freedom_it_is_the_shifted_normal(double delta, double t)
        => Assert.Equal(Normal.CDF(0, 1, t - delta), NoncentralT.Cdf(t, 1e6, delta), 2e-6);

    [Fact]
    public void Turning_both_signs_turns_it_round()
    {
        foreach (var (t, df, delta) in new[] { (1.7, 3.0, 2.0), (-0.4, 12, 1.1), (5, 1, 4), (30, 20, 25) })
        {
            Assert.Equal(1, NoncentralT.Cdf(t, df, delta) + NoncentralT.Cdf(-t, df, -delta), 1e-11);
        }
    }

    /// <summary>P(T ≤ 0) = Φ(-δ) whatever the degrees of freedom.</summary>
    [Theory]
    [InlineData(1)]
    [InlineData(17)]
    [InlineData(1e6)]
    public void At_zero_it_is_the_normal_tail(double df) => Assert.Equal(Normal.CDF(0, 1, -1.3), NoncentralT.Cdf(0, df, 1.3), 1e-12);
}
