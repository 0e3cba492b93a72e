using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Coverage probability of one stratum, cell by cell.
/// </summary>
/// <param name="Stratum">The stratum's name.</param>
/// <param name="Nominal">The coverage an interior place would have with no edge near: what even coverage would be.</param>
/// <param name="CellSizeMetres">Side of a whole cell, metres; cells are cut at the stratum's boundary.</param>
/// <param name="RowBearingRadians">Direction of the rows of cells in the plane, radians anticlockwise from plane east.</param>
/// <param name="Replicates">Number of simulated draws.</param>
/// <param name="Cells">The cells.</param>
/// <param name="Mean">Area-weighted mean of the exact coverage, or of the simulated where no closed form exists.</param>
/// <param name="Min">Smallest of it. Where simulated, it lies too low by chance, and the largest too high.</param>
/// <param name="Max">Largest of it.</param>
/// <param name="Cv">Area-weighted coefficient of variation of it. Where simulated, chance adds to it: see <see cref="StandardError"/>.</param>
/// <param name="SimulatedMean">Area-weighted mean of the simulated coverage.</param>
/// <param name="MaxAbsZ">
/// Largest absolute difference between simulated and exact coverage, in standard errors no smaller than the exact value lets expect; null where no
/// closed form exists.
/// </param>
public sealed record StratumCoverage(
    string Stratum,
    double Nominal,
    double CellSizeMetres,
    double RowBearingRadians,
    int Replicates,
    ImmutableArray<CoverageCell> Cells,
    double Mean,
    double Min,
    double Max,
    double Cv,
    double SimulatedMean,
    double? MaxAbsZ)
{
    /// <summary>Mean coverage against distance from the stratum's boundary, from the boundary inwards; classes without cells are left out. Empty where the draws are too few.</summary>
    public ImmutableArray<EdgeClass> EdgeProfile { get; init; } = [];

    /// <summary>What all this means for the survey; null only where coverage was not judged.</summary>
    public CoverageAdvice? Advice { get; init; }

    /// <summary>Coverage along each transect of the layout drawn, in its order.</summary>
    public ImmutableArray<TransectCoverage> Transects { get; init; } = [];

    /// <summary>Whether the coverage to show is from the closed form, and not simulated.</summary>
    public bool IsExact => !Cells.IsEmpty && Cells[0].Exact is not null;

    /// <summary>
    /// Standard error of a cell's simulated coverage: the root of its mean square over the area. Where few draws cover a cell, that of the cell itself
    /// says little; chance makes the simulated cells differ by about this much. 0 where there are no cells.
    /// </summary>
    public double StandardError
    {
        get
        {
            var (squares, area) = (0.0, 0.0);
            foreach (var cell in Cells)
            {
                // Beside no draw at all stands what one unseen draw could hide. Over many cells none is unseen: those count that a draw did cover.
                squares += cell.Simulated > 0 ? cell.AreaKm2 * cell.StandardError * cell.StandardError : 0;
                area += cell.AreaKm2;
            }

            return area == 0 ? 0 : squares > 0 ? Math.Sqrt(squares / area) : 1.0 / Replicates;
        }
    }

    /// <summary>Share of the area, 0 to 1, whose coverage is below a multiple of nominal; where simulated, chance adds to it.</summary>
    public double ShareBelow(double timesNominal) => Share(cell => cell.Best < timesNominal * Nominal);

    /// <summary>Share of the area, 0 to 1, whose coverage is above a multiple of nominal; where simulated, chance adds to it.</summary>
    public double ShareAbove(double timesNominal) => Share(cell => cell.Best > timesNominal * Nominal);

    private double Share(Func<CoverageCell, bool> isCounted)
    {
        var (counted, area) = (0.0, 0.0);
        foreach (var cell in Cells)
        {
            counted += isCounted(cell) ? cell.AreaKm2 : 0;
            area += cell.AreaKm2;
        }

        return area > 0 ? counted / area : 0;
    }
}

/// <summary>
/// One cell: a square of the grid cut at the stratum's boundary, with the coverage of the place that stands for it.
/// </summary>
/// <param name="Place">The place in the cell whose coverage is given: its centre where that is inside the stratum. Plane, metres.</param>
/// <param name="Position">The same place in degrees.</param>
/// <param name="SquareCentre">Centre of the uncut square, plane, metres: with the cell size and the grid's turn it draws the square.</param>
/// <param name="AreaKm2">Area of the cell inside the stratum, square kilometres.</param>
/// <param name="Exact">Probability of being covered at least once, from the closed form; null where none exists.</param>
/// <param name="Simulated">Share of simulated draws that covered the place at least once.</param>
/// <param name="ExpectedTimes">Mean number of times covered, simulated.</param>
/// <param name="StandardError">Standard error of <paramref name="Simulated"/>; see docs/methods/coverage.md.</param>
public readonly record struct CoverageCell(
    PlanePoint Place,
    LonLat Position,
    PlanePoint SquareCentre,
    double AreaKm2,
    double? Exact,
    double Simulated,
    double ExpectedTimes,
    double StandardError)
{
    /// <summary>The coverage to show: exact where it exists.</summary>
    public double Best => Exact ?? Simulated;
}
