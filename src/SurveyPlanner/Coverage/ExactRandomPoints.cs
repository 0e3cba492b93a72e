using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of n independent points, uniform over R, exactly: one point covers a place p with probability
/// q = area(disk(p, radius) in R) / area(R), so p is covered with probability 1 - (1 - q)^n.
/// </summary>
internal static class ExactRandomPoints
{
    public static double[] At(RandomPoints points, CellGrid grid, CancellationToken stop)
    {
        var clip = points.Stratum.Clip;
        var disk = new DiskArea(clip, points.Stratum.HalfWidthMetres);
        return ExactCoverage.Everywhere(grid, (x, y) => 1 - Math.Pow(1 - (disk.At(x, y) / clip.AreaSquareMetres), points.Count), stop);
    }
}
