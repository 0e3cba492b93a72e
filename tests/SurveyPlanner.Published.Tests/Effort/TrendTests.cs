using MathNet.Numerics.Distributions;
using SurveyPlanner.Effort;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Published.Tests.Effort;

/// <summary>
/// Gerrodette 1987 (Ecology 68:1364-1372; formulas from memory, derived again); powers computed apart with 25 digits, and by 400,000 simulated
/// series each (seed not kept; standard error 0.0008 at most).
/// </summary>
public class TrendTests
{
    [Theory]
    [InlineData(TrendShape.Linear, TrendCvModel.Constant, 0.05, 10, 0.1, 3.68210935938, 0.9574784064, 0.89535582)]
    [InlineData(TrendShape.Linear, TrendCvModel.Constant, -0.05, 10, 0.15, 3.84124951725, 0.9700334560, 0.91804198)]
    [InlineData(TrendShape.Linear, TrendCvModel.InverseRootOfAbundance, 0.05, 10, 0.2, 2.05162951662, 0.5365181083, 0.43870896)]
    [InlineData(TrendShape.Exponential, TrendCvModel.Constant, 0.05, 10, 0.1, 4.44263355989, 0.9934799008, 0.97168341)]
    [InlineData(TrendShape.Exponential, TrendCvModel.Constant, 0.05, 10, 0.2, 2.23769819007, 0.6093917995, 0.50305360)]
    [InlineData(TrendShape.Exponential, TrendCvModel.Constant, -0.05, 10, 0.15, 3.12332096961, 0.8776576529, 0.78074295)]
    [InlineData(TrendShape.Exponential, TrendCvModel.Constant, -0.03, 20, 0.2, 3.96617322927, 0.9775830360, 0.96302687)]
    [InlineData(TrendShape.Exponential, TrendCvModel.InverseRootOfAbundance, -0.05, 10, 0.15, 2.77243584157, 0.7917395356, 0.68136906)]
    public void Noncentrality_and_power_two_sided_at_5_percent(
        TrendShape shape, TrendCvModel cvModel, double change, int surveys, double cv, double delta, double normal, double noncentralT)
    {
        var series = TrendSeries.Of(new TrendDesign(cv, shape, cvModel), change, surveys)!;
        Assert.Equal(delta, series.Noncentrality, 5e-12);
        Assert.Equal(normal, series.NormalPower, 5e-11);
        Assert.Equal(noncentralT, series.NoncentralTPower, 5e-9);
    }

    /// <summary>The mean variances in closed form, as Gerrodette gives them, for the linear case.</summary>
    [Theory]
    [InlineData(TrendCvModel.InverseRootOfAbundance, 0.05, 10)]
    [InlineData(TrendCvModel.Constant, -0.04, 12)]
    [InlineData(TrendCvModel.RootOfAbundance, 0.05, 10)]
    public void Linear_mean_variances_have_closed_forms(TrendCvModel cvModel, double r, int n)
    {
        var factor = cvModel switch
        {
            TrendCvModel.InverseRootOfAbundance => 1 + (r / 2 * (n - 1)),
            TrendCvModel.Constant => 1 + (r * (n - 1) * (1 + (r / 6 * ((2 * n) - 1)))),
            _ => 1 + (3 * r / 2 * (n - 1) * (1 + (r / 3 * ((2 * n) - 1)) + (r * r / 6 * n * (n - 1)))),
        };
        var expected = Math.Abs(r) * Math.Sqrt(n * ((n * n) - 1) / (12 * 0.04 * factor));
        Assert.Equal(expected, TrendSeries.Of(new TrendDesign(0.2, TrendShape.Linear, cvModel), r, n)!.Noncentrality, 1e-12);
    }

    /// <summary>Fewest surveys by the normal form at power 0.95 and 0.80.</summary>
    [Theory]
    [InlineData(0.05, 0.1, 10, 9, 10, 8, 9, 8, 9, 8)]
    [InlineData(0.05, 0.2, 18, 14, 16, 13, 14, 12, 13, 11)]
    [InlineData(-0.05, 0.2, 12, 10, 13, 11, 14, 12, 16, 13)]
    [InlineData(0.02, 0.1, 18, 15, 17, 14, 16, 14, 16, 13)]
    public void Fewest_surveys_by_the_normal_form(double change, double cv, int a, int b, int c, int d, int e, int f, int g, int h)
    {
        (TrendShape Shape, TrendCvModel CvModel, int N95, int N80)[] expected =
        [
            (TrendShape.Linear, TrendCvModel.Constant, a, b),
            (TrendShape.Linear, TrendCvModel.InverseRootOfAbundance, c, d),
            (TrendShape.Exponential, TrendCvModel.Constant, e, f),
            (TrendShape.Exponential, TrendCvModel.InverseRootOfAbundance, g, h),
        ];
        foreach (var (shape, cvModel, n95, n80) in expected)
        {
            Assert.Equal((n95, n80), (Fewest(0.95), Fewest(0.8)));

            int Fewest(double power) => Enumerable.Range(3, 30)
                .First(n => TrendSeries.Of(new TrendDesign(cv, shape, cvModel), change, n)!.NormalPower >= power);
        }
    }

    /// <summary>The 400,000-series figures against ours at 20,000: within 4.5 standard errors of the difference.</summary>
    [Theory]
    [InlineData(0.05, 10, 0.1, 0.97149)]
    [InlineData(0.05, 10, 0.2, 0.50183)]
    [InlineData(-0.05, 10, 0.15, 0.78195)]
    [InlineData(-0.03, 20, 0.2, 0.96300)]
    public void Simulated_power_agrees_with_another_simulation_and_the_noncentral_t(double change, int surveys, double cv, double simulated)
    {
        var series = TrendSeries.Of(new TrendDesign(cv, Seed: 20270603), change, surveys)!;
        var ours = series.SimulatedPower(20_000);
        var error = Math.Sqrt(simulated * (1 - simulated) * ((1 / 20_000.0) + (1 / 400_000.0)));
        Assert.Equal(simulated, ours, 4.5 * error);
        Assert.Equal(series.NoncentralTPower, ours, 4.5 * error);
        Assert.Equal(series.NoncentralTPower, simulated, 4.5 * Math.Sqrt(simulated * (1 - simulated) / 400_000));
    }

    /// <summary>
    /// One-sided tolerance factors k = t'(γ; n - 1, z_p √n) / √n, tabulated by Owen 1963 and in many handbooks, the last row in the
    /// NIST/SEMATECH e-Handbook, section 7.2.6.3 (all from memory): the
    /// noncentral t at the printed factor gives the confidence γ.
    /// </summary>
    [Theory]
    [InlineData(5, 0.90, 0.95, 3.407)]
    [InlineData(5, 0.95, 0.95, 4.203)]
    [InlineData(10, 0.90, 0.95, 2.355)]
    [InlineData(10, 0.95, 0.95, 2.911)]
    [InlineData(20, 0.90, 0.95, 1.926)]
    [InlineData(20, 0.95, 0.95, 2.396)]
    [InlineData(43, 0.90, 0.99, 1.8740)]
    public void Noncentral_t_gives_the_tabulated_tolerance_factors(int n, double content, double confidence, double factor)
    {
        var delta = Normal.InvCDF(0, 1, content) * Math.Sqrt(n);
        var digit = n == 43 ? 5e-5 : 5.5e-4;
        Assert.True(NoncentralT.Cdf((factor - digit) * Math.Sqrt(n), n - 1, delta) < confidence);
        Assert.True(NoncentralT.Cdf((factor + digit) * Math.Sqrt(n), n - 1, delta) > confidence);
    }
}
