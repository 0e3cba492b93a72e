using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Published.Tests.Coverage;

/// <summary>
/// Coverage of an interior place where disks of a point grid overlap: disks less their pairwise lenses, 2r² acos(d / 2r) - (d / 2) √(4r² - d²) each
/// (two a point on a square grid, three on a triangular one), until three or more disks meet; then everything is covered.
/// </summary>
public class OverlappingDisksTests
{
    [Theory]
    [InlineData(GridShape.Square, 0.5)]
    [InlineData(GridShape.Square, 0.55)]
    [InlineData(GridShape.Square, 0.65)]
    [InlineData(GridShape.Square, 0.7071)]
    [InlineData(GridShape.Triangular, 0.51)]
    [InlineData(GridShape.Triangular, 0.55)]
    [InlineData(GridShape.Triangular, 0.5773)]
    public void Nominal_coverage_is_disks_less_lenses(GridShape shape, double radius)
    {
        var (lenses, cell) = shape == GridShape.Square ? (2, 1.0) : (3, Math.Sqrt(3) / 2);
        var lens = (2 * radius * radius * Math.Acos(0.5 / radius)) - (0.5 * Math.Sqrt((4 * radius * radius) - 1));
        Assert.Equal(((Math.PI * radius * radius) - (lenses * lens)) / cell, Nominal(shape, radius), 1e-6);
    }

    [Theory]
    [InlineData(GridShape.Square, 0.70711)]
    [InlineData(GridShape.Square, 2.5)]
    [InlineData(GridShape.Triangular, 0.57736)]
    [InlineData(GridShape.Triangular, 2.5)]
    public void Where_disks_leave_no_gap_everything_is_covered(GridShape shape, double radius) => Assert.Equal(1, Nominal(shape, radius), 1e-12);

    private static double Nominal(GridShape shape, double radius) => PlaneStrata.Prepare(
        PlaneStrata.Rectangle(20, 20), PlaneStrata.LinesAcrossX(spacing: 1, halfWidth: radius, LayoutKind.PointGrid) with { Grid = shape }).NominalCoverage;
}
