using NetTopologySuite.Geometries;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>Polygons of the plane in longitude and latitude, cut at 180° and closed over a pole, so that map programs draw them right.</summary>
internal sealed class LonLatPolygons(EqualAreaProjection projection)
{
    private const double Turn = 360;

    /// <summary>A boundary that was cut at 180° comes back from the plane this near to it, degrees (1 mm), and is put on it again.</summary>
    private const double OnCutDegrees = 1e-8;

    /// <param name="rings">The shell and its holes, plane, metres, not closed.</param>
    public IEnumerable<Polygon> Of(IReadOnlyList<IReadOnlyList<PlanePoint>> rings)
    {
        var shell = Ring(rings[0]);
        var middle = (shell.Min(vertex => vertex.X) + shell.Max(vertex => vertex.X)) / 2;
        var holes = rings.Skip(1).Select(Ring).Select(hole => Moved(hole, Turn * Math.Round((middle - hole.Average(vertex => vertex.X)) / Turn)));
        var polygon = Nts.Factory.CreatePolygon(Closed(shell), [.. holes.Select(Closed)]);
        try
        {
            var pieces = CutAt180(polygon).ToArray();

            // Round a pole the first and the last piece meet on the meridian where the ring began.
            return pieces.Length == 1 ? pieces : Polygons(Nts.Factory.CreateMultiPolygon(pieces).Union());
        }
        catch (TopologyException)
        {
            // Drawn across 180° rather than not at all: these polygons are for the eye, and nothing is computed from them.
            return [polygon];
        }
    }

    /// <summary>Longitudes run on from vertex to vertex; a ring round a pole is led up its last meridian and back down the first.</summary>
    private List<Coordinate> Ring(IReadOnlyList<PlanePoint> plane)
    {
        var ring = new List<Coordinate>(plane.Count + 3);
        foreach (var point in plane)
        {
            var position = projection.Unproject(point);
            var lon = ring.Count == 0 ? position.Lon : ring[^1].X + Longitude.Difference(ring[^1].X, position.Lon);
            var cut = (Turn * Math.Round((lon - 180) / Turn)) + 180;
            ring.Add(new Coordinate(Math.Abs(lon - cut) < OnCutDegrees ? cut : lon, position.Lat));
        }

        var (first, last) = (ring[0], ring[^1]);
        var home = last.X + Longitude.Difference(last.X, first.X);
        if (Math.Abs(home - first.X) > Turn / 2)
        {
            var pole = Math.CopySign(90, projection.Centre.Lat);
            ring.Add(new Coordinate(home, first.Y));
            ring.Add(new Coordinate(home, pole));
            ring.Add(new Coordinate(first.X, pole));
        }

        return ring;
    }

    /// <summary>The polygon in pieces within [-180, 180].</summary>
    private static IEnumerable<Polygon> CutAt180(Polygon polygon)
    {
        var (west, east) = (polygon.EnvelopeInternal.MinX, polygon.EnvelopeInternal.MaxX);
        for (var turn = Math.Floor((west + 180) / Turn); turn * Turn < east + 180; turn++)
        {
            var shift = turn * Turn;
            var isWhole = west >= shift - 180 && east <= shift + 180;
            var window = Nts.Factory.ToGeometry(new Envelope(shift - 180, shift + 180, -90, 90));
            var inside = isWhole ? polygon : window.Intersection(polygon);
            foreach (var piece in Polygons(inside))
            {
                yield return shift == 0 ? piece : Moved(piece, -shift);
            }
        }
    }

    /// <summary>What has area: where shapes only touch, overlays give points and lines too.</summary>
    public static IEnumerable<Polygon> Polygons(Geometry geometry) =>
        Enumerable.Range(0, geometry.NumGeometries).Select(geometry.GetGeometryN).OfType<Polygon>().Where(piece => !piece.IsEmpty);

    private static Polygon Moved(Polygon polygon, double degrees) => Nts.Factory.CreatePolygon(
        Closed(Moved(polygon.Shell.Coordinates.SkipLast(1), degrees)),
        [.. polygon.Holes.Select(hole => Closed(Moved(hole.Coordinates.SkipLast(1), degrees)))]);

    private static List<Coordinate> Moved(IEnumerable<Coordinate> ring, double degrees) =>
        [.. ring.Select(vertex => new Coordinate(vertex.X + degrees, vertex.Y))];

    private static LinearRing Closed(List<Coordinate> ring) => Nts.Factory.CreateLinearRing([.. ring, ring[0].Copy()]);
}
