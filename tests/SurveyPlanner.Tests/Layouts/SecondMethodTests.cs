using CsCheck;
using NetTopologySuite.Geometries;
using NetTopologySuite.Operation.OverlayNG;
using NetTopologySuite.Operation.Union;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>
/// The union of a layout's pieces against NetTopologySuite's OverlayNG: the same lines, put together here from the offset alone and not cut, are
/// cut by the other method. To 1e-7 of the stratum's diagonal for all lines together.
/// </summary>
public class SecondMethodTests
{
    private const int Cases = 60;
    private const uint Seed = 11;

    private static readonly Gen<(Stratum Stratum, double Offset)> Ordinary = Gen.Select(RandomShapes.Strata, Gen.Double[0, 0.999]);

    /// <summary>Needles of a micrometre to a metre wide and kilometres long stand out of the outline.</summary>
    private static readonly Gen<(Stratum Stratum, double Offset)> WithSlivers =
        from drawn in Ordinary
        from logWidth in Gen.Double[-6, 0]
        select (PlaneStrata.Of(Needles(drawn.Stratum.Shape, Math.Pow(10, logWidth))), drawn.Offset);

    public static TheoryData<string> Kinds =>
    [
        "parallel", "zigzag equal-spaced", "zigzag equal-spaced crossed", "zigzag equal-angle", "zigzag adjusted-angle", "segments", "loops",
    ];

    [Theory]
    [MemberData(nameof(Kinds))]
    public void Pieces_are_what_general_overlay_leaves(string kind) => Check(kind, Ordinary);

    [Theory]
    [MemberData(nameof(Kinds))]
    public void Slivers_included(string kind) => Check(kind, WithSlivers);

    private static void Check(string kind, Gen<(Stratum Stratum, double Offset)> strata)
    {
        var checkedCases = 0;
        strata.Hold(Cases, Seed, drawn =>
        {
            if (EveryKind.TryPrepare(drawn.Stratum, EveryKind.Designs[kind]) is not { } generator)
            {
                return;
            }

            var pieces = EveryKind.Draw(generator, drawn.Offset);
            Assert.Equal(
                OverlayLength(generator, Uncut(generator, drawn.Offset)),
                pieces.Sum(piece => piece.Length),
                1e-7 * drawn.Stratum.Shape.Diagonal);
            checkedCases++;
        });
        Assert.True(checkedCases > Cases / 2);
    }

    /// <summary>The lines before they are cut, in the turned frame.</summary>
    private static IEnumerable<(double X0, double Y0, double X1, double Y1)> Uncut(LayoutGenerator generator, double offset)
    {
        var (clip, d) = (generator.Stratum.Clip, generator.SpacingMetres);
        if (generator is Zigzag)
        {
            // The zigzag of the convex hull, which is the same path.
            var hull = PlaneGeometry.ConvexHull(generator.Stratum.ClipShape);
            var stratum = PlaneStrata.Of([.. hull.Select(point => (point.X, point.Y))]);
            return EveryKind.Draw(LayoutKinds.Prepare(stratum, generator.Design), offset).Select(piece => (piece.FromX, piece.FromY, piece.ToX, piece.ToY));
        }

        var rows = Enumerable.Range(-1, (int)(generator.Stratum.ExtentAcross / d) + 3).Select(row => clip.MinY + ((row + offset) * d));
        var columns = Enumerable.Range(-1, (int)(generator.Stratum.ExtentAlong / d) + 3).Select(column => clip.MinX + ((column + offset) * d));
        return generator switch
        {
            ParallelLines => rows.Select(y => (clip.MinX - 1, y, clip.MaxX + 1, y)),
            Segments => rows.SelectMany(y => columns.Select(x => (x, y, x + generator.Design.SegmentMetres!.Value, y))),
            Loops loops => rows.SelectMany(y => columns.SelectMany(x => Square(x, y, loops.SideMetres))),
            _ => throw new NotSupportedException(),
        };
    }

    private static IEnumerable<(double X0, double Y0, double X1, double Y1)> Square(double x, double y, double side)
        => [(x, y, x + side, y), (x + side, y, x + side, y + side), (x + side, y + side, x, y + side), (x, y + side, x, y)];

    private static double OverlayLength(LayoutGenerator generator, IEnumerable<(double X0, double Y0, double X1, double Y1)> lines)
    {
        var polygons = PlaneGeometry.ToPolygons(generator.Stratum.ClipShape);
        var factory = polygons[0].Factory;
        Coordinate At(double x, double y)
        {
            var point = generator.Stratum.Frame.ToPlane(x, y);
            return new Coordinate(point.X, point.Y);
        }

        var region = UnaryUnionOp.Union(polygons, factory);
        return lines.Sum(line => OverlayNGRobust.Overlay(
            region,
            factory.CreateLineString([At(line.X0, line.Y0), At(line.X1, line.Y1)]),
            NetTopologySuite.Operation.Overlay.SpatialFunction.Intersection).Length);
    }

    /// <summary>The same shape with a needle at every fifth vertex of its shells, as long again as that vertex is far from its part's middle.</summary>
    private static PlaneShape Needles(PlaneShape shape, double width)
    {
        var builder = new PlaneShapeBuilder();
        for (var part = 0; part < shape.PartCount; part++)
        {
            builder.StartPart();
            var (middleX, middleY) = MiddleOf(shape, shape.PartStarts[part]);
            for (var ring = shape.PartStarts[part]; ring < shape.PartStarts[part + 1]; ring++)
            {
                builder.StartRing();
                for (var i = shape.RingStarts[ring]; i < shape.RingStarts[ring + 1]; i++)
                {
                    builder.Add(shape.X[i], shape.Y[i]);
                    if (ring == shape.PartStarts[part] && (i - shape.RingStarts[ring]) % 5 == 0)
                    {
                        // Out along the ray through the vertex and back, a hair to the left of it seen from the middle.
                        var (dx, dy) = (shape.X[i] - middleX, shape.Y[i] - middleY);
                        var length = Math.Sqrt((dx * dx) + (dy * dy));
                        builder.Add(shape.X[i] + (dx * 0.2), shape.Y[i] + (dy * 0.2));
                        builder.Add(shape.X[i] - (dy / length * width), shape.Y[i] + (dx / length * width));
                    }
                }
            }
        }

        return builder.Build();
    }

    private static (double X, double Y) MiddleOf(PlaneShape shape, int ring)
    {
        var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
        return (shape.X[start..end].Average(), shape.Y[start..end].Average());
    }
}
