using NetTopologySuite;
using NetTopologySuite.Geometries;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>To the geometry library and back. Its mutable coordinates stay inside the checks of this folder.</summary>
internal static class Nts
{
    // Every geometry comes from this factory: the library's default overlay is its older one.
    public static readonly GeometryFactory Factory =
        new NtsGeometryServices(NtsGeometryServices.Instance.DefaultCoordinateSequenceFactory, PrecisionModel.Floating.Value, 0, GeometryOverlay.NG, new CoordinateEqualityComparer())
            .CreateGeometryFactory();

    public static Polygon ToPolygon(Part part)
        => Factory.CreatePolygon(ToRing(part.Shell.Points), [.. part.Holes.Select(hole => ToRing(hole.Points))]);

    public static Polygon ToPolygon(Outline outline) => Factory.CreatePolygon(ToRing(outline.Points));

    public static Coordinate[] ToCoordinates(IReadOnlyList<FilePoint> points)
    {
        var coordinates = new Coordinate[points.Count + 1];
        for (var i = 0; i < points.Count; i++)
        {
            coordinates[i] = new Coordinate(points[i].X, points[i].Y);
        }

        coordinates[^1] = coordinates[0].Copy();
        return coordinates;
    }

    public static Part ToPart(Polygon polygon, string place)
        => new(new Outline(place, FromRing(polygon.Shell)), [.. polygon.Holes.Select(hole => new Outline(place, FromRing(hole)))]);

    /// <summary>The polygons of an overlay's result; points and lines where shapes only touch have no area and are passed over.</summary>
    public static IEnumerable<Part> ToParts(Geometry geometry, string place)
    {
        for (var i = 0; i < geometry.NumGeometries; i++)
        {
            if (geometry.GetGeometryN(i) is Polygon { IsEmpty: false } polygon)
            {
                yield return ToPart(polygon, place);
            }
        }
    }

    private static List<FilePoint> FromRing(LineString ring)
    {
        var sequence = ring.CoordinateSequence;
        var points = new List<FilePoint>(sequence.Count - 1);
        for (var i = 0; i < sequence.Count - 1; i++)
        {
            points.Add(new FilePoint(sequence.GetX(i), sequence.GetY(i)));
        }

        return points;
    }

    private static LinearRing ToRing(List<FilePoint> points) => Factory.CreateLinearRing(ToCoordinates(points));
}
