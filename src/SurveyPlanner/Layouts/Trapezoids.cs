using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>A part of a shape between two heights with one straight edge to its left and one to its right.</summary>
internal readonly record struct Trapezoid(double LowY, double HighY, double LowLeft, double LowRight, double HighLeft, double HighRight)
{
    public double LowWidth => LowRight - LowLeft;

    public double HighWidth => HighRight - HighLeft;

    public double AreaSquareMetres => (HighY - LowY) * (LowWidth + HighWidth) / 2;

    /// <summary>The part of it that is at least so wide; null when it is narrower everywhere.</summary>
    public Trapezoid? WhereWiderThan(double metres)
    {
        if (Math.Max(LowWidth, HighWidth) < metres)
        {
            return null;
        }

        var height = LowY + ((metres - LowWidth) / (HighWidth - LowWidth) * (HighY - LowY));
        return LowWidth >= metres
            ? HighWidth >= metres ? this : Between(LowY, height)
            : Between(height, HighY);
    }

    /// <summary>The part between two heights within it.</summary>
    private Trapezoid Between(double lowY, double highY)
    {
        var (low, high) = ((lowY - LowY) / (HighY - LowY), (highY - LowY) / (HighY - LowY));
        return new Trapezoid(
            lowY,
            highY,
            LowLeft + (low * (HighLeft - LowLeft)),
            LowRight + (low * (HighRight - LowRight)),
            LowLeft + (high * (HighLeft - LowLeft)),
            LowRight + (high * (HighRight - LowRight)));
    }
}

/// <summary>
/// Cuts a shape into trapezoids with level tops and bottoms, as few as its corners allow (at most two for each vertex). A line swept upwards
/// keeps the edges it crosses in order; a trapezoid ends where one of its edges does, or where another edge comes between them.
/// Heights within a billionth of the shape's are one, so that corners level but for rounding cut it the same way however it is turned.
/// Accuracy: areas add up to the shape's to 1e-8.
/// </summary>
internal sealed class Trapezoids
{
    private const double Level = 1e-9;

    private readonly FrameShape.Edge[] _edges;
    private readonly double _tolerance;

    // By left edge: the right edge of the open trapezoid and where it began, and the right edge it has above the height at hand; -1 for none.
    private readonly int[] _partner;
    private readonly double[] _since;
    private readonly int[] _partnerAbove;
    private readonly List<Trapezoid> _found = [];
    private readonly List<int> _crossed = [];
    private List<(int Left, int Right)> _open = [];

    private Trapezoids(FrameShape shape)
    {
        _edges = [.. shape.Edges.ToArray().Where(edge => edge.HighY > edge.LowY).OrderBy(edge => edge.LowY)];
        _tolerance = Level * (shape.MaxY - shape.MinY);
        _partner = new int[_edges.Length];
        _partnerAbove = new int[_edges.Length];
        _since = new double[_edges.Length];
        Array.Fill(_partner, -1);
        Array.Fill(_partnerAbove, -1);
    }

    public static IReadOnlyList<Trapezoid> Of(FrameShape shape)
    {
        var sweep = new Trapezoids(shape);
        sweep.Run();
        return sweep._found;
    }

    /// <summary>Trapezoids as a shape in the turned frame; null when there are none.</summary>
    public static PlaneShape? ToShape(IReadOnlyList<Trapezoid> trapezoids)
    {
        var builder = new PlaneShapeBuilder();
        foreach (var part in trapezoids)
        {
            builder.StartPart();
            builder.StartRing();
            builder.Add(part.LowLeft, part.LowY);
            builder.Add(part.LowRight, part.LowY);
            builder.Add(part.HighRight, part.HighY);
            builder.Add(part.HighLeft, part.HighY);
        }

        return trapezoids.Count == 0 ? null : builder.Build();
    }

    private void Run()
    {
        var heights = Heights();
        var next = 0;
        for (var i = 0; i < heights.Count; i++)
        {
            var y = heights[i];
            _crossed.RemoveAll(edge => _edges[edge].HighY <= y);
            for (; next < _edges.Length && _edges[next].LowY <= y; next++)
            {
                if (_edges[next].HighY > y)
                {
                    _crossed.Add(next);
                }
            }

            if (i + 1 < heights.Count)
            {
                SortCrossed((y + heights[i + 1]) / 2);
            }

            Pair(y);
        }
    }

    /// <summary>Heights at which edges begin or end, ascending; of those that are one, the highest.</summary>
    private List<double> Heights()
    {
        var (heights, lowest) = (new List<double>(), double.NegativeInfinity);
        foreach (var height in _edges.Select(edge => edge.LowY).Concat(_edges.Select(edge => edge.HighY)).Order())
        {
            if (height - lowest > _tolerance)
            {
                heights.Add(height);
                lowest = height;
            }
            else
            {
                heights[^1] = height;
            }
        }

        return heights;
    }

    /// <summary>Insertion sort: from one height to the next little changes.</summary>
    private void SortCrossed(double y)
    {
        var x = _crossed.ConvertAll(edge => XAt(edge, y));
        for (var i = 1; i < x.Count; i++)
        {
            var (value, edge) = (x[i], _crossed[i]);
            var j = i - 1;
            for (; j >= 0 && x[j] > value; j--)
            {
                (x[j + 1], _crossed[j + 1]) = (x[j], _crossed[j]);
            }

            (x[j + 1], _crossed[j + 1]) = (value, edge);
        }
    }

    /// <summary>Closes the trapezoids that end at a height and opens those that begin there.</summary>
    private void Pair(double y)
    {
        var pairs = new List<(int Left, int Right)>(_crossed.Count / 2);
        for (var i = 0; i + 1 < _crossed.Count; i += 2)
        {
            pairs.Add((_crossed[i], _crossed[i + 1]));
        }

        foreach (var (left, right) in pairs)
        {
            _partnerAbove[left] = right;
        }

        foreach (var (left, right) in _open)
        {
            if (_partnerAbove[left] != right)
            {
                Close(left, right, y);
                _partner[left] = -1;
            }
        }

        foreach (var (left, right) in pairs)
        {
            _partnerAbove[left] = -1;
            if (_partner[left] != right)
            {
                (_partner[left], _since[left]) = (right, y);
            }
        }

        _open = pairs;
    }

    private void Close(int left, int right, double highY)
    {
        var lowY = _since[left];
        _found.Add(new Trapezoid(lowY, highY, XAt(left, lowY), XAt(right, lowY), XAt(left, highY), XAt(right, highY)));
    }

    /// <summary>An edge that ends within the tolerance of a height has its end there.</summary>
    private double XAt(int edge, double y) => _edges[edge].XAt(Math.Clamp(y, _edges[edge].LowY, _edges[edge].HighY));
}
