namespace SurveyPlanner.Layouts;

/// <summary>
/// Slanted lines that are cut together, and where they cross a shape's boundary. Together, because lines are independent of each other: while the
/// processor waits for one it can look at the next. Reused from draw to draw, so that simulation allocates nothing. For one thread.
/// </summary>
internal sealed class SlantedLines
{
    // So few crossings are put in order one by one, quicker than by the library.
    private const int Few = 32;

    private Segment[] _lines = new Segment[64];
    private int[] _legs = new int[64];
    private int[] _crossingStarts = new int[65];
    private double[] _along = new double[64];
    private bool[] _leaves = new bool[64];
    private int _crossings;

    public int Count { get; private set; }

    public ReadOnlySpan<Segment> Lines => _lines.AsSpan(0, Count);

    /// <summary>The boxes of an <see cref="EdgeTree"/> that the lines meet, and may go on to meet in the next draw.</summary>
    public BoxesMet Boxes { get; } = new();

    public void Clear() => (Count, _crossings) = (0, 0);

    /// <summary>Adds a line of some leg; one without a length is left out.</summary>
    public void Add(int leg, double fromX, double fromY, double toX, double toY)
    {
        var (dx, dy) = (toX - fromX, toY - fromY);
        var length = Math.Sqrt((dx * dx) + (dy * dy));
        if (length == 0)
        {
            return;
        }

        if (Count == _lines.Length)
        {
            Array.Resize(ref _lines, 2 * Count);
            Array.Resize(ref _legs, 2 * Count);
            Array.Resize(ref _crossingStarts, (2 * Count) + 1);
        }

        _legs[Count] = leg;
        _lines[Count++] = new Segment(fromX, fromY, dx / length, dy / length, length);
    }

    public int LegOf(int line) => _legs[line];

    /// <summary>Adds the lines of one leg whole. Returns the number of the line after them.</summary>
    public int KeepLeg(int first, int transect, PieceBuffer output)
    {
        var line = first;
        for (; line < Count && _legs[line] == _legs[first]; line++)
        {
            var whole = _lines[line];
            var (toX, toY) = whole.At(whole.Length);
            output.Add(transect, whole.StartX, whole.StartY, toX, toY);
        }

        return line;
    }

    /// <summary>Where on a line it crosses the boundary, ascending, and whether it leaves the inside there.</summary>
    public void CrossingsOf(int line, out Span<double> along, out Span<bool> leaves)
    {
        var (start, end) = (_crossingStarts[line], line + 1 == Count ? _crossings : _crossingStarts[line + 1]);
        along = _along.AsSpan(start, end - start);
        leaves = _leaves.AsSpan(start, end - start);
    }

    /// <summary>From here on crossings are those of a line; lines ascending, none left out.</summary>
    public void BeginCrossings(int line) => _crossingStarts[line] = _crossings;

    public void AddCrossing(double along, bool leaves)
    {
        if (_crossings == _along.Length)
        {
            Array.Resize(ref _along, 2 * _crossings);
            Array.Resize(ref _leaves, 2 * _crossings);
        }

        (_along[_crossings], _leaves[_crossings]) = (along, leaves);
        _crossings++;
    }

    /// <summary>Puts the crossings of each line in order.</summary>
    public void Sort()
    {
        for (var line = 0; line < Count; line++)
        {
            CrossingsOf(line, out var along, out var leaves);
            Sort(along, leaves);
        }
    }

    private static void Sort(Span<double> along, Span<bool> leaves)
    {
        if (along.Length > Few)
        {
            along.Sort(leaves);
            return;
        }

        for (var i = 1; i < along.Length; i++)
        {
            var (place, leaving) = (along[i], leaves[i]);
            var at = i;
            for (; at > 0 && along[at - 1] > place; at--)
            {
                (along[at], leaves[at]) = (along[at - 1], leaves[at - 1]);
            }

            (along[at], leaves[at]) = (place, leaving);
        }
    }
}
