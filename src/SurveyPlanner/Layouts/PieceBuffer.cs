namespace SurveyPlanner.Layouts;

/// <summary>
/// The pieces of one realisation in the turned frame, metres: straight stretches, or points (both ends the same).
/// Reused from draw to draw, so that simulation allocates nothing. For one thread.
/// </summary>
internal sealed class PieceBuffer
{
    private Piece[] _pieces = new Piece[256];

    /// <summary>Room for the crossings of one line; see <see cref="FrameShape.CrossingsAt"/>.</summary>
    public double[] Crossings = new double[64];

    /// <summary>Room for slanted lines and their crossings.</summary>
    public SlantedLines Slanted { get; } = new();

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
    public bool IsPoint => FromX == ToX && FromY == ToY;

    public double Length => FromY == ToY
        ? Math.Abs(ToX - FromX)
        : Math.Sqrt(((ToX - FromX) * (ToX - FromX)) + ((ToY - FromY) * (ToY - FromY)));

    /// <summary>Whether it starts where the piece before it ended, of the same transect: legs of a curve, sides of a circuit.</summary>
    public bool GoesOnFrom(in Piece before)
        => Transect == before.Transect
            && Math.Abs(FromX - before.ToX) < Clipper.ShortestMetres
            && Math.Abs(FromY - before.ToY) < Clipper.ShortestMetres;
}
