using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// Coverage probability at the transects: the mean, over the length of a line, of the coverage of the cells it runs through;
/// at a point, that of its cell. What lies outside every cell (plus edges) has no part in it.
/// </summary>
/// <remarks>Lines are looked at in steps of a quarter of a cell, so that a cell counts to within that of its share of the line.</remarks>
internal sealed class CoverageAlong
{
    public static readonly CoverageAlong None = new();

    private const int StepsPerCell = 4;

    private readonly Dictionary<string, Grid> _grids = [];

    public static CoverageAlong Of(SurveyPlan plan)
    {
        var along = new CoverageAlong();
        foreach (var stratum in plan.Strata)
        {
            if (stratum.Coverage is { Cells.IsEmpty: false } coverage)
            {
                along._grids[stratum.Stratum.Name] = new Grid(coverage);
            }
        }

        return along;
    }

    /// <summary>Null where coverage was not worked out or the transect meets no cell.</summary>
    public double? Mean(PlannedTransect planned)
    {
        if (!_grids.TryGetValue(planned.StratumName, out var grid))
        {
            return null;
        }

        var (sum, weight) = (0.0, 0.0);
        foreach (var (place, share) in Places(planned.Transect, grid.StepMetres))
        {
            if (grid.At(place) is { } coverage)
            {
                sum += coverage * share;
                weight += share;
            }
        }

        return weight > 0 ? sum / weight : null;
    }

    /// <summary>Middles of short steps along the transect, and the length that each stands for.</summary>
    private static IEnumerable<(PlanePoint Place, double Share)> Places(Transect transect, double stepMetres)
    {
        if (transect.IsPoint)
        {
            yield return (transect.Pieces[0].Plane[0], 1);
            yield break;
        }

        foreach (var piece in transect.Pieces)
        {
            for (var i = 1; i < piece.Plane.Length; i++)
            {
                var (from, to) = (piece.Plane[i - 1], piece.Plane[i]);
                var length = Math.Sqrt(((to.X - from.X) * (to.X - from.X)) + ((to.Y - from.Y) * (to.Y - from.Y)));
                var steps = Math.Max(1, (int)Math.Ceiling(length / stepMetres));
                for (var step = 0; step < steps; step++)
                {
                    var share = (step + 0.5) / steps;
                    yield return (new PlanePoint(from.X + (share * (to.X - from.X)), from.Y + (share * (to.Y - from.Y))), length / steps);
                }
            }
        }
    }

    /// <summary>The cells of one stratum by their row and column.</summary>
    private sealed class Grid
    {
        private readonly Dictionary<(long Column, long Row), double> _cells = [];
        private readonly PlanePoint _origin;
        private readonly double _size;
        private readonly double _cos;
        private readonly double _sin;

        public Grid(StratumCoverage coverage)
        {
            _size = coverage.CellSizeMetres;
            (_sin, _cos) = Math.SinCos(coverage.RowBearingRadians);
            _origin = coverage.Cells[0].SquareCentre;
            foreach (var cell in coverage.Cells)
            {
                _cells[Index(cell.SquareCentre)] = cell.Best;
            }
        }

        public double StepMetres => _size / StepsPerCell;

        public double? At(PlanePoint place) => _cells.TryGetValue(Index(place), out var coverage) ? coverage : null;

        private (long Column, long Row) Index(PlanePoint place)
        {
            var (x, y) = (place.X - _origin.X, place.Y - _origin.Y);
            return (Nearest(((x * _cos) + (y * _sin)) / _size), Nearest(((y * _cos) - (x * _sin)) / _size));
        }

        private static long Nearest(double value) => (long)Math.Floor(value + 0.5);
    }
}
