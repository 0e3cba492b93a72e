using NetTopologySuite.Algorithm.Locate;
using NetTopologySuite.Geometries;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// From the rings of a shape to parts with holes: clockwise rings bound ground, anticlockwise ones are holes in the smallest ring round
/// them. An anticlockwise ring that lies in no other was wound the wrong way and bounds ground; that is told.
/// </summary>
internal static class ShapeRings
{
    public static IReadOnlyList<RawPolygon> ToPolygons(Shape shape, int feature, RepairLog log)
    {
        var rings = Split(shape);
        var isHole = rings.Select(ring => rings.Count > 1 && TwiceSignedArea(ring) > 0).ToArray();
        var parent = Parents(rings, isHole);
        var shells = Enumerable.Range(0, rings.Count).Where(i => parent[i] < 0).ToList();
        var polygons = new List<RawPolygon>(shells.Count);
        var holesOf = Enumerable.Range(0, rings.Count).Where(i => parent[i] >= 0).ToLookup(i => parent[i]);
        for (var part = 1; part <= shells.Count; part++)
        {
            var index = shells[part - 1];
            var shell = new RawRing(rings[index], Place.Ring(feature, part, shells.Count, 1));
            if (isHole[index])
            {
                log.Warn("outlines wound the wrong way lie in no other outline and were read as ground, not as holes", shell.Place);
            }

            polygons.Add(new RawPolygon(shell, [.. holesOf[index].Select((hole, i) => new RawRing(rings[hole], Place.Ring(feature, part, shells.Count, i + 2)))]));
        }

        return polygons;
    }

    private static List<FilePoint[]> Split(Shape shape)
    {
        var rings = new List<FilePoint[]>(shape.RingStarts.Count);
        for (var i = 0; i < shape.RingStarts.Count; i++)
        {
            var end = i + 1 < shape.RingStarts.Count ? shape.RingStarts[i + 1] : shape.Points.Count;
            rings.Add([.. shape.Points.Skip(shape.RingStarts[i]).Take(end - shape.RingStarts[i])]);
        }

        return rings;
    }

    /// <summary>For each hole the smallest shell that holds it; -1 for shells, and for holes that none holds.</summary>
    private static int[] Parents(List<FilePoint[]> rings, bool[] isHole)
    {
        var parent = Enumerable.Repeat(-1, rings.Count).ToArray();
        if (!isHole.Contains(true))
        {
            return parent;
        }

        var shells = Enumerable.Range(0, rings.Count).Where(i => !isHole[i] && Open(rings[i]).Length >= 3)
            .OrderBy(i => Math.Abs(TwiceSignedArea(rings[i]))).Select(i => (Index: i, Polygon: ToPolygon(rings[i]))).ToList();
        var locators = new Dictionary<int, IndexedPointInAreaLocator>();
        for (var hole = 0; hole < rings.Count; hole++)
        {
            if (isHole[hole])
            {
                var envelope = new Envelope(rings[hole].Select(point => new Coordinate(point.X, point.Y)));
                parent[hole] = shells.Where(shell => shell.Polygon.EnvelopeInternal.Covers(envelope) && Holds(shell.Index, shell.Polygon, rings[hole]))
                    .Select(shell => shell.Index).DefaultIfEmpty(-1).First();
            }
        }

        return parent;

        bool Holds(int index, Polygon polygon, FilePoint[] ring)
        {
            if (!locators.TryGetValue(index, out var locator))
            {
                locators.Add(index, locator = new IndexedPointInAreaLocator(polygon));
            }

            // A vertex on the shell tells nothing; if all lie there, the ring cannot be outside.
            var place = ring.Select(point => locator.Locate(new Coordinate(point.X, point.Y))).FirstOrDefault(at => at != Location.Boundary, Location.Interior);
            return place == Location.Interior;
        }
    }

    private static Polygon ToPolygon(FilePoint[] ring) => Nts.Factory.CreatePolygon(Nts.ToCoordinates(Open(ring)));

    private static FilePoint[] Open(FilePoint[] ring) => ring[^1] == ring[0] ? ring[..^1] : ring;

    /// <summary>Positive when the ring runs anticlockwise.</summary>
    private static double TwiceSignedArea(FilePoint[] ring)
    {
        var total = 0.0;
        for (var i = 0; i < ring.Length; i++)
        {
            var next = ring[(i + 1) % ring.Length];
            total += ((ring[i].X - ring[0].X) * (next.Y - ring[0].Y)) - ((next.X - ring[0].X) * (ring[i].Y - ring[0].Y));
        }

        return total;
    }
}
