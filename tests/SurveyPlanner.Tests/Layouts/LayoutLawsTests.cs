using CsCheck;
using NetTopologySuite.Geometries;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>What holds for every kind on any stratum: convex, concave, with holes, of several parts.</summary>
public class LayoutLawsTests
{
    private const int Cases = 30;

    private static readonly Gen<(Stratum Stratum, double Offset, double Turn)> Strata
        = Gen.Select(RandomShapes.Strata, Gen.Double[0, 0.999], Gen.Double[-80, 80]);

    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void Every_piece_lies_inside(string kind) => Check(kind, (generator, offset, _) =>
    {
        // Second method: distances by NetTopologySuite, on the plane's own coordinates.
        var polygons = PlaneGeometry.ToPolygons(generator.Stratum.ClipShape);
        var pieces = EveryKind.Draw(generator, offset);
        for (var i = 0; i < pieces.Length; i++)
        {
            var piece = pieces[i];

            // Where transects are kept whole, their first place must lie inside.
            var isFirst = i == 0 || pieces[i - 1].Transect < piece.Transect;
            foreach (var share in EveryKind.LeavesStratum(generator.Design) ? (isFirst ? [0.0] : Array.Empty<double>()) : [0, 0.17, 0.5, 0.83, 1])
            {
                var place = generator.Stratum.Frame.ToPlane(
                    piece.FromX + (share * (piece.ToX - piece.FromX)), piece.FromY + (share * (piece.ToY - piece.FromY)));
                var point = polygons[0].Factory.CreatePoint(new Coordinate(place.X, place.Y));
                Assert.True(polygons.Min(polygon => polygon.Distance(point)) < 1e-6, $"{piece} leaves the stratum");
            }
        }
    });

    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void Transects_are_numbered_in_order_without_gaps(string kind) => Check(kind, (generator, offset, _) =>
    {
        var last = -1;
        foreach (var piece in EveryKind.Draw(generator, offset))
        {
            Assert.InRange(piece.Transect, Math.Max(0, last), last + 1);
            last = piece.Transect;
        }
    });

    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void Shifting_turning_and_rewinding_the_stratum_moves_the_layout_with_it(string kind) => Check(kind, (generator, offset, turn) =>
    {
        var moved = new Mover(turn, 31_234.5, -7_654.3).Move(generator.Stratum.Stratum.Shape);
        var design = generator.Design.Bearing is Bearing.Random ? generator.Design : generator.Design with { Bearing = new Bearing.Degrees(90 - turn) };
        var stratum = PlaneStrata.Of(moved) with { LongAxisBearing = 90 - turn };
        if (EveryKind.TryPrepare(stratum, design) is not { } other)
        {
            return;
        }

        var (before, after) = (EveryKind.Draw(generator, offset), EveryKind.Draw(other, offset));
        Assert.Equal(before.Length, after.Length);
        var (dx, dy) = (other.Stratum.Clip.MinX - generator.Stratum.Clip.MinX, other.Stratum.Clip.MinY - generator.Stratum.Clip.MinY);

        // The margin of plus sampling is a polygon whose corners do not turn with the stratum: its arcs stray by 0.13 % of the half-width.
        var tolerance = design.Edge == EdgeRule.Plus ? 1 : 1e-4;
        for (var i = 0; i < before.Length; i++)
        {
            Assert.Equal(before[i].Transect, after[i].Transect);
            Assert.Equal(before[i].FromX + dx, after[i].FromX, tolerance);
            Assert.Equal(before[i].FromY + dy, after[i].FromY, tolerance);
            Assert.Equal(before[i].ToX + dx, after[i].ToX, tolerance);
            Assert.Equal(before[i].ToY + dy, after[i].ToY, tolerance);
        }
    });

    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void Equal_seeds_give_equal_layouts_and_others_do_not(string kind) => Check(kind, (generator, _, _) =>
    {
        var again = LayoutKinds.Prepare(generator.Stratum.Stratum, generator.Design);
        Assert.Equal(LayoutDrawer.Realise(generator, 7, 0).Pieces, LayoutDrawer.Realise(again, 7, 0).Pieces);
        Assert.NotEqual(LayoutDrawer.Realise(generator, 7, 0).Pieces, LayoutDrawer.Realise(generator, 8, 0).Pieces);
        Assert.NotEqual(LayoutDrawer.Realise(generator, 7, 0).Pieces, LayoutDrawer.Realise(generator, 7, 1).Pieces);
    });

