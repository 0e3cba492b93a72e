using System.Collections.Immutable;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of each stratum's layout, exact where a closed form exists and simulated always, the two held against each other.
/// </summary>
internal sealed class CoverageCalculator(CoverageDesign design, ulong seed, int threads, CancellationToken stop)
{
    private readonly int _replicates = design.Replicates > 0
        ? design.Replicates
        : throw new InputException(new Problem("coverage is simulated by at least one draw", Key: "coverage.replicates"));

    /// <summary>Everything about one stratum's coverage.</summary>
    /// <param name="generator">The stratum's design.</param>
    /// <param name="layout">Its layout as drawn.</param>
    /// <param name="projection">From the plane to degrees.</param>
    /// <param name="cellSizeMetres">Side of its cells.</param>
    /// <param name="stratum">Its index.</param>
    /// <param name="progress">Told how much of the simulation is done.</param>
    public StratumCoverage OfStratum(
        LayoutGenerator generator, Layout layout, EqualAreaProjection projection, double cellSizeMetres, uint stratum, ProgressPart? progress)
    {
        var grid = CellGridBuilder.Build(generator.Stratum.Region, cellSizeMetres, stop);
        var exact = ExactCoverage.At(generator, grid, stop);
        var counts = CoverageSimulation.Run(generator, grid, _replicates, seed, stratum, threads, stop, progress);
        var cells = Cells(generator.Stratum.Frame, projection, grid, exact, counts);
        var summary = Summary.Of(cells);
        var coverage = new StratumCoverage(
            generator.Stratum.Stratum.Name,
            generator.NominalCoverage,
            cellSizeMetres,
            generator.Stratum.Frame.AngleRadians,
            _replicates,
            cells,
            summary.Mean,
            summary.Min,
            summary.Max,
            summary.Cv,
            summary.SimulatedMean,
            exact is null ? null : ExactAgainstSimulated.MaxAbsZ(cells.AsSpan(), _replicates));
        return Judged(coverage with { Transects = Along(generator, layout, coverage, stratum) }, generator, grid);
    }

    /// <summary>
    /// Coverage at any places of a stratum, in the turned frame: exact where the kind has a closed form, and simulated at exactly these places
    /// by the same draws as the cells. Results in the order of the places.
    /// </summary>
    public PlaceCoverage[] At(LayoutGenerator generator, ReadOnlySpan<(double X, double Y)> places, uint stratum, ProgressPart? progress)
    {
        if (places.IsEmpty)
        {
            progress?.Finish();
            return [];
        }

        var grid = CellGrid.OfPlaces(places, out var order);
        var exact = ExactCoverage.At(generator, grid, stop);
        var counts = CoverageSimulation.Run(generator, grid, _replicates, seed, stratum, threads, stop, progress);
        var result = new PlaceCoverage[grid.Count];
        for (var i = 0; i < result.Length; i++)
        {
            result[order[i]] = new PlaceCoverage(exact?[i], counts.Probability(i), counts.ExpectedTimes(i), counts.StandardError(i));
        }

        return result;
    }

    private ImmutableArray<TransectCoverage> Along(LayoutGenerator generator, Layout layout, StratumCoverage cells, uint stratum)
    {
        List<AlongPlace> Places(int most, int least)
            => CoverageAlong.Places(generator.Stratum, layout.Transects, CoverageAlong.Step(generator.Stratum, layout.Transects, most), least);
        var places = Places(CoverageAlong.MostExactPlaces, CoverageAlong.LeastExactPlaces);
        var grid = CellGrid.OfPlaces([.. places.Select(place => (place.X, place.Y))], out var order);
        var coverage = ExactCoverage.At(generator, grid, stop);
        var isExact = coverage is not null;
        if (coverage is null)
        {
            places = Places(CoverageAlong.MostSimulatedPlaces, least: 1);
            grid = CellGrid.OfPlaces([.. places.Select(place => (place.X, place.Y))], out order);
            var counts = CoverageSimulation.Run(generator, grid, _replicates, seed, stratum, threads, stop);
            coverage = [.. Enumerable.Range(0, grid.Count).Select(counts.Probability)];
        }

        var inOrder = new double[places.Count];
        for (var i = 0; i < inOrder.Length; i++)
        {
            inOrder[order[i]] = coverage[i];
        }

        return CoverageAlong.Means(layout.Transects, places, inOrder, isExact, EnoughDraws.TellCells(cells));
    }

