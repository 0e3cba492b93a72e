namespace SurveyPlanner.Layouts;

/// <summary>
/// The boxes of an <see cref="EdgeTree"/> that slanted lines meet. Neighbouring draws move lines by little; boxes are looked for with a margin for
/// some more such moves, and serve until a line has left it. Which boxes are looked into beyond those that a line meets changes nothing but time.
/// Reused from draw to draw, so that simulation allocates nothing. For one thread.
/// </summary>
internal sealed class BoxesMet
{
    // So many moves ahead: fewer, and boxes are looked for too often; more, and too many edges are looked at in vain.
    private const int MovesAhead = 4;

    private EdgeTree? _tree;
    private Segment[] _lines = new Segment[64];
    private int _lineCount;
    private double _marginMetres;
    private int _moves;
    private double _movedMetres;
    private (int Line, int Box)[] _met = new (int, int)[256];
    private (int Line, int Box)[] _more = new (int, int)[256];
    private int _metCount;

    /// <summary>Boxes that lines may meet, by line.</summary>
    public ReadOnlySpan<(int Line, int Box)> Met => _met.AsSpan(0, _metCount);

    /// <summary>How boxes see each line.</summary>
    public SegmentProbe[] Probes { get; private set; } = new SegmentProbe[64];

    /// <summary>Whether the boxes found last hold all that these lines meet.</summary>
    public bool StillHold(EdgeTree tree, ReadOnlySpan<Segment> lines)
    {
        _moves++;
        _movedMetres = double.PositiveInfinity;
        if (tree != _tree || lines.Length != _lineCount)
        {
            return false;
        }

        _movedMetres = 0;
        for (var i = 0; i < lines.Length; i++)
        {
            _movedMetres = Math.Max(_movedMetres, Distance(lines[i], _lines[i]));
        }

        return _movedMetres <= _marginMetres;
    }

    /// <summary>Begins to look for the boxes that lines meet, from the box round all of a tree.</summary>
    public void Begin(EdgeTree tree, ReadOnlySpan<Segment> lines, FrameShape shape, double boxMetres)
    {
        var move = _movedMetres / _moves;
        _marginMetres = 2 * move < boxMetres ? Math.Min(MovesAhead * move, boxMetres) : 0;
        (_tree, _lineCount, _moves) = (tree, lines.Length, 0);
        if (_lines.Length < lines.Length)
        {
            _lines = new Segment[2 * lines.Length];
            Probes = new SegmentProbe[2 * lines.Length];
        }

        lines.CopyTo(_lines);
        _metCount = 0;
        Room(ref _met, lines.Length);
        for (var line = 0; line < lines.Length; line++)
        {
            Probes[line] = new SegmentProbe(lines[line], shape, _marginMetres);
            _met[_metCount++] = (line, 0);
        }
    }

    /// <summary>The boxes to open now, and room for as many in each.</summary>
    public void NextLevel(int boxesPerBox, out ReadOnlySpan<(int Line, int Box)> boxes, out Span<(int Line, int Box)> found)
    {
        Room(ref _more, boxesPerBox * _metCount);
        boxes = Met;
        found = _more;
    }

    /// <summary>So many have been found.</summary>
    public void EndLevel(int count) => (_met, _more, _metCount) = (_more, _met, count);

    private static void Room(ref (int Line, int Box)[] boxes, int count)
    {
        if (boxes.Length < count)
        {
            boxes = new (int, int)[2 * count];
        }
    }

    /// <summary>How far along x or y the ends of a segment are at most from those of another, and so any place of it.</summary>
    private static double Distance(in Segment a, in Segment b)
    {
        var start = Math.Max(Math.Abs(a.StartX - b.StartX), Math.Abs(a.StartY - b.StartY));
        var ((ax, ay), (bx, by)) = (a.At(a.Length), b.At(b.Length));
        return Math.Max(start, Math.Max(Math.Abs(ax - bx), Math.Abs(ay - by)));
    }
}
