using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Published.Tests.Coverage;

/// <summary>
/// Coverage of random lines, segments, loops, points on lines and random points in a rectangle of 10 by 6, each value worked out by hand on paper
/// from the geometry (lines and rows run along the short side; half-width or radius 0.5). Places on the boundary are taken 1e-9 inside it.
/// </summary>
public class KindsCoverageTests
{
    private const double Edge = 1e-9;

    // Four lines over 10: one strip is a tenth of it. 1 - 0.9^4; at the edge half a strip, 1 - 0.95^4.
    [Theory]
    [InlineData(5, 3, 0.3439)]
    [InlineData(Edge, 3, 0.18549375)]
    [InlineData(5, Edge, 0.3439)]
    public void Independent_lines(double x, double y, double expected)
        => Check(Of(LayoutKind.RandomParallel) with { Sizing = new Sizing.Number(4) }, x, y, expected);

    // Bands of 2.5: in the middle of one 1/2.5; on a border half of that from either side, 1 - 0.8²; at the edge 0.5/2.5.
    [Theory]
    [InlineData(3.75, 3, 0.4)]
    [InlineData(5, 3, 0.36)]
    [InlineData(Edge, 3, 0.2)]
    public void One_line_per_band(double x, double y, double expected)
        => Check(Of(LayoutKind.RandomParallel) with { Sizing = new Sizing.Number(4), Placement = LinePlacement.OnePerBand }, x, y, expected);

    // Of lines 4 apart half is walked: half of 1/4, and of 1/8 at the edge along them.
    [Theory]
    [InlineData(5, 3, 0.125)]
    [InlineData(Edge, 3, 0.0625)]
    [InlineData(5, Edge, 0.125)]
    public void Segments_cut_at_the_boundary(double x, double y, double expected)
        => Check(Segments(CrossingRule.Clip), x, y, expected);

    // Starts within 2 behind: cut off where the boundary is nearer behind than that. Rows run towards north.
    [Theory]
    [InlineData(5, 3, 0.125)]
    [InlineData(5, 0.5, 0.03125)]
    [InlineData(5, 6 - Edge, 0.125)]
    [InlineData(Edge, 1, 0.03125)]
    public void Segments_kept_whole(double x, double y, double expected)
        => Check(Segments(CrossingRule.Keep), x, y, expected);

    // (2a(U + V) - UV) / 16 with a = 2: U = V = 1 inside, one of them 0.5 at an edge, both in a corner.
    [Theory]
    [InlineData(5, 3, 0.4375)]
    [InlineData(Edge, 3, 0.34375)]
    [InlineData(5, Edge, 0.34375)]
    [InlineData(Edge, Edge, 0.234375)]
    public void Loops_cut_at_the_boundary(double x, double y, double expected)
        => Check(Loops(CrossingRule.Clip), x, y, expected);

    // Inside the same. Loops run north and west of their start: in the south-west corner only starts at most 2 to the east and 0.5 to the north
    // are inside and reach it (2 times 0.5 over 16); at the east edge only those at most 0.5 to the west and 2 to the south.
    [Theory]
    [InlineData(5, 3, 0.4375)]
    [InlineData(Edge, Edge, 0.0625)]
    [InlineData(10 - Edge, 3, 0.0625)]
    public void Loops_kept_whole(double x, double y, double expected)
        => Check(Loops(CrossingRule.Keep), x, y, expected);

    // A disk of π/4 over cells of 2 by 4.
    [Theory]
    [InlineData(5, 3, Math.PI / 32)]
    [InlineData(Edge, 3, Math.PI / 64)]
    [InlineData(Edge, Edge, Math.PI / 128)]
    public void Points_on_lines(double x, double y, double expected)
        => Check(Of(LayoutKind.PointsOnLines) with { StepMetres = 2 }, x, y, expected);

    // Three points, each within reach with probability π/4 over 60.
    [Theory]
    [InlineData(5, 3, 1)]
    [InlineData(Edge, 3, 0.5)]
    public void Random_points(double x, double y, double shareOfDisk)
        => Check(
            Of(LayoutKind.RandomPoints) with { Sizing = new Sizing.Number(3) },
            x,
            y,
            1 - Math.Pow(1 - (shareOfDisk * Math.PI / 240), 3));

    private static LayoutDesign Of(LayoutKind kind) => PlaneStrata.LinesAcrossX(spacing: 4, halfWidth: 0.5, kind);

    private static LayoutDesign Segments(CrossingRule crossing) => Of(LayoutKind.Segments) with { SegmentMetres = 2, Crossing = crossing };

    private static LayoutDesign Loops(CrossingRule crossing) => Of(LayoutKind.Loops) with { SideMetres = 2, Crossing = crossing };

    private static void Check(LayoutDesign design, double x, double y, double expected)
        => Assert.Equal(expected, PlaneStrata.ExactAt(PlaneStrata.Prepare(PlaneStrata.Rectangle(10, 6), design), x, y), 1e-8);
}
