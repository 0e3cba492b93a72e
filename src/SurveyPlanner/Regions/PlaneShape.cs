using System.Collections.Immutable;

namespace SurveyPlanner.Regions;

/// <summary>
/// Polygons in the plane, metres, as flat arrays: what the layout and coverage loops read.
/// Rings are not closed (the last vertex joins the first); inside is where a ray crosses the edges an odd number of times,
/// so holes need no mark and winding does not matter.
/// </summary>
public sealed class PlaneShape
{
    /// <summary>No area at all.</summary>
    public static readonly PlaneShape Empty = new([], [], [0], [0]);

    /// <param name="x">East of all vertices, ring after ring, metres.</param>
    /// <param name="y">North of all vertices, metres.</param>
    /// <param name="ringStarts">Index of the first vertex of each ring, and the number of vertices as last entry.</param>
    /// <param name="partStarts">Index of the first ring (the shell; holes follow it) of each part, and the number of rings as last entry.</param>
    public PlaneShape(ImmutableArray<double> x, ImmutableArray<double> y, ImmutableArray<int> ringStarts, ImmutableArray<int> partStarts)
    {
        X = x;
        Y = y;
        RingStarts = ringStarts;
        PartStarts = partStarts;
        AreaSquareMetres = Area();
        if (x.Length > 0)
        {
            (MinX, MaxX, MinY, MaxY) = (x.Min(), x.Max(), y.Min(), y.Max());
        }
    }

    public ImmutableArray<double> X { get; }

    public ImmutableArray<double> Y { get; }

    public ImmutableArray<int> RingStarts { get; }

    public ImmutableArray<int> PartStarts { get; }

    public double AreaSquareMetres { get; }

    public double MinX { get; }

    public double MaxX { get; }

    public double MinY { get; }

    public double MaxY { get; }

    public int VertexCount => X.Length;

    public int RingCount => RingStarts.Length - 1;

    public int PartCount => PartStarts.Length - 1;

    public int HoleCount => RingCount - PartCount;

    public bool IsEmpty => X.Length == 0;

    /// <summary>Diagonal of the bounding box, metres: the yardstick for tolerances.</summary>
    public double Diagonal => Math.Sqrt(((MaxX - MinX) * (MaxX - MinX)) + ((MaxY - MinY) * (MaxY - MinY)));

    private double Area()
    {
        var total = 0.0;
        for (var part = 0; part < PartCount; part++)
        {
            for (var ring = PartStarts[part]; ring < PartStarts[part + 1]; ring++)
            {
                var area = Math.Abs(SignedRingArea(ring));
                total += ring == PartStarts[part] ? area : -area;
            }
        }

        return total;
    }

    /// <summary>Length of one ring, metres.</summary>
    public double RingLength(int ring)
    {
        var (start, end) = (RingStarts[ring], RingStarts[ring + 1]);
        var total = 0.0;
        for (var i = start; i < end; i++)
        {
            var next = i + 1 == end ? start : i + 1;
            total += Math.Sqrt(((X[next] - X[i]) * (X[next] - X[i])) + ((Y[next] - Y[i]) * (Y[next] - Y[i])));
        }

        return total;
    }

    /// <summary>Area inside one ring, square metres, positive when it runs anticlockwise.</summary>
    public double SignedRingArea(int ring)
    {
        var (start, end) = (RingStarts[ring], RingStarts[ring + 1]);
        var (x0, y0) = (X[start], Y[start]);
        var twice = 0.0;
        for (var i = start + 1; i < end - 1; i++)
        {
            // Relative to the ring's first vertex: far from the origin nothing cancels.
            twice += ((X[i] - x0) * (Y[i + 1] - y0)) - ((X[i + 1] - x0) * (Y[i] - y0));
        }

        return twice / 2;
    }
}
