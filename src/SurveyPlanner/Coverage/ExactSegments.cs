using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of segments of length l along the rows of a square grid of spacing d, exactly.
/// Cut at the boundary: as systematic lines d apart, of which the share l/d is walked, whatever the row: (l/d) times their probability.
/// Kept whole if they start inside: the starts that cover a place p fill the rectangle [p.x - l, p.x] × [p.y - w, p.y + w], so it is the area of
/// that rectangle in R over d², as long as strips of neighbouring rows do not overlap.
/// None for segments with bearings of their own, and none where short pieces are dropped.
/// </summary>
internal static class ExactSegments
{
    public static double[]? At(Segments segments, CellGrid grid, CancellationToken stop)
    {
        var (width, spacing, length) = (segments.Stratum.HalfWidthMetres, segments.SpacingMetres, segments.Design.SegmentMetres!.Value);
        if (segments.HasRandomBearings || segments.Design.MinLengthMetres > 0 || (segments.IsKeptWhole && segments.StripsMayOverlap))
        {
            return null;
        }

        return segments.IsKeptWhole
            ? ExactCoverage.Everywhere(
                grid, (x, y) => RectangleArea.Of(segments.Stratum.Clip, x - length, x, y - width, y + width) / (spacing * spacing), stop)
            : AcrossSlices.At(
                segments.Stratum.LinesAcross,
                grid,
                (crossings, y) => length / spacing * ExactParallelLines.Probability(crossings, y, width, spacing),
                stop);
    }
}
