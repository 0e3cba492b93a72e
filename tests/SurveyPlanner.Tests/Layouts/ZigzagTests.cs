using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

public class ZigzagTests
{
    // A hull of 60 km with pointed ends, 20 km wide in the middle; the axis runs along plane x.
    private static readonly Stratum Diamond = PlaneStrata.Of((0, 0), (30_000, -10_000), (60_000, 0), (30_000, 10_000));

    private static readonly Stratum Rectangle = PlaneStrata.Rectangle(60_000, 12_000);

    [Fact]
    public void Turns_of_an_equal_spaced_zigzag_are_exactly_one_spacing_apart()
    {
        var turns = TurnsOf(Design(3000), Diamond, 0.3);
        Assert.All(turns.Zip(turns.Skip(1)), pair => Assert.Equal(3000, pair.Second - pair.First, 1e-9));
    }

    [Theory]
    [InlineData(ZigzagTurning.EqualSpaced)]
    [InlineData(ZigzagTurning.EqualAngle)]
    [InlineData(ZigzagTurning.AdjustedAngle)]
    public void The_second_pass_mirrors_the_first_and_comes_back(ZigzagTurning turning)
    {
        var design = Design(4000) with { Turning = turning };
        var once = EveryKind.Draw(PlaneStrata.Prepare(Rectangle, design), 0.3);
        var crossed = EveryKind.Draw(PlaneStrata.Prepare(Rectangle, design with { Crossed = true }), 0.3);
        Assert.Equal(2 * once.Length, crossed.Length);
        Assert.Equal(once, crossed[..once.Length]);
        Assert.Equal(Enumerable.Range(0, crossed.Length), crossed.Select(piece => piece.Transect));

        // Mirrored in the middle line of the rectangle (frame x from 0 to 12 km), and walked the other way.
        Assert.All(once.Zip(crossed.Skip(once.Length).Reverse()), pair =>
        {
            Assert.Equal(12_000 - pair.First.FromX, pair.Second.ToX, 1e-6);
            Assert.Equal(pair.First.FromY, pair.Second.ToY, 1e-6);
            Assert.Equal(12_000 - pair.First.ToX, pair.Second.FromX, 1e-6);
        });
    }

    [Fact]
    public void A_curved_leg_strays_by_less_than_a_hundredth_of_the_half_width_and_stays_one_piece()
    {
        const double halfWidth = 200;
        var design = Design(4000, halfWidth) with { Turning = ZigzagTurning.AdjustedAngle };
        var coarse = EveryKind.Draw(PlaneStrata.Prepare(Diamond, design), 0.3);
        var fine = EveryKind.Draw(PlaneStrata.Prepare(Diamond, design with { HalfWidthMetres = halfWidth / 1000 }), 0.3);
        Assert.True(fine.Length > 10 * coarse.Length);
        foreach (var leg in fine.Where((_, i) => i % 7 == 0))
        {
            var nearest = coarse.Where(piece => piece.Transect == leg.Transect).Min(piece => DistanceTo(piece, leg.FromX, leg.FromY));
            Assert.True(nearest < halfWidth / 100, $"{nearest} m");
        }

        var stratum = PlaneStrata.Prepare(Diamond, design);
        var projection = new AzimuthalEqualArea(new LonLat(10, 50));
        var transect = new TransectBuilder(stratum, projection).Build("T1", 1, [.. coarse.Where(piece => piece.Transect == 3)]);
        Assert.Single(transect.Pieces);
        Assert.InRange(transect.Pieces[0].Plane.Length, 3, 250);
    }

    [Theory]
    [InlineData(ZigzagTurning.EqualAngle)]
    [InlineData(ZigzagTurning.AdjustedAngle)]
    public void A_zigzag_that_cannot_turn_is_refused_and_says_where(ZigzagTurning turning)
    {
        var problem = Assert.Throws<InputException>(() => PlaneStrata.Prepare(Diamond, Design(20_000) with { Turning = turning })).Problems.Single();
        Assert.Equal("layout.turning", problem.Key);
        Assert.Contains("of the 60 km of its axis (towards 270°)", problem.Message, StringComparison.Ordinal);
        Assert.Matches(@"in the (first|last) [0-9.]+ km", problem.Message);
    }

