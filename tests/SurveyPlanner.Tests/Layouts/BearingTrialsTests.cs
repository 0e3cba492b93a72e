using System.Collections.Immutable;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

public class BearingTrialsTests
{
    // 20 km from west to east, 10 km from south to north.
    private static readonly Stratum Rectangle = PlaneStrata.Rectangle(20_000, 10_000);

    [Fact]
    public void Figures_of_a_rectangle_are_those_of_plain_arithmetic()
    {
        var trials = Try(EveryKind.Of(LayoutKind.Parallel, 1000), 45);
        Assert.Equal([0, 45, 90, 135], trials.Select(trial => trial.BearingDegrees));

        // Lines to the north: 20 of 10 km, 1 km apart; lines to the east: 10 of 20 km.
        var (north, slanted, east) = (trials[0].Figures!, trials[1].Figures!, trials[2].Figures!);
        Assert.Equal(20, north.ExpectedTransects, 1e-6);
        Assert.Equal(10, east.ExpectedTransects, 1e-6);
        Assert.All([north, slanted, east], figures => Assert.Equal(200_000, figures.Effort.Mean, 1e-3));
        Assert.Equal(0, north.LineLengthCv!.Value, 1e-6);
        Assert.Equal(19_000, north.OffEffortMetres, 1.0);
        Assert.Equal(9_000, east.OffEffortMetres, 1.0);
        Assert.True(slanted.LineLengthCv > 0.3);

        // Across a slanted rectangle: (20 + 10) / √2 km.
        Assert.Equal(30 / Math.Sqrt(2), slanted.ExpectedTransects, 1e-6);
    }

    [Fact]
    public void The_way_between_pieces_counts_gaps_within_a_line()
    {
        // Two squares of 4 km with 2 km between them: a line to the east crosses the gap, one to the north does not.
        var stratum = PlaneStrata.Of([[(0, 0), (4000, 0), (4000, 4000), (0, 4000)]], [[(6000, 0), (10_000, 0), (10_000, 4000), (6000, 4000)]]);
        var trials = BearingTrials.Of(stratum, EveryKind.Of(LayoutKind.Parallel, 1000), 90, null, CancellationToken.None);
        Assert.Equal((4 * 2000) + 3000, trials[1].Figures!.OffEffortMetres, 1.0);
        Assert.Equal(3000 + 3000 + 3000, trials[0].Figures!.OffEffortMetres, 1.0);
    }

    [Fact]
    public void A_bearing_that_cannot_work_carries_the_reason()
    {
        var trials = Try(EveryKind.Of(LayoutKind.Parallel, 15_000), 90);
        Assert.NotNull(trials[0].Figures);
        Assert.Null(trials[1].Figures);
        Assert.Contains("larger than stratum", trials[1].Refusal, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(-5)]
    [InlineData(181)]
    [InlineData(double.NaN)]
    public void A_step_that_makes_no_sense_is_refused(double step)
        => Assert.Throws<InputException>(() => Try(EveryKind.Of(LayoutKind.Parallel, 1000), step));

    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void Every_kind_can_be_tried(string kind)
    {
        var design = EveryKind.Designs[kind];
        if (design.Bearing is Bearing.Random)
        {
            Assert.Throws<InputException>(() => BearingTrials.Of(EveryKind.Islands, design, 60, null, CancellationToken.None));
            return;
        }

        var trials = BearingTrials.Of(EveryKind.Islands, design, 60, null, CancellationToken.None);
        Assert.Equal(3, trials.Length);
        foreach (var figures in trials.Select(trial => trial.Figures).OfType<BearingFigures>())
        {
            Assert.InRange(figures.OffEffortMetres, 1, 1e7);
            Assert.Equal(design.IsPoints, figures.LineLengthCv is null);
        }
    }

    [Fact]
    public void The_front_door_tries_every_stratum_and_tells_its_progress()
    {
        var progress = new List<double>();
        var design = new SurveyDesign(
            "trial", 1, "zone", [], EveryKind.Of(LayoutKind.Parallel, 1000), ImmutableSortedDictionary<string, LayoutDesign>.Empty, EffortDesign.None, new SurveyPlanner.Coverage.CoverageDesign());
        var inputs = new SurveyInputs(Squares.Boundary(("north", "1.5"), ("south", "2")), [], null);
        var tried = PlanSurvey.TryBearings(design, inputs, 30, new RunOptions(Progress: new Reports(progress)));
        Assert.Equal(["north", "south"], tried.Select(stratum => stratum.Stratum));
        Assert.All(tried, stratum => Assert.Equal(6, stratum.Trials.Length));
        Assert.Equal(progress.Order(), progress);
        Assert.InRange(progress[^1], 0.99, 1);
    }

    private static ImmutableArray<BearingTrial> Try(LayoutDesign design, double step)
        => BearingTrials.Of(Rectangle, design, step, null, CancellationToken.None);

    private sealed class Reports(List<double> values) : IProgress<double>
    {
        public void Report(double value) => values.Add(value);
    }
}
