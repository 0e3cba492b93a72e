using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of points in rows (square and triangular grids, points on lines), exactly: a place p is covered when a point of the grid
/// lies where points may lie and within the radius of p. With a random offset along both axes that is area(disk(p, radius) in R) / area of a grid
/// cell, as long as disks do not overlap. Where they do, no closed form is used and only the simulation speaks.
/// </summary>
internal static class ExactPointRows
{
    public static double[]? At(PointRows points, CellGrid grid, CancellationToken stop)
    {
        if (points.StripsMayOverlap)
        {
            return null;
        }

        var disk = new DiskArea(points.Stratum.Clip, points.Stratum.HalfWidthMetres);
        return ExactCoverage.Everywhere(grid, (x, y) => disk.At(x, y) / points.GridCellArea, stop);
    }
}
