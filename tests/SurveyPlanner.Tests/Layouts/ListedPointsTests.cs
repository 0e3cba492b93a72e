using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Tests.Layouts;

public class ListedPointsTests
{
    private const int Draws = 4000;

    /// <summary>
    /// Places that a start outside the stratum would favour or not: each quarter of the region gets its share of the first, a middle and the last
    /// point of the list. Four standard errors; 24 comparisons, chance of a false alarm 0.2 %.
    /// </summary>
    [Theory]
    [InlineData(LayoutKind.RandomPoints)]
    [InlineData(LayoutKind.BalancedPoints)]
    public void Every_point_of_the_list_is_uniform(LayoutKind kind)
    {
        var generator = Prepare(kind, points: 20, reserve: 20);
        var clip = generator.Stratum.Clip;
        var (middleX, middleY) = ((clip.MinX + clip.MaxX) / 2, (clip.MinY + clip.MaxY) / 2);
        int Quarter(Piece point) => (point.FromX < middleX ? 0 : 1) + (point.FromY < middleY ? 0 : 2);
        var (counts, areas) = (new int[3, 4], new double[4]);
        for (var draw = 0; draw < Draws; draw++)
        {
            var drawn = LayoutDrawer.Realise(generator, (ulong)draw, 0);
            counts[0, Quarter(drawn.Pieces[0])]++;
            counts[1, Quarter(drawn.Pieces[10])]++;
            counts[2, Quarter(drawn.Reserve[^1])]++;
        }

        for (var quarter = 0; quarter < 4; quarter++)
        {
            areas[quarter] = RectangleArea.Of(
                clip,
                quarter % 2 == 0 ? clip.MinX : middleX,
                quarter % 2 == 0 ? middleX : clip.MaxX,
                quarter < 2 ? clip.MinY : middleY,
                quarter < 2 ? middleY : clip.MaxY) / clip.AreaSquareMetres;
            for (var place = 0; place < 3; place++)
            {
                var standardError = Math.Sqrt(areas[quarter] * (1 - areas[quarter]) / Draws);
                Assert.InRange(((double)counts[place, quarter] / Draws) - areas[quarter], -4 * standardError, 4 * standardError);
            }
        }

        Assert.Equal(1, areas.Sum(), 1e-9);
    }

    /// <summary>The left half of a region gets half the points nearly always, where independent points scatter by the square root of their number.</summary>
    [Fact]
    public void Balanced_points_are_spread_out()
    {
        double SpreadOf(LayoutKind kind)
        {
            var generator = Prepare(kind, points: 64, reserve: 0);
            var middle = (generator.Stratum.Clip.MinX + generator.Stratum.Clip.MaxX) / 2;
            var counts = Enumerable.Range(0, 500)
                .Select(draw => (double)LayoutDrawer.Realise(generator, (ulong)draw, 0).Pieces.Count(point => point.FromX < middle))
                .ToArray();
            var mean = counts.Average();
            return Math.Sqrt(counts.Average(count => (count - mean) * (count - mean)));
        }

        Assert.InRange(SpreadOf(LayoutKind.RandomPoints), 3.5, 4.5);
        Assert.InRange(SpreadOf(LayoutKind.BalancedPoints), 0, 2);
    }

    [Theory]
    [InlineData(LayoutKind.RandomPoints)]
    [InlineData(LayoutKind.BalancedPoints)]
    public void The_reserve_goes_on_where_the_points_end(LayoutKind kind)
    {
        var all = LayoutDrawer.Realise(Prepare(kind, points: 30, reserve: 0), seed: 5, 0);
        var parts = LayoutDrawer.Realise(Prepare(kind, points: 20, reserve: 10), seed: 5, 0);
        Assert.Equal(Places(all.Pieces), [.. Places(parts.Pieces), .. Places(parts.Reserve)]);
    }

    [Fact]
    public void The_layout_carries_the_reserve_with_its_own_names()
    {
        var projection = new AzimuthalEqualArea(new LonLat(10, 50));
        LayoutGenerator[] one = [Prepare(LayoutKind.BalancedPoints, points: 3, reserve: 2)];
        var layout = LayoutDrawer.Draw(one, projection, seed: 1).Single();
        Assert.Equal(["T0001", "T0002", "T0003"], layout.Transects.Select(point => point.Id));
        Assert.Equal(["R0001", "R0002"], layout.Reserve.Select(point => point.Id));
        Assert.Equal([1, 2], layout.Reserve.Select(point => point.Order));
        var two = LayoutDrawer.Draw([one[0], one[0]], projection, seed: 1);
        Assert.Equal(["B001", "B002", "B003"], two[1].Transects.Select(point => point.Id));
        Assert.Equal(["B-R01", "B-R02"], two[1].Reserve.Select(point => point.Id));
        Assert.Equal([4, 5, 6], two[1].Transects.Select(point => point.Order));
    }

    [Fact]
    public void Names_stay_within_six_characters()
    {
        var ids = new TransectIds([99_999, 100_001], [0, 100_000]);
        Assert.Equal("T99999", ids.Of(0, 99_998));
        Assert.Equal("U00000", ids.Of(1, 0));
        Assert.Equal("V00000", ids.Of(1, 100_000));
        Assert.Equal("S00000", ids.OfReserve(1, 99_999));
        Assert.Throws<InputException>(() => new TransectIds([700_000], []));
    }

    private static LayoutGenerator Prepare(LayoutKind kind, int points, int reserve)
        => LayoutKinds.Prepare(EveryKind.Islands, EveryKind.Of(kind, 1) with { Sizing = new Sizing.Number(points), Reserve = reserve });

    private static IEnumerable<(double X, double Y)> Places(Piece[] points) => points.Select(point => (point.FromX, point.FromY));
}
