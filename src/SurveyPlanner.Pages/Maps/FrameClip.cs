namespace SurveyPlanner.Pages.Maps;

/// <summary>Cuts polylines at the edge of a drawing (Liang &amp; Barsky 1984, ACM Trans. Graph. 3:1–22).</summary>
internal static class FrameClip
{
    /// <summary>The pieces inside the drawing. A missing point breaks the line, and so does a leap wider than the drawing (the seam of a projection).</summary>
    public static IReadOnlyList<Pixel[]> Clip(IEnumerable<Pixel?> line, MapFrame frame)
    {
        var pieces = new List<Pixel[]>();
        var open = new List<Pixel>();
        Pixel? last = null;
        foreach (var point in line)
        {
            if (last is { } a && point is { } b && a.DistanceTo(b) < frame.Width && Inside(a, b, frame) is { } part)
            {
                if (open.Count == 0 || open[^1] != part.From)
                {
                    Finish();
                    open.Add(part.From);
                }

                open.Add(part.To);
            }

            last = point;
        }

        Finish();
        return pieces;

        void Finish()
        {
            if (open.Count > 1)
            {
                pieces.Add([.. open]);
            }

            open.Clear();
        }
    }

    private static (Pixel From, Pixel To)? Inside(Pixel a, Pixel b, MapFrame frame)
    {
        var (dx, dy) = (b.X - a.X, b.Y - a.Y);
        var (enter, leave) = (0.0, 1.0);
        foreach (var (towards, room) in (ReadOnlySpan<(double, double)>)[(-dx, a.X), (dx, frame.Width - a.X), (-dy, a.Y), (dy, frame.Height - a.Y)])
        {
            if (towards == 0 && room < 0)
            {
                return null;
            }

            if (towards < 0)
            {
                enter = Math.Max(enter, room / towards);
            }
            else if (towards > 0)
            {
                leave = Math.Min(leave, room / towards);
            }
        }

        // The ends themselves where nothing is cut: exact equality joins the segments again.
        return enter >= leave ? null
            : (enter == 0 ? a : new Pixel(a.X + (enter * dx), a.Y + (enter * dy)), leave == 1 ? b : new Pixel(a.X + (leave * dx), a.Y + (leave * dy)));
    }
}
