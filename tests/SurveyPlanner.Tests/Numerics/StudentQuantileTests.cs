using MathNet.Numerics.Distributions;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Tests.Numerics;

public class StudentQuantileTests
{
    [Theory]
    [InlineData(0.975)]
    [InlineData(0.8)]
    [InlineData(0.005)]
    public void The_expansion_meets_the_exact_quantile_where_they_hand_over(double probability)
        => Assert.Equal(StudentT.InvCDF(0, 1, 2001, probability), StudentQuantile.At(probability, 2001), 1e-10);

    [Fact]
    public void Very_many_degrees_of_freedom_are_as_good_as_the_normal()
        => Assert.Equal(StudentQuantile.At(0.975, null), StudentQuantile.At(0.975, 1e13), 1e-12);
}
