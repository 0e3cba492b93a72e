using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>Coverage probability in closed form, for the layout kinds that have one. Derivations: docs/methods/layouts.md.</summary>
internal static class ExactCoverage
{
    /// <summary>The probability at every place of the grid, or null where the kind has no closed form.</summary>
    public static double[]? At(LayoutGenerator generator, CellGrid grid, CancellationToken stop = default) => generator switch
    {
        ParallelLines lines => ExactParallelLines.At(lines, grid, stop),
        RandomParallelLines lines => ExactRandomLines.At(lines, grid, stop),
        Segments segments => ExactSegments.At(segments, grid, stop),
        Loops loops => ExactLoops.At(loops, grid, stop),
        PointRows points => ExactPointRows.At(points, grid, stop),
        RandomPoints points => ExactRandomPoints.At(points, grid, stop),
        _ => null,
    };

    /// <summary>Asks place by place: the function takes x and y in the turned frame.</summary>
    public static double[] Everywhere(CellGrid grid, Func<double, double, double> probability, CancellationToken stop)
    {
        var result = new double[grid.Count];
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            stop.ThrowIfCancellationRequested();
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                result[i] = probability(grid.X[i], grid.RowY[row]);
            }
        }

        return result;
    }
}
