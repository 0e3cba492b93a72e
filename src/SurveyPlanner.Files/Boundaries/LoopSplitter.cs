using NetTopologySuite.Algorithm;
using NetTopologySuite.Geometries;
using NetTopologySuite.Noding;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Takes an outline apart where it meets itself. Where it only touches itself there is one reading: holes hung on the outline, or parts
/// joined at a point. Where it crosses itself, a loop so small that no reading changes the area to speak of is cut off; anything larger
/// would be a guess and is left to the user.
/// </summary>
internal sealed class LoopSplitter(Frame frame, double wholeArea)
{
    /// <summary>An outline drawn by people or rounded by an atlas meets itself here and there; one that does so more often is broken.</summary>
    public const int MostMeetings = 500;

    // Half of the millionth-part accuracy promised for areas leaves ten such loops unnoticed; a loop of a tenth of its own outline is no slip.
    private const double SmallOfWhole = 1e-5;
    private const double SmallOfOutline = 0.1;

    /// <summary>What an outline comes apart into.</summary>
    /// <param name="Shells">Loops that bound ground.</param>
    /// <param name="Holes">Loops that bound holes in it.</param>
    /// <param name="CutOff">Area of all small loops that were cut off, square metres.</param>
    /// <param name="Cuts">How many these were.</param>
    public sealed record Loops(List<List<FilePoint>> Shells, List<List<FilePoint>> Holes, double CutOff, int Cuts);

    /// <summary>The outline taken apart, or null when that would be a guess.</summary>
    public Loops? Split(IReadOnlyList<FilePoint> points)
    {
        if (Meetings(points) is not { } nodes)
        {
            return null;
        }

        var loops = LoopsOf(WithNodes(points, nodes)).Where(loop => loop.Count >= 3)
            .Select(loop => (Points: loop, Area: frame.SignedArea(loop)))
            .Where(loop => loop.Area != 0)
            .OrderByDescending(loop => Math.Abs(loop.Area))
            .ToList();
        return loops.Count == 0 ? null : Sort(loops);
    }

    // One pass that decides on each loop in turn, largest first; cut in two it would have to hand on everything it knows.
    private Loops? Sort(List<(List<FilePoint> Points, double Area)> loops)
    {
        var outlineArea = Math.Abs(loops[0].Area);
        var kept = new List<(Polygon Polygon, List<FilePoint> Points, bool IsHole)>();
        var (cutOff, cuts) = (0.0, 0);
        foreach (var (points, area) in loops)
        {
            var polygon = Nts.Factory.CreatePolygon(Nts.ToCoordinates(points));
            var inside = polygon.InteriorPoint;
            var isHole = kept.Count(other => other.Polygon.Contains(inside)) % 2 == 1;

            // Walked on from a touching point the ground stays on the same side: a hole turns the other way, a second part the same way.
            if (Math.Sign(area) == Math.Sign(loops[0].Area) != isHole)
            {
                kept.Add((polygon, points, isHole));
            }
            else if (Math.Abs(area) <= SmallOfWhole * wholeArea && Math.Abs(area) <= SmallOfOutline * outlineArea)
            {
                cutOff += Math.Abs(area);
                cuts++;
            }
            else
            {
                return null;
            }
        }

        return new Loops(
            [.. kept.Where(loop => !loop.IsHole).Select(loop => loop.Points)],
            [.. kept.Where(loop => loop.IsHole).Select(loop => loop.Points)],
            cutOff,
            cuts);
    }

    /// <summary>The outline with a vertex wherever it meets itself.</summary>
    private static List<FilePoint> WithNodes(IReadOnlyList<FilePoint> points, List<(int Segment, FilePoint At)> nodes)
    {
        var bySegment = nodes.ToLookup(node => node.Segment, node => node.At);
        var noded = new List<FilePoint>(points.Count + nodes.Count);
        for (var i = 0; i < points.Count; i++)
        {
            noded.Add(points[i]);
            var from = points[i];
            var along = bySegment[i].Distinct().OrderBy(at => Math.Abs(at.X - from.X) + Math.Abs(at.Y - from.Y));
            noded.AddRange(along.Where(at => at != from && at != points[(i + 1) % points.Count]));
        }

        return noded;
    }

    /// <summary>Walks the outline and takes a loop off whenever it comes back to a point.</summary>
    private static List<List<FilePoint>> LoopsOf(List<FilePoint> noded)
    {
        var loops = new List<List<FilePoint>>();
        var path = new List<FilePoint>(noded.Count);
        var seen = new Dictionary<FilePoint, int>(noded.Count);
        foreach (var point in noded)
        {
            if (seen.TryGetValue(point, out var at))
            {
                loops.Add(path[at..]);
                foreach (var gone in path.Skip(at + 1))
                {
                    seen.Remove(gone);
                }

                path.RemoveRange(at + 1, path.Count - at - 1);
            }
            else
            {
                seen.Add(point, path.Count);
                path.Add(point);
            }
        }

        loops.Add(path);
        return loops;
    }

    /// <summary>All places where segments that are not neighbours meet, or null when these are too many.</summary>
    private static List<(int Segment, FilePoint At)>? Meetings(IReadOnlyList<FilePoint> points)
    {
        var finder = new MeetingFinder(points.Count);
        new MCIndexNoder(finder).ComputeNodes([new BasicSegmentString(Nts.ToCoordinates(points), null)]);
        return finder.IsDone ? null : finder.Found;
    }

    private sealed class MeetingFinder(int segments) : ISegmentIntersector
    {
        private readonly RobustLineIntersector _intersector = new();

        public List<(int Segment, FilePoint At)> Found { get; } = [];

        public bool IsDone => Found.Count > 2 * MostMeetings;

        public void ProcessIntersections(ISegmentString e0, int segIndex0, ISegmentString e1, int segIndex1)
        {
            var apart = Math.Abs(segIndex0 - segIndex1);
            if (apart == 0)
            {
                return;
            }

            _intersector.ComputeIntersection(
                e0.Coordinates[segIndex0], e0.Coordinates[segIndex0 + 1], e1.Coordinates[segIndex1], e1.Coordinates[segIndex1 + 1]);
            var neighbours = apart == 1 || apart == segments - 1;
            for (var i = 0; i < _intersector.IntersectionNum && !(neighbours && _intersector.IntersectionNum == 1); i++)
            {
                var at = _intersector.GetIntersection(i);
                Found.Add((segIndex0, new FilePoint(at.X, at.Y)));
                Found.Add((segIndex1, new FilePoint(at.X, at.Y)));
            }
        }
    }
}
