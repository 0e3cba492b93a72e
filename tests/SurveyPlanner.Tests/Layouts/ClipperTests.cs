using CsCheck;
using NetTopologySuite.Geometries;
using NetTopologySuite.Operation.OverlayNG;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

public class ClipperTests
{
    private const uint Seed = 4;

    /// <summary>
    /// Second method: NetTopologySuite's OverlayNG on the same line and polygons. (Lines along the boundary itself are left out: overlay counts
    /// it as inside.)
    /// </summary>
    [Fact]
    public void Any_line_is_cut_as_general_overlay_cuts_it() =>
        Gen.Select(RandomShapes.Strata, Gen.Double[0.001, 0.999].Array[4]).Hold(
            500,
            Seed,
            drawn =>
            {
                var (stratum, ends) = drawn;
                var shape = stratum.Shape;
                var (x0, y0) = (shape.MinX + (ends[0] * (shape.MaxX - shape.MinX)), shape.MinY + (ends[1] * (shape.MaxY - shape.MinY)));
                var (x1, y1) = (shape.MinX + (ends[2] * (shape.MaxX - shape.MinX)), shape.MinY + (ends[3] * (shape.MaxY - shape.MinY)));
                var buffer = new PieceBuffer();
                Clipper.ClipSegment(new FrameShape(shape, new TurnedFrame(0)), x0, y0, x1, y1, 0, buffer);
                Assert.Equal(OverlayLength(shape, x0, y0, x1, y1), buffer.TotalLength, 1e-7 * shape.Diagonal);
            });

    [Fact]
    public void A_horizontal_line_is_cut_the_same_by_both_ways() =>
        Gen.Select(RandomShapes.Strata, Gen.Double[0, 1]).Hold(
            500,
            Seed,
            drawn =>
            {
                var (stratum, share) = drawn;
                var shape = new FrameShape(stratum.Shape, new TurnedFrame(0));
                var y = shape.MinY + (share * (shape.MaxY - shape.MinY));
                var (scanned, clipped) = (new PieceBuffer(), new PieceBuffer());
                Clipper.ClipHorizontal(shape, y, 0, leftwards: false, scanned);
                Clipper.ClipSegment(shape, shape.MinX - 1, y, shape.MaxX + 1, y, 0, clipped);
                Assert.Equal(scanned.Count, clipped.Count);
                for (var i = 0; i < scanned.Count; i++)
                {
                    Assert.Equal(scanned.Pieces[i].FromX, clipped.Pieces[i].FromX, 1e-6);
                    Assert.Equal(scanned.Pieces[i].ToX, clipped.Pieces[i].ToX, 1e-6);
                }
            });

    /// <summary>
    /// The triangle 12 m long and 5e-8 m off the line on which general overlay keeps all 200 m of the line (a known fault of it and of its
    /// relatives); the truth is the line's chord of the triangle, 0 or a hair.
    /// </summary>
    [Fact]
    public void A_sliver_does_not_turn_the_cut_inside_out()
    {
        var stratum = PlaneStrata.Of(
            (61607.62679190189, 190194.1555478014), (61620.5389918983, 190197.4990478009), (61619.64380966499, 190197.26724827816));
        var buffer = new PieceBuffer();
        Clipper.ClipSegment(new FrameShape(stratum.Shape, new TurnedFrame(0)), 61607.627, 190100, 61607.627, 190300, 0, buffer);
        Assert.True(buffer.TotalLength < 1e-3, $"{buffer.TotalLength} m");
    }

    /// <summary>The middle of the line, where the clipper used to ask whether it is inside, is the very vertex that it touches.</summary>
    [Fact]
    public void A_line_that_only_touches_a_vertex_is_not_inside()
    {
        var stratum = PlaneStrata.Of((10_000, 0), (3000, 9000), (-8000, 4000), (-7000, -6000), (2000, -9500));
        var buffer = new PieceBuffer();
        for (var turn = 0; turn < 360; turn++)
        {
            var frame = new TurnedFrame(turn * Math.PI / 180);
            var ((x0, y0), (x1, y1)) = (frame.ToFrame(10_000, -10_000), frame.ToFrame(10_000, 10_000));
            Clipper.ClipSegment(new FrameShape(stratum.Shape, frame), x0, y0, x1, y1, 0, buffer);
        }

        Assert.True(buffer.TotalLength < 1e-3, $"{buffer.TotalLength} m");
    }

    [Theory]
    [InlineData(1e-12)]
    [InlineData(1e-9)]
    [InlineData(1e-6)]
    [InlineData(1e-3)]
    public void Slivers_of_any_width_never_lengthen_a_line(double width)
    {
        // A square of 1 km with a sliver of the given width standing 500 m out of its top.
        var stratum = PlaneStrata.Of((0, 0), (1000, 0), (1000, 1000), (400 + width, 1000), (400, 1500), (400, 1000), (0, 1000));
        var shape = new FrameShape(stratum.Shape, new TurnedFrame(0.3));
        var buffer = new PieceBuffer();
        for (var i = 0; i < 2000; i++)
        {
            buffer.Clear();
            Clipper.ClipHorizontal(shape, shape.MinY + ((i + 0.5) / 2000 * (shape.MaxY - shape.MinY)), 0, false, buffer);
            Assert.True(buffer.TotalLength <= 1000 * Math.Sqrt(2) + 1e-6);
        }
    }

    [Fact]
    public void A_line_over_a_shared_border_stays_in_one_piece()
    {
        var stratum = PlaneStrata.Of(
            [[(0, 0), (1000, 0), (1000, 1000), (0, 1000)]],
            [[(1000, 0), (2000, 0), (2000, 1000), (1000, 1000)]]);
        var shape = new FrameShape(stratum.Shape, new TurnedFrame(0));
        var buffer = new PieceBuffer();
        Clipper.ClipHorizontal(shape, 500, 0, false, buffer);
        Clipper.ClipSegment(shape, -10, 400, 2010, 600, 1, buffer);
        Assert.Equal(2, buffer.Count);
        Assert.Equal(2000, buffer.Pieces[0].Length, 1e-9);
    }

    [Fact]
    public void Winding_and_first_vertex_do_not_matter() =>
        RandomShapes.Strata.Hold(
            200,
            Seed,
            stratum =>
            {
                var rewound = new Mover(degrees: 0, east: 0, north: 0).Move(stratum.Shape);
                var (a, b) = (new PieceBuffer(), new PieceBuffer());
                var frame = new TurnedFrame(0.7);
                var (one, two) = (new FrameShape(stratum.Shape, frame), new FrameShape(rewound, frame));
                for (var i = 1; i < 20; i++)
                {
                    var y = one.MinY + (i / 20.0 * (one.MaxY - one.MinY));
                    Clipper.ClipHorizontal(one, y, i, false, a);
                    Clipper.ClipHorizontal(two, y, i, false, b);
                }

                Assert.Equal(a.Pieces.ToArray(), b.Pieces.ToArray());
            });

    private static double OverlayLength(PlaneShape shape, double x0, double y0, double x1, double y1)
    {
        var polygons = PlaneGeometry.ToPolygons(shape);
        var line = polygons[0].Factory.CreateLineString([new Coordinate(x0, y0), new Coordinate(x1, y1)]);
        return polygons.Sum(polygon =>
            OverlayNGRobust.Overlay(polygon, line, NetTopologySuite.Operation.Overlay.SpatialFunction.Intersection).Length);
    }
}