    /// <summary>Rows of lines and grids, and points within a row, lie whole spacings apart; neighbours exactly one. (Turns of a zigzag: ZigzagTests.)</summary>
    [Theory]
    [InlineData("parallel", 1500, 0)]
    [InlineData("parallel plus", 1500, 0)]
    [InlineData("segments kept", 2000, 2000)]
    [InlineData("loops kept", 2000, 2000)]
    [InlineData("point-grid square", 1500, 1500)]
    [InlineData("points-on-lines", 2500, 600)]
    [InlineData("point-grid triangular", 1299.0381056766579, 750)]
    public void Neighbours_are_exactly_one_spacing_apart(string kind, double across, double along) => Check(kind, (generator, offset, _) =>
    {
        var pieces = EveryKind.Draw(generator, offset);
        var starts = pieces.Where((piece, i) => i == 0 || piece.Transect > pieces[i - 1].Transect).ToList();
        AssertSteps(starts.Select(piece => piece.FromY), across);
        if (along > 0)
        {
            AssertSteps(starts.Select(piece => piece.FromX), along);
        }
    });

    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void Short_pieces_are_dropped_and_nothing_else(string kind)
    {
        // Segments with bearings of their own draw these on the way to and fro, which goes otherwise when some are left out; random lines are
        // drawn only where some stretch is long enough.
        var design = EveryKind.Designs[kind];
        if (design.IsPoints || design.Bearing is Bearing.Random || design.Kind == LayoutKind.RandomParallel || EveryKind.LeavesStratum(design))
        {
            return;
        }

        Check(kind, (generator, offset, _) =>
        {
            const double shortest = 700;
            var all = EveryKind.Draw(LayoutKinds.Prepare(generator.Stratum.Stratum, generator.Design with { MinLengthMetres = 0 }), offset);
            var kept = EveryKind.Draw(LayoutKinds.Prepare(generator.Stratum.Stratum, generator.Design with { MinLengthMetres = shortest }), offset);
            var expected = Stretches(all).Where(stretch => stretch.Length >= shortest).Order().ToList();
            var actual = Stretches(kept).Order().ToList();
            Assert.Equal(expected.Count, actual.Count);
            Assert.All(expected.Zip(actual), pair =>
            {
                Assert.Equal(pair.First.LowX, pair.Second.LowX, 1e-6);
                Assert.Equal(pair.First.Length, pair.Second.Length, 1e-6);
            });
        });
    }

    private static void AssertSteps(IEnumerable<double> places, double step)
    {
        var all = places.ToList();
        Assert.All(all, place => Assert.Equal(Math.Round((place - all[0]) / step), (place - all[0]) / step, 1e-9));
        Assert.Contains(all, place => Math.Abs(Math.Abs(place - all[0]) - step) < 1e-6);
    }

    private static IEnumerable<(double LowX, double Length)> Stretches(Piece[] pieces)
    {
        for (var start = 0; start < pieces.Length;)
        {
            var (length, end) = (pieces[start].Length, start + 1);
            for (; end < pieces.Length && pieces[end].GoesOnFrom(pieces[end - 1]); end++)
            {
                length += pieces[end].Length;
            }

            // Travelled either way: which one may change when others are dropped.
            yield return (Math.Min(pieces[start].FromX, pieces[end - 1].ToX), length);
            start = end;
        }
    }

    private static void Check(string kind, Action<LayoutGenerator, double, double> law)
    {
        var checkedCases = 0;
        Strata.Hold(Cases, seed: 4, drawn =>
        {
            if (EveryKind.TryPrepare(drawn.Stratum with { LongAxisBearing = 90 }, EveryKind.Designs[kind]) is { } generator)
            {
                law(generator, drawn.Offset, drawn.Turn);
                checkedCases++;
            }
        });

        Assert.True(checkedCases > Cases / 2, $"only {checkedCases} of {Cases} strata can have a {kind}");
    }
}
