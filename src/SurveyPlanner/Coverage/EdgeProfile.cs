using System.Collections.Immutable;

namespace SurveyPlanner.Coverage;

/// <summary>One class of distance from the stratum's boundary, and the coverage of the places in it.</summary>
/// <param name="FromMetres">Nearest distance.</param>
/// <param name="ToMetres">Farthest distance; null for all that is farther in.</param>
/// <param name="AreaKm2">Area of the cells whose places lie in the class, square kilometres.</param>
/// <param name="MeanCoverage">Their area-weighted mean coverage: exact where that exists.</param>
public sealed record EdgeClass(double FromMetres, double? ToMetres, double AreaKm2, double MeanCoverage);

/// <summary>Sorts cells into classes of distance from the boundary.</summary>
internal static class EdgeProfile
{
    private const int Classes = 10;

    /// <summary>
    /// Width of a class, metres: half the half-width, since the edge is felt one half-width in; or half a cell where that is more, since a cell's
    /// place stands for all of it.
    /// </summary>
    public static double ClassWidth(double halfWidthMetres, double cellSizeMetres) => Math.Max(halfWidthMetres, cellSizeMetres) / 2;

    /// <summary>Distance beyond which no class differs from the next, metres.</summary>
    public static double Reach(double classWidthMetres) => Classes * classWidthMetres;

    /// <summary>The classes that hold any cell, from the boundary inwards.</summary>
    /// <param name="cells">The cells.</param>
    /// <param name="distances">Distance of each cell's place from the boundary, metres; known up to <see cref="Reach"/>.</param>
    /// <param name="classWidthMetres">Width of a class.</param>
    public static ImmutableArray<EdgeClass> Of(ReadOnlySpan<CoverageCell> cells, ReadOnlySpan<double> distances, double classWidthMetres)
    {
        var (areas, sums) = (new double[Classes + 1], new double[Classes + 1]);
        for (var i = 0; i < cells.Length; i++)
        {
            var index = Math.Min((int)(distances[i] / classWidthMetres), Classes);
            areas[index] += cells[i].AreaKm2;
            sums[index] += cells[i].AreaKm2 * cells[i].Best;
        }

        var profile = ImmutableArray.CreateBuilder<EdgeClass>();
        for (var i = 0; i <= Classes; i++)
        {
            if (areas[i] > 0)
            {
                double? to = i < Classes ? (i + 1) * classWidthMetres : null;
                profile.Add(new EdgeClass(i * classWidthMetres, to, areas[i], sums[i] / areas[i]));
            }
        }

        return profile.ToImmutable();
    }
}
