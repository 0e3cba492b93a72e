using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Look;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// Classes of coverage relative to nominal, with the same colours on every map: "as planned" looks the same whatever the design, and strata
/// of different effort and reports of different surveys can be compared.
/// </summary>
internal static class CoverageClasses
{
    // Fifths round 1. Six and the hatch are seven, the most that can be told apart by.
    private static readonly double[] Bounds = [0.5, 0.7, 0.9, 1.1, 1.3];

    // Shares of the way along cividis: lightness rises evenly from class to class, and what is as planned gets a quiet colour.
    private static readonly double[] ColourShares = [0, 0.19, 0.4, 0.64, 0.83, 1];

    /// <summary>The class round 1.</summary>
    public const int AsPlanned = 3;

    /// <summary>The class of a place that can never be covered; it is hatched, not coloured.</summary>
    public const int Never = -1;

    /// <summary>Index of the class, 0 the lowest.</summary>
    public static int Of(CoverageCell cell, double nominal)
    {
        if (!(cell.Best > 0) || !(nominal > 0))
        {
            return Never;
        }

        var relative = cell.Best / nominal;
        return Bounds.Count(bound => relative >= bound);
    }

    /// <summary>The colour of a class as <c>#rrggbb</c>.</summary>
    public static string ColourOf(int index) => Cividis.At(ColourShares[index]);

    /// <summary>All classes with the area of each; the hatched one only where it occurs.</summary>
    public static IReadOnlyList<CoverageClass> Tally(IEnumerable<StratumCoverage> coverages)
    {
        var areas = new double[Bounds.Length + 1];
        var never = 0.0;
        foreach (var coverage in coverages)
        {
            foreach (var cell in coverage.Cells)
            {
                if (Of(cell, coverage.Nominal) is var index && index == Never)
                {
                    never += cell.AreaKm2;
                }
                else
                {
                    areas[index] += cell.AreaKm2;
                }
            }
        }

        var total = areas.Sum() + never;
        var classes = areas.Select((area, i) => new CoverageClass(i, Name(i), ColourOf(i), area, area / total));
        return never > 0 ? [new CoverageClass(Never, "none", null, never, never / total), .. classes] : [.. classes];
    }

    private static string Name(int index)
    {
        if (index == 0)
        {
            return "under " + Figures.Fixed(Bounds[0], 1);
        }

        return index == Bounds.Length
            ? Figures.Fixed(Bounds[^1], 1) + " and over"
            : $"{Figures.Fixed(Bounds[index - 1], 1)}–{Figures.Fixed(Bounds[index], 1)}";
    }
}

/// <summary>One class of the coverage map.</summary>
/// <param name="Index">Its number; <see cref="CoverageClasses.Never"/> for places without coverage.</param>
/// <param name="Name">Its bounds in words, multiples of nominal.</param>
/// <param name="Colour">Its colour; null where it is hatched.</param>
/// <param name="AreaKm2">Area in it.</param>
/// <param name="Share">Share of the whole area.</param>
public sealed record CoverageClass(int Index, string Name, string? Colour, double AreaKm2, double Share);
