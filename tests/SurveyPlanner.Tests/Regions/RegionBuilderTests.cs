using System.Collections.Immutable;
using CsCheck;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Regions;

public class RegionBuilderTests
{

    [Theory]
    [InlineData(10, 50)]
    [InlineData(179.5, -17)] // across 180°
    [InlineData(-180, 66)]
    [InlineData(20, 84)]
    [InlineData(0, 0)]
    [InlineData(-70, -88)]
    public void A_block_of_one_degree_has_its_ellipsoid_area_wherever_it_lies(double west, double south)
    {
        var region = Build(Block("a", west, south, 1, 1));
        var expected = BlockKm2(south, 1, 1);
        Assert.Equal(1, region.AreaKm2 / expected, 1e-6);
        Assert.Equal(1, region.GeodesicAreaKm2 / expected, 1e-6);
        Assert.Single(region.Strata);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(-1)]
    public void A_cap_round_a_pole_has_its_area_and_reaches_all_longitudes(int side)
    {
        // The ring runs once round the parallel of 75°; RFC 7946 would cut it, other sources do not.
        var ring = Enumerable.Range(0, 361).Select(i => new LonLat(i - 180, side * 75)).ToImmutableArray();
        var region = Build(Feature(1, "cap", new GeographicPolygon(ring, [])));
        var ellipsoid = Ellipsoid.Wgs84;
        var share = (1 - (ellipsoid.Q(Math.Sin(75 * Math.PI / 180)) / ellipsoid.QPole)) / 2;
        Assert.Equal(1, region.AreaKm2 / (510065621.7240885 * share), 2e-6);
        Assert.Equal(90 * side, region.Projection.Centre.Lat);

        // RFC 7946, 5.3 (from memory): the bounding box of a region that holds a pole ends at the pole and spans all longitudes.
        Assert.Equal((-180, 180, 90), (region.Extent.West, region.Extent.East, side > 0 ? region.Extent.North : -region.Extent.South));
        Assert.Equal(75, side > 0 ? region.Extent.South : -region.Extent.North, 1e-9);
    }

    [Fact]
    public void A_region_cut_at_180_degrees_is_one_again_in_the_plane()
    {
        var east = Polygon([(179, 10), (180, 10), (180, 11), (179, 11)]);
        var west = Polygon([(-180, 10), (-179, 10), (-179, 11), (-180, 11)]);
        var region = Build(Feature(1, "both", east, west));
        var whole = Build(Feature(1, "both", Polygon([(179, 10), (181, 10), (181, 11), (179, 11)])));
        Assert.Equal(whole.AreaKm2, region.AreaKm2, 1e-6 * whole.AreaKm2);
        Assert.Equal(whole.Strata[0].LongAxisKm, region.Strata[0].LongAxisKm, 1e-6);
        Assert.InRange(region.Extent.West, 178.9999, 179.0001);
        Assert.InRange(region.Extent.East, -179.0001, -178.9999);
    }

    [Fact]
    public void Exclusions_are_cut_out_and_may_have_a_buffer()
    {
        var boundary = Boundary(Block("a", 10, 50, 1, 1));
        var hole = Boundary(Block("closed", 10.4, 50.4, 0.2, 0.2));
        var region = RegionBuilder.Build(boundary, new RegionDesign(), [hole]);
        Assert.Equal(BlockKm2(50, 1, 1) - BlockKm2(50.4, 0.2, 0.2), region.AreaKm2, 0.01);
        Assert.Equal(1, region.Strata[0].Shape.HoleCount);

        // Steiner's formula: a convex shape grown by r gains perimeter times r and a disk. The arcs drawn lie outside by at most 0.13 %.
        var buffered = RegionBuilder.Build(boundary, new RegionDesign(ExclusionBufferMetres: 500), [hole]);
        var perimeterKm = Perimeter(hole, region.Projection) / 1000;
        Assert.Equal(region.AreaKm2 - (perimeterKm * 0.5) - (Math.PI * 0.25), buffered.AreaKm2, 0.1);
    }

    [Fact]
    public void Strata_come_from_an_attribute_in_the_order_asked_for()
    {
        var boundary = Boundary(Block("north", 10, 51, 1, 1), Block("south", 10, 50, 1, 1), Block("north", 12, 51, 1, 1, number: 3));
        var region = RegionBuilder.Build(boundary, new RegionDesign("zone", ["south", "north"]), []);
        Assert.Equal(["south", "north"], region.Strata.Select(stratum => stratum.Name));
        Assert.Equal(2, region.Strata[1].Shape.PartCount);
    }

