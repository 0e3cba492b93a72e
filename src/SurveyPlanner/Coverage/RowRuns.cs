namespace SurveyPlanner.Coverage;

/// <summary>
/// The runs of places that one draw covers, row by row: ascending in their row, and merged where strips overlap. Reused from draw to draw.
/// </summary>
internal sealed class RowRuns(int rows)
{
    // Runs of a row are chained through Next. Number 0 stands for none, so that cleared arrays are empty rows.
    private readonly int[] _firstOfRow = new int[rows];
    private readonly int[] _lastOfRow = new int[rows];
    private readonly int[] _rows = new int[rows];
    private Run[] _runs = new Run[256];
    private int _rowCount;
    private int _runCount = 1;

    /// <summary>The rows that have runs, in the order they were first met.</summary>
    public ReadOnlySpan<int> Rows => _rows.AsSpan(0, _rowCount);

    public void Clear()
    {
        foreach (var row in Rows)
        {
            _firstOfRow[row] = 0;
        }

        (_rowCount, _runCount) = (0, 1);
    }

    /// <summary>Adds the places from <paramref name="first"/> to before <paramref name="end"/>, at least one.</summary>
    public void Add(int row, int first, int end)
    {
        if (_firstOfRow[row] == 0)
        {
            _rows[_rowCount++] = row;
            _firstOfRow[row] = _lastOfRow[row] = New(first, end, 0);
        }
        else if (_runs[_lastOfRow[row]].End < first)
        {
            var run = New(first, end, 0);
            _runs[_lastOfRow[row]].Next = run;
            _lastOfRow[row] = run;
        }
        else
        {
            Insert(row, first, end);
        }
    }

    /// <summary>The number of the first run of a row; 0 where it has none.</summary>
    public int FirstOf(int row) => _firstOfRow[row];

    public ref readonly Run this[int run] => ref _runs[run];

    /// <summary>Puts a run in its place and takes in all that it touches.</summary>
    private void Insert(int row, int first, int end)
    {
        var (before, next) = (0, _firstOfRow[row]);
        while (next != 0 && _runs[next].End < first)
        {
            (before, next) = (next, _runs[next].Next);
        }

        for (; next != 0 && _runs[next].First <= end; next = _runs[next].Next)
        {
            (first, end) = (Math.Min(first, _runs[next].First), Math.Max(end, _runs[next].End));
        }

        var run = New(first, end, next);
        if (before == 0)
        {
            _firstOfRow[row] = run;
        }
        else
        {
            _runs[before].Next = run;
        }

        if (next == 0)
        {
            _lastOfRow[row] = run;
        }
    }

    private int New(int first, int end, int next)
    {
        if (_runCount == _runs.Length)
        {
            Array.Resize(ref _runs, 2 * _runCount);
        }

        _runs[_runCount] = new Run { First = first, End = end, Next = next };
        return _runCount++;
    }

    /// <summary>Places from First to before End; Next is the number of the run that follows in the row, 0 for none.</summary>
    public struct Run
    {
        public int First;
        public int End;
        public int Next;
    }
}
