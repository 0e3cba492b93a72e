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
    /// Circuits of side s whose strips share their corners: 8sw - 4w² of every d², by hand, is 0.1275 of every place, less than the 0.15 that the four
    /// strips of a circuit come to.
    /// </summary>
    [Fact]
    public void Circuits_whose_corners_are_shared_are_even()
    {
        var loops = new LayoutDesign(LayoutKind.Loops, new Sizing.Spacing(4_000), new Bearing.Degrees(0), 300) { SideMetres = 1_000, Edge = EdgeRule.Plus };
        var coverage = Judge.Of(PlaneStrata.Rectangle(40_000, 30_000), loops, 500);

        Assert.Equal(CoverageFinding.Even, coverage.Advice!.Finding);
        Assert.Contains("within a tenth of the 0.12", coverage.Advice.Sentence, StringComparison.Ordinal);
        Assert.All(coverage.Cells, cell => Assert.Equal(0.1275, cell.Best, cell.Exact is null ? 4.5 * cell.StandardError : 1e-12));
    }

    /// <summary>Two passes that cross in the same bands whatever their start: what changes there changes across the axis, which no turning mends.</summary>
    [Fact]
    public void Passes_that_cross_are_not_uneven_along_the_axis()
    {
        var crossed = Zigzag with { Sizing = new Sizing.Spacing(40_000), HalfWidthMetres = 10_000, Crossed = true };
        var advice = Judge.Of(PlaneStrata.Rectangle(400_000, 100_000), crossed, 4_000, 2000).Advice!;

        Assert.Equal(CoverageFinding.UnevenInside, advice.Finding);
        Assert.DoesNotContain("adjusted-angle", advice.Sentence, StringComparison.Ordinal);
    }

    /// <summary>Segments at random bearings kept whole: single cells differ by chance as much as the edge from the inside, but their means do not.</summary>
    [Fact]
    public void A_mean_that_falls_at_the_edge_is_told_where_single_cells_do_not_tell()
    {
        var segments = new LayoutDesign(LayoutKind.Segments, new Sizing.Spacing(6_000), new Bearing.Random(), 300)
        {
            SegmentMetres = 2_000,
            Crossing = CrossingRule.Keep,
        };
        var rectangle = PlaneStrata.Rectangle(40_000, 30_000);

        Assert.Contains(" The mean within 2,300 m of the boundary is ", Judge.Of(rectangle, segments, 500, 1000).Advice!.Sentence, StringComparison.Ordinal);
        Assert.NotEqual(CoverageFinding.Even, Judge.Of(rectangle, segments, 500, 40_000).Advice!.Finding);
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

    /// <summary>
    /// Steep legs between parallel sides: near a turn, up to w H / c = 5.5 km from it, both legs' strips cover the same places. No other turning is
    /// advised, for in a rectangle all are the same; each strip by itself covers evenly.
    /// </summary>
    [Fact]
    public void Legs_that_meet_share_places_but_cover_them_equally_often()
    {
        var steep = Zigzag with { Sizing = new Sizing.Spacing(6_000), HalfWidthMetres = 300 };
        var advice = Judge.Of(PlaneStrata.Rectangle(100_000, 110_000), steep, 1500, 4000).Advice!;

        Assert.Equal(CoverageFinding.UnevenInside, advice.Finding);
        Assert.DoesNotContain("adjusted-angle", advice.Sentence, StringComparison.Ordinal);
        Assert.Contains("the expected number of times that a place is covered is even", advice.Sentence, StringComparison.Ordinal);
    }

    /// <summary>
    /// Coverage known to be a sixth too high in half the cells, and times simulated with an error so large that chance might explain that: not to be
    /// told apart is not the same as even. One of a twentieth is.
    /// </summary>
    [Theory]
    [InlineData(0.29, false)]
    [InlineData(0.26, true)]
    public void The_number_of_times_is_called_even_only_where_it_is_seen_to_be(double times, bool isEven)
    {
        double At(int i, double high) => i % 2 == 0 ? 0.25 : high;
        var advice = Of(i => At(i, 0.29), standardError: 0.05, times: i => At(i, times));

        Assert.Equal(CoverageFinding.UnevenInside, advice.Finding);
        Assert.Equal(isEven, advice.Sentence.Contains("the expected number of times that a place is covered is even", StringComparison.Ordinal));
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

    /// <summary>0.03 from nominal, of which 0.025 is within a tenth: the rest is three standard errors of 0.0017, and not of 0.0016.</summary>
    [Fact]
    public void What_simulation_leaves_uncertain_is_not_called_uneven()
    {
        Assert.Equal(CoverageFinding.Even, Of(_ => 0.22, isExact: false, standardError: 0.0017).Finding);
        Assert.NotEqual(CoverageFinding.Even, Of(_ => 0.22, isExact: false, standardError: 0.0016).Finding);
        Assert.Equal(
            "Coverage is even as far as 1,000 simulated draws tell: 100 % of the area is within a tenth of nominal, or no farther from that than chance explains (2 % of nominal).",
            Of(_ => 0.22, isExact: false, standardError: 0.0017).Sentence);
    }

    [Fact]
    public void Unevenness_that_does_not_follow_the_axis_is_told_apart()
    {
        // Cells alternate, so that every stretch of the axis is even on average.
        Assert.Equal(CoverageFinding.UnevenInside, Of(i => i % 2 == 0 ? 0.15 : 0.35).Finding);
        Assert.Equal(CoverageFinding.UnevenAlongAxis, Of(i => i < 50 ? 0.15 : 0.35).Finding);
    }

    [Fact]
    public void Area_that_can_never_be_covered_is_named()
    {
        var advice = Of(i => i < 2 ? 0 : 0.25);

        Assert.Equal(2, advice.NeverCoveredKm2);
        Assert.EndsWith("Places of 2 km² in all (2 % of the area) can never be covered: the estimator cannot speak for them.", advice.Sentence, StringComparison.Ordinal);
    }

    /// <summary>
    /// 100 cells, 1,000 draws: with more coverage than ln(100 / 1e-6) / 1000 = 0.0184 a cell without a draw has a chance below 1e-6 in all, and 0.0184 is
    /// 7.4 % of the nominal 0.25.
    /// </summary>
    [Fact]
    public void Area_that_none_of_enough_draws_covered_is_named_with_the_most_it_can_have()
    {
        var advice = Of(i => i < 2 ? 0 : 0.25, isExact: false);

        Assert.Equal(2, advice.NeverCoveredKm2);
        Assert.EndsWith(
            "None of 1,000 simulated draws covered places of 2 km² in all (2 % of the area), so that coverage there is under 8 % of nominal, if not 0: the estimator cannot speak for them.",
            advice.Sentence,
            StringComparison.Ordinal);
    }

    /// <summary>Told from 2 ln(100 / 1e-6) / 0.25 = 147.4 draws on: 147 are too few, 148 enough. Standard errors are small, as with one offset.</summary>
    [Theory]
    [InlineData(147, false)]
    [InlineData(148, true)]
    public void So_few_draws_may_miss_places_by_chance(int replicates, bool isTold)
    {
        var advice = Of(i => i < 2 ? 0 : 0.25, isExact: false, replicates: replicates);

        Assert.Equal(CoverageFinding.Even, advice.Finding);
        Assert.Equal(isTold ? 2.0 : null, advice.NeverCoveredKm2);
        Assert.Equal(!isTold, advice.Sentence.EndsWith(
            "None of 147 simulated draws covered places of 2 km² in all (2 % of the area), which may be chance: about 150 would tell (replicates in [coverage]).",
            StringComparison.Ordinal));
    }

    /// <summary>
    /// Three standard errors of half the nominal 0.25, and a little more or less. Two of 100 cells have no draw and count as 0 among them:
    /// 0.125 / (3 √0.98) = 0.04209.
    /// </summary>
    [Theory]
    [InlineData(0.0420, CoverageFinding.Even)]
    [InlineData(0.0422, CoverageFinding.TooFewDraws)]
    public void Draws_that_cannot_tell_half_the_coverage_from_all_of_it_are_too_few(double standardError, CoverageFinding expected)
    {
        var advice = Of(i => i < 2 ? 0 : 0.25, isExact: false, standardError: standardError, replicates: 20);

        Assert.Equal(expected, advice.Finding);
        Assert.Null(advice.NeverCoveredKm2);
        if (expected == CoverageFinding.TooFewDraws)
        {
            Assert.Equal(
                "20 simulated draws are too few to tell the coverage of single cells and transects, only its mean over the stratum: about 150 would tell (replicates in [coverage]).",
                advice.Sentence);
        }
    }

    [Fact]
    public void More_draws_than_can_be_asked_for_are_said_to_be()
        => Assert.EndsWith(
            "about 3,700,000 would tell, more than the 1,000,000 that replicates in [coverage] can ask for.",
            Of(i => i == 0 ? 1e-3 : 0, isExact: false, nominal: 1e-5).Sentence,
            StringComparison.Ordinal);

    /// <summary>
    /// Thirty points in 1,000 draws, as in a first plan: a cell is covered by a draw or none. With as many draws as the advice asks for, most cells are
    /// within a tenth of nominal, or chance; and nothing is said to be without coverage.
    /// </summary>
    [Fact]
    public void A_few_balanced_points_are_not_judged_by_too_few_draws()
    {
        var design = new LayoutDesign(LayoutKind.BalancedPoints, new Sizing.Number(30), new Bearing.Degrees(0), 300);
        var few = Judge.Of(PlaneStrata.Rectangle(60_000, 40_000), design, 2_000);
        Assert.True(few.Min == 0);
        Assert.Equal(CoverageFinding.TooFewDraws, few.Advice!.Finding);
        Assert.Null(few.Advice.NeverCoveredKm2);
        Assert.Contains("about 12,000 would tell", few.Advice.Sentence, StringComparison.Ordinal);
        Assert.All(few.Transects, transect => Assert.Null(transect.Mean));
        Assert.Empty(few.EdgeProfile);

        var enough = Judge.Of(PlaneStrata.Rectangle(60_000, 40_000), design, 2_000, 12_000);
        Assert.Equal(CoverageFinding.Even, enough.Advice!.Finding);
        Assert.Equal(0, enough.Advice.NeverCoveredKm2);
        Assert.DoesNotContain("None of", enough.Advice.Sentence, StringComparison.Ordinal);

        // A point inside is covered 30 π 0.3² / 2400 times on average. Under 12,000 draws that is 42 times: 5 standard errors are 77 % of it.
        Assert.All(enough.Transects, transect => Assert.InRange(transect.Mean!.Value / (30 * Math.PI * 0.09 / 2400), 0.2, 1.77));
    }

    /// <summary>
    /// What mends unevenness depends on where it comes from: on the turns of a zigzag, on what is left out or kept whole. Where nothing in the design
    /// makes it, nothing is advised but to weight.
    /// </summary>
    [Fact]
    public void Only_what_would_even_it_out_is_advised()
    {
        string Advice(LayoutDesign design) => Of(i => i < 50 ? 0.1 : 0.4, design: design).Sentence;
        const string parallel = "parallel lines (kind = \"parallel\") would even it out; otherwise weight";
        Assert.Contains($": an adjusted-angle zigzag (turning = \"adjusted-angle\") or {parallel}", Advice(Zigzag), StringComparison.Ordinal);
        Assert.Contains($": {parallel}", Advice(Zigzag with { Turning = ZigzagTurning.AdjustedAngle }), StringComparison.Ordinal);
        Assert.Contains($": {parallel}", Advice(Lines with { Kind = LayoutKind.RandomParallel }), StringComparison.Ordinal);
        Assert.Contains(": a smaller min_length would even it out; otherwise weight", Advice(Lines with { MinLengthMetres = 9_000 }), StringComparison.Ordinal);

        foreach (var kind in new[] { LayoutKind.Segments, LayoutKind.Loops })
        {
            var kept = Lines with { Kind = kind, SegmentMetres = 300, Crossing = CrossingRule.Keep };
            Assert.Contains(": cutting what crosses the boundary (crossing = \"clip\") would even it out; otherwise weight", Advice(kept), StringComparison.Ordinal);
            Assert.EndsWith("from nominal): weight each detection by its coverage.", Advice(kept with { Crossing = CrossingRule.Clip }), StringComparison.Ordinal);
        }

        foreach (var kind in new[] { LayoutKind.Parallel, LayoutKind.PointGrid, LayoutKind.PointsOnLines, LayoutKind.RandomPoints, LayoutKind.BalancedPoints })
        {
            Assert.EndsWith("from nominal): weight each detection by its coverage.", Advice(Lines with { Kind = kind }), StringComparison.Ordinal);
        }
    }

    /// <summary>And it does: the advised designs are even on the same ground.</summary>
    [Fact]
    public void Segments_cut_at_the_margin_are_even_as_advised()
    {
        var kept = new LayoutDesign(LayoutKind.Segments, new Sizing.Spacing(6_000), new Bearing.Degrees(0), 300) { SegmentMetres = 3_000, Crossing = CrossingRule.Keep };
        var ground = PlaneStrata.Rectangle(40_000, 30_000);
        Assert.Contains(
            ": consider cutting what crosses the boundary (crossing = \"clip\") together with plus sampling (edge = \"plus\"), or weight each detection",
            Judge.Of(ground, kept, 250).Advice!.Sentence,
            StringComparison.Ordinal);
        Assert.NotEqual(CoverageFinding.Even, Judge.Of(ground, kept with { Edge = EdgeRule.Plus }, 250).Advice!.Finding);
        Assert.Equal("Coverage is even: 100 % of the area is within a tenth of nominal.", Judge.Of(ground, kept with { Crossing = CrossingRule.Clip, Edge = EdgeRule.Plus }, 250).Advice!.Sentence);
    }

    /// <summary>Strips of 10 km to either side, 4 km apart: with plus sampling every place is covered five times on average, 2 · 10 / 4, and never not.</summary>
    [Fact]
    public void That_strips_overlap_is_told_with_how_often_a_place_is_covered()
    {
        var wide = Lines with { HalfWidthMetres = 10_000, Edge = EdgeRule.Plus };
        Assert.Equal(
            "Coverage is even: 100 % of the area is within a tenth of nominal. Strips overlap: a place that is covered is covered 5 times on average, and an animal there may be counted as often.",
            Judge.Of(PlaneStrata.Rectangle(100_000, 60_000), wide, 2_000).Advice!.Sentence);
        Assert.DoesNotContain("overlap", Judge.Of(PlaneStrata.Rectangle(100_000, 60_000), wide with { HalfWidthMetres = 2_000 }, 2_000).Advice!.Sentence, StringComparison.Ordinal);
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
        Func<int, double> coverage,
        Func<int, double>? distance = null,
        bool isExact = true,
        double standardError = 0.001,
        EdgeRule edge = EdgeRule.Minus,
        int replicates = 1000,
        double nominal = 0.25,
        LayoutDesign? design = null,
        Func<int, double>? times = null)
    {
        var cells = Enumerable.Range(0, 100).Select(i => new CoverageCell(
            default, default, default, 1, isExact ? coverage(i) : null, coverage(i), (times ?? coverage)(i), standardError));
        var stratum = new StratumCoverage("figure", nominal, 1000, 0, replicates, [.. cells], 0, 0, 0, 0, 0, isExact ? 1 : null);
        double[] distances = [.. Enumerable.Range(0, 100).Select(distance ?? (_ => 5000))];
        double[] along = [.. Enumerable.Range(0, 100).Select(i => (double)i)];
        return CoverageAdvisor.Of(design ?? Lines with { Edge = edge }, stratum, distances, along);
    }
}