    [Fact]
    public void Overlapping_strata_are_refused_with_their_area()
    {
        var boundary = Boundary(Block("a", 10, 50, 1, 1), Block("b", 10.9, 50, 1, 1));
        var refusal = Assert.Throws<InputException>(() => RegionBuilder.Build(boundary, new RegionDesign("zone"), []));
        var expected = BlockKm2(50, 0.1, 1).ToString("0.0", System.Globalization.CultureInfo.InvariantCulture);
        Assert.Contains($"overlap by {expected}", refusal.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Overlapping_features_of_one_stratum_count_once_and_it_is_told()
    {
        var boundary = Boundary(Block("a", 10, 50, 1, 1), Block("a", 10, 50, 1, 1, number: 2));
        var region = RegionBuilder.Build(boundary, new RegionDesign("zone"), []);
        Assert.Equal(BlockKm2(50, 1, 1), region.AreaKm2, 0.01);
        Assert.Contains(region.Notices, notice => notice.Kind == NoticeKind.Repair && notice.Message.Contains("overlap", StringComparison.Ordinal));
    }

    [Fact]
    public void A_gap_that_strata_enclose_is_told_and_an_island_is_not()
    {
        // A frame of four blocks round an empty square, and a block with an island of its own.
        var frame = new[] { Block("a", 10, 50, 3, 1), Block("b", 10, 51, 1, 1, 2), Block("c", 12, 51, 1, 1, 3), Block("d", 10, 52, 3, 1, 4) };
        var region = RegionBuilder.Build(Boundary(frame), new RegionDesign("zone"), []);
        var gap = Math.Floor(BlockKm2(51, 1, 1)).ToString("0.", System.Globalization.CultureInfo.InvariantCulture);
        Assert.Contains(region.Notices, notice => notice.Message.Contains($"a gap of {gap}.", StringComparison.Ordinal));

        var ring = Polygon([(20.4, 50.4), (20.6, 50.4), (20.6, 50.6), (20.4, 50.6)]).Shell;
        var island = Feature(2, "z", Polygon([(20, 50), (21, 50), (21, 51), (20, 51)]) with { Holes = [ring] });
        Assert.Empty(RegionBuilder.Build(Boundary(Block("a", 10, 50, 1, 1), island), new RegionDesign("zone"), []).Notices);
    }

    [Fact]
    public void Missing_fields_and_strata_are_named_with_what_there_is()
    {
        var boundary = Boundary(Block("a", 10, 50, 1, 1));
        var field = Assert.Throws<InputException>(() => RegionBuilder.Build(boundary, new RegionDesign("region"), []));
        Assert.Contains("'zone'", field.Message, StringComparison.Ordinal);
        var stratum = Assert.Throws<InputException>(() => RegionBuilder.Build(boundary, new RegionDesign("zone", ["b"]), []));
        Assert.Contains("'a'", stratum.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void The_long_axis_of_a_strip_lies_along_it() =>
        Gen.Double[0, 180].Hold(
            100,
            seed: 1,
            bearing =>
            {
                // A strip of 60 km by 10 km at 45° N, laid out along a bearing.
                var (sin, cos) = Math.SinCos(bearing * Math.PI / 180);
                (double, double) At(double along, double across) => (
                    ((along * sin) + (across * cos)) / (111.32 * Math.Cos(Math.PI / 4)), 45 + (((along * cos) - (across * sin)) / 111.13));
                var region = Build(Feature(1, "strip", Polygon([At(-30, -5), At(30, -5), At(30, 5), At(-30, 5)])));
                var turn = Math.Abs(region.Strata[0].LongAxisBearing - bearing) % 180;
                Assert.True(Math.Min(turn, 180 - turn) < 0.5, $"{region.Strata[0].LongAxisBearing} for {bearing}");
                Assert.InRange(region.Strata[0].LongAxisKm, 59, 61);
            });

    /// <summary>Second method for scale: lengths in the plane against geodesic lengths, in all directions.</summary>
    [Fact]
    public void The_largest_scale_error_bounds_every_length() =>
        Gen.Select(Gen.Double[-170, 170], Gen.Double[-80, 80], Gen.Double[0.5, 8]).Hold(
            60,
            seed: 1,
            block =>
            {
                var (lon, lat, size) = block;
                var region = Build(Block("a", lon, Math.Clamp(lat, -80, 80 - size), size, size));
                var limit = (region.MaxScaleErrorPercent / 100) + 1e-6;
                foreach (var (dx, dy) in new[] { (0.0, 1.0), (1, 0), (0.7, 0.7) })
                {
                    for (var corner = 0; corner < 4; corner++)
                    {
                        var from = new LonLat(lon + (corner % 2 * size), Math.Clamp(lat, -80, 80 - size) + (corner / 2 * size));
                        var point = region.Projection.Project(from);
                        var to = region.Projection.Unproject(new PlanePoint(point.X + (100 * dx), point.Y + (100 * dy)));
                        var metres = Geodesic.Inverse(from, to).Metres;
                        Assert.InRange((100 * Math.Sqrt((dx * dx) + (dy * dy)) / metres) - 1, (1 / (1 + limit)) - 1 - 1e-6, limit);
                    }
                }
            });

    private static Region Build(BoundaryFeature feature) => RegionBuilder.Build(Boundary(feature), new RegionDesign(), []);

    private static Boundary Boundary(params BoundaryFeature[] features) => new("test.geojson", [.. features], "WGS 84", []);

    private static BoundaryFeature Block(string zone, double west, double south, double width, double height, int number = 1)
        => Feature(number, zone, Polygon([(west, south), (west + width, south), (west + width, south + height), (west, south + height)]));

    private static BoundaryFeature Feature(int number, string zone, params GeographicPolygon[] polygons)
        => new(number, ImmutableSortedDictionary<string, string>.Empty.Add("zone", zone), [.. polygons]);

    private static GeographicPolygon Polygon((double Lon, double Lat)[] ring)
        => new([.. ring.Append(ring[0]).Select(vertex => new LonLat(vertex.Lon, vertex.Lat))], []);

    /// <summary>Area between two parallels and two meridians in closed form (Snyder's q), square kilometres.</summary>
    private static double BlockKm2(double south, double width, double height)
    {
        var ellipsoid = Ellipsoid.Wgs84;
        double Q(double lat) => ellipsoid.Q(Math.Sin(lat * Math.PI / 180));
        return ellipsoid.SemiMajorMetres * ellipsoid.SemiMajorMetres / 2 * (Q(south + height) - Q(south)) * width * Math.PI / 180 / 1e6;
    }

    private static double Perimeter(Boundary boundary, EqualAreaProjection projection)
    {
        var points = boundary.Features[0].Polygons[0].Shell.Select(projection.Project).ToList();
        return points.Zip(points.Skip(1), (a, b) => Math.Sqrt(Math.Pow(a.X - b.X, 2) + Math.Pow(a.Y - b.Y, 2))).Sum();
    }
}
