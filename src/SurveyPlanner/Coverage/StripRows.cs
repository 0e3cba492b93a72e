using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>From where to where a strip covers a row.</summary>
internal struct Stretch
{
    public int Row;
    public double Low;
    public double High;
}

/// <summary>
/// What the strips of one draw cover of the rows that they meet: a strip is a rectangle of the half-width to either side of a piece, square at its
/// ends, or the disk of the half-width round a point. Reused from draw to draw, so that simulation allocates nothing. For one thread.
/// </summary>
/// <remarks>
/// Step by step for all rectangles rather than rectangle by rectangle: a processor looks ahead only where it knows how often it has to go round, and
/// how many rows a rectangle meets it knows at the end of a long reckoning.
/// </remarks>
internal sealed class StripRows(CellGrid grid, double halfWidthMetres)
{
    private Rectangle[] _rectangles = [];
    private int[] _firstRows = [];
    private int[] _endRows = [];
    private Stretch[] _stretches = new Stretch[256];
    private int _count;

    // The rows met last, and between which y: pieces of one line, or points of one row, meet the same.
    private double _lowY = double.NaN;
    private double _highY = double.NaN;
    private int _firstRow;
    private int _endRow;

    /// <summary>The stretches, strip by strip; only of rows that may have places there.</summary>
    public ReadOnlySpan<Stretch> Of(ReadOnlySpan<Piece> pieces)
    {
        if (_rectangles.Length < pieces.Length)
        {
            _rectangles = new Rectangle[2 * pieces.Length];
            (_firstRows, _endRows) = (new int[2 * pieces.Length], new int[2 * pieces.Length]);
        }

        (_count, var rectangles) = (0, 0);
        foreach (ref readonly var piece in pieces)
        {
            if (piece.IsPoint)
            {
                CoverDisk(piece.FromX, piece.FromY);
            }
            else
            {
                _rectangles[rectangles++].Set(piece, halfWidthMetres);
            }
        }

        CoverRectangles(_rectangles.AsSpan(0, rectangles));
        return _stretches.AsSpan(0, _count);
    }

    private void CoverDisk(double x, double y)
    {
        FindRows(y - halfWidthMetres, y + halfWidthMetres);
        MakeRoom(_endRow - _firstRow);
        for (var row = _firstRow; row < _endRow; row++)
        {
            var dy = grid.RowY[row] - y;
            var half = Math.Sqrt(double.MaxNative((halfWidthMetres * halfWidthMetres) - (dy * dy), 0));
            if (grid.MayHold(row, x - half, x + half))
            {
                _stretches[_count++] = new Stretch { Row = row, Low = x - half, High = x + half };
            }
        }
    }

    private void CoverRectangles(ReadOnlySpan<Rectangle> rectangles)
    {
        var (firstRows, endRows, most) = (_firstRows, _endRows, 0);
        for (var i = 0; i < rectangles.Length; i++)
        {
            FindRows(rectangles[i].LowY, rectangles[i].HighY);
            (firstRows[i], endRows[i]) = (_firstRow, _endRow);
            most += _endRow - _firstRow;
        }

        MakeRoom(most);
        var (rowY, stretches, count) = (grid.RowY, _stretches, _count);
        for (var i = 0; i < rectangles.Length; i++)
        {
            ref readonly var rectangle = ref rectangles[i];
            var end = endRows[i];
            for (var row = firstRows[i]; row < end; row++)
            {
                // Written first and then kept or not, without a branch that nothing foretells.
                rectangle.RangeAt(rowY[row], out var low, out var high);
                stretches[count] = new Stretch { Row = row, Low = low, High = high };
                count += grid.MayHold(row, low, high) ? 1 : 0;
            }
        }

        _count = count;
    }

    private void FindRows(double lowY, double highY)
    {
        if (lowY != _lowY || highY != _highY)
        {
            (_lowY, _highY) = (lowY, highY);
            (_firstRow, _endRow) = grid.RowsWithin(lowY, highY);
        }
    }

    /// <summary>Room for so many stretches more, and one that is written but not kept.</summary>
    private void MakeRoom(int count)
    {
        if (_count + count >= _stretches.Length)
        {
            Array.Resize(ref _stretches, 2 * (_count + count));
        }
    }

    private struct Rectangle
    {
        // A rectangle is where two pairs of parallel sides overlap. On the horizontal line through its middle each pair leaves a stretch, which
        // shifts by so much for a metre of y.
        private double _middleY;
        private double _shiftAlong;
        private double _lowAlong;
        private double _highAlong;
        private double _shiftAcross;
        private double _lowAcross;
        private double _highAcross;

        public double LowY { get; private set; }

        public double HighY { get; private set; }

        /// <summary>Set in its place: a copy would wait until what it copies is written.</summary>
        public void Set(in Piece piece, double halfWidthMetres)
        {
            var middleX = (piece.FromX + piece.ToX) / 2;
            _middleY = (piece.FromY + piece.ToY) / 2;
            var (dx, dy, length) = (piece.ToX - piece.FromX, piece.ToY - piece.FromY, piece.Length);
            (_shiftAlong, var half) = Stretch(dx, dy, length * length / 2);
            (_lowAlong, _highAlong) = (middleX - half, middleX + half);
            (_shiftAcross, half) = Stretch(-dy, dx, halfWidthMetres * length);
            (_lowAcross, _highAcross) = (middleX - half, middleX + half);
            var reach = (Math.Abs(dy) / 2) + (Math.Abs(dx) * halfWidthMetres / length);
            (LowY, HighY) = (_middleY - reach, _middleY + reach);
        }

        /// <summary>The stretch of the horizontal line at y, between <see cref="LowY"/> and <see cref="HighY"/>, that is covered.</summary>
        public readonly void RangeAt(double y, out double low, out double high)
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
}
