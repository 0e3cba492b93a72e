using System.Collections.Immutable;
using NetTopologySuite;
using NetTopologySuite.Geometries;
using NetTopologySuite.Operation.Buffer;
using NetTopologySuite.Operation.OverlayNG;

namespace SurveyPlanner.Regions;

/// <summary>
/// The few general overlay operations that regions need, on <see cref="PlaneShape"/>: the one place where NetTopologySuite's mutable
/// coordinates live. Layout and coverage loops never come here.
/// </summary>
internal static class PlaneGeometry
{
    // Every geometry comes from this factory: the library's default overlay is its older one.
    private static readonly GeometryFactory Factory =
        new NtsGeometryServices(NtsGeometryServices.Instance.DefaultCoordinateSequenceFactory, PrecisionModel.Floating.Value, 0, GeometryOverlay.NG, new CoordinateEqualityComparer())
            .CreateGeometryFactory();

    /// <summary>The shape without what the other covers.</summary>
    public static PlaneShape Subtract(PlaneShape shape, PlaneShape other)
        => FromGeometry(OverlayNGRobust.Overlay(Merged(shape), Merged(other), NetTopologySuite.Operation.Overlay.SpatialFunction.Difference));

    /// <summary>What both shapes cover.</summary>
    public static PlaneShape Intersect(PlaneShape shape, PlaneShape other)
        => FromGeometry(OverlayNGRobust.Overlay(Merged(shape), Merged(other), NetTopologySuite.Operation.Overlay.SpatialFunction.Intersection));

    /// <summary>Parts that overlap or share a border made one.</summary>
    public static PlaneShape Unite(PlaneShape shape) => FromGeometry(Merged(shape));

    /// <summary>
    /// Groups of parts that share borders made one, in the place of the first of each; all other parts keep their vertices digit for digit.
    /// </summary>
    /// <param name="shape">The shape.</param>
    /// <param name="together">Indices of the parts of each group, ascending.</param>
    public static PlaneShape Join(PlaneShape shape, ImmutableArray<ImmutableArray<int>> together)
    {
        if (together.IsEmpty)
        {
            return shape;
        }

        var groups = together.ToDictionary(group => group[0]);
        var joined = together.SelectMany(group => group).ToHashSet();
        var builder = new PlaneShapeBuilder();
        for (var part = 0; part < shape.PartCount; part++)
        {
            if (groups.TryGetValue(part, out var group))
            {
                builder.Add(Joined(shape, group));
            }
            else if (!joined.Contains(part))
            {
                builder.AddPart(shape, part);
            }
        }

        return builder.Build();
    }

    /// <summary>
    /// All places within a distance of the shape. Arcs are drawn just outside the true curve (by at most 0.13 % of the distance), never inside it.
    /// </summary>
    public static PlaneShape Grow(PlaneShape shape, double metres)
    {
        const int quadrantSegments = 16;
        var outside = metres / Math.Cos(Math.PI / (4 * quadrantSegments));
        return FromGeometry(BufferOp.Buffer(Merged(shape), outside, new BufferParameters(quadrantSegments)));
    }

    /// <summary>The convex hull's vertices, anticlockwise, not closed.</summary>
    public static ImmutableArray<PlanePoint> ConvexHull(PlaneShape shape)
    {
        var points = new Coordinate[shape.VertexCount];
        for (var i = 0; i < points.Length; i++)
        {
            points[i] = new Coordinate(shape.X[i], shape.Y[i]);
        }

        var ring = new NetTopologySuite.Algorithm.ConvexHull(points, Factory).GetConvexHull().Coordinates;
        var hull = ring.Take(ring.Length - 1).Select(c => new PlanePoint(c.X, c.Y));
        return NetTopologySuite.Algorithm.Orientation.IsCCW(ring) ? [.. hull] : [.. hull.Reverse()];
    }

    /// <summary>Area, square metres, that two shapes share.</summary>
    public static double SharedArea(PlaneShape shape, PlaneShape other) => Intersect(shape, other).AreaSquareMetres;

    public static PlaneShape FromGeometry(Geometry geometry)
    {
        var builder = new PlaneShapeBuilder();
        for (var i = 0; i < geometry.NumGeometries; i++)
        {
            // Overlay may leave points and lines where shapes only touch: they have no area and are dropped.
            if (geometry.GetGeometryN(i) is Polygon { IsEmpty: false } polygon)
            {
                builder.StartPart();
                AddRing(builder, polygon.Shell);
                foreach (var hole in polygon.Holes)
                {
                    AddRing(builder, hole);
                }
            }
        }

        return builder.Build();
    }

    /// <summary>The shape as polygons of the library, one for each part.</summary>
    public static Polygon[] ToPolygons(PlaneShape shape)
    {
        var polygons = new Polygon[shape.PartCount];
        for (var part = 0; part < polygons.Length; part++)
        {
            var (first, end) = (shape.PartStarts[part], shape.PartStarts[part + 1]);
            polygons[part] = Factory.CreatePolygon(
                ToRing(shape, first),
                [.. Enumerable.Range(first + 1, end - first - 1).Select(ring => ToRing(shape, ring))]);
        }

        return polygons;
    }

    private static PlaneShape Joined(PlaneShape shape, ImmutableArray<int> parts)
    {
        // Rounding moves an area by 1e-12 of it or so; more would mean that ground was lost or won.
        const double areaTolerance = 1e-9;
        var builder = new PlaneShapeBuilder();
        foreach (var part in parts)
        {
            builder.AddPart(shape, part);
        }

        var apart = builder.Build();
        var one = Unite(apart);
        return Math.Abs(one.AreaSquareMetres - apart.AreaSquareMetres) <= areaTolerance * apart.AreaSquareMetres ? one : apart;
    }

    private static Geometry Merged(PlaneShape shape)
    {
        var polygons = ToPolygons(shape);
        return polygons.Length == 1
            ? polygons[0]
            : NetTopologySuite.Operation.Union.UnaryUnionOp.Union(polygons, Factory) ?? Factory.CreateMultiPolygon();
    }

    private static LinearRing ToRing(PlaneShape shape, int ring)
    {
        var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
        var coordinates = new Coordinate[end - start + 1];
        for (var i = start; i < end; i++)
        {
            coordinates[i - start] = new Coordinate(shape.X[i], shape.Y[i]);
        }

        coordinates[^1] = coordinates[0].Copy();
        return Factory.CreateLinearRing(coordinates);
    }

    private static void AddRing(PlaneShapeBuilder builder, LinearRing ring)
    {
        builder.StartRing();
        var coordinates = ring.CoordinateSequence;
        for (var i = 0; i < coordinates.Count - 1; i++)
        {
            builder.Add(coordinates.GetX(i), coordinates.GetY(i));
        }
    }
}
