namespace SurveyPlanner.Layouts;

/// <summary>
/// The edges of a shape sorted into square tiles, and for each tile how many tiles away the nearest edge is: whoever looks for edges near a
/// place skips what is empty. Safe to share between threads.
/// </summary>
internal sealed class EdgeTiles
{
    // A rough coast runs through few of the tiles over it: four tiles for each edge leave about ten edges in those.
    private const int TilesPerEdge = 4;
    private const int MinTiles = 1 << 10;
    private const int MaxTiles = 1 << 22;

    // An edge belongs to every tile it comes within a millionth of a tile of: rounding cannot lose one at the border of two tiles.
    private const double Margin = 1e-6;

    private readonly FrameShape.Edge[] _edges;
    private readonly double _originX;
    private readonly double _originY;
    private readonly double _tilesPerMetre;
    private readonly int _columns;
    private readonly int _rows;
    private readonly int[] _starts;
    private readonly int[] _indices;
    private readonly ushort[] _tilesToEdge;

    public EdgeTiles(FrameShape shape, FrameShape.Edge[] edges)
    {
        _edges = edges;
        var (width, height) = (shape.MaxX - shape.MinX, shape.MaxY - shape.MinY);
        var tiles = Math.Clamp((long)edges.Length * TilesPerEdge, MinTiles, MaxTiles);
        TileMetres = Math.Max(Math.Sqrt(width * height / tiles), Math.Max(width, height) / tiles);
        _tilesPerMetre = 1 / TileMetres;
        _columns = (int)(width * _tilesPerMetre) + 1;
        _rows = (int)(height * _tilesPerMetre) + 1;
        (_originX, _originY) = (shape.MinX, shape.MinY);
        (_starts, _indices) = SortIntoTiles();
        _tilesToEdge = MeasureEmptiness();
    }

    /// <summary>Side of a tile, metres.</summary>
    public double TileMetres { get; }

    /// <summary>No edge is nearer to a place in the bounding box than this, metres; 0 where that is not known without a closer look.</summary>
    public double Clearance(double x, double y)
        => Math.Max(0, _tilesToEdge[(Row(y) * _columns) + Column(x)] - 1) * TileMetres;

    /// <summary>Distance from a place in the bounding box to the nearest edge, or the limit where none is nearer. Metres.</summary>
    public double Distance(double x, double y, double limit)
    {
        var (row, column) = (Row(y), Column(x));
        var nearest = limit * limit;

        // Squares of tiles round the place, growing: an edge in the n-th is at least n - 1 tiles away.
        for (var reach = (int)_tilesToEdge[(row * _columns) + column]; ; reach++)
        {
            var atLeast = Math.Max(0, reach - 1) * TileMetres;
            if (atLeast * atLeast >= nearest)
            {
                return Math.Sqrt(nearest);
            }

            for (var r = Math.Max(0, row - reach); r <= Math.Min(_rows - 1, row + reach); r++)
            {
                var step = reach == 0 || Math.Abs(r - row) == reach ? 1 : 2 * reach;
                for (var c = column - reach; c <= column + reach; c += step)
                {
                    nearest = c >= 0 && c < _columns ? Nearest((r * _columns) + c, x, y, nearest) : nearest;
                }
            }
        }
    }

    /// <summary>
    /// Numbers of the edges in the tiles that a box touches; an edge stands there once for every tile that it runs through.
    /// </summary>
    public BoxTiles In(double lowX, double highX, double lowY, double highY)
        => new(this, Column(lowX), Column(highX), Row(lowY), Row(highY));

    private double Nearest(int tile, double x, double y, double nearest)
    {
        for (var i = _starts[tile]; i < _starts[tile + 1]; i++)
        {
            nearest = Math.Min(nearest, SquaredDistance(_edges[_indices[i]], x, y));
        }

        return nearest;
    }

    private static double SquaredDistance(in FrameShape.Edge edge, double x, double y)
    {
        var (dx, dy) = (edge.HighX - edge.LowX, edge.HighY - edge.LowY);
        var (px, py) = (x - edge.LowX, y - edge.LowY);
        var squared = (dx * dx) + (dy * dy);
        var share = squared > 0 ? Math.Clamp(((px * dx) + (py * dy)) / squared, 0, 1) : 0;
        var (ax, ay) = (px - (share * dx), py - (share * dy));
        return (ax * ax) + (ay * ay);
    }

    private int Column(double x) => Math.Clamp((int)((x - _originX) * _tilesPerMetre), 0, _columns - 1);

    private int Row(double y) => Math.Clamp((int)((y - _originY) * _tilesPerMetre), 0, _rows - 1);

