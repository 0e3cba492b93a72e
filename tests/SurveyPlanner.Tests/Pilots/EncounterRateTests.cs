using System.Collections.Immutable;
using CsCheck;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Pilots;

public class EncounterRateTests
{
    private static readonly EncounterRateEstimator[] All = Enum.GetValues<EncounterRateEstimator>();

    /// <summary>
    /// Twelve systematic lines of unit spacing and length with a random start, Poisson counts with mean 2 + 1.5 x (λ = 11 a line):
    /// the true variance of the rate is λ/K + β²/12, random-lines expects λ/K + β²(K + 1)/12, overlapping-pairs λ/K + β²/(2K).
    /// 2,000 surveys, seed 11, 5 standard errors.
    /// </summary>
    [Fact]
    public void Under_a_trend_overlapping_pairs_is_near_the_truth_and_random_lines_far_above()
    {
        const int surveys = 2000;
        var (rates, random, overlapping) = (new double[surveys], new double[surveys], new double[surveys]);
        for (var i = 0; i < surveys; i++)
        {
            var stream = new PhiloxStream(11, 1003, 0, (uint)i);
            var start = stream.NextDouble();
            var transects = Transects([.. Enumerable.Range(0, 12).Select(k => stream.NextPoisson(2 + (1.5 * (start + k))))]);
            (rates[i], random[i], overlapping[i]) = (
                EncounterRate.Of(transects, EncounterRateEstimator.RandomLines).Rate,
                EncounterRate.Of(transects, EncounterRateEstimator.RandomLines).Variance!.Value,
                EncounterRate.Of(transects, EncounterRateEstimator.OverlappingPairs).Variance!.Value);
        }

        var mean = rates.Average();
        Near((11 / 12.0) + (2.25 / 12), [.. rates.Select(rate => (rate - mean) * (rate - mean))]);
        Near((11 / 12.0) + (2.25 * 13 / 12), random);
        Near((11 / 12.0) + (2.25 / 24), overlapping);
    }

    /// <summary>1,500 pilots of 10 lines with nearly normal counts (Poisson, mean 100), seed 12, 5 standard errors.</summary>
    [Theory]
    [InlineData(EncounterRateEstimator.RandomLines)]
    [InlineData(EncounterRateEstimator.AdjacentPairs)]
    [InlineData(EncounterRateEstimator.OverlappingPairs)]
    public void Variances_spread_like_a_chi_square_with_the_stated_degrees_of_freedom(EncounterRateEstimator estimator)
    {
        var ratios = Enumerable.Range(0, 1500).Select(i =>
        {
            var stream = new PhiloxStream(12, 1003, 1, (uint)i);
            var transects = Transects([.. Enumerable.Range(0, 10).Select(_ => stream.NextPoisson(100))]);
            return EncounterRate.Of(transects, estimator).Variance!.Value / (100 / 10.0);
        }).ToArray();
        Near(1, ratios);
        Near(2 / estimator.ChiSquareDegreesOfFreedom(10), [.. ratios.Select(ratio => (ratio - 1) * (ratio - 1))]);
    }

    [Fact]
    public void Changing_the_unit_of_effort_changes_no_coefficient_of_variation()
        => Gen.Select(Gen.Int[0, 20], Gen.Double[0.5, 9]).Array[2, 12].Where(rows => rows.Any(row => row.Item1 > 0)).Hold(
            100,
            seed: 1,
            rows =>
            {
                ImmutableArray<PilotTransect> km = [.. rows.Select((row, i) => new PilotTransect("", $"{i}", row.Item2, row.Item1))];
                ImmutableArray<PilotTransect> metres = [.. km.Select(transect => transect with { Effort = transect.Effort * 1000 })];
                Assert.All(All, estimator =>
                {
                    var (a, b) = (EncounterRate.Of(km, estimator), EncounterRate.Of(metres, estimator));
                    Assert.Equal(a.Cv!.Value, b.Cv!.Value, 1e-9);
                    Assert.Equal(a.Dispersion!.Value, b.Dispersion!.Value, 1e-9);
                });
            });

    [Fact]
    public void One_transect_has_a_rate_and_no_variance()
    {
        var rate = EncounterRate.Of(Transects([4]), EncounterRateEstimator.OverlappingPairs);
        Assert.Equal(4, rate.Rate);
        Assert.Null(rate.Variance);
        Assert.Null(rate.Cv);
        Assert.Null(rate.Dispersion);
    }

    [Fact]
    public void Strata_pool_by_area()
    {
        var (a, b) = (EncounterRate.Of(Transects([2, 4]), All[0]), EncounterRate.Of(Transects([10, 14]), All[0]));
        var pooled = EncounterRate.Pooled([(a, 0.75), (b, 0.25)]);
        Assert.Equal((0.75 * 3) + (0.25 * 12), pooled.Rate, 1e-14);
        Assert.Equal((0.5625 * a.Variance!.Value) + (0.0625 * b.Variance!.Value), pooled.Variance!.Value, 1e-14);
        Assert.InRange(pooled.DegreesOfFreedom!.Value, 1, 2);
    }

    private static void Near(double expected, double[] values)
    {
        var mean = values.Average();
        var error = Math.Sqrt(values.Sum(value => (value - mean) * (value - mean)) / values.Length / (values.Length - 1));
        Assert.Equal(expected, mean, 5 * error);
    }

    private static ImmutableArray<PilotTransect> Transects(int[] counts)
        => [.. counts.Select((count, i) => new PilotTransect("", $"T{i}", 1, count))];
}
