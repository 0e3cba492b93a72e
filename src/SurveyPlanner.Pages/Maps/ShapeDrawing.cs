using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>A shape of the plane on a drawing: its rings in pixels, simplified to what the eye can see.</summary>
public sealed record ShapeDrawing(IReadOnlyList<Pixel[]> Rings)
{
    private const int Lattice = 24;

    /// <summary>All rings as one path, to be filled by the even-odd rule.</summary>
    public string Path
    {
        get
        {
            var path = new PathData();
            foreach (var ring in Rings)
            {
                path.Ring(ring);
            }

            return path.ToString();
        }
    }

    /// <summary>
    /// The edges alone where parts of the shape meet, as those of a region cut at 180° do: what two of them share is no edge.
    /// Null where none meet, and <see cref="Path"/> has the edges too.
    /// </summary>
    public string? Outline
    {
        get
        {
            var edges = Rings.SelectMany(Edges).ToHashSet();
            bool IsShared((Pixel From, Pixel To) edge) => edges.Contains((edge.To, edge.From));
            if (!edges.Any(IsShared))
            {
                return null;
            }

            var path = new PathData();
            foreach (var ring in Rings)
            {
                // Begun after a shared edge, so that no run of others is cut in two.
                var all = Edges(ring).ToArray();
                var start = Array.FindIndex(all, IsShared) + 1;
                var run = new List<Pixel>();
                foreach (var edge in all[start..].Concat(all[..start]))
                {
                    if (run.Count > 0 && IsShared(edge))
                    {
                        path.Polyline([.. run]);
                        run.Clear();
                    }
                    else if (!IsShared(edge))
                    {
                        run.AddRange(run.Count == 0 ? [edge.From, edge.To] : [edge.To]);
                    }
                }

                if (run.Count > 0)
                {
                    path.Polyline([.. run]);
                }
            }

            return path.ToString();
        }
    }

    private static IEnumerable<(Pixel From, Pixel To)> Edges(Pixel[] ring) => ring.Select((from, i) => (from, ring[(i + 1) % ring.Length]));

    public static ShapeDrawing Of(PlaneShape shape, MapFrame frame)
    {
        var rings = new List<Pixel[]>();
        for (var ring = 0; ring < shape.RingCount; ring++)
        {
            var pixels = new Pixel[shape.RingStarts[ring + 1] - shape.RingStarts[ring]];
            for (var i = 0; i < pixels.Length; i++)
            {
                var vertex = shape.RingStarts[ring] + i;
                pixels[i] = frame.ToPixel(new PlanePoint(shape.X[vertex], shape.Y[vertex]));
            }

            var simple = RingSimplifier.Simplify(pixels);
            rings.Add(simple.Length >= 3 ? simple : Speck(pixels));
        }

        return new ShapeDrawing(rings);
    }

    /// <summary>Places inside the shape, the one furthest from its edges first: where a name can stand.</summary>
    public IReadOnlyList<Pixel> RoomiestPlaces(int most)
    {
        if (Rings.Count == 0)
        {
            return [];
        }

        var main = Rings.MaxBy(ring => ring.Max(p => p.X) - ring.Min(p => p.X) + ring.Max(p => p.Y) - ring.Min(p => p.Y))!;
        var (minX, maxX, minY, maxY) = (main.Min(p => p.X), main.Max(p => p.X), main.Min(p => p.Y), main.Max(p => p.Y));
        var inside =
            from i in Enumerable.Range(0, Lattice)
            from j in Enumerable.Range(0, Lattice)
            let place = new Pixel(minX + ((maxX - minX) * (i + 0.5) / Lattice), minY + ((maxY - minY) * (j + 0.5) / Lattice))
            where Holds(place)
            orderby Room(place) descending
            select place;
        Pixel[] places = [.. inside.Take(most)];
        return places.Length > 0 ? places : [new Pixel((minX + maxX) / 2, (minY + maxY) / 2)];
    }

    /// <summary>How long a text in the middle of which a place lies may be without leaving the shape on either side.</summary>
    public double WidthAt(Pixel place)
    {
        var nearest = double.MaxValue;
        foreach (var ring in Rings)
        {
            for (var i = 0; i < ring.Length; i++)
            {
                var (a, b) = (ring[i], ring[(i + 1) % ring.Length]);
                if ((a.Y > place.Y) != (b.Y > place.Y))
                {
                    nearest = Math.Min(nearest, Math.Abs(a.X + ((b.X - a.X) * (place.Y - a.Y) / (b.Y - a.Y)) - place.X));
                }
            }
        }

        return 2 * nearest;
    }

    // A name is wider than high: room to the sides counts for less.
    private double Room(Pixel place)
    {
        var least = double.MaxValue;
        foreach (var ring in Rings)
        {
            for (var i = 0; i < ring.Length; i++)
            {
                var (a, b) = (ring[i], ring[(i + 1) % ring.Length]);
                least = Math.Min(least, RingSimplifier.DistanceToSegment(
                    place with { X = place.X / 2 }, a with { X = a.X / 2 }, b with { X = b.X / 2 }));
            }
        }

        return least;
    }

    private bool Holds(Pixel place)
    {
        var inside = false;
        foreach (var ring in Rings)
        {
            for (var i = 0; i < ring.Length; i++)
            {
                var (a, b) = (ring[i], ring[(i + 1) % ring.Length]);
                if ((a.Y > place.Y) != (b.Y > place.Y) && place.X < a.X + ((b.X - a.X) * (place.Y - a.Y) / (b.Y - a.Y)))
                {
                    inside = !inside;
                }
            }
        }

        return inside;
    }

    // An island under half a pixel is still an island: a dot of half a pixel keeps it in sight.
    private static Pixel[] Speck(Pixel[] ring)
    {
        var (x, y) = (ring.Average(p => p.X), ring.Average(p => p.Y));
        return [new Pixel(x - 0.3, y + 0.3), new Pixel(x + 0.3, y + 0.3), new Pixel(x, y - 0.3)];
    }
}