    private (int[] Starts, int[] Indices) SortIntoTiles()
    {
        // Counted first, then filled from the end of each tile to its start.
        var starts = new int[(_columns * _rows) + 1];
        foreach (ref readonly var edge in _edges.AsSpan())
        {
            var path = new TilePath(this, edge);
            for (var row = path.FirstRow; row <= path.LastRow; row++)
            {
                var (from, to) = path.ColumnsIn(row);
                for (var column = from; column <= to; column++)
                {
                    starts[(row * _columns) + column]++;
                }
            }
        }

        for (var tile = 1; tile < starts.Length; tile++)
        {
            starts[tile] += starts[tile - 1];
        }

        var indices = new int[starts[^1]];
        for (var i = _edges.Length - 1; i >= 0; i--)
        {
            var path = new TilePath(this, _edges[i]);
            for (var row = path.FirstRow; row <= path.LastRow; row++)
            {
                var (from, to) = path.ColumnsIn(row);
                for (var column = from; column <= to; column++)
                {
                    indices[--starts[(row * _columns) + column]] = i;
                }
            }
        }

        return (starts, indices);
    }

    /// <summary>
    /// For each tile, how many steps (to any of eight neighbours) away the nearest tile with an edge is: once down and up the rows, exact.
    /// </summary>
    private ushort[] MeasureEmptiness()
    {
        var steps = new ushort[_columns * _rows];
        for (var tile = 0; tile < steps.Length; tile++)
        {
            steps[tile] = _starts[tile] < _starts[tile + 1] ? (ushort)0 : ushort.MaxValue;
        }

        for (var row = 0; row < _rows; row++)
        {
            for (var column = 0; column < _columns; column++)
            {
                Lower(steps, row, column, -1);
            }
        }

        for (var row = _rows - 1; row >= 0; row--)
        {
            for (var column = _columns - 1; column >= 0; column--)
            {
                Lower(steps, row, column, 1);
            }
        }

        return steps;
    }

    /// <summary>Looks at the neighbour in the same row and the three in the row on one side.</summary>
    private void Lower(ushort[] steps, int row, int column, int side)
    {
        var tile = (row * _columns) + column;
        int least = steps[tile];
        if (column + side >= 0 && column + side < _columns)
        {
            least = Math.Min(least, steps[tile + side] + 1);
        }

        if (row + side >= 0 && row + side < _rows)
        {
            for (var c = Math.Max(0, column - 1); c <= Math.Min(_columns - 1, column + 1); c++)
            {
                least = Math.Min(least, steps[((row + side) * _columns) + c] + 1);
            }
        }

        steps[tile] = (ushort)least;
    }

    /// <summary>Walks the edges in a box of tiles, row by row; see <see cref="In"/>.</summary>
    public ref struct BoxTiles(EdgeTiles tiles, int firstColumn, int lastColumn, int firstRow, int lastRow)
    {
        private int _row = firstRow - 1;
        private int _next;
        private int _end;

        /// <summary>Number of the edge.</summary>
        public int Current { get; private set; }

        public readonly BoxTiles GetEnumerator() => this;

        public bool MoveNext()
        {
            // Tiles of a row stand one after the other, so a row of the box is one stretch of the list.
            while (_next == _end)
            {
                if (++_row > lastRow)
                {
                    return false;
                }

                _next = tiles._starts[(_row * tiles._columns) + firstColumn];
                _end = tiles._starts[(_row * tiles._columns) + lastColumn + 1];
            }

            Current = tiles._indices[_next++];
            return true;
        }
    }

    /// <summary>The tiles that an edge comes within the margin of.</summary>
    private readonly struct TilePath
    {
        private readonly EdgeTiles _tiles;
        private readonly FrameShape.Edge _edge;
        private readonly double _slope;
        private readonly double _margin;

        public TilePath(EdgeTiles tiles, in FrameShape.Edge edge)
        {
            (_tiles, _edge, _margin) = (tiles, edge, Margin * tiles.TileMetres);
            _slope = (edge.HighX - edge.LowX) / (edge.HighY - edge.LowY);
            (FirstRow, LastRow) = (tiles.Row(edge.LowY - _margin), tiles.Row(edge.HighY + _margin));
        }

        public int FirstRow { get; }

        public int LastRow { get; }

        public (int From, int To) ColumnsIn(int row)
        {
            // Only where the line goes on beyond the row is its x there asked for: a level line never divides by its height of nothing.
            var bottom = _tiles._originY + (row * _tiles.TileMetres) - _margin;
            var top = bottom + _tiles.TileMetres + (2 * _margin);
            var lowX = _edge.LowY >= bottom ? _edge.LowX : _edge.LowX + ((bottom - _edge.LowY) * _slope);
            var highX = _edge.HighY <= top ? _edge.HighX : _edge.LowX + ((top - _edge.LowY) * _slope);
            return (_tiles.Column(Math.Min(lowX, highX) - _margin), _tiles.Column(Math.Max(lowX, highX) + _margin));
        }
    }
}
