namespace SurveyPlanner.Layouts;

/// <summary>
/// The pieces of one realisation in the turned frame, metres: straight stretches, or points (both ends the same).
/// Reused from draw to draw, so that simulation allocates nothing. For one thread.
/// </summary>
internal sealed class PieceBuffer
{
    // So few crossings are put in order one by one, quicker than by the library.
    private const int Few = 32;

    private Piece[] _pieces = new Piece[256];

    private bool[] _leaves = new bool[64];
    private int[] _moreBoxes = new int[256];

    /// <summary>Room for the crossings of one line; see <see cref="FrameShape.CrossingsAt"/>.</summary>
    public double[] Crossings = new double[64];

    /// <summary>Room for the boxes of a tree that a slanted line meets.</summary>
    public int[] FoundBoxes { get; private set; } = new int[256];

    /// <summary>Room for the turns of one zigzag.</summary>
    public List<Turn> Turns { get; } = [];

    /// <summary>Room for positions drawn one by one and put in order afterwards.</summary>
    public List<double> Positions { get; } = [];

    public int Count { get; private set; }

    public ReadOnlySpan<Piece> Pieces => _pieces.AsSpan(0, Count);

    /// <summary>Number of transects.</summary>
    public int Transects => Count == 0 ? 0 : _pieces[Count - 1].Transect + 1;

    /// <summary>Total length of the pieces, metres.</summary>
    public double TotalLength
    {
        get
        {
            var total = 0.0;
            foreach (ref readonly var piece in Pieces)
            {
                total += piece.Length;
            }

            return total;
        }
    }

    public void Clear() => Count = 0;

    /// <summary>Room for so many boxes of the next level.</summary>
    public Span<int> MoreBoxes(int count)
    {
        if (_moreBoxes.Length < count)
        {
            _moreBoxes = new int[2 * count];
        }

        return _moreBoxes;
    }

    /// <summary>The boxes of the next level are those found now.</summary>
    public void SwapBoxes() => (FoundBoxes, _moreBoxes) = (_moreBoxes, FoundBoxes);

    /// <summary>Whether each crossing of a slanted line goes from the inside to the outside.</summary>
    public ReadOnlySpan<bool> Leaves => _leaves;

    /// <summary>Notes one crossing of a slanted line: where on the line, and whether it leaves the inside there.</summary>
    public void SetCrossing(int index, double along, bool leaves)
    {
        if (index >= Crossings.Length)
        {
            Array.Resize(ref Crossings, 2 * index);
        }

        if (index >= _leaves.Length)
        {
            Array.Resize(ref _leaves, 2 * index);
        }

        (Crossings[index], _leaves[index]) = (along, leaves);
    }

    /// <summary>Sorts the first crossings by their place on the line.</summary>
    public void SortCrossings(int count)
    {
        if (count > Few)
        {
            Crossings.AsSpan(0, count).Sort(_leaves.AsSpan(0, count));
            return;
        }

        for (var i = 1; i < count; i++)
        {
            var (along, leaves) = (Crossings[i], _leaves[i]);
            var at = i;
            for (; at > 0 && Crossings[at - 1] > along; at--)
            {
                (Crossings[at], _leaves[at]) = (Crossings[at - 1], _leaves[at - 1]);
            }

            (Crossings[at], _leaves[at]) = (along, leaves);
        }
    }

    public void Add(int transect, double fromX, double fromY, double toX, double toY)
    {
        if (Count == _pieces.Length)
        {
            Array.Resize(ref _pieces, 2 * Count);
        }

        _pieces[Count++] = new Piece(transect, fromX, fromY, toX, toY);
    }

    /// <summary>
    /// Of the pieces from an index on, keeps those whose stretch (pieces that go on from one another) is at least so long.
    /// Returns whether any are left.
    /// </summary>
    public bool KeepStretches(int first, double shortestMetres)
    {
        if (shortestMetres > 0)
        {
            var kept = first;
            for (var start = first; start < Count;)
            {
                var end = StretchEnd(start, out var length);
                if (length >= shortestMetres)
                {
                    Array.Copy(_pieces, start, _pieces, kept, end - start);
                    kept += end - start;
                }

                start = end;
            }

            Count = kept;
        }

        return Count > first;
    }

    private int StretchEnd(int start, out double length)
    {
        length = _pieces[start].Length;
        var end = start + 1;
        while (end < Count && _pieces[end].GoesOnFrom(_pieces[end - 1]))
        {
            length += _pieces[end++].Length;
        }

        return end;
    }
}

/// <summary>A straight stretch of one transect, or a point.</summary>
/// <param name="Transect">Which transect of the realisation it belongs to, from 0, in order of visit.</param>
/// <param name="FromX">Start, in the turned frame, metres.</param>
/// <param name="FromY">Start.</param>
/// <param name="ToX">End.</param>
/// <param name="ToY">End.</param>
internal readonly record struct Piece(int Transect, double FromX, double FromY, double ToX, double ToY)
{
    public double Length => FromY == ToY
        ? Math.Abs(ToX - FromX)
        : Math.Sqrt(((ToX - FromX) * (ToX - FromX)) + ((ToY - FromY) * (ToY - FromY)));

    /// <summary>Whether it starts where the piece before it ended, of the same transect: legs of a curve, sides of a circuit.</summary>
    public bool GoesOnFrom(in Piece before)
        => Transect == before.Transect
            && Math.Abs(FromX - before.ToX) < Clipper.ShortestMetres
            && Math.Abs(FromY - before.ToY) < Clipper.ShortestMetres;
}
