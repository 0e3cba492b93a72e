namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// Leaves out vertices that the eye would miss: Douglas &amp; Peucker 1973, Cartographica 10:112–122. For the screen only, never for the data.
/// </summary>
internal static class RingSimplifier
{
    /// <summary>No vertex left out lies further than this from the line drawn, pixels.</summary>
    public const double TolerancePixels = 0.5;

    /// <summary>The vertices of a closed ring (last joins first) that are worth drawing; fewer than three where the ring is too small to see.</summary>
    public static Pixel[] Simplify(ReadOnlySpan<Pixel> ring)
    {
        if (ring.Length < 4)
        {
            return ring.ToArray();
        }

        // Anchored at a vertex and the one furthest from it: both ends of the ring's extent stay.
        var far = FurthestFrom(ring[0], ring);
        var keep = new bool[ring.Length];
        (keep[0], keep[far]) = (true, true);
        Mark(ring, 0, far, keep);
        Mark(ring, far, ring.Length, keep);
        var kept = new List<Pixel>();
        for (var i = 0; i < ring.Length; i++)
        {
            if (keep[i])
            {
                kept.Add(ring[i]);
            }
        }

        return [.. kept];
    }

    private static int FurthestFrom(Pixel place, ReadOnlySpan<Pixel> ring)
    {
        var (best, furthest) = (0, 0.0);
        for (var i = 1; i < ring.Length; i++)
        {
            if (place.DistanceTo(ring[i]) is var distance && distance > furthest)
            {
                (best, furthest) = (i, distance);
            }
        }

        return best;
    }

    // Index ring.Length stands for vertex 0 again. A stack of its own: rings of a million vertices do not exhaust the thread's.
    private static void Mark(ReadOnlySpan<Pixel> ring, int from, int to, bool[] keep)
    {
        var open = new Stack<(int From, int To)>();
        open.Push((from, to));
        while (open.TryPop(out var span))
        {
            var (a, b) = (ring[span.From], ring[span.To % ring.Length]);
            var (worst, distance) = (-1, TolerancePixels);
            for (var i = span.From + 1; i < span.To; i++)
            {
                if (DistanceToSegment(ring[i], a, b) is var d && d > distance)
                {
                    (worst, distance) = (i, d);
                }
            }

            if (worst >= 0)
            {
                keep[worst] = true;
                open.Push((span.From, worst));
                open.Push((worst, span.To));
            }
        }
    }

    internal static double DistanceToSegment(Pixel p, Pixel a, Pixel b)
    {
        var (dx, dy) = (b.X - a.X, b.Y - a.Y);
        var squared = (dx * dx) + (dy * dy);
        var along = squared > 0 ? Math.Clamp((((p.X - a.X) * dx) + ((p.Y - a.Y) * dy)) / squared, 0, 1) : 0;
        return p.DistanceTo(new Pixel(a.X + (along * dx), a.Y + (along * dy)));
    }
}
