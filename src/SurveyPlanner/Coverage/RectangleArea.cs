using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Area that an upright rectangle of the turned frame shares with a shape, exactly, by Green's theorem: an edge with the inside to its left counts,
/// at every height, what of the rectangle lies to its left. Accuracy: 1e-12 of the rectangle's area for each edge that passes it.
/// </summary>
internal static class RectangleArea
{
    public static double Of(FrameShape shape, double lowX, double highX, double lowY, double highY)
    {
        var total = 0.0;
        foreach (ref readonly var edge in shape.EdgesBetween(lowY, highY))
        {
            var (from, to) = (Math.Max(edge.LowY, lowY), Math.Min(edge.HighY, highY));
            if (to > from)
            {
                var left = AreaLeft(edge.XAt(from) - lowX, edge.XAt(to) - lowX, highX - lowX, to - from);
                total += edge.InsideLeft ? left : -left;
            }
        }

        return total;
    }

    /// <summary>Area to the left of a straight line over a height, between 0 and a width; the line runs from x0 to x1.</summary>
    private static double AreaLeft(double x0, double x1, double width, double height)
    {
        if (x0 > x1)
        {
            (x0, x1) = (x1, x0);
        }

        // x as a share t of the height: left of 0 nothing, right of the width all of it.
        var (enters, leaves) = x1 > x0
            ? (Math.Clamp(-x0 / (x1 - x0), 0, 1), Math.Clamp((width - x0) / (x1 - x0), 0, 1))
            : x0 <= 0 ? (1.0, 1.0) : x0 >= width ? (0.0, 0.0) : (0.0, 1.0);
        var (from, to) = (x0 + (enters * (x1 - x0)), x0 + (leaves * (x1 - x0)));
        return height * (((leaves - enters) * (from + to) / 2) + ((1 - leaves) * width));
    }
}
