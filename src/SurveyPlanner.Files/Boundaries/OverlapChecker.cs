using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Prepared;
using NetTopologySuite.Index.Strtree;
using NetTopologySuite.Operation.Overlay;
using NetTopologySuite.Operation.OverlayNG;
using NetTopologySuite.Operation.Union;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Parts of one feature that overlap: repeats are left out, partial overlaps united, both told. A part that lies wholly inside another is
/// refused, because it may have been meant as a hole. Parts that share a border are left alone.
/// </summary>
internal sealed class OverlapChecker(Frame frame, string source, RepairLog log)
{
    // Honest files have a handful of overlaps; boxes of honest islands meet a few thousand times.
    private const int MostOverlaps = 1000;
    private const int MostBoxMeetings = 1_000_000;

    private readonly List<Problem> _problems = [];
    private readonly Dictionary<int, IPreparedGeometry> _prepared = [];

    public IReadOnlyList<Problem> Problems => _problems;

    public List<Part> Check(List<Part> parts)
    {
        if (parts.Count < 2)
        {
            return parts;
        }

        var polygons = parts.Select(Nts.ToPolygon).ToArray();
        var group = Enumerable.Range(0, parts.Count).ToArray();
        var overlaps = 0;
        foreach (var (i, j) in BoxMeetings(polygons, parts))
        {
            if (Overlaps(parts, polygons, i, j))
            {
                Join(group, i, j);
                if (++overlaps > MostOverlaps)
                {
                    throw FileBytes.Refusal(source, $"more than {MostOverlaps} pairs of parts overlap; unite them in a GIS program", parts[i].Shell.Place);
                }
            }
        }

        return overlaps == 0 || _problems.Count > 0 ? parts : Unite(parts, polygons, group);
    }

    private bool Overlaps(List<Part> parts, Polygon[] polygons, int i, int j)
    {
        // The larger one is prepared: an island against a mainland of a million vertices costs next to nothing.
        var (large, small) = polygons[i].NumPoints >= polygons[j].NumPoints ? (i, j) : (j, i);
        if (!Prepared(polygons, large).Intersects(polygons[small]))
        {
            return false;
        }

        var shared = OverlayNGRobust.Overlay(polygons[large], polygons[small], SpatialFunction.Intersection);
        var common = Nts.ToParts(shared, "").ToList();
        var area = common.Sum(frame.Area);
        if (area <= RingCleaner.ThinMetres / 2 * common.Sum(part => frame.Perimeter(part.Shell.Points)))
        {
            // Neighbours whose common border is rounded differently: nothing that anyone could find on the ground.
            return false;
        }

        var (inner, outer) = frame.Area(parts[i]) <= frame.Area(parts[j]) ? (i, j) : (j, i);
        var isRepeat = frame.Area(parts[outer]) - area <= 1e-9 * area;
        if (isRepeat || frame.Area(parts[inner]) - area > 1e-9 * area)
        {
            return true;
        }

        var at = polygons[inner].InteriorPoint;
        _problems.Add(new Problem(
            $"the part lies wholly inside another part ({parts[outer].Shell.Place}), near {frame.Position(at.X, at.Y)}; if it is a hole, make it one, else remove it",
            source,
            Key: parts[inner].Shell.Place));
        return false;
    }

    private IPreparedGeometry Prepared(Polygon[] polygons, int index)
    {
        if (!_prepared.TryGetValue(index, out var prepared))
        {
            prepared = PreparedGeometryFactory.Prepare(polygons[index]);
            _prepared.Add(index, prepared);
        }

        return prepared;
    }

    /// <summary>Pairs of parts whose bounding boxes share an area.</summary>
    private List<(int I, int J)> BoxMeetings(Polygon[] polygons, List<Part> parts)
    {
        _prepared.Clear();
        var tree = new STRtree<int>();
        for (var i = 0; i < polygons.Length; i++)
        {
            tree.Insert(polygons[i].EnvelopeInternal, i);
        }

        var pairs = new List<(int, int)>();
        for (var i = 0; i < polygons.Length; i++)
        {
            foreach (var j in tree.Query(polygons[i].EnvelopeInternal).Where(j => j > i).Order())
            {
                pairs.Add((i, j));
            }

            if (pairs.Count > MostBoxMeetings)
            {
                throw FileBytes.Refusal(source, "the parts of this feature overlap each other far too often to be islands; simplify the boundary in a GIS program", parts[i].Shell.Place);
            }
        }

        return pairs;
    }

    private List<Part> Unite(List<Part> parts, Polygon[] polygons, int[] group)
    {
        var united = new List<Part>();
        foreach (var members in Enumerable.Range(0, parts.Count).GroupBy(i => Root(group, i)))
        {
            var indices = members.ToList();
            if (indices.Count == 1)
            {
                united.Add(parts[indices[0]]);
                continue;
            }

            var place = parts[indices[0]].Shell.Place;
            var union = UnaryUnionOp.Union(indices.Select(i => polygons[i]), Nts.Factory);
            var pieces = Nts.ToParts(union, place).ToList();
            log.Repair(
                "parts that overlap were united",
                string.Join(" and ", indices.Take(3).Select(i => parts[i].Shell.Place)) + (indices.Count > 3 ? " and more" : ""),
                pieces.Sum(frame.Area) - indices.Sum(i => frame.Area(parts[i])));
            united.AddRange(pieces);
        }

        return united;
    }

    private static void Join(int[] group, int i, int j) => group[Root(group, i)] = Root(group, j);

    private static int Root(int[] group, int i)
    {
        while (group[i] != i)
        {
            i = group[i] = group[group[i]];
        }

        return i;
    }
}
