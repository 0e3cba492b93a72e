namespace SurveyPlanner.Coverage;

/// <summary>
/// The places at which coverage is looked at, in rows along x of the turned frame: a place for each cell, or any places at all.
/// Flat arrays, so that a strip becomes a run of places on each row it meets. Safe to share between threads.
/// </summary>
internal sealed class CellGrid
{
    private readonly SlotTable _rows;
    private readonly Slot[] _rowSlots;
    private readonly SlotTable[] _rowPlaces;
    private readonly Slot[] _placeSlots;

    /// <param name="rowY">y of each row, ascending.</param>
    /// <param name="rowStarts">Index of the first place of each row, and the number of places as last entry.</param>
    /// <param name="x">x of each place, ascending within its row.</param>
    /// <param name="cells">The cells that the places stand for; null where they stand for none.</param>
    public CellGrid(double[] rowY, int[] rowStarts, double[] x, GridCells? cells)
    {
        RowY = rowY;
        RowStarts = rowStarts;
        X = x;
        Cells = cells;
        // Rows of places lie at sixteenths of a cell.
        _rows = SlotTable.Of(rowY, [0, rowY.Length], (cells?.SizeMetres ?? 0) / 16, out _rowSlots)[0];
        _rowPlaces = SlotTable.Of(x, rowStarts, cells?.SizeMetres ?? 0, out _placeSlots);
    }

    /// <summary>The cells that the places stand for, with the same index; null where they stand for none.</summary>
    public GridCells? Cells { get; }

    /// <summary>y of each row, ascending.</summary>
    public double[] RowY { get; }

    /// <summary>Index of the first place of each row, and the number of places as last entry.</summary>
    public int[] RowStarts { get; }

    /// <summary>x of each place, ascending within its row.</summary>
    public double[] X { get; }

    public int Count => X.Length;

    /// <summary>Any places, in the turned frame, that stand for no cells.</summary>
    /// <param name="places">The places, in any order.</param>
    /// <param name="order">Takes the order they went in: place <c>order[i]</c> has index i in the grid.</param>
    public static CellGrid OfPlaces(ReadOnlySpan<(double X, double Y)> places, out int[] order)
    {
        var sorted = new (double Y, double X, int Place)[places.Length];
        for (var i = 0; i < sorted.Length; i++)
        {
            sorted[i] = (places[i].Y, places[i].X, i);
        }

        Array.Sort(sorted);
        order = Array.ConvertAll(sorted, entry => entry.Place);
        var (rowY, rowStarts) = (new List<double>(), new List<int>());
        for (var i = 0; i < sorted.Length; i++)
        {
            if (i == 0 || sorted[i].Y != sorted[i - 1].Y)
            {
                rowY.Add(sorted[i].Y);
                rowStarts.Add(i);
            }
        }

        rowStarts.Add(sorted.Length);
        return new CellGrid([.. rowY], [.. rowStarts], Array.ConvertAll(sorted, entry => entry.X), cells: null);
    }

    /// <summary>The row of a place; the number of rows for the number of places.</summary>
    public int RowOf(int place)
    {
        var row = Array.BinarySearch(RowStarts, place);
        return row >= 0 ? row : ~row - 1;
    }

    /// <summary>The rows from one y to another: first index and end, the same where there are none.</summary>
    public (int First, int End) RowsWithin(double lowY, double highY)
        => (_rows.FirstFrom(_rowSlots, RowY, lowY), _rows.FirstBeyond(_rowSlots, RowY, highY));

    /// <summary>Whether a row has places on either side of some x or between them. Most rows at a coast hold a place or two, which most ranges miss.</summary>
    /// <remarks>Both are asked, without a branch between them: which of them fails nothing foretells.</remarks>
    public bool MayHold(int row, double low, double high) => low <= _rowPlaces[row].Last & high >= _rowPlaces[row].First;

    /// <summary>The places of a row with x from <paramref name="low"/> to <paramref name="high"/>: first index and end, not after it where there are none.</summary>
    public (int First, int End) Run(int row, double low, double high)
    {
        ref readonly var places = ref _rowPlaces[row];
        return (places.FirstFrom(_placeSlots, X, low), places.FirstBeyond(_placeSlots, X, high));
    }
}

/// <summary>Square cells in columns and rows of the turned frame, cut at a stratum's boundary.</summary>
/// <param name="SizeMetres">Side of an uncut cell, metres.</param>
/// <param name="OriginX">x of the left side of column 0.</param>
/// <param name="OriginY">y of the lower side of row 0.</param>
/// <param name="Areas">Area of each cell inside the stratum, square metres.</param>
/// <param name="Columns">Column of each cell.</param>
internal sealed record GridCells(double SizeMetres, double OriginX, double OriginY, double[] Areas, int[] Columns)
{
    /// <summary>x of the middle of a column.</summary>
    public double ColumnX(int column) => OriginX + ((column + 0.5) * SizeMetres);

    /// <summary>Middle of the row of cells that a height lies in.</summary>
    public double RowMiddle(double y) => OriginY + ((Math.Floor((y - OriginY) / SizeMetres) + 0.5) * SizeMetres);
}
