namespace SurveyPlanner.Coverage;

/// <summary>
/// The runs of places that one draw covers, row by row: ascending in their row, and merged where strips overlap. Reused from draw to draw.
/// </summary>
internal sealed class RowRuns
{
    private readonly int[] _touched;
    private readonly List<(int First, int End)> _overlaps = [];
    private Run[] _runs;
    private int _touchedCount;
    private int _runCount;

    public RowRuns(int rows)
    {
        _touched = new int[rows];
        _runs = new Run[rows + 256];
        _runCount = rows;
    }

    /// <summary>The rows that have runs, in the order they were first met.</summary>
    public ReadOnlySpan<int> Rows => _touched.AsSpan(0, _touchedCount);

    /// <summary>Each stretch of places that was covered once more when it was covered already.</summary>
    public List<(int First, int End)> Overlaps => _overlaps;

    /// <summary>
    /// The first run of a row has the number of the row and is empty, from 0 to 0, where the row has none; the others are chained behind it.
    /// </summary>
    public ref readonly Run this[int run] => ref _runs[run];

    public void Clear()
    {
        foreach (var row in Rows)
        {
            _runs[row] = default;
        }

        (_touchedCount, _runCount) = (0, _touched.Length);
        _overlaps.Clear();
    }

    /// <summary>Adds the places from <paramref name="first"/> to before <paramref name="end"/>, at least one.</summary>
    public void Add(int row, int first, int end)
    {
        ref var run = ref _runs[row];
        if (run.End > 0)
        {
            Insert(row, first, end);
            return;
        }

        (run.First, run.End) = (first, end);
        _touched[_touchedCount++] = row;
    }

    private void Insert(int row, int first, int end)
    {
        ref var head = ref _runs[row];
        if (first < head.First)
        {
            (first, end, head.First, head.End) = (head.First, head.End, first, end);
        }

        var at = row;
        for (var next = head.Next; next != 0 && _runs[next].First <= first; next = _runs[at].Next)
        {
            at = next;
        }

        if (first > _runs[at].End)
        {
            at = Append(at, first, end);
        }
        else
        {
            Extend(ref _runs[at], first, end);
        }

        // What it reaches now of those that follow is taken in.
        for (var next = _runs[at].Next; next != 0 && _runs[next].First <= _runs[at].End; next = _runs[at].Next)
        {
            Extend(ref _runs[at], _runs[next].First, _runs[next].End);
            _runs[at].Next = _runs[next].Next;
        }
    }

    private void Extend(ref Run run, int first, int end)
    {
        if (first < run.End)
        {
            _overlaps.Add((first, Math.Min(end, run.End)));
        }

        run.End = Math.Max(end, run.End);
    }

    private int Append(int after, int first, int end)
    {
        if (_runCount == _runs.Length)
        {
            Array.Resize(ref _runs, 2 * _runCount);
        }

        _runs[_runCount] = new Run { First = first, End = end, Next = _runs[after].Next };
        return _runs[after].Next = _runCount++;
    }

    /// <summary>Places from First to before End; Next is the number of the run that follows in the row, 0 for none.</summary>
    public struct Run
    {
        public int First;
        public int End;
        public int Next;
    }
}
