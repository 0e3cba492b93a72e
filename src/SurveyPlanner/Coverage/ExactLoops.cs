using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of square circuits of side a on a square grid of spacing d, exactly, where strips of different loops and of opposite sides
/// do not overlap (2w at most a, a + 2w at most d). Strips of adjacent sides do, at the corner they share.
/// Cut at the boundary: with V and U the lengths of {|u| ≤ w : p + u inside R} across and along the rows, the starts that cover p by a side along
/// the rows fill two rectangles a × V, by one across them two rectangles a × U, and these overlap in four corners of U × V together:
/// (2a(U + V) - UV) / d². Kept whole if they start inside: the area in R of that pattern for U = V = 2w, over d².
/// None where short pieces are dropped.
/// </summary>
internal static class ExactLoops
{
    public static double[]? At(Loops loops, CellGrid grid, CancellationToken stop)
    {
        if (loops.StripsMayOverlap || loops.Design.MinLengthMetres > 0)
        {
            return null;
        }

        var cell = loops.SpacingMetres * loops.SpacingMetres;
        if (loops.IsKeptWhole)
        {
            return ExactCoverage.Everywhere(grid, (x, y) => StartsThatCover(loops, x, y) / cell, stop);
        }

        var (side, width) = (loops.SideMetres, loops.Stratum.HalfWidthMetres);
        var across = AcrossSlices.At(
            loops.Stratum.LinesAcross, grid, (crossings, y) => AcrossSlices.Measure(crossings, y - width, y + width), stop);
        var result = new double[grid.Count];
        var crossings = new double[64];
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            stop.ThrowIfCancellationRequested();
            var count = loops.Stratum.Clip.CrossingsAt(grid.RowY[row], ref crossings);
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                var along = AcrossSlices.Measure(crossings.AsSpan(0, count), grid.X[i] - width, grid.X[i] + width);
                result[i] = ((2 * side * (across[i] + along)) - (across[i] * along)) / cell;
            }
        }

        return result;
    }

    /// <summary>
    /// Area of the places inside from which a loop covers (x, y): a square of side a with strips of width 2w along its sides, its outer corners
    /// cut out. In pieces that do not overlap.
    /// </summary>
    private static double StartsThatCover(Loops loops, double x, double y)
    {
        var (clip, a, w) = (loops.Stratum.Clip, loops.SideMetres, loops.Stratum.HalfWidthMetres);
        double Area(double lowX, double highX, double lowY, double highY) => RectangleArea.Of(clip, lowX, highX, lowY, highY);

        // Sides along the rows in full; of those across, what the first two leave.
        return Area(x - a, x, y - w, y + w)
            + Area(x - a, x, y - a - w, y - a + w)
            + Area(x - w, x + w, y - a + w, y - w)
            + Area(x - a - w, x - a + w, y - a + w, y - w)
            + Area(x, x + w, y - w, y)
            + Area(x, x + w, y - a, y - a + w)
            + Area(x - a - w, x - a, y - w, y)
            + Area(x - a - w, x - a, y - a, y - a + w);
    }
}
