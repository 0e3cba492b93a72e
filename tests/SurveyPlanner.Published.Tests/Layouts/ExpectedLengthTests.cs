using SurveyPlanner.Layouts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Published.Tests.Layouts;

/// <summary>
/// Total length of systematic lines over the random start: E = area / spacing for any region; standard deviation, least and most in closed form
/// for rectangle (from the fraction of width / spacing), disk (Bessel series, checked by quadrature) and right triangle.
/// </summary>
public class ExpectedLengthTests
{
    // Numbers of offsets tried: prime, so that they share no period with the spacing.
    private const int Many = 100_003;

    [Theory]
    [InlineData(10, 6, 4, 15, 3, 12, 18)]
    [InlineData(10, 6, 3, 20, 2.82842712475, 18, 24)]
    [InlineData(20, 10, 4, 50, 0, 50, 50)]
    [InlineData(25, 10, 4, 62.5, 4.33012701892, 60, 70)]
    public void Rectangle(double width, double height, double spacing, double mean, double sd, double least, double most)
        => Check(PlaneStrata.Rectangle(width, height), spacing, (mean, sd, least, most), tolerance: 1e-9, jump: height);

    [Theory]
    [InlineData(4, 19.6349540849, 1.62212067381, 17.7979589711, 22)]
    [InlineData(2.5, 31.4159265359, 1.20157652162, 27.3205080757, 32.5936732864)]
    [InlineData(1, 78.5398163397, 0.772062513297, 75.9262207221, 79.2996955903)]
    public void Disk(double spacing, double mean, double sd, double least, double most)
        => Check(PlaneStrata.Disk(5, 40_000), spacing, (mean, sd, least, most), tolerance: 0.05, jump: 0);

    [Fact]
    public void Triangle() => Check(PlaneStrata.Triangle(8, 6), 4, (6, 1.73205080757, 3, 9), tolerance: 1e-4, jump: 0);

    /// <param name="tolerance">
    /// Of least and most, which evenly spread offsets come near without hitting them (where a line first touches the disk, length starts with
    /// infinite slope: off by the root of the step).
    /// </param>
    /// <param name="jump">Where length jumps with the offset, as in a rectangle, each jump costs the mean up to half of it over the number of offsets.</param>
    private static void Check(
        SurveyPlanner.Regions.Stratum stratum, double spacing, (double Mean, double Sd, double Least, double Most) expected, double tolerance, double jump)
    {
        var lines = PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(spacing, 0.1));
        var spread = EffortIntegral.Over(lines, out _, Many);
        var fine = (jump / Many) + 1e-6;
        Assert.Equal(expected.Mean, lines.ExpectedLength!.Value, 1e-6);
        Assert.Equal(expected.Mean, spread.Mean, fine);
        Assert.Equal(expected.Sd, spread.StandardDeviation, fine);
        Assert.Equal(expected.Least, spread.Smallest, tolerance);
        Assert.Equal(expected.Most, spread.Largest, tolerance);
    }
}
