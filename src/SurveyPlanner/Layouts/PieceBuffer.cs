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

    public int Count { get; private set; }

    public ReadOnlySpan<Piece> Pieces => _pieces.AsSpan(0, Count);

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
}
