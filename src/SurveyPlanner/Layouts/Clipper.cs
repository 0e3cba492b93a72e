namespace SurveyPlanner.Layouts;

/// <summary>
/// Cuts straight lines at a shape's boundary. Pieces shorter than a tenth of a millimetre are rounding and are left out;
/// pieces that touch end to end (at a border shared by two parts) are one piece.
/// </summary>
internal static class Clipper
{
    public const double ShortestMetres = 1e-4;

    /// <summary>The parts of a horizontal line inside the shape, from left to right, or from right to left.</summary>
    public static void ClipHorizontal(FrameShape shape, double y, int transect, bool leftwards, PieceBuffer output)
    {
        var count = shape.CrossingsAt(y, ref output.Crossings);
        var pairs = Join(output.Crossings.AsSpan(0, count));
        for (var i = 0; i < pairs; i++)
        {
            var pair = leftwards ? pairs - 1 - i : i;
            var (from, to) = (output.Crossings[2 * pair], output.Crossings[(2 * pair) + 1]);
            if (leftwards)
            {
                (from, to) = (to, from);
            }

            output.Add(transect, from, y, to, y);
        }
    }

    /// <summary>The parts of any straight line inside the shape, in the direction from its start to its end.</summary>
    public static void ClipSegment(FrameShape shape, double fromX, double fromY, double toX, double toY, int transect, PieceBuffer output)
    {
        var lines = output.Slanted;
        lines.Clear();
        lines.Add(leg: 0, fromX, fromY, toX, toY);
        shape.Tree.FindCrossings(lines);
        ClipLeg(shape, lines, 0, transect, output);
    }

    /// <summary>
    /// The parts of the lines of one leg inside the shape, after their crossings have been found. Returns the number of the line after them.
    /// </summary>
    /// <param name="shape">The shape.</param>
    /// <param name="lines">All lines.</param>
    /// <param name="first">Number of the first line of the leg.</param>
    /// <param name="transect">The transect that the pieces belong to.</param>
    /// <param name="output">Takes the pieces.</param>
    public static int ClipLeg(FrameShape shape, SlantedLines lines, int first, int transect, PieceBuffer output)
    {
        var line = first;
        for (; line < lines.Count && lines.LegOf(line) == lines.LegOf(first); line++)
        {
            ref readonly var segment = ref lines.Lines[line];
            lines.CrossingsOf(line, out var cuts, out var leaves);
            EmitSegment(cuts, IsInsideAtStart(shape, segment, cuts, leaves), segment, transect, output);
        }

        return line;
    }

    /// <summary>The x between which a shape lies at the heights from low to high; low above high when it has no part there.</summary>
    public static (double Low, double High) ExtentBetween(FrameShape shape, double lowY, double highY)
    {
        var (low, high) = (double.PositiveInfinity, double.NegativeInfinity);
        foreach (ref readonly var edge in shape.EdgesBetween(lowY, highY))
        {
            var (from, to) = (Math.Max(lowY, edge.LowY), Math.Min(highY, edge.HighY));
            if (from <= to)
            {
                var (x0, x1) = from < to || edge.HighY > edge.LowY ? (edge.XAt(from), edge.XAt(to)) : (edge.LowX, edge.HighX);
                (low, high) = (Math.Min(low, Math.Min(x0, x1)), Math.Max(high, Math.Max(x0, x1)));
            }
        }

        return (low, high);
    }

    /// <summary>Whether the stretch before the first crossing is inside: the crossings know, which by turns go in and out.</summary>
    private static bool IsInsideAtStart(FrameShape shape, in Segment segment, ReadOnlySpan<double> cuts, ReadOnlySpan<bool> leaves)
    {
        for (var i = 1; i < cuts.Length; i++)
        {
            // Not where two are at the same place, at a shared border or a vertex: only rounding put them in order.
            if (leaves[i] == leaves[i - 1] || cuts[i] - cuts[i - 1] < ShortestMetres)
            {
                return IsInsideByLongest(shape, segment, cuts);
            }
        }

        return cuts.Length > 0 ? leaves[0] : IsInside(shape, segment, 0, segment.Length);
    }

    /// <summary>
    /// The same, asked within the longest stretch, where rounding cannot matter, and counted back: every crossing changes sides.
    /// </summary>
    private static bool IsInsideByLongest(FrameShape shape, in Segment segment, ReadOnlySpan<double> cuts)
    {
        var (longest, start, index) = (-1.0, 0.0, 0);
        for (var i = 0; i <= cuts.Length; i++)
        {
            var (low, high) = (i == 0 ? 0 : cuts[i - 1], i == cuts.Length ? segment.Length : cuts[i]);
            if (high - low > longest)
            {
                (longest, start, index) = (high - low, low, i);
            }
        }

        return IsInside(shape, segment, start, longest) == (index % 2 == 0);
    }

    /// <summary>Whether a stretch without crossings is inside.</summary>
    private static bool IsInside(FrameShape shape, in Segment segment, double start, double length)
    {
        // One of the places asked may be a vertex that the line only touches, where the answer is chance: two of three decide.
        var first = IsInsideAt(shape, segment, start + (0.5 * length));
        return first == IsInsideAt(shape, segment, start + (0.31 * length)) ? first : IsInsideAt(shape, segment, start + (0.73 * length));
    }

    private static bool IsInsideAt(FrameShape shape, in Segment segment, double along)
    {
        var (x, y) = segment.At(along);
        return shape.Contains(x, y);
    }

    private static void EmitSegment(ReadOnlySpan<double> cuts, bool inside, in Segment segment, int transect, PieceBuffer output)
    {
        var start = 0.0;
        for (var i = 0; i <= cuts.Length; i++)
        {
            var cut = i == cuts.Length ? segment.Length : cuts[i];
            if (!inside)
            {
                (start, inside) = (cut, true);
                continue;
            }

            if (i + 1 < cuts.Length && cuts[i + 1] - cut < ShortestMetres)
            {
                // Out and in again at once, at a shared border: still the same piece.
                i++;
                continue;
            }

            inside = false;
            if (cut - start >= ShortestMetres)
            {
                var (fromX, fromY) = segment.At(start);
                var (toX, toY) = segment.At(cut);
                output.Add(transect, fromX, fromY, toX, toY);
            }
        }
    }

    /// <summary>Joins stretches that touch and drops those too short to matter; returns how many pairs are left at the front.</summary>
    private static int Join(Span<double> crossings)
    {
        var kept = 0;
        for (var i = 0; i + 1 < crossings.Length; i += 2)
        {
            var (low, high) = (crossings[i], crossings[i + 1]);
            if (kept > 0 && low - crossings[(2 * kept) - 1] < ShortestMetres)
            {
                crossings[(2 * kept) - 1] = high;
            }
            else
            {
                crossings[2 * kept] = low;
                crossings[(2 * kept) + 1] = high;
                kept++;
            }
        }

        var longEnough = 0;
        for (var pair = 0; pair < kept; pair++)
        {
            var (low, high) = (crossings[2 * pair], crossings[(2 * pair) + 1]);
            if (high - low >= ShortestMetres)
            {
                (crossings[2 * longEnough], crossings[(2 * longEnough) + 1]) = (low, high);
                longEnough++;
            }
        }

        return longEnough;
    }
}
