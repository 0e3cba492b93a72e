using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Published.Tests.Effort;

/// <summary>
/// Hand arithmetic of the encounter-rate variance formulas of Fewster and others 2009, Biometrics 65:225-236 (the formulas are from memory;
/// the arithmetic was done separately, in exact fractions).
/// </summary>
public class EncounterRateTests
{
    private static readonly int[] Falling = [2, 5, 4, 7, 9, 9];
    private static readonly int[] Unequal = [6, 4, 9, 3, 12, 5];
    private static readonly double[] UnequalLengths = [3, 2, 4, 2, 5, 4];
    private static readonly int[] Trend = [1, 3, 5, 7, 9, 11, 13, 15, 17, 19];
    private static readonly int[] Points = [3, 0, 2, 5, 1, 4, 2, 3];

    [Theory]
    [InlineData(EncounterRateEstimator.RandomLines, 1.0 / 3, 5, 0.1924500897)]
    [InlineData(EncounterRateEstimator.AdjacentPairs, 1.0 / 8, 3, 0.1178511302)]
    [InlineData(EncounterRateEstimator.OverlappingPairs, 23.0 / 240, 5, 0.1031898646)]
    public void Equal_lengths(EncounterRateEstimator estimator, double variance, int df, double cv)
        => Check(Falling, [2, 2, 2, 2, 2, 2], estimator, 3, variance, df, cv);

    [Theory]
    [InlineData(EncounterRateEstimator.RandomLines, 0.045555, 5, 0.1094544478)]
    [InlineData(EncounterRateEstimator.AdjacentPairs, 61.0 / 810, 3, null)]
    [InlineData(EncounterRateEstimator.OverlappingPairs, 9223.0 / 165375, 5, 0.1211062522)]
    public void Unequal_lengths(EncounterRateEstimator estimator, double variance, int df, double? cv)
        => Check(Unequal, UnequalLengths, estimator, 1.95, variance, df, cv);

    [Theory]
    [InlineData(EncounterRateEstimator.RandomLines, 11.0 / 3)]
    [InlineData(EncounterRateEstimator.AdjacentPairs, 0.2)]
    [InlineData(EncounterRateEstimator.OverlappingPairs, 0.2)]
    public void Pure_trend(EncounterRateEstimator estimator, double variance)
        => Check(Trend, [1, 1, 1, 1, 1, 1, 1, 1, 1, 1], estimator, 10, variance, estimator == EncounterRateEstimator.AdjacentPairs ? 5 : 9, null);

    [Fact]
    public void Points_with_one_visit_each()
        => Check(Points, [1, 1, 1, 1, 1, 1, 1, 1], EncounterRateEstimator.RandomLines, 2.5, 9.0 / 28, 7, null);

    /// <summary>The dispersion times rate over effort is the other random-lines estimator of that paper, which weights by length once.</summary>
    [Theory]
    [InlineData(3.0 / 80)]
    public void Dispersion_is_the_length_weighted_variance(double lengthWeighted)
    {
        var rate = EncounterRate.Of(Transects(Unequal, UnequalLengths), EncounterRateEstimator.RandomLines);
        Assert.Equal(lengthWeighted, rate.Dispersion!.Value * rate.Rate / rate.Effort, 1e-14);
    }

    private static void Check(int[] counts, double[] lengths, EncounterRateEstimator estimator, double rate, double variance, int df, double? cv)
    {
        var result = EncounterRate.Of(Transects(counts, lengths), estimator);
        Assert.Equal(rate, result.Rate, 1e-14);
        Assert.Equal(variance, result.Variance!.Value, 1e-13);
        Assert.Equal(df, result.DegreesOfFreedom);
        if (cv is { } expected)
        {
            Assert.Equal(expected, result.Cv!.Value, 5e-11);
        }
    }

    private static ImmutableArray<PilotTransect> Transects(int[] counts, double[] lengths)
        => [.. counts.Select((count, i) => new PilotTransect("", $"T{i + 1}", lengths[i], count))];
}
