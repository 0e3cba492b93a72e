using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Published.Tests.Layouts;

/// <summary>
/// The three zigzags of Strindberg and Buckland 2004, Zigzag survey designs in line transect sampling, JABES 9:443-461 (their abstract was read;
/// the values follow from their definitions, worked out separately to 25 digits). The axis runs along x, H(x) is the height of the region, and
/// to first order in the half-width w coverage along the axis is 2 w E[sec θ(x)] / H(x).
/// </summary>
public class ZigzagTests
{
    private const double HalfWidth = 0.1;

    // Height 2 + 0.1 x over an axis of 80; straight lower side.
    private static readonly Stratum Trapezoid = Figure((0, 0), (0, 2), (80, 10), (80, 0));

    // Height 0.5 x over an axis of 100.
    private static readonly Stratum Triangle = Figure((0, 0), (100, 50), (100, 0));

    [Theory]
    [InlineData(ZigzagTurning.EqualSpaced)]
    [InlineData(ZigzagTurning.EqualAngle)]
    [InlineData(ZigzagTurning.AdjustedAngle)]
    public void In_a_rectangle_all_three_are_the_same(ZigzagTurning turning)
    {
        var zigzag = Prepare(Figure((0, 0), (0, 10), (100, 10), (100, 0)), turning, spacing: 5);
        var spread = EffortIntegral.Over(zigzag);
        Assert.Equal(223.60679774998, spread.Mean, 1e-9);
        Assert.Equal(0, spread.StandardDeviation, 1e-6);
        Assert.Equal(0.044721359549996, zigzag.NominalCoverage, 1e-12);
    }

    [Theory]
    [InlineData(0, 0.2)]
    [InlineData(20, 0.1)]
    [InlineData(40, 0.0666667)]
    [InlineData(60, 0.05)]
    [InlineData(80, 0.04)]
    public void Equal_angle_covers_as_one_over_height(double x, double coverage)
    {
        var zigzag = EqualAngle60();
        Assert.Equal(coverage, CoverageAlongAxis(zigzag, x, height: 2 + (0.1 * x)), 5e-8);
    }

    [Fact]
    public void Equal_angle_has_the_same_length_in_every_draw()
    {
        var spread = EffortIntegral.Over(EqualAngle60());
        Assert.Equal(160, spread.Smallest, 1e-9);
        Assert.Equal(160, spread.Largest, 1e-9);
        Assert.Equal(1.0 / 15, EqualAngle60().NominalCoverage, 1e-12);
    }

    /// <summary>Density growing along the axis, estimated as if coverage were even: 40 instead of 48.889, 18 % too low.</summary>
    [Fact]
    public void Taking_equal_angle_coverage_for_even_is_wrong_by_two_elevenths()
    {
        var zigzag = EqualAngle60();
        var pieces = PiecesAt(zigzag, 0.37);
        var seen = pieces.Sum(piece => piece.Length * (piece.FromY + piece.ToY) / 2) / pieces.Sum(piece => piece.Length);
        const double truth = ((2 * 80 * 80 / 2.0) + (0.1 * 80 * 80 * 80 / 3.0)) / 480;
        Assert.Equal(9.0 / 11, seen / truth, 1e-12);
    }

    [Theory]
    [InlineData(20, 1.4293489272253, 0.071467446361)]
    [InlineData(40, 2.2398802407021, 0.055997006018)]
    [InlineData(60, 3.1636128113007, 0.052726880188)]
    [InlineData(80, 4.1237049798169, 0.051546312248)]
    public void Equal_spaced_in_a_triangle(double x, double meanSecant, double coverage)
    {
        const double halfWidth = 0.25;
        var zigzag = Prepare(Triangle, ZigzagTurning.EqualSpaced, spacing: 10, halfWidth);
        var secant = MeanSecant(zigzag, x, starts: 20_000);

        // Midpoint rule over 20,000 starts, where the secant has a corner: 1e-8.
        Assert.Equal(meanSecant, secant, 1e-8);
        Assert.Equal(coverage, 2 * halfWidth * secant / (0.5 * x), 1e-9);
    }

    [Fact]
    public void Equal_angle_in_a_triangle_crosses_in_geometric_steps()
    {
        var path = Path(Triangle, new EqualAngleSwing(tangent: 2, HalfWidth));
        var (x, left) = (10.0, true);
        foreach (var expected in new[] { 13.333333, 16.666667, 22.222222, 27.777778, 37.037037 })
        {
            (x, left) = (path.NextTurn(x, left), !left);
            Assert.Equal(expected, x, 5e-7);
        }

        Assert.Equal(5.0 / 3, path.NextTurn(path.NextTurn(30, true), false) / 30, 1e-12);
    }

