using System.Collections.Immutable;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of each stratum's layout, exact where a closed form exists and simulated always, the two held against each other.
/// </summary>
internal static class CoverageCalculator
{
    public static StratumCoverage Compute(
        LayoutGenerator generator,
        EqualAreaProjection projection,
        double cellSizeMetres,
        int replicates,
        ulong seed,
        uint stratum,
        int threads,
        CancellationToken stop)
    {
        var grid = CellGridBuilder.Build(generator.Stratum.Region, cellSizeMetres);
        var exact = ExactCoverage.At(generator, grid);
        var counts = CoverageSimulation.Run(generator, grid, replicates, seed, stratum, threads, stop);
        var cells = Cells(generator.Stratum.Frame, projection, grid, exact, counts);
        var summary = Summary.Of(cells);
        return new StratumCoverage(
            generator.Stratum.Stratum.Name,
            generator.NominalCoverage,
            cellSizeMetres,
            generator.Stratum.Frame.AngleRadians,
            replicates,
            cells,
            summary.Mean,
            summary.Min,
            summary.Max,
            summary.Cv,
            summary.SimulatedMean,
            summary.MaxAbsZ);
    }

    private static ImmutableArray<CoverageCell> Cells(
        TurnedFrame frame, EqualAreaProjection projection, CellGrid grid, double[]? exact, CoverageCounts counts)
    {
        var cells = ImmutableArray.CreateBuilder<CoverageCell>(grid.Count);
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                var place = frame.ToPlane(grid.X[i], grid.RowY[row]);
                cells.Add(new CoverageCell(
                    place,
                    projection.Unproject(place),
                    frame.ToPlane(grid.SquareCentres[i].X, grid.SquareCentres[i].Y),
                    grid.Areas[i] / 1e6,
                    exact?[i],
                    (double)counts.Draws[i] / counts.Replicates,
                    (double)counts.Times[i] / counts.Replicates,
                    StandardError(counts.Starts[i], counts.Replicates)));
            }
        }

        return cells.MoveToImmutable();
    }

    /// <summary>
    /// From differences between draws with neighbouring offsets: half the sum of their squares over the square of the number of draws. A place
    /// that came under cover k times changed state 2k times. Errs on the large side; never below what one unseen change could hide.
    /// </summary>
    private static double StandardError(int starts, int replicates) => Math.Sqrt(Math.Max(1, starts)) / replicates;

    private readonly record struct Summary(double Mean, double Min, double Max, double Cv, double SimulatedMean, double? MaxAbsZ)
    {
        public static Summary Of(ImmutableArray<CoverageCell> cells)
        {
            double area = 0, sum = 0, squares = 0, simulated = 0, min = double.PositiveInfinity, max = 0, maxZ = 0;
            foreach (ref readonly var cell in cells.AsSpan())
            {
                area += cell.AreaKm2;
                sum += cell.AreaKm2 * cell.Best;
                simulated += cell.AreaKm2 * cell.Simulated;
                min = Math.Min(min, cell.Best);
                max = Math.Max(max, cell.Best);
                maxZ = cell.Exact is { } exact ? Math.Max(maxZ, Math.Abs(cell.Simulated - exact) / cell.StandardError) : maxZ;
            }

            var mean = sum / area;
            foreach (ref readonly var cell in cells.AsSpan())
            {
                squares += cell.AreaKm2 * (cell.Best - mean) * (cell.Best - mean);
            }

            var cv = mean == 0 ? 0 : Math.Sqrt(squares / area) / mean;
            return new Summary(mean, min, max, cv, simulated / area, cells[0].Exact is null ? null : maxZ);
        }
    }
}
