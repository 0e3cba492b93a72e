using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of a grid of points, exactly: a place p is covered when a point of the grid lies where points may lie and within the
/// radius of p. With a random offset along both axes that is area(disk(p, radius) in R) / area of a grid cell, as long as disks do not overlap.
/// Where they do, no closed form is used and only the simulation speaks.
/// </summary>
internal static class ExactPointGrid
{
    public static double[]? At(PointGrid points, CellGrid grid, CancellationToken stop)
    {
        if (points.StripsMayOverlap)
        {
            return null;
        }

        var disk = new DiskArea(points.Stratum.Clip, points.Stratum.HalfWidthMetres);
        var result = new double[grid.Count];
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            stop.ThrowIfCancellationRequested();
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                result[i] = disk.At(grid.X[i], grid.RowY[row]) / points.GridCellArea;
            }
        }

        return result;
    }
}
