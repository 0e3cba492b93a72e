using System.Collections.Immutable;
using CsCheck;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.Tests.Coverage;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Regions;

/// <summary>Polygons of one stratum that share a border are one shape in the plane; the border is none of the stratum's.</summary>
public class SharedBordersTests
{
    /// <summary>The same box of two degrees, uncut and cut at 180°, by an outline that has a vertex on one side of the cut only too.</summary>
    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void A_box_cut_at_180_degrees_is_the_uncut_box(bool withVertexOnOneSide)
    {
        (double, double)[] east = withVertexOnOneSide ? [(179, 10), (180, 10), (180, 10.3), (180, 11), (179, 11)] : [(179, 10), (180, 10), (180, 11), (179, 11)];
        var cut = Build(Polygon(east), Polygon((-180, 10), (-179, 10), (-179, 11), (-180, 11))).Shape;
        var whole = Build(Polygon((179, 10), (181, 10), (181, 11), (179, 11))).Shape;

        Assert.Equal((1, 0), (cut.PartCount, cut.HoleCount));

        // Areas agree within the vertices that either has on its bent edges: these stray by some tenths of a millimetre.
        Assert.Equal(whole.AreaSquareMetres, cut.AreaSquareMetres, 1e-9 * whole.AreaSquareMetres);
        Assert.Equal(whole.RingLength(0), cut.RingLength(0), 1e-9 * whole.RingLength(0));
    }

    /// <summary>Half the box as strata of their own: the same plane and vertices, but nothing joined.</summary>
    [Fact]
    public void Joining_changes_the_area_by_no_more_than_rounding()
    {
        foreach (var west in new[] { 179.0, 10 })
        {
            var (one, other) = (Polygon((west, 60), (west + 1, 60.2), (west + 1, 61), (west, 61)), Polygon((west + 1, 60.2), (west + 2, 60), (west + 2, 62), (west + 1, 61)));
            var apart = RegionBuilder.Build(Boundary(("a", one), ("b", other)), new RegionDesign("zone"), []).Strata;
            var joined = Assert.Single(RegionBuilder.Build(Boundary(("a", one), ("a", other)), new RegionDesign("zone"), []).Strata).Shape;

            Assert.Equal(1, joined.PartCount);
            var area = apart.Sum(stratum => stratum.Shape.AreaSquareMetres);
            Assert.Equal(area, joined.AreaSquareMetres, 1e-9 * area);
        }
    }

    /// <summary>
    /// Blocks of a grid across 180°, taken at random, some a turn of longitude further west and with further vertices on two sides. What they come to
    /// is counted on the grid: area by Snyder's q, parts by walking from block to block, and the outline as the sides with a block on one hand only.
    /// </summary>
    [Fact]
    public void Blocks_side_by_side_have_the_parts_area_and_outline_counted_on_their_grid() =>
        Gen.Select(Gen.Bool.Array[20], Gen.Int[-84, 80], Gen.Bool.Array[20]).Where((taken, _, _) => taken.Any(one => one)).Hold(60, 20261201, one =>
        {
            var (taken, south, turned) = one;
            bool At(int column, int row) => column is >= 0 and < 5 && row is >= 0 and < 4 && taken[(5 * row) + column];
            var places = Enumerable.Range(0, 20).Where(i => taken[i]).Select(i => (Column: i % 5, Row: i / 5)).ToList();

            GeographicPolygon Block((int Column, int Row) place)
            {
                var (west, low) = (178 + place.Column, south + place.Row);
                return turned[(5 * place.Row) + place.Column]
                    ? Polygon((west - 360, low), (west - 359.5, low), (west - 359, low), (west - 359, low + 1), (west - 360, low + 1), (west - 360, low + 0.25))
                    : Polygon((west, low), (west + 1, low), (west + 1, low + 1), (west, low + 1));
            }

            var stratum = Build([.. places.Select(Block)]);
            var expectedKm2 = places.Sum(place => BlockKm2(south + place.Row));
            Assert.Equal(1, stratum.AreaKm2 / expectedKm2, 1e-6);
            Assert.Equal(Components(places), stratum.Shape.PartCount);

            var sides = 0.0;
            foreach (var (column, row) in places)
            {
                var (west, low) = (178.0 + column, south + row);
                sides += At(column - 1, row) ? 0 : Side((west, low), (west, low + 1.0));
                sides += At(column + 1, row) ? 0 : Side((west + 1, low), (west + 1, low + 1.0));
                sides += At(column, row - 1) ? 0 : Side((west, low), (west + 1, low));
                sides += At(column, row + 1) ? 0 : Side((west, low + 1.0), (west + 1, low + 1.0));
            }

            // Geodesic lengths against lengths in the plane, whose scale is off by a few parts in ten thousand over so small a region.
            var outline = Enumerable.Range(0, stratum.Shape.RingCount).Sum(stratum.Shape.RingLength);
            Assert.Equal(1, outline / sides, 1e-3);
        });

    [Fact]
    public void A_border_shared_in_part_only_is_none_from_there_to_there()
    {
        // The second block stands at the middle of the first one's side, on a slant: neither meridian nor parallel.
        var (first, second) = (Polygon((10, 50), (11, 50), (12, 51), (10, 51)), Polygon((11.25, 50.25), (12, 50), (12.5, 50.5), (11.75, 50.75)));
        var shape = Build(first, second).Shape;

        Assert.Equal((1, 0), (shape.PartCount, shape.HoleCount));
        Assert.DoesNotContain(Enumerable.Range(0, shape.VertexCount), i => i > 0 && shape.X[i] == shape.X[i - 1] && shape.Y[i] == shape.Y[i - 1]);
    }

