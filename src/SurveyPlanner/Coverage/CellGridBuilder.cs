using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Lays square cells over a shape in the turned frame, cuts them at its boundary and finds a place inside each to stand for it:
/// the centre where that is inside, else the middle of the widest stretch inside on the cell's middle line, else on a line further up or down.
/// A sliver that none of fifteen lines meets is joined to the cell before it, so that no area is lost.
/// Accuracy: areas of cells add up to the area of the shape to 1e-9.
/// </summary>
internal sealed class CellGridBuilder
{
    // Middle line first, then ever finer: a cell's place lies on the first of these that meets its inside. In ascending order below.
    private static readonly double[] LineShares = [0.5, 0.25, 0.75, 0.125, 0.375, 0.625, 0.875, .0625, .1875, .3125, .4375, .5625, .6875, .8125, .9375];

    private readonly FrameShape _shape;
    private readonly double _size;
    private readonly int _columns;
    private readonly double _originX;
    private readonly double _originY;

    private readonly double[] _areas;
    private readonly double[] _heights;
    private readonly double[] _placeX;
    private readonly int[] _placeLine;

    private readonly List<double> _rowY = [];
    private readonly List<int> _rowStarts = [];

    // Grown by a little where the first estimate of their number falls short: memory for a million cells is counted.
    private double[] _x;
    private double[] _cellAreas;
    private int[] _cellColumns;
    private int _count;

    // The columns that edges of the current row touch: beyond them it holds nothing.
    private int _lowColumn = int.MaxValue;
    private int _highColumn = -1;
    private double[] _crossings = new double[64];
    private double _pendingArea;

    private CellGridBuilder(FrameShape shape, double size)
    {
        _shape = shape;
        _size = size;

        // Whole cells centred on the shape, so that opposite edges are treated alike. A billionth of a cell too wide is rounding.
        _columns = (int)Math.Max(1, Math.Ceiling(((shape.MaxX - shape.MinX) / size) - 1e-9));
        Rows = (int)Math.Max(1, Math.Ceiling(((shape.MaxY - shape.MinY) / size) - 1e-9));
        _originX = ((shape.MinX + shape.MaxX) / 2) - (_columns * size / 2);
        _originY = ((shape.MinY + shape.MaxY) / 2) - (Rows * size / 2);
        _areas = new double[_columns + 1];
        _heights = new double[_columns + 1];
        _placeX = new double[_columns];
        _placeLine = new int[_columns];
        var estimate = (int)(1.05 * shape.AreaSquareMetres / (size * size)) + 64;
        (_x, _cellAreas, _cellColumns) = (new double[estimate], new double[estimate], new int[estimate]);
    }

    private int Rows { get; }

    /// <summary>Cells of the given side over a shape.</summary>
    public static CellGrid Build(FrameShape shape, double sizeMetres, CancellationToken stop = default)
    {
        var builder = new CellGridBuilder(shape, sizeMetres);
        for (var row = 0; row < builder.Rows; row++)
        {
            stop.ThrowIfCancellationRequested();
            builder.AddRow(row);
        }

        return builder.Finish();
    }

    private void AddRow(int row)
    {
        var bottom = _originY + (row * _size);
        MeasureAreas(bottom);
        if (_lowColumn <= _highColumn)
        {
            FindPlaces(bottom);
            Emit(bottom);
        }
    }

    /// <summary>
    /// Exact area of each cell of one row, by Green's theorem: going up an edge with the inside to its left adds, for every height, all that lies
    /// to its left in the row; going down takes it away again.
    /// </summary>
    private void MeasureAreas(double bottom)
    {
        if (_lowColumn <= _highColumn)
        {
            // Only what the row before touched: a row may be wide and nearly empty.
            Array.Clear(_areas, _lowColumn, _highColumn - _lowColumn + 1);
            Array.Clear(_heights, _lowColumn, _highColumn - _lowColumn + 1);
        }

        (_lowColumn, _highColumn) = (int.MaxValue, -1);
        var top = bottom + _size;
        foreach (ref readonly var edge in _shape.EdgesBetween(bottom, top))
        {
            var (lowY, highY) = (Math.Max(edge.LowY, bottom), Math.Min(edge.HighY, top));
            if (highY > lowY)
            {
                AddEdge(edge.XAt(lowY), lowY, edge.XAt(highY), highY, edge.InsideLeft ? 1 : -1);
            }
        }

        // An edge's height counts in full for every cell to its left.
        var height = 0.0;
        for (var column = _highColumn; column >= _lowColumn; column--)
        {
            _areas[column] += height * _size;
            height += _heights[column];
        }
    }

