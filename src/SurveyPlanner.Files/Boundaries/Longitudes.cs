namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Makes longitudes run on: within an outline across 180°, between outlines so that all lie in one turn of the globe, and round a pole.
/// </summary>
internal static class Longitudes
{
    private const double Turn = 360;

    /// <summary>
    /// The points with each longitude moved by whole turns so that no edge spans more than half the globe: that is how an outline looks that
    /// crosses 180° without being cut there. Tells whether anything had to be moved, and whether the outline goes round a pole.
    /// </summary>
    public static (List<FilePoint> Points, bool Crossed, bool RoundPole) Unwrap(IReadOnlyList<FilePoint> ring)
    {
        var poleSeam = ring.Any(point => Math.Abs(point.Y) == 90);
        var points = new List<FilePoint>(ring.Count);
        var shift = 0.0;
        var crossed = false;
        for (var i = 0; i < ring.Count; i++)
        {
            if (i > 0)
            {
                var step = ring[i].X - ring[i - 1].X;
                if (Math.Abs(step) > Turn / 2 && !RunsAlongParallel(step, ring[i - 1], ring[i], poleSeam))
                {
                    shift -= Turn * Math.Round(step / Turn);
                    crossed = true;
                }
            }

            points.Add(new FilePoint(ring[i].X + shift, ring[i].Y));
        }

        var span = points.Count == 0 ? 0 : points[^1].X - points[0].X;
        if (Math.Abs(Math.Abs(span) - Turn) < 1e-9 && points.Count > 3)
        {
            return (points, false, true);
        }

        return OpenAtPole(points) is { } open ? (open, false, true) : (points, crossed, false);
    }

    /// <summary>A polygon written in plain degrees can hold a pole only by running along ±90° and along a whole parallel: these edges are meant.</summary>
    private static bool RunsAlongParallel(double step, FilePoint from, FilePoint to, bool poleSeam)
        => (Math.Abs(from.Y) == 90 && Math.Abs(to.Y) == 90) || (poleSeam && Math.Abs(step) == Turn);

    /// <summary>An outline that reaches a pole along one meridian, runs a whole turn along it and comes back the same way really goes round the pole.</summary>
    private static List<FilePoint>? OpenAtPole(List<FilePoint> points)
    {
        var open = points.Count > 1 && points[0] == points[^1] ? points[..^1] : points;
        var first = open.FindIndex(point => Math.Abs(point.Y) == 90);
        if (first < 0)
        {
            return null;
        }

        // Turned so that the points on the pole stand last.
        var start = first;
        while (Math.Abs(open[start % open.Count].Y) == 90 && start < first + open.Count)
        {
            start++;
        }

        List<FilePoint> turned = [.. open[(start % open.Count)..], .. open[..(start % open.Count)]];
        var off = turned.TakeWhile(point => Math.Abs(point.Y) != 90).ToList();
        var meets = off.Count >= 2 && off.Count < turned.Count && turned.Skip(off.Count).All(point => Math.Abs(point.Y) == 90)
            && Math.Abs(Math.Abs(off[^1].X - off[0].X) - Turn) < 1e-9 && off[^1].Y == off[0].Y;
        return meets ? [.. off.Zip(off.Skip(1), ThirdsOf).SelectMany(points => points), off[^1]] : null;
    }

    /// <summary>The start of an edge and points on it, so that none that runs along a parallel is longer than a third of it.</summary>
    private static IEnumerable<FilePoint> ThirdsOf(FilePoint from, FilePoint to)
    {
        var pieces = Math.Max(1, (int)Math.Ceiling(Math.Abs(to.X - from.X) / (Turn / 3)));
        return Enumerable.Range(0, pieces).Select(i => new FilePoint(from.X + ((to.X - from.X) * i / pieces), from.Y + ((to.Y - from.Y) * i / pieces)));
    }

    /// <summary>Moves outlines by whole turns into one common turn, begun in the widest stretch of longitude without any, and centred within ±180°.</summary>
    public static void Align(IReadOnlyList<Part> parts)
    {
        if (parts.Count == 0 || parts.Any(part => part.Shell.RoundPole))
        {
            return;
        }

        // One sum for each outline: adding and taking away again would leave neighbours a hair apart.
        var seam = WidestGap(parts);
        var turns = parts.Select(part => Math.Ceiling((seam - part.Shell.MinX) / Turn)).ToList();
        var west = parts.Select((part, i) => part.Shell.MinX + (Turn * turns[i])).Min();
        var east = parts.Select((part, i) => part.Shell.MaxX + (Turn * turns[i])).Max();
        var back = Math.Round((west + east) / 2 / Turn);
        for (var i = 0; i < parts.Count; i++)
        {
            var shell = parts[i].Shell;
            shell.Shift(Turn * (turns[i] - back));
            var middle = (shell.MinX + shell.MaxX) / 2;
            foreach (var hole in parts[i].Holes)
            {
                hole.Shift(Turn * Math.Round((middle - ((hole.MinX + hole.MaxX) / 2)) / Turn));
            }
        }
    }

    private static double WidestGap(IReadOnlyList<Part> parts)
    {
        var spans = parts
            .Select(part => (Start: part.Shell.MinX - (Turn * Math.Floor(part.Shell.MinX / Turn)), Length: part.Shell.MaxX - part.Shell.MinX))
            .OrderBy(span => span.Start)
            .ToList();

        // Spans may reach over 360° into the next turn: what they cover at its beginning counts before the first start.
        var reached = spans.Max(span => span.Start + span.Length) - Turn;
        var (widest, seam) = (-1.0, spans[0].Start);
        foreach (var (start, length) in spans)
        {
            if (start - reached > widest)
            {
                (widest, seam) = (start - reached, start - (Math.Max(0, start - reached) / 2));
            }

            reached = Math.Max(reached, start + length);
        }

        return seam;
    }
}
