using System.Collections.Immutable;

namespace SurveyPlanner.Regions;

/// <summary>
/// Finds the polygons of a stratum that share a border: a stratum cut at 180°, or one made of counties. Such a border is none of the stratum's.
/// A border is shared where both outlines run along the same edge, which may have a vertex in one of them only. A point in common is not a border.
/// </summary>
/// <remarks>
/// Done in degrees, where edges are straight: in the plane a vertex that only one outline has would lie beside the other's chord.
/// Polygons that share no border keep their vertices digit for digit.
/// </remarks>
internal sealed class SharedBorders
{
    // A micrometre: a few hundred times the rounding of degrees, and far too little to move an area.
    private const double ToleranceDegrees = 1e-11;

    private readonly double _meridian;
    private readonly VertexTiles _tiles;
    private readonly int[] _touches;

    private SharedBorders(IReadOnlyList<GeographicPolygon> polygons, double meridian)
    {
        _meridian = meridian;
        _touches = new int[polygons.Count];
        var vertices = new List<BorderVertex>();
        for (var polygon = 0; polygon < polygons.Count; polygon++)
        {
            foreach (var ring in Rings(polygons[polygon]))
            {
                for (var i = 1; i < ring.Length; i++)
                {
                    vertices.Add(new BorderVertex(ring[i].Lat, East(ring[i]), ring[i].Lon, polygon));
                }
            }
        }

        _tiles = new VertexTiles(vertices);
    }

    /// <summary>The same polygons, in order, with the vertices that another has on a border they share; and which belong together.</summary>
    /// <param name="polygons">The polygons of one stratum.</param>
    /// <param name="meridian">Longitude far from whose opposite the stratum lies.</param>
    public static BorderedPolygons Find(ImmutableArray<GeographicPolygon> polygons, double meridian)
    {
        if (polygons.Length < 2)
        {
            return new BorderedPolygons(polygons, []);
        }

        var borders = new SharedBorders(polygons, meridian);
        GeographicPolygon[] noded = [.. polygons.Select(borders.WithVerticesOfOthers)];
        var groups = borders.Groups(noded);
        var inGroup = groups.SelectMany(group => group).ToHashSet();
        return new BorderedPolygons([.. polygons.Select((polygon, i) => inGroup.Contains(i) ? noded[i] : polygon)], groups);
    }

    private static IEnumerable<ImmutableArray<LonLat>> Rings(GeographicPolygon polygon) => polygon.Holes.Prepend(polygon.Shell);

    /// <summary>Degrees east of the meridian, so that turns do not count.</summary>
    private double East(LonLat position) => Longitude.From(_meridian, position.Lon);

    private GeographicPolygon WithVerticesOfOthers(GeographicPolygon polygon, int index)
    {
        var noded = new GeographicPolygon(WithVerticesOfOthers(polygon.Shell, index), [.. polygon.Holes.Select(hole => WithVerticesOfOthers(hole, index))]);
        var isSame = Rings(noded).Zip(Rings(polygon)).All(pair => pair.First.Length == pair.Second.Length);
        return isSame ? polygon : noded;
    }

    private ImmutableArray<LonLat> WithVerticesOfOthers(ImmutableArray<LonLat> ring, int polygon)
    {
        List<LonLat>? result = null;
        var on = new List<(double Along, LonLat Position)>();
        for (var i = 1; i < ring.Length; i++)
        {
            on.Clear();
            FindVerticesOn(ring[i - 1], ring[i], polygon, on);
            if (on.Count > 0)
            {
                result ??= [.. ring[..i]];
                on.Sort((a, b) => a.Along.CompareTo(b.Along));
                result.AddRange(on.Where((one, k) => k == 0 || one.Along > on[k - 1].Along + ToleranceDegrees).Select(one => one.Position));
            }

            result?.Add(ring[i]);
        }

        return result is null ? ring : [.. result];
    }

