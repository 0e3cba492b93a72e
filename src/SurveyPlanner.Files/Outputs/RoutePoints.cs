using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// The fewest points of a path that a receiver, steering the great circle from each to the next, needs in order to stay on it:
/// two for a straight line, whatever vertices it was drawn with.
/// </summary>
internal static class RoutePoints
{
    /// <summary>Most points that receivers hold in a route.</summary>
    public const int MaxCount = 250;

    /// <summary>How far from the path the course may run, in half-widths: less than anyone steers (common practice, no source).</summary>
    private const double TolerancePerHalfWidth = 0.05;

    /// <summary>The least of it, metres: less than a receiver errs.</summary>
    private const double LeastToleranceMetres = 1;

    /// <summary>Mean radius of the Earth, metres (IUGG R1, from memory): a sphere is near enough for a tolerance.</summary>
    private const double EarthRadiusMetres = 6_371_009;

    /// <summary>At least two points, at most <see cref="MaxCount"/>; beyond that the tolerance is doubled until they suffice.</summary>
    public static ImmutableArray<LonLat> Of(ImmutableArray<LonLat> path, double halfWidthMetres)
    {
        var unit = path.Select(Unit).ToArray();
        var tolerance = Math.Max(LeastToleranceMetres, TolerancePerHalfWidth * halfWidthMetres) / EarthRadiusMetres;
        while (true)
        {
            var kept = Keep(unit, tolerance);
            if (kept.Count <= MaxCount)
            {
                return [.. kept.Select(index => path[index])];
            }

            tolerance *= 2;
        }
    }

    /// <summary>Douglas and Peucker's thinning (1973) with distances from the great circle, without recursion.</summary>
    private static SortedSet<int> Keep(Vector[] path, double tolerance)
    {
        var kept = new SortedSet<int> { 0, path.Length - 1 };
        var open = new Stack<(int From, int To)>([(0, path.Length - 1)]);
        while (open.TryPop(out var span))
        {
            var (farthest, distance) = (-1, tolerance);
            for (var i = span.From + 1; i < span.To; i++)
            {
                var off = DistanceFromArc(path[i], path[span.From], path[span.To]);
                if (off > distance)
                {
                    (farthest, distance) = (i, off);
                }
            }

            if (farthest > 0)
            {
                kept.Add(farthest);
                open.Push((span.From, farthest));
                open.Push((farthest, span.To));
            }
        }

        return kept;
    }

    private static Vector Unit(LonLat position)
    {
        var (sinLat, cosLat) = Math.SinCos(position.Lat * Math.PI / 180);
        var (sinLon, cosLon) = Math.SinCos(position.Lon * Math.PI / 180);
        return new Vector(cosLat * cosLon, cosLat * sinLon, sinLat);
    }

    /// <summary>Distance of p from the shorter arc from a to b, radians (as a chord or sine, which at these distances is the same).</summary>
    private static double DistanceFromArc(Vector p, Vector a, Vector b)
    {
        var pole = a.Cross(b);
        var length = pole.Length;
        var isBeside = length > 0 && pole.Cross(a).Dot(p) >= 0 && b.Cross(pole).Dot(p) >= 0;
        return isBeside ? Math.Abs(pole.Dot(p)) / length : Math.Min(p.Minus(a).Length, p.Minus(b).Length);
    }

    private readonly record struct Vector(double X, double Y, double Z)
    {
        public double Length => Math.Sqrt(Dot(this));

        public double Dot(Vector other) => (X * other.X) + (Y * other.Y) + (Z * other.Z);

        public Vector Minus(Vector other) => new(X - other.X, Y - other.Y, Z - other.Z);

        public Vector Cross(Vector other) =>
            new((Y * other.Z) - (Z * other.Y), (Z * other.X) - (X * other.Z), (X * other.Y) - (Y * other.X));
    }
}
