using SurveyPlanner.Effort;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Published.Tests.Effort;

/// <summary>
/// The first row is the worked example of Buckland and others 2001, Introduction to Distance Sampling, section 7.2.2 (from memory); the
/// others are separate arithmetic of the same formulas. Intervals: section 3.6 of Buckland and others 1993 (formula from memory), values
/// computed apart with 25 digits.
/// </summary>
public class SizingTests
{
    [Theory]
    [InlineData(20, 5, 0.10, 3, 75)]
    [InlineData(20, 5, 0.10, 2.5, 62.5)]
    [InlineData(20, 5, 0.10, 1.5, 37.5)]
    [InlineData(26, 40, 0.15, 3, 205.128205128)]
    [InlineData(18, 30, 0.15, 3.64, 269.629629630)]
    public void Effort_for_a_target(int detections, double effort, double cv, double b, double expected)
    {
        var needed = EffortFormula.EffortFor(cv, b, detections / effort);
        Assert.Equal(expected, needed, 5e-10);
        Assert.Equal(cv, EffortFormula.CvAt(needed, b, detections / effort), 1e-14);
    }

    [Fact]
    public void B_from_the_coefficient_of_variation_a_pilot_reached()
    {
        var b = EffortFormula.B(42, 0.26);
        Assert.Equal(2.8392, b, 1e-12);
        Assert.Equal(180.266666667, EffortFormula.EffortFor(0.15, b, 42 / 60.0), 5e-10);
    }

    /// <summary>The same rows through the front door.</summary>
    [Fact]
    public void A_plan_from_rates_and_b()
    {
        var lines = Plan(20 / 5.0, 0.10, false, null)!;
        Assert.Equal(75, lines.Required!.Effort, 1e-9);
        Assert.Equal(300, lines.Required.Precision.ExpectedDetections, 1e-9);
        Assert.Equal(206, Plan(26 / 40.0, 0.15, true, null)!.Required!.Effort);
        Assert.Equal(269.629629630, Plan(18 / 30.0, 0.15, false, new GivenClusterSize(5, 4))!.Required!.Effort, 5e-10);
    }

    [Theory]
    [InlineData(0.1, 1.21592979055, 8.22415905730, 12.1592979055)]
    [InlineData(0.2, 1.47425913208, 6.78306803897, 14.7425913208)]
    [InlineData(0.3, 1.77778422336, 5.62497960585, 17.7778422336)]
    [InlineData(0.5, 2.52401077090, 3.96194822750, 25.2401077090)]
    public void Log_normal_interval_of_a_density_of_10(double cv, double factor, double lower, double upper)
    {
        var c = LogNormalInterval.Factor(cv, null);
        Assert.Equal(factor, c, 5e-11);
        Assert.Equal(lower, 10 / c, 1e-10);
        Assert.Equal(upper, 10 * c, 5e-10);
    }

    [Fact]
    public void Components_add_up_with_Satterthwaites_degrees_of_freedom()
    {
        var two = CvDecomposition.Of([(CvSource.EncounterRate, 0.2, 9), (CvSource.Detection, 0.1, 59)]);
        Check(two, 0.223606797750, 13.929695697796, 1.60636768493, [0.8, 0.2]);
        var three = CvDecomposition.Of([(CvSource.EncounterRate, 0.2, 9), (CvSource.Detection, 0.1, 59), (CvSource.ClusterSize, 0.05, 59)]);
        Check(three, 0.229128784748, 15.348430228747, 1.61800034653, [0.76190476, 0.19047619, 0.047619048]);
    }

    private static void Check(CvDecomposition result, double cv, double df, double factor, double[] shares)
    {
        Assert.Equal(cv, result.Cv, 1e-12);
        Assert.Equal(df, result.DegreesOfFreedom!.Value, 1e-11);
        Assert.Equal(factor, result.IntervalFactor!.Value, 1e-11);
        Assert.Equal(shares, result.Components.Select(component => component.Share!.Value), (a, b) => Math.Abs(a - b) < 5e-9);
    }

    private static EffortPlan? Plan(double rate, double cv, bool isPoints, GivenClusterSize? size)
        => EffortPlanning.For(
            EffortDesign.None with { TargetCv = cv, GivenEncounterRate = rate, B = 3, ClusterSize = size },
            null,
            [new EffortStratum("all", 100, isPoints, 100, true)],
            1);
}
