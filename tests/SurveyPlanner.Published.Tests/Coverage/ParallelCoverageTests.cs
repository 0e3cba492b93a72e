using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Published.Tests.Coverage;

/// <summary>
/// Closed forms for systematic lines, w = 0.5, d = 4, derived by hand for rectangle, disk and triangle (25 digits) and confirmed by plain
/// Monte Carlo. Places on the boundary are taken 1e-9 inside it.
/// </summary>
public class ParallelCoverageTests
{
    private const double Inside = 1e-9;

    [Theory]
    [InlineData(5, 3, 0.25)] // interior
    [InlineData(Inside, 3, 0.125)] // edge parallel to the lines
    [InlineData(0.2, 3, 0.175)] // 0.2 inside it
    [InlineData(Inside, Inside, 0.125)] // corner
    [InlineData(5, Inside, 0.25)] // edge at right angles to the lines: no loss
    public void Rectangle(double x, double y, double expected)
        => Assert.Equal(expected, PlaneStrata.ExactAt(Lines(PlaneStrata.Rectangle(10, 6)), x, y), 1e-8);

    [Theory]
    [InlineData(0, 0, 0.25)]
    [InlineData(4.9, 0, 0.15)]
    [InlineData(5 - Inside, 0, 0.125)]
    [InlineData(0, 4.99, 0.15803480629)]
    [InlineData(3, 3.9, 0.15722439236)]
    [InlineData(4 - (4 * Inside), 3 - (3 * Inside), 0.125)]
    [InlineData(-4.8, 1, 0.14974487139)]
    public void Disk(double x, double y, double expected)
        => Assert.Equal(expected, PlaneStrata.ExactAt(Lines(PlaneStrata.Disk(5)), x, y), 1e-8);

    [Theory]
    [InlineData(Inside, Inside, 0.125)]
    [InlineData(8 - (3 * Inside), Inside, 0.125)]
    [InlineData(Inside / 3, 6 - Inside, 0)]
    [InlineData(Inside, 5.9, 0.03333333333)]
    [InlineData(0.1, 5.7, 0.1)]
    [InlineData(4, 2, 0.25)]
    [InlineData(4 - Inside, 3 - Inside, 0.125)]
    [InlineData(7.9, Inside, 0.15)]
    public void Triangle(double x, double y, double expected)
        => Assert.Equal(expected, PlaneStrata.ExactAt(Lines(PlaneStrata.Triangle(8, 6)), x, y), 1e-8);

    [Theory]
    [InlineData("rectangle", 0.24375)]
    [InlineData("triangle", 0.23470052083)]
    [InlineData("disk", 0.24204391112)]
    public void Mean_over_the_region(string figure, double expected)
    {
        var stratum = figure switch
        {
            "rectangle" => PlaneStrata.Rectangle(10, 6),
            "triangle" => PlaneStrata.Triangle(8, 6),
            _ => PlaneStrata.Disk(5, 20_000),
        };
        var lines = Lines(stratum);
        var grid = CellGridBuilder.Build(lines.Stratum.Region, 0.01);
        var exact = ExactCoverage.At(lines, grid)!;
        var mean = exact.Zip(grid.Cells!.Areas, (probability, area) => probability * area).Sum() / grid.Cells!.Areas.Sum();

        // Midpoint rule with cells of 0.01: error below 1e-6 where coverage is piecewise linear, 1e-5 along curved edges.
        Assert.Equal(expected, mean, 1e-5);
        Assert.Equal(stratum.Shape.AreaSquareMetres, grid.Cells!.Areas.Sum(), 1e-9 * stratum.Shape.AreaSquareMetres);
    }

    /// <summary>
    /// Where the boundary is tangent to the lines across: nothing at the place itself, and a hair inside, at depth t, a chord of 2 sqrt(2 a t).
    /// </summary>
    [Theory]
    [InlineData(1e-9)]
    [InlineData(1e-6)]
    public void Disk_where_its_edge_runs_across_the_lines(double depth)
        => Assert.Equal(2 * Math.Sqrt(2 * 5 * depth) / 4, PlaneStrata.ExactAt(Lines(PlaneStrata.Disk(5)), 0, 5 - depth), 1e-5);

    [Fact]
    public void Plus_sampling_is_even_to_the_edge()
    {
        var lines = PlaneStrata.Prepare(PlaneStrata.Triangle(8, 6), PlaneStrata.LinesAcrossX(4, 0.5) with { Edge = EdgeRule.Plus });
        var grid = CellGridBuilder.Build(lines.Stratum.Region, 0.1);
        Assert.All(ExactCoverage.At(lines, grid)!, probability => Assert.Equal(0.25, probability, 1e-12));
    }

    private static LayoutGenerator Lines(SurveyPlanner.Regions.Stratum stratum)
        => PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(spacing: 4, halfWidth: 0.5));
}
