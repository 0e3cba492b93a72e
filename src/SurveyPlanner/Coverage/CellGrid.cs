namespace SurveyPlanner.Coverage;

/// <summary>
/// The places at which coverage is looked at, in rows along x of the turned frame: one place stands for each cell.
/// Flat arrays, so that a strip becomes a run of places on each row it meets.
/// </summary>
internal sealed class CellGrid
{
    private readonly int[] _firstRowOfSlot;
    private readonly double _slotsPerMetre;

    public CellGrid(double sizeMetres, double[] rowY, int[] rowStarts, double[] x, double[] areas, (double X, double Y)[] squareCentres)
    {
        SizeMetres = sizeMetres;
        RowY = rowY;
        RowStarts = rowStarts;
        X = x;
        Areas = areas;
        SquareCentres = squareCentres;
        var slots = Math.Max(1, rowY.Length);
        var extent = rowY.Length == 0 ? 0 : rowY[^1] - rowY[0];
        _slotsPerMetre = extent > 0 ? slots / extent : 0;
        _firstRowOfSlot = new int[slots + 1];
        for (int slot = 0, row = 0; slot <= slots; slot++)
        {
            while (row < rowY.Length && Slot(rowY[row]) < slot)
            {
                row++;
            }

            _firstRowOfSlot[slot] = row;
        }
    }

    /// <summary>Side of an uncut cell, metres.</summary>
    public double SizeMetres { get; }

    /// <summary>y of each row, ascending.</summary>
    public double[] RowY { get; }

    /// <summary>Index of the first place of each row, and the number of places as last entry.</summary>
    public int[] RowStarts { get; }

    /// <summary>x of each place, ascending within its row.</summary>
    public double[] X { get; }

    /// <summary>Area of each cell inside the stratum, square metres.</summary>
    public double[] Areas { get; }

    /// <summary>Centre of each cell's uncut square, in the turned frame.</summary>
    public (double X, double Y)[] SquareCentres { get; }

    public int Count => X.Length;

    /// <summary>Index of the first row at or above y.</summary>
    public int FirstRowFrom(double y)
    {
        if (RowY.Length == 0 || y <= RowY[0])
        {
            return 0;
        }

        if (y > RowY[^1])
        {
            return RowY.Length;
        }

        var row = _firstRowOfSlot[Slot(y)];
        while (RowY[row] < y)
        {
            row++;
        }

        return row;
    }

    /// <summary>The places of a row with x from <paramref name="low"/> to <paramref name="high"/>: first index and end.</summary>
    public (int First, int End) Run(int row, double low, double high)
    {
        var (start, end) = (RowStarts[row], RowStarts[row + 1]);
        return (LowerBound(start, end, low), UpperBound(start, end, high));
    }

    private int Slot(double y) => Math.Min((int)((y - RowY[0]) * _slotsPerMetre), _firstRowOfSlot.Length - 2);

    private int LowerBound(int low, int high, double value)
    {
        while (low < high)
        {
            var middle = (int)((uint)(low + high) >> 1);
            (low, high) = X[middle] < value ? (middle + 1, high) : (low, middle);
        }

        return low;
    }

    private int UpperBound(int low, int high, double value)
    {
        while (low < high)
        {
            var middle = (int)((uint)(low + high) >> 1);
            (low, high) = X[middle] <= value ? (middle + 1, high) : (low, middle);
        }

        return low;
    }
}
