namespace SurveyPlanner.Regions;

/// <summary>
/// Puts vertices into edges that are straight in longitude and latitude, so that the straight edges between their images in the plane
/// stray from them by no more than a tolerance. Equal edges get equal vertices whichever way they run, so that shared borders stay shared.
/// </summary>
internal sealed class EdgeDensifier(EqualAreaProjection projection, double toleranceMetres)
{
    // Edges longer than this are first cut up: only a short edge's image is bent evenly enough for one measurement at its middle.
    private const double MaxDegrees = 1;

    /// <summary>Adds the image of one closed ring to the builder.</summary>
    public void AddRing(PlaneShapeBuilder builder, IReadOnlyList<LonLat> ring)
    {
        builder.StartRing();
        var from = projection.Project(ring[0]);
        for (var i = 1; i < ring.Count; i++)
        {
            builder.Add(from.X, from.Y);
            var to = projection.Project(ring[i]);
            AddInside(builder, ring[i - 1], ring[i], from, to);
            from = to;
        }
    }

    /// <summary>Sum, over the edges of a closed ring, of the square root of how far the image of each strays: what its pieces are counted from.</summary>
    public double RootOfStray(IReadOnlyList<LonLat> ring)
    {
        var total = 0.0;
        var from = projection.Project(ring[0]);
        for (var i = 1; i < ring.Count; i++)
        {
            var to = projection.Project(ring[i]);
            total += Math.Sqrt(Stray(ring[i - 1], ring[i], from, to));
            from = to;
        }

        return total;
    }

    private void AddInside(PlaneShapeBuilder builder, LonLat from, LonLat to, PlanePoint fromPoint, PlanePoint toPoint)
    {
        var forward = IsFirst(from, to);
        var (a, b) = forward ? (from, to) : (to, from);
        var (pa, pb) = forward ? (fromPoint, toPoint) : (toPoint, fromPoint);
        var inside = new List<PlanePoint>();
        var degrees = Math.Max(Math.Abs(b.Lon - a.Lon), Math.Abs(b.Lat - a.Lat));
        var stretches = Math.Max(1, (int)Math.Ceiling(degrees / MaxDegrees));
        for (var stretch = 0; stretch < stretches; stretch++)
        {
            var start = Between(a, b, (double)stretch / stretches);
            var end = Between(a, b, (double)(stretch + 1) / stretches);
            var startPoint = stretch == 0 ? pa : projection.Project(start);
            var endPoint = stretch == stretches - 1 ? pb : projection.Project(end);
            if (stretch > 0)
            {
                inside.Add(startPoint);
            }

            var pieces = Pieces(start, end, startPoint, endPoint);
            for (var piece = 1; piece < pieces; piece++)
            {
                inside.Add(projection.Project(Between(start, end, (double)piece / pieces)));
            }
        }

        if (!forward)
        {
            inside.Reverse();
        }

        foreach (var point in inside)
        {
            builder.Add(point.X, point.Y);
        }
    }

    /// <summary>A bent edge cut into n strays by 1/n² of what the whole one does.</summary>
    private int Pieces(LonLat start, LonLat end, PlanePoint startPoint, PlanePoint endPoint)
        => Math.Max(1, (int)Math.Ceiling(Math.Sqrt(Stray(start, end, startPoint, endPoint) / toleranceMetres)));

    private double Stray(LonLat start, LonLat end, PlanePoint startPoint, PlanePoint endPoint)
    {
        var middle = projection.Project(Between(start, end, 0.5));
        var dx = middle.X - ((startPoint.X + endPoint.X) / 2);
        var dy = middle.Y - ((startPoint.Y + endPoint.Y) / 2);
        return Math.Sqrt((dx * dx) + (dy * dy));
    }

    private static LonLat Between(LonLat a, LonLat b, double share)
        => new(a.Lon + (share * (b.Lon - a.Lon)), a.Lat + (share * (b.Lat - a.Lat)));

    private static bool IsFirst(LonLat a, LonLat b)
        => a.Lat != b.Lat ? a.Lat < b.Lat : Longitude.Normalise(a.Lon) <= Longitude.Normalise(b.Lon);
}
