using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

/// <summary>The rules of docs/methods/coverage.md, on real layouts and at their limits.</summary>
public class CoverageAdviceTests
{
    private static readonly LayoutDesign Lines = PlaneStrata.LinesAcrossX(4_000, 500);

    private static readonly LayoutDesign Zigzag =
        new(LayoutKind.Zigzag, new Sizing.Spacing(10_000), new Bearing.Degrees(0), 250);

    [Fact]
    public void A_large_rectangle_is_even()
    {
        var advice = Judge.Of(PlaneStrata.Rectangle(100_000, 60_000), Lines, 500).Advice!;

        Assert.Equal(CoverageFinding.Even, advice.Finding);
        Assert.Equal("Coverage is even: 99 % of the area is within a tenth of nominal.", advice.Sentence);
    }

    [Fact]
    public void A_small_one_is_uneven_at_the_edge_only_and_plus_sampling_mends_it()
    {
        var minus = Judge.Of(PlaneStrata.Rectangle(10_000, 6_000), Lines, 50).Advice!;
        Assert.Equal(CoverageFinding.UnevenAtEdge, minus.Finding);
        Assert.Equal(0.08, minus.UnevenShare, 1e-12);
        Assert.Contains("edge = \"plus\"", minus.Sentence, StringComparison.Ordinal);

        var plus = Judge.Of(PlaneStrata.Rectangle(10_000, 6_000), Lines with { Edge = EdgeRule.Plus }, 50).Advice!;
        Assert.Equal(CoverageFinding.Even, plus.Finding);
    }

    /// <summary>Overlapping disks cover 0.951 of the inside (by the lens formula), not the 1.131 that their areas come to.</summary>
    [Fact]
    public void Overlapping_disks_far_from_the_edge_are_even()
    {
        var grid = new LayoutDesign(LayoutKind.PointGrid, new Sizing.Spacing(5_000), new Bearing.Degrees(0), 3_000);

        Assert.Equal(CoverageFinding.Even, Judge.Of(PlaneStrata.Rectangle(500_000, 400_000), grid, 5_000).Advice!.Finding);
    }

    /// <summary>
    /// Segments of 3 km kept whole if they start inside: whether a place near the side they start from is covered is decided up to 3 km away.
    /// </summary>
    [Fact]
    public void Segments_kept_whole_are_uneven_at_the_edge_only()
    {
        var segments = new LayoutDesign(LayoutKind.Segments, new Sizing.Spacing(6_000), new Bearing.Degrees(0), 300)
        {
            SegmentMetres = 3_000,
            Crossing = CrossingRule.Keep,
        };

        Assert.Equal(CoverageFinding.UnevenAtEdge, Judge.Of(PlaneStrata.Rectangle(40_000, 30_000), segments, 250).Advice!.Finding);
    }

    [Fact]
    public void An_equal_spaced_zigzag_in_a_triangle_is_uneven_along_the_axis()
    {
        // The axis runs along x, the height is x / 2: coverage is far above nominal at the apex.
        var advice = Judge.Of(PlaneStrata.Of((0, 0), (100_000, 0), (100_000, 50_000)), Zigzag, 1000, 4000).Advice!;

        Assert.Equal(CoverageFinding.UnevenAlongAxis, advice.Finding);
        Assert.Contains("turning = \"adjusted-angle\"", advice.Sentence, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(5, CoverageFinding.Even)]
    [InlineData(6, CoverageFinding.UnevenAtEdge)]
    public void Five_percent_of_the_area_may_be_uneven(int unevenCells, CoverageFinding expected)
        => Assert.Equal(expected, Of(i => i < unevenCells ? 0.1 : 0.25, distance: i => i < unevenCells ? 100 : 5000).Finding);

    [Fact]
    public void Cells_within_a_tenth_are_even()
    {
        Assert.Equal(CoverageFinding.Even, Of(_ => 0.226).Finding);
        Assert.Equal(CoverageFinding.Even, Of(_ => 0.274).Finding);
        Assert.NotEqual(CoverageFinding.Even, Of(_ => 0.224).Finding);
        Assert.NotEqual(CoverageFinding.Even, Of(_ => 0.276).Finding);
    }

    [Fact]
    public void What_simulation_leaves_uncertain_is_not_called_uneven()
    {
        Assert.Equal(CoverageFinding.Even, Of(_ => 0.22, isExact: false, standardError: 0.003).Finding);
        Assert.NotEqual(CoverageFinding.Even, Of(_ => 0.22, isExact: false, standardError: 0.002).Finding);
    }

    [Fact]
    public void Unevenness_that_does_not_follow_the_axis_is_told_apart()
    {
        // Cells alternate, so that every stretch of the axis is even on average.
        Assert.Equal(CoverageFinding.UnevenInside, Of(i => i % 2 == 0 ? 0.15 : 0.35).Finding);
        Assert.Equal(CoverageFinding.UnevenAlongAxis, Of(i => i < 50 ? 0.15 : 0.35).Finding);
    }

    [Fact]
    public void Area_that_no_draw_covers_is_named()
    {
        var advice = Of(i => i < 2 ? 0 : 0.25, isExact: false);

        Assert.Equal(2, advice.NeverCoveredKm2);
        Assert.EndsWith(
            "Places of 2 km² in all (2 % of the area) were covered by none of 1000 simulated draws: the estimator cannot speak for them.",
            advice.Sentence,
            StringComparison.Ordinal);
        Assert.EndsWith("(2 % of the area) can never be covered: the estimator cannot speak for them.", Of(i => i < 2 ? 0 : 0.25).Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_finding_and_edge_rule_has_its_sentence()
    {
        foreach (var edge in Enum.GetValues<EdgeRule>())
        {
            Assert.All(
                new[] { Of(_ => 0.25, edge: edge), Of(_ => 0.1, distance: _ => 1, edge: edge), Of(i => i < 50 ? 0.1 : 0.4, edge: edge), Of(i => i % 2 == 0 ? 0.1 : 0.4, edge: edge) },
                advice => Assert.NotEmpty(advice.Sentence));
        }
    }

    /// <summary>A hundred cells of 1 km² in a row along the axis; nominal coverage 0.25, half-width 500 m.</summary>
    private static CoverageAdvice Of(
        Func<int, double> coverage, Func<int, double>? distance = null, bool isExact = true, double standardError = 0.001, EdgeRule edge = EdgeRule.Minus)
    {
        var cells = Enumerable.Range(0, 100).Select(i => new CoverageCell(
            default, default, default, 1, isExact ? coverage(i) : null, coverage(i), coverage(i), standardError));
        var stratum = new StratumCoverage("figure", 0.25, 1000, 0, 1000, [.. cells], 0, 0, 0, 0, 0, isExact ? 1 : null);
        double[] distances = [.. Enumerable.Range(0, 100).Select(distance ?? (_ => 5000))];
        double[] along = [.. Enumerable.Range(0, 100).Select(i => (double)i)];
        return CoverageAdvisor.Of(Lines with { Edge = edge }, stratum, distances, along);
    }
}