    [Fact]
    public void A_block_in_a_hole_that_fits_it_fills_it()
    {
        (double, double)[] ring = [(10.4, 50.4), (10.6, 50.4), (10.6, 50.6), (10.4, 50.6)];
        var frame = Polygon((10, 50), (11, 50), (11, 51), (10, 51)) with { Holes = [Polygon(ring).Shell] };
        var shape = Build(frame, Polygon(ring)).Shape;

        Assert.Equal((1, 0), (shape.PartCount, shape.HoleCount));
    }

    /// <summary>At a corner of both, at a corner of one in the middle of the other's side, and nowhere.</summary>
    [Fact]
    public void What_touches_at_a_point_only_keeps_its_vertices()
    {
        ImmutableArray<GeographicPolygon> polygons =
        [
            Polygon((10, 50), (11, 50), (11, 51), (10, 51)),
            Polygon((11, 51), (12, 51), (12, 52), (11, 52)),
            Polygon((10.5, 50), (10.8, 49), (10.2, 49)),
            Polygon((20, 50), (21, 50), (21, 51), (20, 51)),
        ];
        var (same, together) = SharedBorders.Find(polygons, 15);

        Assert.Empty(together);
        Assert.All(same.Zip(polygons), pair => Assert.Same(pair.Second, pair.First));
        Assert.Equal(4, Build([.. polygons]).Shape.PartCount);
    }

    [Fact]
    public void Parts_beside_joined_ones_keep_their_vertices_digit_for_digit()
    {
        var (island, left, right) = (Polygon((9, 49), (10, 50), (9, 50)), Polygon((10, 50), (11, 50), (11, 51), (10, 51)), Polygon((11, 50), (12, 50), (12, 51), (11, 51)));
        var alone = RegionBuilder.Build(Boundary(("a", island), ("b", left), ("b", right)), new RegionDesign("zone"), []).Strata[0].Shape;
        var beside = RegionBuilder.Build(Boundary(("a", island), ("a", left), ("a", right)), new RegionDesign("zone"), []).Strata[0].Shape;

        Assert.Equal(2, beside.PartCount);
        Assert.Equal(alone.X, beside.X[..alone.VertexCount]);
        Assert.Equal(alone.Y, beside.Y[..alone.VertexCount]);
    }

    /// <summary>A turn about the Earth's axis changes nothing of a survey: a box across 180°, cut there, is one at 10°, uncut.</summary>
    [Theory]
    [InlineData(EdgeRule.Minus)]
    [InlineData(EdgeRule.Plus)]
    public void The_cut_is_no_edge_of_coverage(EdgeRule edge)
    {
        var design = new LayoutDesign(LayoutKind.PointGrid, new Sizing.Spacing(8_000), new Bearing.Degrees(30), 3_000, edge);
        var here = Judge.Of(Build(Polygon((9, 10), (11, 10), (11, 11), (9, 11))), design, 2_000, 20);
        var there = Judge.Of(Build(Polygon((179, 10), (180, 10), (180, 11), (179, 11)), Polygon((-180, 10), (-179, 10), (-179, 11), (-180, 11))), design, 2_000, 20);

        Assert.Equal(here.EdgeProfile.Length, there.EdgeProfile.Length);
        Assert.All(here.EdgeProfile.Zip(there.EdgeProfile), pair =>
        {
            Assert.Equal(pair.First.AreaKm2, pair.Second.AreaKm2, 1e-5 * pair.First.AreaKm2);
            Assert.Equal(pair.First.MeanCoverage, pair.Second.MeanCoverage, 1e-5);
        });
    }

    private static double Side((double Lon, double Lat) from, (double Lon, double Lat) to)
    {
        const int steps = 20;
        LonLat At(int step) => new(from.Lon + ((to.Lon - from.Lon) * step / steps), from.Lat + ((to.Lat - from.Lat) * step / steps));
        return Enumerable.Range(0, steps).Sum(step => Geodesic.Inverse(At(step), At(step + 1)).Metres);
    }

    private static int Components(List<(int Column, int Row)> places)
    {
        var (left, count) = (places.ToHashSet(), 0);
        for (; left.Count > 0; count++)
        {
            var next = new Stack<(int Column, int Row)>([left.First()]);
            while (next.TryPop(out var place))
            {
                if (left.Remove(place))
                {
                    next.Push((place.Column + 1, place.Row));
                    next.Push((place.Column - 1, place.Row));
                    next.Push((place.Column, place.Row + 1));
                    next.Push((place.Column, place.Row - 1));
                }
            }
        }

        return count;
    }

    /// <summary>Area of a block of one degree in closed form (Snyder's q), square kilometres.</summary>
    private static double BlockKm2(double south)
    {
        var ellipsoid = Ellipsoid.Wgs84;
        double Q(double lat) => ellipsoid.Q(Math.Sin(lat * Math.PI / 180));
        return ellipsoid.SemiMajorMetres * ellipsoid.SemiMajorMetres / 2 * (Q(south + 1) - Q(south)) * Math.PI / 180 / 1e6;
    }

    private static Stratum Build(params GeographicPolygon[] polygons)
        => Assert.Single(RegionBuilder.Build(Boundary([.. polygons.Select(polygon => ("a", polygon))]), new RegionDesign(), []).Strata);

    private static Boundary Boundary(params (string Zone, GeographicPolygon Polygon)[] features) => new(
        "test.geojson",
        [.. features.Select((one, i) => new BoundaryFeature(i + 1, ImmutableSortedDictionary<string, string>.Empty.Add("zone", one.Zone), [one.Polygon]))],
        "WGS 84",
        []);

    private static GeographicPolygon Polygon(params (double Lon, double Lat)[] ring)
        => new([.. ring.Append(ring[0]).Select(vertex => new LonLat(vertex.Lon, vertex.Lat))], []);
}
