using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

public class SimulationTests
{
    private const ulong Seed = 20261201;

    /// <summary>
    /// Stratified offsets: a place covered for k stretches of the offset errs by less than 2k/M, since only the stretches that hold an end
    /// can be counted wrong, each by less than 1/M. In a convex figure k = 1.
    /// </summary>
    [Theory]
    [InlineData(100)]
    [InlineData(1000)]
    public void Parallel_lines_in_a_convex_figure_are_within_two_draws_of_the_exact_coverage(int draws)
    {
        var lines = PlaneStrata.Prepare(PlaneStrata.Rectangle(10_000, 6_000), PlaneStrata.LinesAcrossX(4_000, 500));
        var grid = CellGridBuilder.Build(lines.Stratum.Region, 200);
        var exact = ExactCoverage.At(lines, grid)!;
        var counts = CoverageSimulation.Run(lines, grid, draws, Seed, 0, 1, CancellationToken.None);
        for (var i = 0; i < grid.Count; i++)
        {
            Assert.True(Math.Abs((counts.Probability(i)) - exact[i]) < 2.0 / draws);
        }
    }

    /// <summary>Plain draws: 1,000 cells or more, none beyond 4.5 standard errors (chance of a false alarm below 1 %); seed stated above.</summary>
    [Theory]
    [InlineData(LayoutKind.Parallel)]
    [InlineData(LayoutKind.PointGrid)]
    public void Under_plain_draws_every_cell_is_within_four_and_a_half_standard_errors(LayoutKind kind)
    {
        const int draws = 20_000;
        var generator = PlaneStrata.Prepare(PlaneStrata.Rectangle(10_000, 6_000), PlaneStrata.LinesAcrossX(4_000, 500, kind));
        var grid = CellGridBuilder.Build(generator.Stratum.Region, 240);
        Assert.True(grid.Count >= 1000);
        var exact = ExactCoverage.At(generator, grid)!;
        var counter = new CoverageCounter(grid, generator.Stratum.HalfWidthMetres);
        var buffer = new PieceBuffer();
        var offsets = new double[generator.OffsetRanges.Length];
        for (var draw = 0; draw < draws; draw++)
        {
            var random = new PhiloxStream(Seed, 99, 0, (uint)draw);
            for (var axis = 0; axis < offsets.Length; axis++)
            {
                offsets[axis] = random.NextDouble();
            }

            buffer.Clear();
            generator.Realise(offsets, ref random, buffer);
            counter.Count(buffer.Pieces, onlyRemember: false);
        }

        var counts = CoverageCounter.Sum([counter], draws);
        for (var i = 0; i < grid.Count; i++)
        {
            var standardError = Math.Sqrt(exact[i] * (1 - exact[i]) / draws);
            Assert.True(Math.Abs((counts.Probability(i)) - exact[i]) <= 4.5 * standardError);
        }
    }

    [Theory]
    [InlineData(LayoutKind.Parallel)]
    [InlineData(LayoutKind.Zigzag)]
    [InlineData(LayoutKind.PointGrid)]
    public void The_number_of_threads_changes_nothing(LayoutKind kind)
    {
        var generator = PlaneStrata.Prepare(PlaneStrata.Triangle(10_000, 6_000), PlaneStrata.LinesAcrossX(2_000, 300, kind));
        var grid = CellGridBuilder.Build(generator.Stratum.Region, 200);
        var one = CoverageSimulation.Run(generator, grid, 500, Seed, 0, 1, CancellationToken.None);
        foreach (var threads in new[] { 2, 3, 8 })
        {
            var many = CoverageSimulation.Run(generator, grid, 500, Seed, 0, threads, CancellationToken.None);
            Assert.Equal(one.Draws, many.Draws);
            Assert.Equal(one.Times, many.Times);
            Assert.Equal(one.Again, many.Again);
        }
    }

    /// <summary>
    /// Along the axis of a rectangle, to first order in the half-width: 2w secθ / H, and half of it at the long edges
    /// (METHOD: Strindberg and Buckland 2004 define the zigzags; the formula is derived in docs/methods/zigzag.md).
    /// </summary>
    [Fact]
    public void A_zigzag_in_a_rectangle_covers_as_the_first_order_formula_says()
    {
        const double width = 100_000, height = 10_000, halfWidth = 100;
        var zigzag = PlaneStrata.Prepare(
            PlaneStrata.Rectangle(width, height),
            new LayoutDesign(LayoutKind.Zigzag, new Sizing.Spacing(5_000), new Bearing.Degrees(0), halfWidth));
        var (grid, order) = PlaneStrata.GridOf(zigzag, (50_000, 5_000), (50_000, 1));
        var counts = CoverageSimulation.Run(zigzag, grid, 20_000, Seed, 0, 1, CancellationToken.None);
        var expected = 2 * halfWidth * Math.Sqrt(5) / height;
        Assert.Equal(expected, (double)counts.Times[Array.IndexOf(order, 0)] / 20_000, 0.001);
        Assert.Equal(expected / 2, (double)counts.Times[Array.IndexOf(order, 1)] / 20_000, 0.001);
        Assert.Equal(223_606.79774998, EffortIntegral.Over(zigzag).Mean, 5);
    }
}
