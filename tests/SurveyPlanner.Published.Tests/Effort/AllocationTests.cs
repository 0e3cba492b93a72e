using System.Collections.Immutable;
using SurveyPlanner.Effort;

namespace SurveyPlanner.Published.Tests.Effort;

/// <summary>
/// Stratified allocation after Cochran 1977, Sampling Techniques, sections 5.5 to 5.9. The 64 cities are his example (data from memory, the
/// arithmetic done apart); the television survey is a textbook exercise as posted on a study site (inputs seen, arithmetic done apart).
/// A sample of n_h units from N_h with variance S_h² is the effort model with rate 1, dispersion S_h² and weight N_h / N; finite populations,
/// which effort does not have, enter here in the test.
/// </summary>
public class AllocationTests
{
    private static readonly double[] CitySizes = [16, 48];
    private static readonly double[] CityVariances = [53843, 5581];

    private static readonly double[] TownSizes = [1550, 620, 930];
    private static readonly double[] TownVariances = [25, 225, 100];

    [Theory]
    [InlineData(Allocation.Proportional, 6, 18, 1882293.33, 0.005)]
    [InlineData(Allocation.Equal, 12, 12, 1090826.67, 0.005)]
    [InlineData(Allocation.Optimal, 12.2084186, 11.7915814, 1090157.13, 0.005)]
    public void Cochrans_64_cities(Allocation allocation, double first, double second, double varianceOfTotal, double digit)
    {
        var model = Model(CitySizes, CityVariances);
        var shares = EffortShares.Of(model, allocation, ImmutableSortedDictionary<string, double>.Empty);
        Assert.Equal([first, second], shares.Select(share => 24 * share), (a, b) => Math.Abs(a - b) < 5e-8);
        var mean = model.WithShares(shares).UnitCv2 / 24;
        Assert.Equal(varianceOfTotal, (64 * 64 * mean) - Finite(CitySizes, CityVariances), digit);
    }

    [Fact]
    public void Costs_pull_effort_to_cheap_strata()
    {
        var model = Model(TownSizes, TownVariances);
        var costs = ImmutableSortedDictionary<string, double>.Empty.Add("0", 9).Add("1", 9).Add("2", 16);
        Check([18.7096774, 22.4516129, 16.8387097], costs);
        Check([17.0588235, 20.4705882, 20.4705882], ImmutableSortedDictionary<string, double>.Empty);

        var rounded = model.WithShares([19 / 58.0, 22 / 58.0, 17 / 58.0]).UnitCv2 / 58;
        Assert.Equal(1.26745004, rounded, 5e-9);
        Assert.Equal(1.23922424, rounded - (Finite(TownSizes, TownVariances) / 3100 / 3100), 5e-9);

        void Check(double[] expected, ImmutableSortedDictionary<string, double> given)
            => Assert.Equal(
                expected, EffortShares.Of(model, Allocation.Optimal, given).Select(share => 58 * share), (a, b) => Math.Abs(a - b) < 5e-8);
    }

    private static double Finite(double[] sizes, double[] variances) => sizes.Zip(variances, (size, variance) => size * variance).Sum();

    private static EffortModel Model(double[] sizes, double[] variances)
        => new(
            false,
            [.. sizes.Select((size, i) => new StratumModel($"{i}", size / sizes.Sum(), 1, variances[i], null, 0, null, null))],
            null, null, null, null, false);
}
