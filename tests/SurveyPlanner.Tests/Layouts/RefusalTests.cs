using SurveyPlanner.Layouts;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>Designs that cannot work are refused with the key and the reason.</summary>
public class RefusalTests
{
    public static TheoryData<LayoutKind> Kinds => [.. Enum.GetValues<LayoutKind>()];

    [Theory]
    [MemberData(nameof(Kinds))]
    public void A_spacing_larger_than_the_stratum(LayoutKind kind)
        => AssertRefused(Of(kind, 50_000), "layout.spacing", "is larger than stratum 'figure'");

    [Theory]
    [MemberData(nameof(Kinds))]
    public void More_than_a_hundred_thousand_transects(LayoutKind kind)
        => AssertRefused(Of(kind, kind is LayoutKind.Parallel or LayoutKind.RandomParallel or LayoutKind.Zigzag ? 0.05 : 30) with { StepMetres = Step(kind, 30), SegmentMetres = Segment(kind, 20), SideMetres = Side(kind, 20) }, "layout.spacing", "the limit is 100000");

    [Theory]
    [MemberData(nameof(Kinds))]
    public void So_little_that_transects_would_lie_farther_apart_than_the_stratum_is_long(LayoutKind kind)
    {
        var design = Of(kind, 1);
        if (design.IsPoints || kind == LayoutKind.RandomParallel)
        {
            return;
        }

        AssertRefused(design with { Sizing = new Sizing.TotalLength(10) }, "layout.total_length", "asks for so little");
    }

    [Theory]
    [MemberData(nameof(Kinds))]
    public void A_total_length_of_points(LayoutKind kind)
    {
        var design = Of(kind, 2000) with { Sizing = new Sizing.TotalLength(60_000) };
        if (design.IsPoints)
        {
            AssertRefused(design, "layout.total_length", "points have no length");
        }
        else
        {
            Assert.Equal(60_000, EffortIntegral.Over(LayoutKinds.Prepare(EveryKind.Islands, design)).Mean, 9_000.0);
        }
    }

    [Theory]
    [InlineData(LayoutKind.Segments, "layout.length")]
    [InlineData(LayoutKind.Loops, "layout.side")]
    public void Segments_and_loops_longer_than_their_spacing(LayoutKind kind, string key)
        => AssertRefused(Of(kind, 1500) with { SegmentMetres = Segment(kind, 1501), SideMetres = Side(kind, 1501) }, key, "neighbours would overlap");

    [Fact]
    public void Options_of_other_kinds_and_missing_ones_all_at_once()
    {
        var design = EveryKind.Of(LayoutKind.Segments, 2000) with { Crossed = true, Reserve = 5, StepMetres = 100, Placement = LinePlacement.OnePerBand };
        var problems = Assert.Throws<InputException>(() => LayoutKinds.Prepare(EveryKind.Islands, design)).Problems;
        Assert.Equal(["layout.crossed", "layout.placement", "layout.length", "layout.step", "layout.reserve"], problems.Select(problem => problem.Key));
        Assert.Contains("belongs to zigzag, and the kind here is segments", problems[0].Message, StringComparison.Ordinal);
        Assert.Contains("is missing: segments cannot do without it", problems[2].Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_reserve_on_a_systematic_kind()
        => AssertRefused(Of(LayoutKind.PointGrid, 2000) with { Reserve = 5 }, "layout.reserve", "belongs to random-points, balanced-points");

    [Fact]
    public void Bearings_of_their_own_on_lines()
        => AssertRefused(Of(LayoutKind.Parallel, 2000) with { Bearing = new Bearing.Random() }, "layout.bearing", "only segments");

    [Fact]
    public void A_least_length_that_nothing_reaches()
    {
        AssertRefused(Of(LayoutKind.Parallel, 2000) with { MinLengthMetres = 60_000 }, "layout.min_length", "no line along 90° runs 60 km or more");
        AssertRefused(Of(LayoutKind.Segments, 2000) with { MinLengthMetres = 1001 }, "layout.min_length", "nothing would be left");
        AssertRefused(Of(LayoutKind.Loops, 2000) with { MinLengthMetres = 10, Crossing = CrossingRule.Keep }, "layout.min_length", "nothing is cut");
    }

    private static LayoutDesign Of(LayoutKind kind, double spacing)
        => EveryKind.Of(kind, spacing) with { SegmentMetres = Segment(kind, 1000), SideMetres = Side(kind, 1000), StepMetres = Step(kind, 500) };

    private static double? Segment(LayoutKind kind, double metres) => kind == LayoutKind.Segments ? metres : null;

    private static double? Side(LayoutKind kind, double metres) => kind == LayoutKind.Loops ? metres : null;

    private static double? Step(LayoutKind kind, double metres) => kind == LayoutKind.PointsOnLines ? metres : null;

    private static void AssertRefused(LayoutDesign design, string key, string message)
    {
        var problem = Assert.Throws<InputException>(() => LayoutKinds.Prepare(EveryKind.Islands, design)).Problems.Single();
        Assert.Equal(key, problem.Key);
        Assert.Contains(message, problem.Message, StringComparison.Ordinal);
    }
}