    /// <summary>
    /// kH &lt; 1 in the pointed ends of any hull (here in the last 3 km): the strip of constant width there keeps coverage near 2wk, where a path
    /// along the axis would cover 6 times as much, and the user is told.
    /// </summary>
    [Fact]
    public void Coverage_of_an_adjusted_angle_zigzag_goes_on_into_the_tips()
    {
        const double halfWidth = 20;
        const int draws = 1000;
        var zigzag = PlaneStrata.Prepare(Diamond, Design(2000, halfWidth) with { Turning = ZigzagTurning.AdjustedAngle });
        Assert.Contains("cannot turn at the sides of the first", zigzag.Warning, StringComparison.Ordinal);
        var nominal = 2 * halfWidth * Math.Sqrt((1 / 2000.0 / 2000) + (1 / 10_000.0 / 10_000));
        (double FromTip, double Tolerance)[] places = [(500, 0.25), (1000, 0.25), (10_000, 0.005), (30_000, 0.005)];
        var swept = new double[places.Length];
        for (var draw = 0; draw < draws; draw++)
        {
            foreach (var piece in EveryKind.Draw(zigzag, (draw + 0.5) / draws))
            {
                for (var i = 0; i < places.Length; i++)
                {
                    var y = -60_000 + places[i].FromTip;
                    swept[i] += piece.FromY <= y && piece.ToY > y ? 2 * halfWidth * piece.Length / (piece.ToY - piece.FromY) / draws : 0;
                }
            }
        }

        for (var i = 0; i < places.Length; i++)
        {
            Assert.Equal(nominal, swept[i] / (2 * places[i].FromTip / 3), places[i].Tolerance * nominal);
        }
    }

    /// <summary>
    /// A box whose ends lean by half a degree, as between parallels and meridians: near its ends a place is covered as often as far from them, all
    /// across the box. 2,000 stratified starts: a place counts 146 of them give or take a few (the bound is two for each time it comes under cover).
    /// </summary>
    [Fact]
    public void Ends_that_lean_a_little_are_no_sides_to_turn_at()
    {
        var box = PlaneStrata.Of([(0, 0), (60_000, 0), (59_700, 30_000), (300, 30_000)]);
        var zigzag = PlaneStrata.Prepare(box, Design(8000, halfWidth: 300));
        foreach (var across in new[] { 4_000, 10_000, 15_000, 22_000 })
        {
            var (grid, order) = PlaneStrata.GridOf(zigzag, (700, across), (3_000, across), (30_000, across), (57_000, across), (59_300, across));
            var counts = CoverageSimulation.Run(zigzag, grid, 2000, seed: 1, 0, 1, CancellationToken.None);
            var middle = counts.ExpectedTimes(Array.IndexOf(order, 2));
            for (var place = 0; place < 5; place++)
            {
                Assert.InRange(counts.ExpectedTimes(place), 0.95 * middle, 1.05 * middle);
            }
        }
    }

    [Theory]
    [InlineData(ZigzagTurning.EqualSpaced)]
    [InlineData(ZigzagTurning.EqualAngle)]
    [InlineData(ZigzagTurning.AdjustedAngle)]
    public void A_length_or_a_number_asked_for_is_what_to_expect(ZigzagTurning turning)
    {
        var design = Design(1) with { Turning = turning, Crossed = turning == ZigzagTurning.EqualAngle };
        var byLength = PlaneStrata.Prepare(Diamond, design with { Sizing = new Sizing.TotalLength(300_000) });
        Assert.Equal(300_000, EffortIntegral.Over(byLength).Mean, 0.1);
        EffortIntegral.Over(PlaneStrata.Prepare(Diamond, design with { Sizing = new Sizing.Number(25) }), out var legs);
        Assert.Equal(25, legs, 0.03);
    }

    private static LayoutDesign Design(double spacing, double halfWidth = 100)
        => PlaneStrata.LinesAcrossX(spacing, halfWidth, LayoutKind.Zigzag);

    private static List<double> TurnsOf(LayoutDesign design, Stratum stratum, double offset)
    {
        var turns = new List<Turn>();
        var hull = new HullSides(new StratumFrame(stratum, design));
        new EqualSpacedPath(hull, ((Sizing.Spacing)design.Sizing).Metres).AddTurns(offset, mirrored: false, turns);
        return [.. turns.Select(turn => turn.Y)];
    }

    private static double DistanceTo(Piece piece, double x, double y)
    {
        var (dx, dy) = (piece.ToX - piece.FromX, piece.ToY - piece.FromY);
        var share = Math.Clamp((((x - piece.FromX) * dx) + ((y - piece.FromY) * dy)) / ((dx * dx) + (dy * dy)), 0, 1);
        return Math.Sqrt(Math.Pow(x - piece.FromX - (share * dx), 2) + Math.Pow(y - piece.FromY - (share * dy), 2));
    }
}
