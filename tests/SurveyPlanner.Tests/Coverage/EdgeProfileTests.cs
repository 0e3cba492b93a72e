using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Coverage;

/// <summary>
/// Lines 4 km apart with a half-width of 500 m in a rectangle of 10 km across the lines by 6 km along them. Coverage depends on the distance t
/// from the sides along the lines only: (500 + t) / 4000 up to 500 m, 1/4 farther in. Shares and means below are integrals of that by hand.
/// </summary>
public class EdgeProfileTests
{
    private const double Cell = 50;

    [Fact]
    public void Mean_coverage_by_distance_is_the_integral_over_the_ring_at_that_distance()
    {
        var coverage = Judge.Of(PlaneStrata.Rectangle(10_000, 6_000), PlaneStrata.LinesAcrossX(4_000, 500), Cell);
        var profile = coverage.EdgeProfile;

        // The first 250 m: 7.75 km², of it two strips of 0.25 x 6 km along the sides with 0.15625 on average, and along the ends
        // 0.25 km² where coverage still rises (0.21875 on average) and 4.5 km² where it is even.
        Assert.Equal((0, 250), (profile[0].FromMetres, profile[0].ToMetres));
        Assert.Equal(7.75, profile[0].AreaKm2, 1e-9);
        Assert.Equal(((3 * 0.15625) + (0.25 * 0.21875) + (4.5 * 0.25)) / 7.75, profile[0].MeanCoverage, 1e-12);

        // From 500 m on nothing is felt of the edge.
        Assert.All(profile.Skip(2), edge => Assert.Equal(0.25, edge.MeanCoverage, 1e-12));
        Assert.Equal((2500, null), (profile[^1].FromMetres, profile[^1].ToMetres));
        Assert.Equal(60, profile.Sum(edge => edge.AreaKm2), 1e-9);
        Assert.Equal(11, profile.Length);
    }

    [Fact]
    public void Shares_below_and_above_nominal_are_those_of_the_area()
    {
        var coverage = Judge.Of(PlaneStrata.Rectangle(10_000, 6_000), PlaneStrata.LinesAcrossX(4_000, 500), Cell);

        // Below 0.9 of nominal within 400 m of either side, below 0.7 within 200 m, never below half.
        Assert.Equal(0.08, coverage.ShareBelow(0.9), 1e-12);
        Assert.Equal(0.04, coverage.ShareBelow(0.7), 1e-12);
        Assert.Equal(0, coverage.ShareBelow(0.5));
        Assert.Equal(0, coverage.ShareAbove(1.1));
    }

    [Fact]
    public void Classes_that_hold_no_cell_are_left_out()
    {
        // 600 m wide: no place is farther than 300 m from an edge.
        var coverage = Judge.Of(PlaneStrata.Rectangle(10_000, 600), PlaneStrata.LinesAcrossX(4_000, 500), Cell);

        Assert.Equal([0.0, 250.0], coverage.EdgeProfile.Select(edge => edge.FromMetres));
    }

    [Fact]
    public void Cells_larger_than_the_half_width_set_the_classes()
    {
        var coverage = Judge.Of(PlaneStrata.Rectangle(100_000, 60_000), PlaneStrata.LinesAcrossX(4_000, 300), 1000);

        Assert.Equal(500, coverage.EdgeProfile[0].ToMetres);
    }
}
