using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>Left and right side of the convex hull of where transects may lie, as functions of y in the turned frame.</summary>
internal sealed class HullSides
{
    private readonly (double X, double Y)[] _left;
    private readonly (double X, double Y)[] _right;

    public HullSides(StratumFrame stratum)
    {
        var hull = PlaneGeometry.ConvexHull(stratum.ClipShape).Select(point => stratum.Frame.ToFrame(point.X, point.Y)).ToArray();
        MinY = hull.Min(point => point.Y);
        MaxY = hull.Max(point => point.Y);

        // Anticlockwise from the lowest vertex the right side goes up to the highest and the left side comes down again.
        var lowest = IndexOf(hull, (a, b) => a.Y < b.Y || (a.Y == b.Y && a.X > b.X));
        var highest = IndexOf(hull, (a, b) => a.Y > b.Y || (a.Y == b.Y && a.X > b.X));
        _right = [.. Walk(hull, lowest, highest)];
        var lowestLeft = IndexOf(hull, (a, b) => a.Y < b.Y || (a.Y == b.Y && a.X < b.X));
        var highestLeft = IndexOf(hull, (a, b) => a.Y > b.Y || (a.Y == b.Y && a.X < b.X));
        _left = [.. Walk(hull, highestLeft, lowestLeft).Reverse()];
    }

    private HullSides(HullSides hull, (double X, double Y)[] left, (double X, double Y)[] right)
        => (MinY, MaxY, _left, _right) = (hull.MinY, hull.MaxY, left, right);

    public double MinY { get; }

    public double MaxY { get; }

    /// <summary>Mean distance between the sides, metres.</summary>
    public double MeanWidth => Sections().Sum(section => section.AreaSquareMetres) / (MaxY - MinY);

    /// <summary>x of the left side; beyond the ends that of the end.</summary>
    public double Left(double y)
    {
        var from = 0;
        return Left(y, ref from);
    }

    /// <summary>The same, for heights that ascend from call to call: looked for from a vertex on, at first 0, which moves along.</summary>
    public double Left(double y, ref int from) => At(_left, Within(y), ref from);

    /// <summary>x of the right side; beyond the ends that of the end.</summary>
    public double Right(double y)
    {
        var from = 0;
        return Right(y, ref from);
    }

    /// <summary>See <see cref="Left(double, ref int)"/>.</summary>
    public double Right(double y, ref int from) => At(_right, Within(y), ref from);

    /// <summary>
    /// The same, but a side ends where it becomes flatter than a leg of a zigzag that turns at such steps along the axis, and goes on straight along
    /// the axis from there: what is flatter closes the band, and is no side to turn at. (The ends of a box between parallels and meridians are never
    /// quite at right angles to its axis.)
    /// </summary>
    public HullSides WithoutFlatEnds(double spacingMetres)
        => new(this, SteepPart(_left, spacingMetres), SteepPart(_right, spacingMetres));

    /// <summary>The hull in sections with straight sides, from its lower to its upper end.</summary>
    public ImmutableArray<ZigzagSection> Sections()
    {
        var sections = new List<ZigzagSection>();
        var low = Within(MinY);
        foreach (var high in _left.Concat(_right).Select(vertex => Within(vertex.Y)).Order())
        {
            // Sections lower than the margin would have sides that lean by rounding alone.
            if (high - low > Margin)
            {
                var (left, right) = (Left(low), Right(low));
                var height = high - low;
                sections.Add(new ZigzagSection(low, high, low, left, (Left(high) - left) / height, right, (Right(high) - right) / height));
                low = high;
            }
        }

        sections[0] = sections[0] with { LowY = MinY };
        sections[^1] = sections[^1] with { HighY = MaxY };
        return [.. sections];
    }

    private double Margin => 1e-6 * (MaxY - MinY);

    /// <summary>
    /// A millionth inside the ends: an end that is flat but for rounding keeps both its corners, and turning the region changes nothing.
    /// </summary>
    private double Within(double y) => Math.Clamp(y, MinY + Margin, MaxY - Margin);

    private (double X, double Y)[] SteepPart((double X, double Y)[] chain, double spacingMetres)
    {
        // A leg crosses the hull while it advances by the spacing.
        double Width(double y) => Right(y) - Left(y);
        bool IsFlat((double X, double Y) end, (double X, double Y) inner)
            => Math.Abs(inner.X - end.X) * spacingMetres > Math.Abs(inner.Y - end.Y) * Math.Max(Width(inner.Y), Width(end.Y));
        var (first, last) = (0, chain.Length - 1);
        while (first < last && IsFlat(chain[first], chain[first + 1]))
        {
            first++;
        }

        while (first < last && IsFlat(chain[last], chain[last - 1]))
        {
            last--;
        }

        return chain[first..(last + 1)];
    }

    private static double At((double X, double Y)[] chain, double y, ref int from)
    {
        if (y <= chain[0].Y)
        {
            return chain[0].X;
        }

        if (y >= chain[^1].Y)
        {
            return chain[^1].X;
        }

        while (chain[from + 1].Y <= y)
        {
            from++;
        }

        var (low, high) = (chain[from], chain[from + 1]);
        return low.X + ((y - low.Y) * (high.X - low.X) / (high.Y - low.Y));
    }

    private static int IndexOf((double X, double Y)[] hull, Func<(double X, double Y), (double X, double Y), bool> better)
    {
        var best = 0;
        for (var i = 1; i < hull.Length; i++)
        {
            best = better(hull[i], hull[best]) ? i : best;
        }

        return best;
    }

    private static IEnumerable<(double X, double Y)> Walk((double X, double Y)[] hull, int from, int to)
    {
        for (var i = from; ; i = (i + 1) % hull.Length)
        {
            yield return hull[i];
            if (i == to)
            {
                yield break;
            }
        }
    }
}
