using System.Collections.Concurrent;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

/// <summary>Bad input, progress, and stopping.</summary>
public class CoverageLimitsTests
{
    [Fact]
    public void No_draws_at_all_are_refused()
    {
        var problem = Assert.Single(Assert.Throws<InputException>(() => Judge.Of(PlaneStrata.Rectangle(10_000, 6_000), PlaneStrata.LinesAcrossX(4_000, 500), 500, 0)).Problems);

        Assert.Equal("coverage.replicates", problem.Key);
    }

    [Fact]
    public void A_billion_cells_are_refused_with_the_memory_they_would_take()
    {
        var problem = Refused([PlaneStrata.Rectangle(10_000, 6_000)], 1_000_000_000);

        Assert.Equal("coverage.cells", problem.Key);
        Assert.Contains("would take about 200 GB of memory; the limit is 20000000", problem.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Cells_larger_than_a_stratum_are_refused_by_its_name()
    {
        var islet = PlaneStrata.Rectangle(100, 100) with { Name = "islet" };
        var problem = Refused([PlaneStrata.Rectangle(100_000, 60_000), islet], 10_000);

        Assert.Equal("coverage.cells", problem.Key);
        Assert.Contains("a cell of 0.6 km² is larger than stratum 'islet' of 0.01 km²", problem.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Left_to_itself_every_stratum_gets_five_hundred_cells()
    {
        var (large, islet) = (PlaneStrata.Rectangle(100_000, 60_000), PlaneStrata.Rectangle(100, 100));
        var sizes = CellSizes.For([large, islet], new CoverageDesign());

        Assert.InRange(large.Shape.AreaSquareMetres / (sizes[0] * sizes[0]), 5_000, 50_001);
        Assert.Equal(500, islet.Shape.AreaSquareMetres / (sizes[1] * sizes[1]), 1e-6);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(3)]
    public void Progress_grows_smoothly_to_exactly_one(int threads)
    {
        var (generator, grid) = Zigzag();
        var heard = new Listener();
        CoverageSimulation.Run(generator, grid, 5000, Judge.Seed, 0, threads, CancellationToken.None, ProgressPart.Of(heard, 0, 2));
        CoverageSimulation.Run(generator, grid, 5000, Judge.Seed, 1, threads, CancellationToken.None, ProgressPart.Of(heard, 1, 2));

        var shares = heard.Shares.ToArray();
        Assert.Equal(1, shares[^1]);
        Assert.Contains(0.5, shares);
        Assert.All(shares.Zip(shares.Skip(1)), pair => Assert.InRange(pair.Second - pair.First, 0, 0.02));
    }

    [Theory]
    [InlineData(1)]
    [InlineData(3)]
    public void A_simulation_stops_when_told_to(int threads)
    {
        var (generator, grid) = Zigzag();
        using var stop = new CancellationTokenSource();

        // Told at the first sign of progress of a simulation that would take a minute.
        var progress = ProgressPart.Of(new Listener(stop.Cancel), 0, 1);
        Assert.ThrowsAny<OperationCanceledException>(
            () => CoverageSimulation.Run(generator, grid, 2_000_000, Judge.Seed, 0, threads, stop.Token, progress));
    }

    [Theory]
    [InlineData(LayoutKind.Parallel)]
    [InlineData(LayoutKind.PointGrid)]
    public void Exact_coverage_stops_when_told_to(LayoutKind kind)
    {
        using var stop = new CancellationTokenSource();
        stop.Cancel();
        var generator = PlaneStrata.Prepare(PlaneStrata.Rectangle(10_000, 6_000), PlaneStrata.LinesAcrossX(4_000, 500, kind));
        var grid = CellGridBuilder.Build(generator.Stratum.Region, 200);
        Assert.Throws<OperationCanceledException>(() => ExactCoverage.At(generator, grid, stop.Token));
    }

    private static Problem Refused(SurveyPlanner.Regions.Stratum[] strata, int cells)
        => Assert.Single(Assert.Throws<InputException>(() => CellSizes.For(strata, new CoverageDesign(cells))).Problems);

    private static (LayoutGenerator Generator, CellGrid Grid) Zigzag()
    {
        var generator = PlaneStrata.Prepare(PlaneStrata.Triangle(10_000, 6_000), PlaneStrata.LinesAcrossX(2_000, 300, LayoutKind.Zigzag));
        return (generator, CellGridBuilder.Build(generator.Stratum.Region, 200));
    }

    private sealed class Listener(Action? react = null) : IProgress<double>
    {
        public ConcurrentQueue<double> Shares { get; } = [];

        public void Report(double value)
        {
            Shares.Enqueue(value);
            react?.Invoke();
        }
    }
}
