using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Look;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// Classes of coverage relative to nominal: the same on every map, so that "even" looks even whatever the design, and strata of different effort can be compared.
/// </summary>
internal static class CoverageClasses
{
    // Fifths round 1: under 0.5, …, over 1.5. Seven, the most that a legend's colours can be told apart by.
    private static readonly double[] Bounds = [0.5, 0.7, 0.9, 1.1, 1.3, 1.5];

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

    /// <summary>The classes from the lowest to the highest that occur, with colours spread over them and the area of each.</summary>
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

        var (total, lowest, highest) = (areas.Sum() + never, Array.FindIndex(areas, area => area > 0), Array.FindLastIndex(areas, area => area > 0));
        var classes = new List<CoverageClass>();
        if (never > 0)
        {
            classes.Add(new CoverageClass(Never, "none", null, never, never / total));
        }

        if (lowest >= 0)
        {
            var colours = Cividis.Classes(highest - lowest + 1);
            classes.AddRange(colours.Select((colour, i) =>
                new CoverageClass(lowest + i, Name(lowest + i), colour, areas[lowest + i], areas[lowest + i] / total)));
        }

        return classes;
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
