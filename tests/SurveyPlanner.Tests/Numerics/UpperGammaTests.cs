using MathNet.Numerics;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Tests.Numerics;

public class UpperGammaTests
{
    /// <summary>E1(1) as tabulated by Abramowitz and Stegun, table 5.1 (from memory).</summary>
    [Fact]
    public void Order_0_is_the_exponential_integral() => Assert.Equal(0.219383934395520, UpperGamma.At(0, 1), 1e-14);

    [Theory]
    [InlineData(0.01)]
    [InlineData(0.7)]
    [InlineData(3)]
    public void Order_one_half_is_the_error_function(double t)
        => Assert.Equal(Math.Sqrt(Math.PI) * SpecialFunctions.Erfc(Math.Sqrt(t)), UpperGamma.At(0.5, t), 1e-14);

    [Theory]
    [InlineData(-0.999)]
    [InlineData(-0.5)]
    [InlineData(-1e-9)]
    [InlineData(0.3)]
    [InlineData(0.96)]
    public void The_recurrence_holds_from_far_below_one_to_far_above(double s)
    {
        foreach (var t in new[] { 1e-30, 1e-6, 0.2, 0.999, 1, 1.5, 20 })
        {
            var (first, second) = (s * UpperGamma.At(s, t), Math.Exp((s * Math.Log(t)) - t));
            Assert.Equal(UpperGamma.At(s + 1, t), first + second, 2e-13 * (Math.Abs(first) + second));
        }
    }
}
