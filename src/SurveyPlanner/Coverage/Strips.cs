using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>What a piece covers, as the stretch that it leaves on horizontal lines.</summary>
internal interface IStrip
{
    /// <summary>The lowest y covered.</summary>
    public double LowY { get; }

    /// <summary>The highest y covered.</summary>
    public double HighY { get; }

    /// <summary>The stretch of the horizontal line at y, between <see cref="LowY"/> and <see cref="HighY"/>, that is covered.</summary>
    public void RangeAt(double y, out double low, out double high);
}

/// <summary>The rectangle of the half-width to either side of a piece of line, square at its ends.</summary>
internal readonly struct RectangleStrip : IStrip
{
    // A rectangle is where two pairs of parallel sides overlap. On the horizontal line through its middle each pair leaves a stretch, which shifts
    // by so much for a metre of y.
    private readonly double _middleY;
    private readonly double _shiftAlong;
    private readonly double _lowAlong;
    private readonly double _highAlong;
    private readonly double _shiftAcross;
    private readonly double _lowAcross;
    private readonly double _highAcross;

    public RectangleStrip(in Piece piece, double halfWidthMetres)
    {
        (var middleX, _middleY) = ((piece.FromX + piece.ToX) / 2, (piece.FromY + piece.ToY) / 2);
        var (dx, dy, length) = (piece.ToX - piece.FromX, piece.ToY - piece.FromY, piece.Length);
        (_shiftAlong, var half) = Stretch(dx, dy, length * length / 2);
        (_lowAlong, _highAlong) = (middleX - half, middleX + half);
        (_shiftAcross, half) = Stretch(-dy, dx, halfWidthMetres * length);
        (_lowAcross, _highAcross) = (middleX - half, middleX + half);
        var reach = (Math.Abs(dy) / 2) + (Math.Abs(dx) * halfWidthMetres / length);
        (LowY, HighY) = (_middleY - reach, _middleY + reach);
    }

    public double LowY { get; }

    public double HighY { get; }

    public void RangeAt(double y, out double low, out double high)
    {
        var dy = y - _middleY;
        var (along, across) = (_shiftAlong * dy, _shiftAcross * dy);
        low = double.MaxNative(_lowAlong + along, _lowAcross + across);
        high = double.MinNative(_highAlong + along, _highAcross + across);
    }

    /// <summary>|x · slopeX + y · slopeY| is at most the limit: on a line of constant y a stretch of x, endless where x does not matter.</summary>
    private static (double ShiftPerMetre, double HalfLength) Stretch(double slopeX, double slopeY, double limit)
    {
        var inverse = 1 / slopeX;
        return slopeX == 0 ? (0, double.PositiveInfinity) : (-slopeY * inverse, limit * Math.Abs(inverse));
    }
}

/// <summary>The disk of the half-width round a point.</summary>
internal readonly struct DiskStrip(in Piece point, double halfWidthMetres) : IStrip
{
    private readonly double _x = point.FromX;
    private readonly double _y = point.FromY;
    private readonly double _squaredRadius = halfWidthMetres * halfWidthMetres;

    public double LowY { get; } = point.FromY - halfWidthMetres;

    public double HighY { get; } = point.FromY + halfWidthMetres;

    public void RangeAt(double y, out double low, out double high)
    {
        var dy = y - _y;
        var half = Math.Sqrt(Math.Max(0, _squaredRadius - (dy * dy)));
        (low, high) = (_x - half, _x + half);
    }
}
