using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>
/// A shape in the turned frame, its edges sorted into horizontal bands, so that a line meets only the edges that can cross it.
/// Inside is where a ray crosses the edges an odd number of times. Safe to share between threads.
/// </summary>
/// <remarks>
/// Robust where general overlay is not: whether an edge crosses a line is decided once a vertex (on it or below counts as below), so crossings
/// always pair up, however thin the sliver between them. Accuracy of a crossing: a few units in the last place of the edge's length.
/// </remarks>
internal sealed class FrameShape
{
    private const int MaxBands = 1 << 17;

    // An edge stands in every band that it touches. Bands are no finer than pays: where edges are long, a quarter of an edge besides those that
    // cross a line costs nothing, and memory stays proportional to the number of edges.
    private const int BandsPerCrossedEdge = 4;

    // Each edge once, as the rings run; in the order of the band of its lower end; and every edge of every band.
    private readonly Edge[] _edges;
    private readonly Edge[] _byLowEnd;
    private readonly int[] _lowStarts;
    private readonly Edge[] _bandEdges;
    private readonly int[] _bandStarts;
    private readonly double _bandsPerMetre;
    private readonly Lazy<EdgeTiles> _tiles;
    private readonly Lazy<EdgeTree> _tree;

    /// <param name="shape">The shape in the plane.</param>
    /// <param name="frame">How it is turned.</param>
    /// <param name="transposed">Swap x and y afterwards: bands then run across the lines.</param>
    public FrameShape(PlaneShape shape, TurnedFrame frame, bool transposed = false)
    {
        var (x, y) = Turn(shape, frame, transposed);
        (MinX, MaxX, MinY, MaxY) = (x.Min(), x.Max(), y.Min(), y.Max());
        _edges = EdgesOf(shape, x, y, transposed);
        var bands = BandsFor(_edges, MaxY - MinY);
        _bandsPerMetre = bands / Math.Max(MaxY - MinY, double.Epsilon);
        if (!double.IsFinite(_bandsPerMetre))
        {
            (bands, _bandsPerMetre) = (1, 0);
        }

        (_lowStarts, _byLowEnd) = SortIntoBands(bands, lowestOnly: true);
        (_bandStarts, _bandEdges) = SortIntoBands(bands, lowestOnly: false);
        AreaSquareMetres = shape.AreaSquareMetres;
        PartRanges = YRanges(shape, y);
        _tiles = new Lazy<EdgeTiles>(() => new EdgeTiles(this, _edges));
        _tree = new Lazy<EdgeTree>(() => new EdgeTree(this, shape.RingStarts.AsSpan()));
    }

    public double MinX { get; }

    public double MaxX { get; }

    public double MinY { get; }

    public double MaxY { get; }

    /// <summary>Middle of the bounding box.</summary>
    public double MiddleX => (MinX + MaxX) / 2;

    /// <summary>Middle of the bounding box.</summary>
    public double MiddleY => (MinY + MaxY) / 2;

    public double AreaSquareMetres { get; }

    /// <summary>All edges, by number.</summary>
    public ReadOnlySpan<Edge> Edges => _edges;

    /// <summary>The edges in square tiles, for looking round a place.</summary>
    public EdgeTiles Tiles => _tiles.Value;

    /// <summary>The edges in a tree, for looking along a slanted line.</summary>
    public EdgeTree Tree => _tree.Value;

    /// <summary>Lowest and highest y of each part.</summary>
    public (double Low, double High)[] PartRanges { get; }

    /// <summary>
    /// The x at which the horizontal line at <paramref name="y"/> crosses the boundary, ascending, always an even number:
    /// the line is inside from each even entry to the next. The buffer is replaced by a larger one when it is too small.
    /// </summary>
    public int CrossingsAt(double y, ref double[] buffer)
    {
        if (!(y >= MinY && y <= MaxY))
        {
            return 0;
        }

        var band = BandOf(y);
        var (start, end) = (_bandStarts[band], _bandStarts[band + 1]);
        if (buffer.Length < end - start)
        {
            buffer = new double[Math.Max(end - start, 2 * buffer.Length)];
        }

        var count = 0;
        for (var i = start; i < end; i++)
        {
            ref readonly var edge = ref _bandEdges[i];

            // Edges run upwards (LowY < HighY): crossed where the lower end is on or below the line and the upper end above it.
            if (edge.LowY <= y && edge.HighY > y)
            {
                buffer[count++] = edge.XAt(y);
            }
        }

        SortShort(buffer.AsSpan(0, count));
        return count;
    }

    /// <summary>Whether a place lies inside.</summary>
    public bool Contains(double x, double y)
    {
        if (!(y >= MinY && y <= MaxY))
        {
            return false;
        }

        var band = BandOf(y);
        var inside = false;
        for (var i = _bandStarts[band]; i < _bandStarts[band + 1]; i++)
        {
            ref readonly var edge = ref _bandEdges[i];
            inside ^= edge.LowY <= y && edge.HighY > y && edge.XAt(y) > x;
        }

        return inside;
    }

    /// <summary>
    /// The edges that may touch the rows from <paramref name="low"/> to <paramref name="high"/>, each edge once.
    /// </summary>
    public BandEdges EdgesBetween(double low, double high)
    {
        if (high < MinY || low > MaxY)
        {
            return default;
        }

        return new BandEdges(this, BandOf(low), BandOf(high));
    }

    private int BandOf(double y) => Math.Clamp((int)((y - MinY) * _bandsPerMetre), 0, _bandStarts.Length - 2);

