using System.Collections.Immutable;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Tests.Pilots;

public class DetectionBootstrapTests
{
    private const double Truncation = 100;

    /// <summary>
    /// A second method: with one model inside its bounds the bootstrap gives the n cv² of the likelihood, within 4 standard errors of a variance
    /// from 500 replicates (√(2/500) each) and 5 % for 200 distances being no infinite number. Seed 31.
    /// </summary>
    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void With_one_model_the_bootstrap_agrees_with_the_likelihood(bool isPoints)
    {
        var fits = DetectionFitting.Fit(Sample(new HalfNormalDetection(40), isPoints, 200, 31), Truncation, isPoints, [DetectionModel.HalfNormal]);
        var part = DetectionBootstrap.Of(fits).Part!.Value;
        Assert.Equal(1, part / fits.Chosen!.RelativeVariance!.Value, (4 * Math.Sqrt(2.0 / DetectionBootstrap.Replicates)) + 0.05);
    }

    /// <summary>
    /// At the bound where detection does not fall off, 1/σ² is estimated as the positive part of a normal about 0, whose variance is
    /// 1/2 - 1/(2π) of that normal's (arithmetic); without the bound n cv² would be 5/4 along lines and 3 at points, the half-normal's theory as σ grows.
    /// Within 4 standard errors of the bootstrap (kurtosis of the half-normal spike: twice the usual) and 10 % for 200 distances.
    /// </summary>
    [Theory]
    [InlineData(false, 1.25)]
    [InlineData(true, 3)]
    public void At_the_flat_bound_the_bootstrap_gives_the_variance_of_an_estimate_that_cannot_pass_it(bool isPoints, double unbounded)
    {
        ImmutableArray<double> even = [.. Enumerable.Range(1, 200).Select(i => Truncation * (isPoints ? Math.Sqrt(i / 200.0) : i / 200.0))];
        var fits = DetectionFitting.Fit(even, Truncation, isPoints, [DetectionModel.HalfNormal]);
        Assert.True(fits.Chosen!.IsFlat);
        var expected = unbounded * (0.5 - (1 / (2 * Math.PI)));
        Assert.Equal(1, DetectionBootstrap.Of(fits).Part!.Value / expected, (4 * Math.Sqrt(4.0 / DetectionBootstrap.Replicates)) + 0.1);
    }

    /// <summary>Where one model of three is chosen from the data, more varies than one model's width does. Seed 32.</summary>
    [Fact]
    public void Choosing_a_model_adds_to_the_detection_part()
    {
        var sample = Sample(new HalfNormalDetection(40), false, 100, 32);
        var one = DetectionFitting.Fit(sample, Truncation, false, [DetectionModel.HalfNormal]);
        var three = DetectionFitting.Fit(sample, Truncation, false, [DetectionModel.HalfNormal, DetectionModel.HazardRate, DetectionModel.UniformCosine]);
        Assert.True(DetectionBootstrap.Of(three).Part > 1.3 * DetectionBootstrap.Of(one).Part);
    }

    [Fact]
    public void Nothing_to_fit_leaves_nothing_to_draw_from()
    {
        var bootstrap = DetectionBootstrap.Of(DetectionFitting.Fit([0, 0, 0], Truncation, false, [DetectionModel.HalfNormal]));
        Assert.Null(bootstrap.Part);
        Assert.Empty(bootstrap.FitParts);
    }

    private static ImmutableArray<double> Sample(DetectionFunction truth, bool isPoints, int n, ulong seed)
    {
        var random = new PhiloxStream(seed, 1006, 0, 0);
        var distances = new double[n];
        for (var i = 0; i < n; i++)
        {
            distances[i] = random.NextDistance(truth.ProbabilityAt, Truncation, isPoints);
        }

        return [.. distances];
    }
}
