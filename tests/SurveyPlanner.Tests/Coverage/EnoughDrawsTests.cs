using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

public class EnoughDrawsTests
{
    /// <summary>
    /// Random points have a closed form, so what is said of cells without a draw can be held against the truth. Forty runs from too few draws to many,
    /// seeds 1 to 40: no cell without a draw has the coverage it is said not to have, though most runs have such cells; the chance of one is 4e-5.
    /// </summary>
    [Fact]
    public void No_cell_without_a_draw_has_more_coverage_than_it_can_be_said_to_have()
    {
        var design = new LayoutDesign(LayoutKind.RandomPoints, new Sizing.Number(60), new Bearing.Degrees(0), 300);
        var generator = PlaneStrata.Prepare(PlaneStrata.Rectangle(60_000, 40_000), design);
        var grid = CellGridBuilder.Build(generator.Stratum.Region, 2_000);
        var exact = ExactCoverage.At(generator, grid)!;
        var runsWithZero = 0;
        for (var run = 1; run <= 40; run++)
        {
            var draws = 50 * run;
            var counts = CoverageSimulation.Run(generator, grid, draws, (ulong)run, 0, 1, CancellationToken.None);
            var cells = Enumerable.Range(0, grid.Count).Select(i => new CoverageCell(default, default, default, 1, null, counts.Probability(i), 0, counts.StandardError(i)));
            var coverage = new StratumCoverage("figure", generator.NominalCoverage, 2_000, 0, draws, [.. cells], 0, 0, 0, 0, 0, null);
            var without = exact.Where((_, i) => counts.Draws[i] == 0).ToList();
            runsWithZero += without.Count > 0 ? 1 : 0;
            Assert.All(without, truth => Assert.True(truth < EnoughDraws.MostWithoutDraw(coverage)));

            // Even coverage here: whenever zero is called told, there must be no cell without a draw.
            Assert.False(EnoughDraws.TellZero(coverage) && without.Count > 0);
        }

        Assert.InRange(runsWithZero, 10, 39);
    }

    /// <summary>
    /// With plus sampling random points are even, and no number of draws may say otherwise: covered from 0.07 times on average to 140, seeds 1 to 24.
    /// </summary>
    [Fact]
    public void What_is_even_is_never_called_uneven_by_chance()
    {
        var design = new LayoutDesign(LayoutKind.RandomPoints, new Sizing.Number(60), new Bearing.Degrees(0), 300, EdgeRule.Plus);
        var generator = PlaneStrata.Prepare(PlaneStrata.Rectangle(60_000, 40_000), design);
        var grid = CellGridBuilder.Build(generator.Stratum.Region, 1_000);
        var findings = new List<CoverageFinding>();
        for (var run = 1; run <= 24; run++)
        {
            var draws = (int)(10 * Math.Pow(2000, (run - 1) / 23.0));
            var counts = CoverageSimulation.Run(generator, grid, draws, (ulong)run, 0, 1, CancellationToken.None);
            var cells = Enumerable.Range(0, grid.Count).Select(i => new CoverageCell(
                default, default, default, 1, null, counts.Probability(i), counts.ExpectedTimes(i), counts.StandardError(i)));
            var coverage = new StratumCoverage("figure", generator.NominalCoverage, 1_000, 0, draws, [.. cells], 0, 0, 0, 0, 0, null);
            findings.Add(CoverageAdvisor.Of(design, coverage, new double[grid.Count], new double[grid.Count]).Finding);
        }

        Assert.Equal(CoverageFinding.TooFewDraws, findings[0]);
        Assert.Equal(CoverageFinding.Even, findings[^1]);
        Assert.DoesNotContain(findings, finding => finding is not (CoverageFinding.Even or CoverageFinding.TooFewDraws));
    }

    /// <summary>N cells, chance 1e-6: exp(−M p) N = 1e-6 at M = ln(1e6 N) / p, for p of half the nominal.</summary>
    [Fact]
    public void As_many_draws_are_needed_as_leave_a_millionth_of_a_chance()
    {
        var cell = new CoverageCell(default, default, default, 1, null, 0, 0, 0);
        var coverage = new StratumCoverage("figure", 0.02, 1_000, 0, 1000, [.. Enumerable.Repeat(cell, 5_000)], 0, 0, 0, 0, 0, null);
        var needed = EnoughDraws.Needed(coverage);

        Assert.Equal(1e-6, 5_000 * Math.Exp(-needed * 0.01), 1e-15);
        Assert.False(EnoughDraws.TellZero(coverage with { Replicates = (int)needed }));
        Assert.True(EnoughDraws.TellZero(coverage with { Replicates = (int)needed + 1 }));
    }
}
