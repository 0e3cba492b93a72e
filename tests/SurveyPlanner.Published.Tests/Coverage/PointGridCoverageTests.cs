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

    private static LayoutGenerator Grid(SurveyPlanner.Regions.Stratum stratum)
        => PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(spacing: 5, halfWidth: 1, LayoutKind.PointGrid));
}
