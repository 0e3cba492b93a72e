using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// What one piece covers: the rectangle of the half-width to either side of a line, square at its ends, or the disk round a point.
/// </summary>
internal readonly ref struct Strip
{
    private readonly double _middleX;
    private readonly double _middleY;
    private readonly double _squaredRadius;

    // A rectangle is where two pairs of parallel sides overlap. On the horizontal line through its middle each pair leaves a stretch, which shifts
    // by so much for a metre of y.
    private readonly double _shiftAlong;
    private readonly double _lowAlong;
    private readonly double _highAlong;
    private readonly double _shiftAcross;
    private readonly double _lowAcross;
    private readonly double _highAcross;

    public Strip(in Piece piece, double halfWidthMetres)
    {
        (_middleX, _middleY) = ((piece.FromX + piece.ToX) / 2, (piece.FromY + piece.ToY) / 2);
        IsDisk = piece.FromX == piece.ToX && piece.FromY == piece.ToY;
        var reach = halfWidthMetres;
        if (IsDisk)
        {
            _squaredRadius = halfWidthMetres * halfWidthMetres;
        }
        else
        {
            var (dx, dy, length) = (piece.ToX - piece.FromX, piece.ToY - piece.FromY, piece.Length);
            (_shiftAlong, var half) = Stretch(dx, dy, length * length / 2);
            (_lowAlong, _highAlong) = (_middleX - half, _middleX + half);
            (_shiftAcross, half) = Stretch(-dy, dx, halfWidthMetres * length);
            (_lowAcross, _highAcross) = (_middleX - half, _middleX + half);
            reach = (Math.Abs(dy) / 2) + (Math.Abs(dx) * halfWidthMetres / length);
        }

        (LowY, HighY) = (_middleY - reach, _middleY + reach);
    }

    public double LowY { get; }

    public double HighY { get; }

    private bool IsDisk { get; }

    /// <summary>The stretch of the horizontal line at y, between <see cref="LowY"/> and <see cref="HighY"/>, that is covered.</summary>
    public void RangeAt(double y, out double low, out double high)
    {
        var dy = y - _middleY;
        if (IsDisk)
        {
            var half = Math.Sqrt(Math.Max(0, _squaredRadius - (dy * dy)));
            (low, high) = (_middleX - half, _middleX + half);
            return;
        }

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
