using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of systematic parallel lines, exactly: a place p is covered by the line at offset u across it when the foot of the
/// perpendicular from p lies where lines may lie and |u| is at most the half-width w. So the expected number of covering lines is
/// |{u in [-w, w] : p + u n in R}| / d, and where strips overlap (2w > d) the probability is the measure of that set modulo d, over d.
/// R is where lines may lie; stretches that are dropped as too short are no part of it.
/// </summary>
internal static class ExactParallelLines
{
    public static double[] At(ParallelLines lines, CellGrid grid, CancellationToken stop)
    {
        var (width, spacing) = (lines.Stratum.HalfWidthMetres, lines.SpacingMetres);
        return AcrossSlices.At(lines.Stratum.LinesAcross, grid, (crossings, y) => Probability(crossings, y, width, spacing), stop);
    }

    /// <summary>Share of offsets that cover the place at height y between the crossings.</summary>
    public static double Probability(ReadOnlySpan<double> crossings, double y, double halfWidth, double spacing)
        => (2 * halfWidth > spacing
            ? AcrossSlices.MeasureModulo(crossings, y - halfWidth, y + halfWidth, spacing)
            : AcrossSlices.Measure(crossings, y - halfWidth, y + halfWidth)) / spacing;
}