    [Fact]
    public void Adjusted_angle_turns_at_the_points_of_its_curve()
    {
        var path = Path(Trapezoid, new AdjustedAngleSwing(k: 1));
        var turns = new List<double> { 0 };
        for (var left = true; ; left = !left)
        {
            var next = path.NextTurn(turns[^1], left);
            if (next > 80)
            {
                break;
            }

            turns.Add(next);
        }

        Assert.Equal(78, turns.Count);
        double[] first = [0, 1.1767669799625, 2.2747581548191, 3.4147636235459, 4.4905686561545, 5.6055561754109, 6.6659734590240];
        Assert.All(first.Zip(turns), pair => Assert.Equal(pair.First, pair.Second, 5e-13));
        Assert.Equal(79.078462915044, turns[^1], 5e-13);
    }

    /// <summary>Length k times area, and coverage 2 w k everywhere along the axis.</summary>
    [Fact]
    public void Adjusted_angle_is_even_along_its_axis()
    {
        var zigzag = AdjustedK1();
        var spread = EffortIntegral.Over(zigzag);

        // Drawn as chords that stray by at most a hundredth of the half-width: a hair shorter than the curve.
        Assert.Equal(480, spread.Mean, 2e-3);
        Assert.Equal(0, spread.StandardDeviation, 2e-3);
        Assert.Equal(0.2, zigzag.NominalCoverage, 1e-6);
        foreach (var x in new[] { 1.0, 20, 40, 60, 79 })
        {
            Assert.Equal(0.2, CoverageAlongAxis(zigzag, x, 2 + (0.1 * x)), 2e-4);
        }
    }

    [Theory]
    [InlineData(0, 60)]
    [InlineData(20, 75.5224878141)]
    [InlineData(40, 80.4059317731)]
    [InlineData(60, 82.8192442185)]
    [InlineData(80, 84.2608295227)]
    public void Adjusted_angle_follows_the_height(double x, double degrees)
        => Assert.Equal(degrees, Math.Atan(new AdjustedAngleSwing(k: 1).TangentAt(2 + (0.1 * x))) * 180 / Math.PI, 5e-11);

    // Mean height 6: tangent √3 = 6 / spacing.
    private static LayoutGenerator EqualAngle60() => Prepare(Trapezoid, ZigzagTurning.EqualAngle, spacing: 6 / Math.Sqrt(3));

    // Mean height 6: k = 1 where the tangent is √(36 - 1) = 6 / spacing.
    private static LayoutGenerator AdjustedK1() => Prepare(Trapezoid, ZigzagTurning.AdjustedAngle, spacing: 6 / Math.Sqrt(35));

    /// <summary>A figure given by places along the axis and across it; the turned frame's y is the way along the axis.</summary>
    private static Stratum Figure(params (double Along, double Across)[] corners)
        => PlaneStrata.Of([.. corners.Select(corner => (-corner.Along, corner.Across))]);

    private static LayoutGenerator Prepare(Stratum stratum, ZigzagTurning turning, double spacing, double halfWidth = HalfWidth)
        => PlaneStrata.Prepare(stratum, PlaneStrata.LinesAcrossX(spacing, halfWidth, LayoutKind.Zigzag) with { Turning = turning });

    private static SwingPath Path(Stratum stratum, SwingRule rule)
    {
        var frame = new StratumFrame(stratum, PlaneStrata.LinesAcrossX(1, HalfWidth, LayoutKind.Zigzag));
        var hull = new HullSides(frame);
        return new SwingPath(ZigzagBand.For(frame, hull, rule, "tested").Outline, rule, hull.MinY, hull.MaxY, HalfWidth);
    }

    private static Piece[] PiecesAt(LayoutGenerator zigzag, double offset)
    {
        var (buffer, random) = (new PieceBuffer(), new PhiloxStream(1, 1, 1, 1));
        zigzag.Realise([offset], ref random, buffer);
        return [.. buffer.Pieces];
    }

    private static double CoverageAlongAxis(LayoutGenerator zigzag, double x, double height)
        => 2 * HalfWidth * MeanSecant(zigzag, x, starts: 200) / height;

    /// <summary>Mean over the random start of the secant of the angle at which the drawn path crosses a place of the axis.</summary>
    private static double MeanSecant(LayoutGenerator zigzag, double x, int starts)
    {
        var (buffer, random) = (new PieceBuffer(), new PhiloxStream(1, 1, 1, 1));
        x = Math.Clamp(x, 1e-9, 80 - 1e-9);
        var total = 0.0;
        for (var start = 0; start < starts; start++)
        {
            buffer.Clear();
            zigzag.Realise([(start + 0.5) / starts], ref random, buffer);
            var pieces = buffer.Pieces;
            for (var i = 0; i < pieces.Length; i++)
            {
                if (pieces[i].FromY <= x && pieces[i].ToY > x)
                {
                    total += pieces[i].Length / (pieces[i].ToY - pieces[i].FromY);
                }
            }
        }

        return total / starts;
    }
}
