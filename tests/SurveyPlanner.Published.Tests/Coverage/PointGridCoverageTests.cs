using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Published.Tests.Coverage;

/// <summary>Closed forms for a grid of points, radius 1, grid cell 25: area of the disk inside the region over 25 (segment and lens formulas).</summary>
public class PointGridCoverageTests
{
    [Theory]
    [InlineData(10, 10, 0.12566370614)]
    [InlineData(10, 0, 0.06283185307)]
    [InlineData(0, 0, 0.03141592654)]
    [InlineData(10, 0.25, 0.08262152164)]
    [InlineData(10, 0.5, 0.10109631217)]
    [InlineData(10, 0.75, 0.11659747106)]
    public void Square_region(double x, double y, double expected)
        => Assert.Equal(expected, PlaneStrata.ExactAt(Grid(PlaneStrata.Rectangle(20, 20)), x, y), 1e-10);

    [Theory]
    [InlineData(4.1, 0.12305863003)]
    [InlineData(4.5, 0.09922090535)]
    [InlineData(5, 0.06016251113)]
    public void Disk_of_radius_5(double distance, double expected)
        => Assert.Equal(expected, PlaneStrata.ExactAt(Grid(PlaneStrata.Disk(5)), distance, 0), 1e-9);

    /// <summary>At a vertex of angle α, both sides longer than the radius: α r² / 2 over the grid's cell.</summary>
    [Theory]
    [InlineData(0, 0, Math.PI / 2)]
    [InlineData(20, 0, Math.PI / 4)]
    [InlineData(0, 20, Math.PI / 4)]
    public void Vertices_of_a_right_triangle(double x, double y, double angle)
        => Assert.Equal(angle / 2 / 25, PlaneStrata.ExactAt(Grid(PlaneStrata.Triangle(20, 20)), x, y), 1e-10);

    /// <summary>A triangular grid of spacing d has a cell of d² √3 / 2: the same areas over that.</summary>
    [Theory]
    [InlineData(10, 10, Math.PI)]
    [InlineData(10, 0.25, 2.0655380410749)]
    [InlineData(10, 0.5, 2.5274078042854)]
    [InlineData(10, 0.75, 2.9149367766010)]
    public void Triangular_grid(double x, double y, double area)
    {
        var design = PlaneStrata.LinesAcrossX(spacing: 5, halfWidth: 1, LayoutKind.PointGrid) with { Grid = GridShape.Triangular };
        var grid = PlaneStrata.Prepare(PlaneStrata.Rectangle(20, 20), design);
        Assert.Equal(area / (25 * Math.Sqrt(3) / 2), PlaneStrata.ExactAt(grid, x, y), 1e-10);
    }

    /// <summary>π r² over the grid's cell up to the very edge and corner, but for the margin's arcs, drawn up to 0.13 % outside the true ones.</summary>
    [Theory]
    [InlineData(10, 10)]
    [InlineData(10, 0)]
    [InlineData(0, 0)]
    public void Plus_sampling_is_even_to_the_edge(double x, double y)
    {
        var design = PlaneStrata.LinesAcrossX(spacing: 5, halfWidth: 1, LayoutKind.PointGrid) with { Edge = EdgeRule.Plus };
        Assert.Equal(0.12566370614, PlaneStrata.ExactAt(PlaneStrata.Prepare(PlaneStrata.Rectangle(20, 20), design), x, y), 1e-9);
    }

    private static LayoutGenerator Grid(SurveyPlanner.Regions.Stratum stratum)
        => PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(spacing: 5, halfWidth: 1, LayoutKind.PointGrid));
}
