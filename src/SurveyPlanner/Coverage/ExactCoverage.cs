using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>Coverage probability in closed form, for the layout kinds that have one.</summary>
internal static class ExactCoverage
{
    /// <summary>The probability at every place of the grid, or null where the kind has no closed form.</summary>
    public static double[]? At(LayoutGenerator generator, CellGrid grid, CancellationToken stop = default) => generator switch
    {
        ParallelLines lines => ExactParallelLines.At(lines, grid, stop),
        PointGrid points => ExactPointGrid.At(points, grid, stop),
        _ => null,
    };
}
