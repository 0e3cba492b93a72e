using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Published.Tests.Effort;

/// <summary>
/// Detection functions of Buckland and others 2001, Introduction to Distance Sampling, chapters 2 and 3 (from memory). Values: the closed
/// forms evaluated apart with 25 digits, each checked there by quadrature to 1e-24.
/// </summary>
public class DetectionTests
{
    private static readonly ImmutableArray<double> Distances = [2, 5, 1, 8, 12, 3, 7, 4, 15, 6];

    public static TheoryData<DetectionFunction, double, double, double> Functions => new()
    {
        { new HalfNormalDetection(10), double.PositiveInfinity, 12.533141373155, 14.142135623731 },
        { new HalfNormalDetection(10), 10, 8.5562439189215, 8.8709564341999 },
        { new HalfNormalDetection(10), 20, 11.962880133226, 13.150397079658 },
        { new HalfNormalDetection(10), 30, 12.499304447415, 14.063363775866 },
        { new HalfNormalDetection(100), 250, 123.77488146339, 138.27964899989 },
        { new HazardRateDetection(10, 2), 20, 12.922902719371, 13.889130650110 },
        { new HazardRateDetection(10, 3), 30, 12.989707524345, 14.196255331726 },
        { new HazardRateDetection(25, 4), 75, 30.327589966045, 32.225482931011 },
        { new HazardRateDetection(10, 3), double.PositiveInfinity, 13.541179394264, 16.367463257047 },
        { new UniformCosineDetection(50, [0.5]), 50, 33.333333333333, 36.454483782642 },
        { new UniformCosineDetection(50, [0.8]), 50, 27.777777777778, 30.636130910171 },
        { new StripDetection(), 50, 50, 50 },
    };

    [Theory]
    [MemberData(nameof(Functions))]
    public void Effective_half_width_and_radius(DetectionFunction function, double truncation, double halfWidth, double radius)
    {
        Assert.Equal(halfWidth, function.EffectiveHalfWidth(truncation), 6e-13 * Math.Max(halfWidth, 1));
        Assert.Equal(radius, function.EffectiveRadius(truncation), 6e-13 * Math.Max(radius, 1));
    }

    [Fact]
    public void Half_normal_estimate_along_lines_without_truncation()
    {
        var fit = Fit(double.PositiveInfinity, false);
        Assert.Equal(7.5696763471102, fit.Parameters[0].Value, 1e-12);
        Assert.Equal(9.4871823807360, fit.EffectiveMetres!.Value, 1e-12);
        Assert.Equal(0.10540537325714, 1 / fit.EffectiveMetres.Value, 1e-14);
        Assert.Equal(-27.499416645051, fit.LogLikelihood!.Value, 1e-11);
        Assert.Equal(1 / Math.Sqrt(20), fit.EffectiveCv!.Value, 1e-12);
    }

    [Fact]
    public void Half_normal_estimate_at_points_without_truncation()
    {
        var fit = Fit(double.PositiveInfinity, true);
        Assert.Equal(5.3525694764291, fit.Parameters[0].Value, 1e-12);
        Assert.Equal(7.5696763471102, fit.EffectiveMetres!.Value, 1e-12);

        // h(0) = f'(0) = 2 / ρ².
        Assert.Equal(0.034904013961606, 2 / Math.Pow(fit.EffectiveMetres.Value, 2), 1e-14);
        Assert.Equal(1 / Math.Sqrt(10), fit.EffectiveCv!.Value, 1e-12);
    }

    [Fact]
    public void Half_normal_estimate_along_lines_truncated()
    {
        var fit = Fit(20, false);
        Assert.Equal(7.9058581079876, fit.Parameters[0].Value, 1e-12);
        Assert.Equal(9.7954303923523, fit.EffectiveMetres!.Value, 1e-12);
        Assert.Equal(-27.402969773533, fit.LogLikelihood!.Value, 1e-11);
        Assert.Equal(2.13040027505, fit.Parameters[0].StandardError!.Value, 5e-11);
        Assert.Equal(0.24704085686, fit.EffectiveCv!.Value, 5e-11);
    }

    /// <summary>n cv² of the effective half-width or area under a half-normal truncated at w, from (E x²)² / var(x²).</summary>
    [Theory]
    [InlineData(1, 1.06278970064, 2.55434744926)]
    [InlineData(1.5, 0.891174308823, 2.12738052622)]
    [InlineData(2, 0.732312787680, 1.71023903609)]
    [InlineData(2.5, 0.615680080851, 1.38224527246)]
    [InlineData(3, 0.546781067062, 1.17077661058)]
    [InlineData(double.PositiveInfinity, 0.5, 1)]
    public void Detection_part_of_b(double truncation, double lines, double points)
    {
        Assert.Equal(lines, Part(false), 5e-11);
        Assert.Equal(points, Part(true), 5e-11);

        double Part(bool isPoints)
        {
            var (mean, variance) = HalfNormalFit.Moments(1, truncation, isPoints);
            return mean * mean / variance;
        }
    }

    private static DetectionFit Fit(double truncation, bool isPoints)
        => DetectionFitting.Fit(Distances, truncation, isPoints, [DetectionModel.HalfNormal]).Chosen!;
}
