using NetTopologySuite.Operation.Valid;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Mends one outline where there is only one way to mend it: an open end is closed, repeated points and spikes without width go.
/// </summary>
internal sealed class RingCleaner(Frame frame, RepairLog log)
{
    /// <summary>A spike, a part or a hole thinner than this is a fault of drawing, not ground: no coordinate is surveyed that sharply.</summary>
    public const double ThinMetres = 0.001;

    /// <summary>The vertices with the first once more at the end; a gap there is told.</summary>
    public IReadOnlyList<FilePoint> Close(RawRing raw)
    {
        var points = raw.Points;
        if (points.Count < 2 || points[^1] == points[0])
        {
            return points;
        }

        log.Repair(
            "outlines that did not end where they began were closed by a straight edge",
            $"{raw.Place}: {Wording.Length(frame.Distance(points[^1], points[0]))} from vertex {points.Count} to vertex 1",
            0);
        return [.. points, points[0]];
    }

    /// <summary>The outline mended, or null when nothing with an area is left.</summary>
    /// <param name="raw">Where it stands.</param>
    /// <param name="points">Its points, closed, longitudes running on.</param>
    /// <param name="roundPole">Whether it goes round a pole; then spikes are left alone, because lengths in degrees mean nothing there.</param>
    public Outline? Clean(RawRing raw, IReadOnlyList<FilePoint> points, bool roundPole)
    {
        List<FilePoint> open = [.. points];
        if (open.Count > 0)
        {
            open.RemoveAt(open.Count - 1);
        }

        var cleaned = roundPole ? WithoutRepeats(open) : WithoutSpikes(open, raw.Place);
        if (cleaned.Count < open.Count)
        {
            var repeated = open.Count - WithoutRepeats(open).Count;
            if (repeated > 0)
            {
                log.Repair("points that repeat the one before were left out", $"{raw.Place}: {repeated}", 0);
            }
        }

        var outline = new Outline(raw.Place, cleaned) { RoundPole = roundPole };
        return roundPole || IsWide(outline) ? outline : null;
    }

    private bool IsWide(Outline outline)
    {
        if (outline.Points.Count < 3)
        {
            return false;
        }

        // A strip of width w and length l has the area w·l and the perimeter 2·l. A figure of eight has no area either, but it crosses itself
        // and is no strip: that is for the checks that follow to say.
        return 2 * frame.Area(outline) >= ThinMetres * frame.Perimeter(outline.Points) || !new IsSimpleOp(Nts.ToPolygon(outline).Shell).IsSimple();
    }

    private static List<FilePoint> WithoutRepeats(List<FilePoint> points)
    {
        var kept = new List<FilePoint>(points.Count);
        foreach (var point in points)
        {
            if (kept.Count == 0 || kept[^1] != point)
            {
                kept.Add(point);
            }
        }

        while (kept.Count > 1 && kept[^1] == kept[0])
        {
            kept.RemoveAt(kept.Count - 1);
        }

        return kept;
    }

    private List<FilePoint> WithoutSpikes(List<FilePoint> points, string place)
    {
        var kept = new List<FilePoint>(points.Count);
        var spikes = new Spikes();
        foreach (var point in points)
        {
            kept.Add(point);
            TrimEnd(kept, spikes);
        }

        // An index instead of removing from the front, which would cost the square of the number of points in a hostile file.
        var start = TrimSeam(kept, spikes);
        if (spikes.Count > 0)
        {
            log.Repair(
                "spikes without width were cut off",
                $"{place}: {spikes.Count}, the first at {frame.Position(spikes.First.X, spikes.First.Y)}",
                spikes.AreaChange * Math.Sign(frame.SignedArea(points)));
        }

        return kept[start..];
    }

    /// <summary>The end of the list may spike or repeat together with its beginning. Returns the index where the outline now begins.</summary>
    private int TrimSeam(List<FilePoint> kept, Spikes spikes)
    {
        var start = 0;
        while (kept.Count - start >= 3)
        {
            if (kept[^1] == kept[start])
            {
                kept.RemoveAt(kept.Count - 1);
            }
            else if (IsSpike(kept[^2], kept[^1], kept[start]))
            {
                spikes.Add(kept[^1], TriangleArea(kept[^2], kept[^1], kept[start]));
                kept.RemoveAt(kept.Count - 1);
            }
            else if (IsSpike(kept[^1], kept[start], kept[start + 1]))
            {
                spikes.Add(kept[start], TriangleArea(kept[^1], kept[start], kept[start + 1]));
                start++;
            }
            else
            {
                break;
            }
        }

        return start;
    }

    /// <summary>Takes repeats and spikes off the end of the list.</summary>
    private void TrimEnd(List<FilePoint> kept, Spikes spikes)
    {
        while (kept.Count >= 2)
        {
            if (kept[^1] == kept[^2])
            {
                kept.RemoveAt(kept.Count - 1);
            }
            else if (kept.Count >= 3 && IsSpike(kept[^3], kept[^2], kept[^1]))
            {
                spikes.Add(kept[^2], TriangleArea(kept[^3], kept[^2], kept[^1]));
                kept.RemoveAt(kept.Count - 2);
            }
            else
            {
                break;
            }
        }
    }

    /// <summary>True when the outline goes to the tip and back along the same line.</summary>
    private bool IsSpike(FilePoint before, FilePoint tip, FilePoint after)
    {
        var u = frame.Step(tip, before);
        var v = frame.Step(tip, after);
        var forward = (u.East * v.East) + (u.North * v.North);
        if (forward <= 0)
        {
            return false;
        }

        var cross = Math.Abs((u.East * v.North) - (u.North * v.East));
        var longer = Math.Sqrt(Math.Max((u.East * u.East) + (u.North * u.North), (v.East * v.East) + (v.North * v.North)));
        return cross < ThinMetres * longer;
    }

    /// <summary>By how much the signed area shrinks when the tip goes.</summary>
    private double TriangleArea(FilePoint before, FilePoint tip, FilePoint after)
    {
        var u = frame.Step(tip, before);
        var v = frame.Step(tip, after);
        return ((v.East * u.North) - (v.North * u.East)) / 2;
    }

    private sealed class Spikes
    {
        public int Count { get; private set; }

        public FilePoint First { get; private set; }

        public double AreaChange { get; private set; }

        public void Add(FilePoint tip, double area)
        {
            First = Count++ == 0 ? tip : First;
            AreaChange -= area;
        }
    }
}
