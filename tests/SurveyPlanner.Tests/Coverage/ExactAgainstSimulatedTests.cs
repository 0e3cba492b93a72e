using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

/// <summary>The largest difference between simulated and exact coverage alarms where something is wrong, and nowhere else.</summary>
public class ExactAgainstSimulatedTests
{
    private const int Draws = 1000;

    /// <summary>
    /// 150 points of 300 m in 60 by 40 km: a cell is covered by 17.5 draws of 1,000 on average. By the standard error of those same draws some cell is
    /// far out in most runs; by that under the exact value none of 9,600 is beyond 4.5, for which the chance is about 0.06 a run if they were normal and
    /// independent; low counts, the only ones that the exact value speaks for, have the shorter tail. Seeds 1 to 20.
    /// </summary>
    [Fact]
    public void Cells_that_few_draws_cover_raise_no_alarm()
    {
        var design = new LayoutDesign(LayoutKind.RandomPoints, new Sizing.Number(150), new Bearing.Degrees(0), 300);
        var generator = PlaneStrata.Prepare(PlaneStrata.Rectangle(60_000, 40_000), design);
        var alarmsByOwnError = 0;
        for (ulong seed = 1; seed <= 20; seed++)
        {
            var cells = Cells(generator, 500, seed);
            alarmsByOwnError += cells.Max(cell => Math.Abs(cell.Simulated - cell.Exact!.Value) / cell.StandardError) > 4.5 ? 1 : 0;
            Assert.InRange(ExactAgainstSimulated.MaxAbsZ(cells, Draws), 2.5, 4.5);
        }

        Assert.True(alarmsByOwnError >= 10, $"{alarmsByOwnError} of 20");
    }

    /// <summary>A closed form that is too large, of points and of lines, whose draws are stratified and know a tenth: beyond 4.5.</summary>
    [Theory]
    [InlineData(LayoutKind.RandomPoints, 0.35)]
    [InlineData(LayoutKind.Parallel, 0.1)]
    public void A_closed_form_that_is_wrong_raises_one(LayoutKind kind, double tooLargeBy)
    {
        var design = kind == LayoutKind.Parallel
            ? PlaneStrata.LinesAcrossX(4_000, 300)
            : new LayoutDesign(kind, new Sizing.Number(400), new Bearing.Degrees(0), 300);
        var cells = Cells(PlaneStrata.Prepare(PlaneStrata.Rectangle(60_000, 40_000), design), 1_000, Judge.Seed);
        CoverageCell[] wrong = [.. cells.Select(cell => cell with { Exact = (1 + tooLargeBy) * cell.Exact })];

        Assert.True(ExactAgainstSimulated.MaxAbsZ(cells, Draws) < 4.5);
        Assert.True(ExactAgainstSimulated.MaxAbsZ(wrong, Draws) > 4.5, $"{ExactAgainstSimulated.MaxAbsZ(wrong, Draws)}");
    }

    /// <summary>
    /// By hand: 100 draws, exact 0.2, so 16 is the variance of plain draws in each of two cells. Draws of 0.12 and 0.28 with 4 and 12 changes: half of what
    /// plain draws have. The first gets half of 16, not its own 4: z = 8 / √8; the second keeps its 12: 8 / √12.
    /// </summary>
    [Fact]
    public void The_error_is_no_smaller_than_the_exact_value_lets_expect()
    {
        CoverageCell[] cells = [Cell(0.12, 4), Cell(0.28, 12)];
        Assert.Equal(8 / Math.Sqrt(8), ExactAgainstSimulated.MaxAbsZ(cells, 100), 1e-12);
        Assert.Equal(8 / Math.Sqrt(12), ExactAgainstSimulated.MaxAbsZ(cells.AsSpan(1), 100), 1e-12);

        static CoverageCell Cell(double simulated, int changes) => new(default, default, default, 1, 0.2, simulated, simulated, Math.Sqrt(changes) / 100);
    }

    [Fact]
    public void Where_nothing_can_be_covered_and_nothing_is_there_is_no_difference()
        => Assert.Equal(0, ExactAgainstSimulated.MaxAbsZ([new CoverageCell(default, default, default, 1, 0, 0, 0, 0.01)], 100));

    private static CoverageCell[] Cells(LayoutGenerator generator, double cellSize, ulong seed)
    {
        var grid = CellGridBuilder.Build(generator.Stratum.Region, cellSize);
        var exact = ExactCoverage.At(generator, grid)!;
        var counts = CoverageSimulation.Run(generator, grid, Draws, seed, 0, 1, CancellationToken.None);
        return
        [
            .. Enumerable.Range(0, grid.Count).Select(i => new CoverageCell(
                default, default, default, 1, exact[i], counts.Probability(i), counts.ExpectedTimes(i), counts.StandardError(i))),
        ];
    }
}
