using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Coverage;

/// <summary>Chooses the side of the cells of each stratum.</summary>
internal static class CellSizes
{
    private const int CellsInSmallestStratum = 500;
    private const int DefaultCells = 5000;
    private const int MaxDefaultCells = 50_000;
    private const int MaxCells = 20_000_000;

    // Position, area, coverage, counts on two threads: what one cell takes while it is worked on.
    private const int BytesPerCell = 200;

    /// <summary>Side in metres for each stratum: the same for all, smaller only in strata that would get fewer than 500 cells.</summary>
    public static double[] For(IReadOnlyList<Stratum> strata, CoverageDesign design)
    {
        var total = strata.Sum(stratum => stratum.Shape.AreaSquareMetres);
        if (design.Cells is { } cells)
        {
            Refuse(cells, strata);
            return [.. strata.Select(_ => Math.Sqrt(total / cells))];
        }

        var smallest = strata.Min(stratum => stratum.Shape.AreaSquareMetres);
        var count = Math.Clamp(total / smallest * CellsInSmallestStratum, DefaultCells, MaxDefaultCells);
        return [.. strata.Select(stratum => Math.Min(
            Math.Sqrt(total / count),
            Math.Sqrt(stratum.Shape.AreaSquareMetres / CellsInSmallestStratum)))];
    }

    private static void Refuse(int cells, IReadOnlyList<Stratum> strata)
    {
        if (cells > MaxCells)
        {
            throw new InputException(new Problem(
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"{cells} cells would take about {(double)cells * BytesPerCell / 1e9:0.#} GB of memory; the limit is {MaxCells}"),
                Key: "coverage.cells"));
        }

        var total = strata.Sum(stratum => stratum.Shape.AreaSquareMetres);
        foreach (var stratum in strata.Where(stratum => stratum.Shape.AreaSquareMetres < total / cells))
        {
            throw new InputException(new Problem(
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"with {cells} cells a cell of {total / cells / 1e6:0.###} km² is larger than stratum '{stratum.Name}' of {stratum.AreaKm2:0.###} km²; ask for more cells"),
                Key: "coverage.cells"));
        }
    }
}
