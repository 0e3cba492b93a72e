using System.Diagnostics;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>What is mended, how that is told, and what is refused because mending it would be a guess. Areas: plain geometry of the made-up shapes.</summary>
public class Repairs
{
    // A tenth of a degree square at the equator; its area is the unit of the tests below.
    private const string Square = "10 0, 10.1 0, 10.1 0.1, 10 0.1";

    private static readonly double SquareArea = AreaOf.SquareKilometres(InMemory.Read(InMemory.Polygon(Square)));

    [Fact]
    public void An_open_ring_is_closed_and_the_length_of_the_new_edge_told()
    {
        var boundary = InMemory.Read(InMemory.Polygon(Square + " open"));

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(boundary), 1e-9);
        Assert.Contains("Repair: outlines that did not end where they began were closed by a straight edge (feature 1, ring 1: 11.12 km from vertex 4 to vertex 1)", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void Repeated_points_go_and_are_counted()
    {
        var boundary = InMemory.Read(InMemory.Polygon("10 0, 10 0, 10.1 0, 10.1 0.1, 10.1 0.1, 10.1 0.1, 10 0.1"));

        Assert.Equal(5, boundary.Features[0].Polygons[0].Shell.Length);
        Assert.Contains("points that repeat the one before were left out (feature 1, ring 1: 3); this changed the area by 0 m²", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("10 0, 10.1 0, 10.1 0.1, 10.05 0.1, 10.05 0.2, 10.05 0.1, 10 0.1", "longitude 10.05, latitude 0.2")]
    [InlineData("10 0, 10.1 0, 10.1 0.1, 10.05 0.1, 10.05 0.05, 10.05 0.1, 10 0.1", "longitude 10.05, latitude 0.05")]
    [InlineData("10 0, 10.1 0, 10.15 0, 10.1 0, 10.1 0.1, 10 0.1", "longitude 10.15, latitude 0")]
    [InlineData("9.9 0, 10 0, 10.1 0, 10.1 0.1, 10 0.1, 10 0", "longitude 9.9, latitude 0")]
    public void A_spike_without_width_is_cut_off_wherever_it_stands(string ring, string place)
    {
        var boundary = InMemory.Read(InMemory.Polygon(ring));

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(boundary), 1e-9);
        Assert.Contains($"spikes without width were cut off (feature 1, ring 1: 1, the first at {place})", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void A_narrow_spit_that_has_a_width_stays()
    {
        // 1e-7 degrees are 11 mm.
        var boundary = InMemory.Read(InMemory.Polygon("10 0, 10.1 0, 10.1 0.1, 10.0500001 0.1, 10.0500001 0.2, 10.05 0.2, 10.05 0.1, 10 0.1"));

        Assert.Equal(9, boundary.Features[0].Polygons[0].Shell.Length);
        Assert.Empty(boundary.Notices);
    }

    [Fact]
    public void Parts_and_holes_thinner_than_a_millimetre_are_left_out_and_told()
    {
        var boundary = InMemory.Read(InMemory.MultiPolygon(
            [Square, "10.02 0.02, 10.02 0.08, 10.020000002 0.05"],
            ["11 0, 11 1, 11.000000001 1, 11.000000001 0"]));

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(boundary), 1e-9);
        Assert.Contains("parts without any width were left out (feature 1, part 2, ring 1)", InMemory.Told(boundary), StringComparison.Ordinal);
        Assert.Contains("holes without any width were left out (feature 1, part 1, ring 2)", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void A_hole_hung_on_its_outline_by_a_bridge_without_width_becomes_a_hole()
    {
        var boundary = InMemory.Read(InMemory.Polygon("10 0, 10.1 0, 10.1 0.1, 10 0.1, 10 0.05, 10.04 0.05, 10.04 0.06, 10.06 0.06, 10.06 0.04, 10.04 0.04, 10.04 0.05, 10 0.05"));

        Assert.Single(boundary.Features[0].Polygons);
        Assert.Single(boundary.Features[0].Polygons[0].Holes);
        Assert.Equal(0.96 * SquareArea, AreaOf.SquareKilometres(boundary), 1e-6 * SquareArea);
        Assert.Contains("outlines that touch themselves were taken apart", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void An_outline_that_touches_itself_at_a_point_becomes_two_parts()
    {
        var boundary = InMemory.Read(InMemory.Polygon("10 0, 10.1 0, 10.1 0.1, 10.2 0.1, 10.2 0.2, 10.1 0.2, 10.1 0.1, 10 0.1"));

        Assert.Equal(2, boundary.Features[0].Polygons.Length);
        Assert.Equal(2 * SquareArea, AreaOf.SquareKilometres(boundary), 1e-5 * SquareArea);
    }

    [Fact]
    public void A_figure_of_eight_with_a_vertex_at_the_crossing_is_refused_like_one_without()
        => Assert.Contains("crosses itself near longitude 10.05, latitude 0.05", InMemory.Refusal(InMemory.Polygon("10 0, 10.05 0.05, 10.1 0.1, 10.1 0, 10.05 0.05, 10 0.1")), StringComparison.Ordinal);

    [Fact]
    public void Holes_that_share_an_edge_become_one()
    {
        var boundary = InMemory.Read(InMemory.Polygon(Square, "10.02 0.02, 10.02 0.04, 10.04 0.04, 10.04 0.02", "10.04 0.02, 10.04 0.04, 10.06 0.04, 10.06 0.02"));

        Assert.Single(boundary.Features[0].Polygons[0].Holes);
        Assert.Equal(0.92 * SquareArea, AreaOf.SquareKilometres(boundary), 1e-6 * SquareArea);
        Assert.Contains("Repair: holes that overlap or touch along a line were made one", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void Parts_that_overlap_are_united_and_the_overlap_told()
    {
        var boundary = InMemory.Read(InMemory.MultiPolygon([Square], ["10.05 0, 10.15 0, 10.15 0.1, 10.05 0.1"]));

        Assert.Single(boundary.Features[0].Polygons);
        Assert.Equal(1.5 * SquareArea, AreaOf.SquareKilometres(boundary), 1e-6 * SquareArea);
        Assert.Contains("parts that overlap were united (feature 1, part 1, ring 1 and feature 1, part 2, ring 1); this changed the area by -61.5", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void Parts_that_share_a_border_stay_two()
        => Assert.Equal(2, InMemory.Read(InMemory.MultiPolygon([Square], ["10.1 0, 10.2 0, 10.2 0.1, 10.1 0.1"])).Features[0].Polygons.Length);

    [Fact]
    public void A_part_given_twice_counts_once()
    {
        var boundary = InMemory.Read(InMemory.MultiPolygon([Square], ["10.1 0, 10.1 0.1, 10 0.1, 10 0"]));

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(boundary), 1e-9);
        Assert.Contains("united", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void Features_with_one_outline_and_other_attributes_are_both_kept_and_told()
    {
        var boundary = InMemory.Read(InMemory.Collection(
            InMemory.Feature(InMemory.Polygon(Square), """{"zone":"a"}"""),
            InMemory.Feature(InMemory.Polygon("10.1 0, 10.1 0.1, 10 0.1, 10 0"), """{"zone":"b"}""")));

        Assert.Equal(2, boundary.Features.Length);
        Assert.Contains("Warning: features have the same outline but other attributes (features 1 and 2)", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("a hole lies inside another hole", Square, "10.02 0.02, 10.02 0.08, 10.08 0.08, 10.08 0.02", "10.04 0.04, 10.04 0.06, 10.06 0.06, 10.06 0.04")]
    [InlineData("the hole crosses its outline", Square, "10.05 0.05, 10.05 0.15, 10.06 0.15, 10.06 0.05")]
    [InlineData("the hole lies outside its outline", Square, "10.25 0.05, 10.25 0.15, 10.26 0.15, 10.26 0.05")]
    [InlineData("the outline crosses itself near longitude 10.05, latitude 0.05", "10 0, 10.1 0.1, 10.1 0, 10 0.1")]
    public void What_would_be_a_guess_is_refused_with_its_place(string words, params string[] rings)
    {
        var refusal = InMemory.Refusal(InMemory.Polygon(rings));

        Assert.Contains(words, refusal, StringComparison.Ordinal);
        Assert.Contains("feature 1, ring ", refusal, StringComparison.Ordinal);
    }

    [Fact]
    public void A_part_inside_another_is_refused_because_it_may_be_meant_as_a_hole()
        => Assert.Contains("feature 1, part 2, ring 1: the part lies wholly inside another part", InMemory.Refusal(InMemory.MultiPolygon([Square], ["10.02 0.02, 10.02 0.04, 10.04 0.04, 10.04 0.02"])), StringComparison.Ordinal);

    [Fact]
    public void All_parts_that_cross_themselves_are_named_at_once()
    {
        var error = Assert.Throws<InputException>(() => InMemory.Read(InMemory.MultiPolygon(["10 0, 10.1 0.1, 10.1 0, 10 0.1"], [Square], ["20 0, 20.1 0.1, 20.1 0, 20 0.1"])));

        Assert.Equal(["feature 1, part 1, ring 1", "feature 1, part 3, ring 1"], error.Problems.Select(problem => problem.Key));
    }

    [Theory]
    [InlineData(4001)]
    [InlineData(20_001)]
    public void A_hostile_star_is_refused_in_little_time(int points)
    {
        var watch = Stopwatch.StartNew();

        Assert.Contains("crosses itself", InMemory.Refusal(InMemory.Polygon(InMemory.Star(points))), StringComparison.Ordinal);
        Assert.True(watch.Elapsed.TotalSeconds < 5, $"{watch.Elapsed}");
    }

    [Fact]
    public void Thousands_of_overlapping_parts_are_refused_in_little_time()
    {
        var watch = Stopwatch.StartNew();
        var parts = Enumerable.Range(0, 3000).Select(i => FormattableString.Invariant($"{10 + (i * 1e-5)} 0, {10.1 + (i * 1e-5)} 0, {10.1 + (i * 1e-5)} 0.1, {10 + (i * 1e-5)} 0.1"));

        Assert.Contains("overlap", InMemory.Refusal(InMemory.MultiPolygon([.. parts.Select(part => new[] { part })])), StringComparison.Ordinal);
        Assert.True(watch.Elapsed.TotalSeconds < 5, $"{watch.Elapsed}");
    }

    [Fact]
    public void A_ring_that_runs_to_and_fro_on_a_line_is_trimmed_in_little_time()
    {
        // All of it is one spike that can be trimmed only from its beginning: a hundred thousand times.
        var watch = Stopwatch.StartNew();
        var line = string.Join(", ", Enumerable.Range(0, 100_000).Select(i => FormattableString.Invariant($"{10 + (i * 1e-5)} 0")));

        InMemory.Read(InMemory.Polygon(line + ", 11 0.1, 11.1 0"));

        Assert.True(watch.Elapsed.TotalSeconds < 5, $"{watch.Elapsed}");
    }
}
