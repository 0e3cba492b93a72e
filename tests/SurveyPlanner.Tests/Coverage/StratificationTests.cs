using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

/// <summary>What stratified offsets promise (docs/methods/coverage.md), measured.</summary>
public class StratificationTests
{
    /// <summary>
    /// Each stretch of offsets that covers a place has two ends; only the draws whose strata hold an end can be counted wrong, each by less than
    /// one draw. So |simulated - exact| is below 2k / M, k the number of stretches, without exception.
    /// </summary>
    [Theory]
    [InlineData(50)]
    [InlineData(1000)]
    public void With_one_offset_no_place_errs_by_more_than_the_ends_of_its_stretches(int draws)
    {
        foreach (var stratum in RandomShapes.Sample(10))
        {
            var lines = PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(2_000, 900));
            var grid = CellGridBuilder.Build(lines.Stratum.Region, 350);
            var exact = ExactCoverage.At(lines, grid)!;
            var counts = CoverageSimulation.Run(lines, grid, draws, Judge.Seed, 0, 1, CancellationToken.None);
            for (var row = 0; row < grid.RowY.Length; row++)
            {
                for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
                {
                    var stretches = Stretches(lines.Stratum.LinesAcross, grid.X[i], grid.RowY[row] - 900, grid.RowY[row] + 900);
                    Assert.True(Math.Abs(counts.Probability(i) - exact[i]) < 2.0 * stretches / draws);
                }
            }
        }
    }

    /// <summary>
    /// With two offsets only the strata that the edge of the covered set runs through can be counted wrong. That set is a disk wrapped round the
    /// range; each of its four quarter arcs runs through at most a + b - 1 of a x b strata, and wrapping cuts them in at most four more places.
    /// What is left over of M draws is drawn plainly.
    /// </summary>
    [Theory]
    [InlineData(100)]
    [InlineData(1000)]
    public void With_two_offsets_no_place_errs_by_more_than_the_strata_at_the_rim_of_its_disk(int draws)
    {
        var points = PlaneStrata.Prepare(PlaneStrata.Rectangle(10_000, 10_000), PlaneStrata.LinesAcrossX(2_000, 900, LayoutKind.PointGrid));
        var grid = CellGridBuilder.Build(points.Stratum.Region, 350);
        var exact = ExactCoverage.At(points, grid)!;
        var counts = CoverageSimulation.Run(points, grid, draws, Judge.Seed, 0, 1, CancellationToken.None);
        var columns = (int)Math.Sqrt(draws);
        var rows = draws / columns;
        var limit = (4.0 * (columns + rows - 1) + 8 + (draws - (columns * rows))) / draws;
        for (var i = 0; i < grid.Count; i++)
        {
            Assert.InRange(Math.Abs(counts.Probability(i) - exact[i]), 0, limit);
        }
    }

    /// <summary>
    /// At 1,000 draws, over 20 seeds and all cells: theory says about 16 times for one stretch (√(p(1-p)/M) against √(1/3)/M); 5 is asked for.
    /// </summary>
    [Fact]
    public void Stratified_offsets_err_at_least_five_times_less_than_plain_ones()
    {
        const int draws = 1000;
        var lines = PlaneStrata.Prepare(PlaneStrata.Triangle(10_000, 6_000), PlaneStrata.LinesAcrossX(4_000, 500));
        var grid = CellGridBuilder.Build(lines.Stratum.Region, 250);
        var exact = ExactCoverage.At(lines, grid)!;
        double stratified = 0, plain = 0;
        for (var seed = 1u; seed <= 20; seed++)
        {
            stratified += SquaredErrors(CoverageSimulation.Run(lines, grid, draws, seed, 0, 1, CancellationToken.None), exact);
            plain += SquaredErrors(Plain(lines, grid, draws, seed), exact);
        }

        Assert.InRange(Math.Sqrt(plain / stratified), 10, 25);
    }

    /// <summary>And so do the standard errors that are reported.</summary>
    [Fact]
    public void Standard_errors_are_at_least_five_times_smaller_than_those_of_plain_draws()
    {
        const int draws = 1000;
        var lines = PlaneStrata.Prepare(PlaneStrata.Rectangle(10_000, 6_000), PlaneStrata.LinesAcrossX(4_000, 500));
        var grid = CellGridBuilder.Build(lines.Stratum.Region, 250);
        var exact = ExactCoverage.At(lines, grid)!;
        var counts = CoverageSimulation.Run(lines, grid, draws, Judge.Seed, 0, 1, CancellationToken.None);
        for (var i = 0; i < grid.Count; i++)
        {
            Assert.InRange(counts.StandardError(i), 1.0 / draws, Math.Sqrt(exact[i] * (1 - exact[i]) / draws) / 5);
        }
    }

    /// <summary>
    /// The reported standard error is on the large side: over 300 seeds and all cells its mean square is three times the mean square error where
    /// a place has one stretch of one offset, and between one and three times where the edge of a disk crosses strata at all angles.
    /// Sampling error of either ratio: about 5 %. Spacing, half-width and cells share no divisor, so that no stretch ends where a stratum does.
    /// </summary>
    [Theory]
    [InlineData(LayoutKind.Parallel, 2.6, 3.4)]
    [InlineData(LayoutKind.PointGrid, 1.2, 3)]
    public void The_standard_error_is_never_too_small_on_average(LayoutKind kind, double least, double most)
    {
        const int draws = 100;
        var layout = PlaneStrata.Prepare(PlaneStrata.Rectangle(10_000, 6_000), PlaneStrata.LinesAcrossX(2_003, 487, kind));
        var grid = CellGridBuilder.Build(layout.Stratum.Region, 613);
        var exact = ExactCoverage.At(layout, grid)!;
        double errors = 0, reported = 0;
        for (var seed = 1u; seed <= 300; seed++)
        {
            var counts = CoverageSimulation.Run(layout, grid, draws, seed, 0, 1, CancellationToken.None);
            errors += SquaredErrors(counts, exact);
            reported += Enumerable.Range(0, grid.Count).Sum(i => counts.StandardError(i) * counts.StandardError(i));
        }

        Assert.InRange(reported / errors, least, most);
    }

    [Theory]
    [InlineData(1, 10)]
    [InlineData(2, 10)]
    [InlineData(2, 1000)]
    [InlineData(2, 1)]
    public void Every_stratum_of_offsets_is_drawn_from_once(int axes, int draws)
    {
        var offsets = new StratifiedOffsets(Judge.Seed, 0, draws, axes);
        var (columns, rows) = axes == 1 ? (draws, 1) : ((int)Math.Sqrt(draws), draws / (int)Math.Sqrt(draws));
        var met = new HashSet<(int, int)>();
        var drawn = new double[axes];
        for (var draw = 0; draw < columns * rows; draw++)
        {
            offsets.Fill(draw, drawn);
            Assert.All(drawn, offset => Assert.InRange(offset, 0, 1 - 1e-12));
            Assert.True(met.Add(((int)(drawn[0] * columns), axes == 1 ? 0 : (int)(drawn[1] * rows))));
        }
    }

    private static double SquaredErrors(CoverageCounts counts, double[] exact)
        => exact.Select((probability, i) => (counts.Probability(i) - probability) * (counts.Probability(i) - probability)).Sum();

    private static CoverageCounts Plain(LayoutGenerator generator, CellGrid grid, int draws, ulong seed)
    {
        var (counter, buffer) = (new CoverageCounter(grid, generator.Stratum.HalfWidthMetres), new PieceBuffer());
        for (var draw = 0; draw < draws; draw++)
        {
            var random = new PhiloxStream(seed, 99, 0, (uint)draw);
            buffer.Clear();
            generator.Realise([random.NextDouble()], ref random, buffer);
            counter.Count(buffer.Pieces, onlyRemember: false);
        }

        return CoverageCounter.Sum([counter], draws);
    }

    private static int Stretches(FrameShape across, double x, double low, double high)
    {
        var crossings = new double[64];
        var count = across.CrossingsAt(x, ref crossings);
        return Enumerable.Range(0, count / 2).Count(pair => crossings[(2 * pair) + 1] > low && crossings[2 * pair] < high);
    }
}