    /// <summary>Vertices of other polygons on an edge, its ends left out. Counts those at its second end too.</summary>
    private void FindVerticesOn(LonLat from, LonLat to, int polygon, List<(double Along, LonLat Position)> on)
    {
        var (dLat, dLon) = (to.Lat - from.Lat, to.Lon - from.Lon);
        var (start, end) = (East(from), East(to));
        var (lowLat, highLat) = (Math.Min(from.Lat, to.Lat) - ToleranceDegrees, Math.Max(from.Lat, to.Lat) + ToleranceDegrees);
        var (low, high) = (Math.Min(start, start + dLon) - ToleranceDegrees, Math.Max(start, start + dLon) + ToleranceDegrees);
        var length = Math.Sqrt((dLat * dLat) + (dLon * dLon));
        for (var row = _tiles.Row(lowLat); row <= _tiles.Row(highLat); row++)
        {
            foreach (ref readonly var vertex in _tiles.Between(row, low, high))
            {
                if (vertex.Polygon == polygon || vertex.Lat < lowLat || vertex.Lat > highLat || vertex.East < low || vertex.East > high)
                {
                    continue;
                }

                var (lat, east) = (vertex.Lat - from.Lat, vertex.East - start);
                var along = ((lat * dLat) + (east * dLon)) / length;
                var isBetween = along > ToleranceDegrees && along < length - ToleranceDegrees
                    && Math.Abs((lat * dLon) - (east * dLat)) <= ToleranceDegrees * length;
                if (isBetween)
                {
                    // The same digits as the other's vertex, but for whole turns: they then have the same place in the plane.
                    var turns = Math.Round((from.Lon + (along / length * dLon) - vertex.Lon) / 360);
                    on.Add((along, new LonLat(vertex.Lon + (360 * turns), vertex.Lat)));
                    _touches[vertex.Polygon]++;
                }

                _touches[polygon] += isBetween || (vertex.Lat == to.Lat && vertex.East == end) ? 1 : 0;
            }
        }
    }

    /// <summary>Polygons joined, directly or through others, by an edge that two of them have; indices ascending.</summary>
    private ImmutableArray<ImmutableArray<int>> Groups(GeographicPolygon[] polygons)
    {
        int[] first = [.. Enumerable.Range(0, polygons.Length)];
        int FirstOf(int polygon)
        {
            while (first[polygon] != polygon)
            {
                (first[polygon], polygon) = (first[first[polygon]], first[polygon]);
            }

            return polygon;
        }

        var owners = new Dictionary<((double, double), (double, double)), int>();

        // An edge in common has two ends in common.
        foreach (var index in Enumerable.Range(0, polygons.Length).Where(index => _touches[index] >= 2))
        {
            foreach (var ring in Rings(polygons[index]))
            {
                for (var i = 1; i < ring.Length; i++)
                {
                    var (a, b) = ((ring[i - 1].Lat, East(ring[i - 1])), (ring[i].Lat, East(ring[i])));
                    var key = a.CompareTo(b) < 0 ? (a, b) : (b, a);
                    if (!owners.TryAdd(key, index))
                    {
                        var (one, other) = (FirstOf(owners[key]), FirstOf(index));
                        first[Math.Max(one, other)] = Math.Min(one, other);
                    }
                }
            }
        }

        return [.. Enumerable.Range(0, polygons.Length).GroupBy(FirstOf).Where(group => group.Count() > 1).Select(group => group.ToImmutableArray())];
    }
}

/// <summary>The polygons of a stratum, and which share borders.</summary>
/// <param name="Polygons">All of them, those that share a border with the same vertices on it.</param>
/// <param name="Together">Indices of the polygons that belong together, a group at a time; polygons without a shared border are in none.</param>
internal sealed record BorderedPolygons(ImmutableArray<GeographicPolygon> Polygons, ImmutableArray<ImmutableArray<int>> Together);
