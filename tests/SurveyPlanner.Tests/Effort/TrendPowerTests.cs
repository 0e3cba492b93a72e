using SurveyPlanner.Effort;

namespace SurveyPlanner.Tests.Effort;

public class TrendPowerTests
{
    private static readonly TrendDesign Design = new(0.2, Seed: 31);

    [Fact]
    public void The_smallest_change_just_reaches_the_power()
    {
        foreach (var decline in new[] { true, false })
        {
            var smallest = TrendPower.SmallestChange(Design, 10, 0.8, decline)!;
            Assert.InRange(smallest.Power, 0.8, 0.802);
            Assert.Equal(decline, smallest.ChangePerYear < 0);
        }
    }

    [Fact]
    public void The_surveys_needed_are_the_fewest()
    {
        var needed = TrendPower.SurveysNeeded(Design, -0.05, 0.8)!;
        Assert.True(needed.Power >= 0.8);
        Assert.True(TrendPower.At(Design, -0.05, needed.Surveys - 1)!.Power < 0.8);
        Assert.Equal(needed.Surveys - 1, needed.Years);
    }

    /// <summary>The simulated test's level is the significance level: 20,000 series, seed 31, 4.5 standard errors.</summary>
    [Fact]
    public void Without_a_change_the_test_finds_one_as_often_as_its_level_says()
    {
        var still = TrendSeries.Of(Design, 0, 8)!;
        Assert.Equal(0.05, still.NoncentralTPower, 1e-10);
        Assert.Equal(0.05, still.SimulatedPower(20_000), 4.5 * Math.Sqrt(0.05 * 0.95 / 20_000));
    }

    [Fact]
    public void Surveys_every_second_year_of_a_yearly_change_are_yearly_surveys_of_the_change_over_two()
    {
        var everySecond = TrendPower.At(Design with { YearsBetweenSurveys = 2 }, -0.04, 7)!;
        Assert.Equal(TrendPower.At(Design, (0.96 * 0.96) - 1, 7)!.Power, everySecond.Power, 1e-12);
        Assert.Equal(12, everySecond.Years);
        Assert.Equal(Math.Pow(0.96, 12) - 1, everySecond.TotalChange, 1e-12);
    }

    [Fact]
    public void A_one_sided_test_finds_more_in_its_direction()
        => Assert.True(TrendPower.At(Design with { OneSided = true }, -0.04, 8)!.Power > TrendPower.At(Design, -0.04, 8)!.Power);

    [Fact]
    public void Where_the_noncentral_t_is_not_exact_power_is_simulated_and_says_so()
    {
        var figure = TrendPower.At(Design with { Shape = TrendShape.Linear }, 0.05, 10)!;
        Assert.Equal(TrendMethod.Simulation, figure.Method);
        Assert.InRange(figure.StandardError!.Value, 0.001, 0.0036);
        Assert.Equal(figure.NoncentralT, figure.Power, 0.05);
        Assert.Equal(figure, TrendPower.At(Design with { Shape = TrendShape.Linear }, 0.05, 10));
    }

    [Fact]
    public void A_linear_decline_to_nothing_has_no_power_to_speak_of()
    {
        var linear = Design with { Shape = TrendShape.Linear };
        Assert.Null(TrendPower.At(linear, -0.12, 10));
        Assert.NotNull(TrendPower.At(linear, -0.10, 10));
        Assert.Null(TrendPower.SurveysNeeded(linear with { FirstCv = 1 }, -0.3, 0.9));
    }

    [Fact]
    public void Impossible_programmes_are_refused_with_every_problem()
    {
        var problems = Assert.Throws<InputException>(
            () => TrendPower.At(new TrendDesign(20, SignificanceLevel: 5, YearsBetweenSurveys: 0), 0.1, 10)).Problems;
        Assert.Equal(3, problems.Count);
        Assert.Throws<InputException>(() => TrendPower.At(Design, 0.1, 2));
        Assert.Throws<InputException>(() => TrendPower.At(Design, double.NaN, 5));
    }
}