    private StratumCoverage Judged(StratumCoverage coverage, LayoutGenerator generator, CellGrid grid)
    {
        var (distances, along) = (new double[grid.Count], new double[grid.Count]);
        var classWidth = EdgeProfile.ClassWidth(generator.Stratum.HalfWidthMetres, grid.Cells!.SizeMetres);
        var tiles = generator.Stratum.Region.Tiles;
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            stop.ThrowIfCancellationRequested();
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                along[i] = grid.RowY[row];
                distances[i] = tiles.Distance(grid.X[i], grid.RowY[row], EdgeProfile.Reach(classWidth));
            }
        }

        return coverage with
        {
            EdgeProfile = EnoughDraws.TellCells(coverage) ? EdgeProfile.Of(coverage.Cells.AsSpan(), distances, classWidth) : [],
            Advice = CoverageAdvisor.Of(generator.Design, coverage, distances, along),
        };
    }

    private ImmutableArray<CoverageCell> Cells(
        TurnedFrame frame, EqualAreaProjection projection, CellGrid grid, double[]? exact, CoverageCounts counts)
    {
        var (cells, squares) = (ImmutableArray.CreateBuilder<CoverageCell>(grid.Count), grid.Cells!);
        for (var row = 0; row < grid.RowY.Length; row++)
        {
            stop.ThrowIfCancellationRequested();
            for (var i = grid.RowStarts[row]; i < grid.RowStarts[row + 1]; i++)
            {
                var place = frame.ToPlane(grid.X[i], grid.RowY[row]);
                cells.Add(new CoverageCell(
                    place,
                    projection.Unproject(place),
                    frame.ToPlane(squares.ColumnX(squares.Columns[i]), squares.RowMiddle(grid.RowY[row])),
                    squares.Areas[i] / 1e6,
                    exact?[i],
                    counts.Probability(i),
                    counts.ExpectedTimes(i),
                    counts.StandardError(i)));
            }
        }

        return cells.MoveToImmutable();
    }

    private readonly record struct Summary(double Mean, double Min, double Max, double Cv, double SimulatedMean)
    {
        public static Summary Of(ImmutableArray<CoverageCell> cells)
        {
            double area = 0, sum = 0, squares = 0, simulated = 0, min = double.PositiveInfinity, max = 0;
            foreach (ref readonly var cell in cells.AsSpan())
            {
                area += cell.AreaKm2;
                sum += cell.AreaKm2 * cell.Best;
                simulated += cell.AreaKm2 * cell.Simulated;
                min = Math.Min(min, cell.Best);
                max = Math.Max(max, cell.Best);
            }

            var mean = sum / area;
            foreach (ref readonly var cell in cells.AsSpan())
            {
                squares += cell.AreaKm2 * (cell.Best - mean) * (cell.Best - mean);
            }

            var cv = mean == 0 ? 0 : Math.Sqrt(squares / area) / mean;
            return new Summary(mean, min, max, cv, simulated / area);
        }
    }
}

/// <summary>Coverage at one place.</summary>
/// <param name="Exact">Probability of being covered at least once, from the closed form; null where none exists.</param>
/// <param name="Simulated">Share of simulated draws that covered the place at least once.</param>
/// <param name="ExpectedTimes">Mean number of times covered, simulated.</param>
/// <param name="StandardError">Standard error of <paramref name="Simulated"/>.</param>
internal readonly record struct PlaceCoverage(double? Exact, double Simulated, double ExpectedTimes, double StandardError);