    private static (double[] X, double[] Y) Turn(PlaneShape shape, TurnedFrame frame, bool transposed)
    {
        var (x, y) = (new double[shape.VertexCount], new double[shape.VertexCount]);
        for (var i = 0; i < x.Length; i++)
        {
            (x[i], y[i]) = frame.ToFrame(shape.X[i], shape.Y[i]);
        }

        return transposed ? (y, x) : (x, y);
    }

    private static Edge[] EdgesOf(PlaneShape shape, double[] x, double[] y, bool transposed)
    {
        var edges = new Edge[shape.VertexCount];
        for (var part = 0; part < shape.PartCount; part++)
        {
            for (var ring = shape.PartStarts[part]; ring < shape.PartStarts[part + 1]; ring++)
            {
                // The inside lies to the left of a shell that runs anticlockwise and of a hole that runs clockwise; transposing swaps sides.
                var isShell = ring == shape.PartStarts[part];
                var insideLeft = ((shape.SignedRingArea(ring) > 0) == isShell) != transposed;
                var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
                for (var i = start; i < end; i++)
                {
                    var next = i + 1 == end ? start : i + 1;
                    edges[i] = y[i] <= y[next]
                        ? new Edge(x[i], y[i], x[next], y[next], insideLeft)
                        : new Edge(x[next], y[next], x[i], y[i], !insideLeft);
                }
            }
        }

        return edges;
    }

    private static int BandsFor(Edge[] edges, double height)
    {
        var total = edges.Sum(edge => edge.HighY - edge.LowY);
        var useful = total > 0 ? Math.Min(edges.Length / 2, BandsPerCrossedEdge * edges.Length * height / total) : 1;
        return (int)Math.Clamp(useful, 1, MaxBands);
    }

    /// <summary>Counting sort: every edge into the band of its lower end, or into every band it touches.</summary>
    private (int[] Starts, Edge[] Sorted) SortIntoBands(int bands, bool lowestOnly)
    {
        var starts = new int[bands + 1];
        int Band(double y) => Math.Clamp((int)((y - MinY) * _bandsPerMetre), 0, bands - 1);
        foreach (ref readonly var edge in _edges.AsSpan())
        {
            var low = Band(edge.LowY);
            for (var band = low; band <= (lowestOnly ? low : Band(edge.HighY)); band++)
            {
                starts[band + 1]++;
            }
        }

        for (var band = 0; band < bands; band++)
        {
            starts[band + 1] += starts[band];
        }

        var sorted = new Edge[starts[bands]];
        var next = starts.AsSpan(0, bands).ToArray();
        foreach (ref readonly var edge in _edges.AsSpan())
        {
            var low = Band(edge.LowY);
            for (var band = low; band <= (lowestOnly ? low : Band(edge.HighY)); band++)
            {
                sorted[next[band]++] = edge;
            }
        }

        return (starts, sorted);
    }

    private static (double Low, double High)[] YRanges(PlaneShape shape, double[] y)
    {
        var ranges = new (double Low, double High)[shape.PartCount];
        for (var part = 0; part < ranges.Length; part++)
        {
            var shell = shape.PartStarts[part];
            var span = y.AsSpan(shape.RingStarts[shell]..shape.RingStarts[shell + 1]);
            var (low, high) = (double.PositiveInfinity, double.NegativeInfinity);
            foreach (var value in span)
            {
                low = Math.Min(low, value);
                high = Math.Max(high, value);
            }

            ranges[part] = (low, high);
        }

        return ranges;
    }

    /// <summary>Insertion sort: a line seldom crosses more than a dozen edges; many crossings go to the library's sort.</summary>
    private static void SortShort(Span<double> values)
    {
        if (values.Length > 32)
        {
            values.Sort();
            return;
        }

        for (var i = 1; i < values.Length; i++)
        {
            var value = values[i];
            var j = i - 1;
            while (j >= 0 && values[j] > value)
            {
                values[j + 1] = values[j];
                j--;
            }

            values[j + 1] = value;
        }
    }

    /// <summary>One edge, its lower end first. <paramref name="InsideLeft"/>: going up it, the inside is to the left.</summary>
    public readonly record struct Edge(double LowX, double LowY, double HighX, double HighY, bool InsideLeft)
    {
        /// <summary>Where a horizontal line that crosses the edge does so. The same digits whichever way the ring runs.</summary>
        public double XAt(double y) => LowX + ((y - LowY) * (HighX - LowX) / (HighY - LowY));
    }

    /// <summary>Walks the edges of some bands, each edge once: first all of the lowest band, then those that begin in the bands above it.</summary>
    public ref struct BandEdges
    {
        private readonly ReadOnlySpan<Edge> _above;
        private ReadOnlySpan<Edge> _walked;
        private int _index;
        private bool _isAbove;

        public BandEdges(FrameShape shape, int firstBand, int lastBand)
        {
            _walked = shape._bandEdges.AsSpan(shape._bandStarts[firstBand]..shape._bandStarts[firstBand + 1]);
            _above = shape._byLowEnd.AsSpan(shape._lowStarts[firstBand + 1]..shape._lowStarts[lastBand + 1]);
            _index = -1;
        }

        public readonly ref readonly Edge Current => ref _walked[_index];

        public readonly BandEdges GetEnumerator() => this;

        public bool MoveNext()
        {
            if (++_index < _walked.Length)
            {
                return true;
            }

            if (_isAbove)
            {
                return false;
            }

            _walked = _above;
            (_index, _isAbove) = (0, true);
            return _walked.Length > 0;
        }
    }
}
