using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// What one piece covers: the rectangle of the half-width to either side of a line, square at its ends, or the disk round a point.
/// </summary>
internal readonly ref struct Strip
{
    private readonly double _middleX;
    private readonly double _middleY;
    private readonly double _alongX;
    private readonly double _alongY;
    private readonly double _halfLength;
    private readonly double _halfWidth;

    public Strip(in Piece piece, double halfWidthMetres)
    {
        (_middleX, _middleY) = ((piece.FromX + piece.ToX) / 2, (piece.FromY + piece.ToY) / 2);
        _halfWidth = halfWidthMetres;
        _halfLength = piece.Length / 2;
        double reach;
        if (_halfLength == 0)
        {
            reach = halfWidthMetres;
        }
        else
        {
            (_alongX, _alongY) = ((piece.ToX - piece.FromX) / (2 * _halfLength), (piece.ToY - piece.FromY) / (2 * _halfLength));
            reach = (Math.Abs(_alongY) * _halfLength) + (Math.Abs(_alongX) * halfWidthMetres);
        }

        (LowY, HighY) = (_middleY - reach, _middleY + reach);
    }

    public double LowY { get; }

    public double HighY { get; }

    /// <summary>The stretch of the horizontal line at y that is covered.</summary>
    public bool RangeAt(double y, out double low, out double high)
    {
        var dy = y - _middleY;
        if (_halfLength == 0)
        {
            var half = Math.Sqrt(Math.Max(0, (_halfWidth * _halfWidth) - (dy * dy)));
            (low, high) = (_middleX - half, _middleX + half);
            return true;
        }

        // |along the piece| <= half length and |across it| <= half-width, each a stretch of x.
        (low, high) = (double.NegativeInfinity, double.PositiveInfinity);
        Narrow(_alongX, dy * _alongY, _halfLength, ref low, ref high);
        Narrow(-_alongY, dy * _alongX, _halfWidth, ref low, ref high);
        (low, high) = (low + _middleX, high + _middleX);
        return low <= high;
    }

    /// <summary>Narrows to where |slope · x + constant| is at most the limit.</summary>
    private static void Narrow(double slope, double constant, double limit, ref double low, ref double high)
    {
        if (slope == 0)
        {
            if (Math.Abs(constant) > limit)
            {
                (low, high) = (1, 0);
            }

            return;
        }

        var (a, b) = ((-limit - constant) / slope, (limit - constant) / slope);
        low = Math.Max(low, Math.Min(a, b));
        high = Math.Min(high, Math.Max(a, b));
    }
}