    private void AddEdge(double lowX, double lowY, double highX, double highY, int sign)
    {
        var slope = (highY - lowY) / (highX - lowX);
        var (x, y) = (lowX, lowY);
        var column = Column(lowX);
        var lastColumn = Column(highX);
        var step = lastColumn >= column ? 1 : -1;
        for (; ; column += step)
        {
            var (nextX, nextY) = (highX, highY);
            if (column != lastColumn)
            {
                nextX = _originX + ((column + (step > 0 ? 1 : 0)) * _size);
                nextY = Math.Clamp(lowY + ((nextX - lowX) * slope), y, highY);
            }

            var height = sign * (nextY - y);
            _areas[column] += height * (((x + nextX) / 2) - (_originX + (column * _size)));
            _heights[column] += height;
            (_lowColumn, _highColumn) = (Math.Min(_lowColumn, column), Math.Max(_highColumn, column));
            (x, y) = (nextX, nextY);
            if (column == lastColumn)
            {
                return;
            }
        }
    }

    private int Column(double x) => Math.Clamp((int)((x - _originX) / _size), 0, _columns - 1);

    private void FindPlaces(double bottom)
    {
        Array.Fill(_placeLine, -1, _lowColumn, _highColumn - _lowColumn + 1);
        for (var line = 0; line < LineShares.Length; line++)
        {
            var missing = false;
            for (var column = _lowColumn; column <= _highColumn && !missing; column++)
            {
                missing = _placeLine[column] < 0 && _areas[column] > NoArea;
            }

            if (!missing)
            {
                return;
            }

            FindPlacesOn(line, bottom + (LineShares[line] * _size));
        }
    }

    // Rounding leaves a few square micrometres in cells that an edge only touches.
    private double NoArea => 1e-9 * _size * _size;

    private void FindPlacesOn(int line, double y)
    {
        var pairs = _shape.CrossingsAt(y, ref _crossings) / 2;
        var widest = -1.0;
        var widestColumn = -1;
        for (var pair = 0; pair < pairs; pair++)
        {
            var (low, high) = (_crossings[2 * pair], _crossings[(2 * pair) + 1]);
            for (var column = Math.Max(Column(low), _lowColumn); column <= Math.Min(Column(high), _highColumn); column++)
            {
                if ((_placeLine[column] >= 0 && _placeLine[column] != line) || _areas[column] <= NoArea)
                {
                    continue;
                }

                var centre = _originX + ((column + 0.5) * _size);
                var (from, to) = (Math.Max(low, centre - (_size / 2)), Math.Min(high, centre + (_size / 2)));

                // On the boundary itself a place is neither in nor out: stay a millionth of a cell away from it.
                var holdsCentre = from < centre - (1e-6 * _size) && to > centre + (1e-6 * _size);
                var width = holdsCentre ? double.PositiveInfinity : to - from;
                if (widestColumn != column)
                {
                    (widest, widestColumn) = (0, column);
                }

                if (width > widest)
                {
                    widest = width;
                    _placeX[column] = holdsCentre ? centre : (from + to) / 2;
                    _placeLine[column] = line;
                }
            }
        }
    }

    private void Emit(double bottom)
    {
        foreach (var line in LinesAscending)
        {
            var started = false;
            for (var column = _lowColumn; column <= _highColumn; column++)
            {
                if (_placeLine[column] != line)
                {
                    continue;
                }

                if (!started)
                {
                    _rowY.Add(bottom + (LineShares[line] * _size));
                    _rowStarts.Add(_count);
                    started = true;
                }

                Add(column);
            }
        }

        for (var column = _lowColumn; column <= _highColumn; column++)
        {
            _pendingArea += _placeLine[column] < 0 ? _areas[column] : 0;
        }

        if (_count > 0)
        {
            _cellAreas[_count - 1] += _pendingArea;
            _pendingArea = 0;
        }
    }

    private void Add(int column)
    {
        if (_count == _x.Length)
        {
            Resize(_count + (_count / 8) + 64);
        }

        (_x[_count], _cellAreas[_count], _cellColumns[_count]) = (_placeX[column], _areas[column], column);
        _count++;
    }

    private static readonly int[] LinesAscending = [.. Enumerable.Range(0, LineShares.Length).OrderBy(line => LineShares[line])];

    private void Resize(int length)
    {
        Array.Resize(ref _x, length);
        Array.Resize(ref _cellAreas, length);
        Array.Resize(ref _cellColumns, length);
    }

    private CellGrid Finish()
    {
        _rowStarts.Add(_count);
        Resize(_count);
        return new CellGrid([.. _rowY], [.. _rowStarts], _x, new GridCells(_size, _originX, _originY, _cellAreas, _cellColumns));
    }
}
