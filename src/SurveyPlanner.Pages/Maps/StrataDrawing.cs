using System.Globalization;
using SurveyPlanner.Pages.Look;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>The strata of a region on a drawing.</summary>
public sealed record StrataDrawing(IReadOnlyList<StratumDrawing> Strata, string Exclusions)
{
    public const double NameSize = 14;

    // A name is written out up to the first; a longer one is cut to the room there is, but never below the second.
    private const double LongestName = 235;
    private const double ShortestCut = 118;

    private const double SpotPixels = 3;

    /// <summary>A lone stratum needs no name: the map's title has it.</summary>
    internal static StrataDrawing Of(Region region, MapFrame frame, LabelPlacer placer)
    {
        var shapes = region.Strata.Select(stratum => ShapeDrawing.Of(stratum.Shape, frame)).ToArray();
        var fills = FillsFor(shapes);
        var strata = region.Strata.Select((stratum, i) => new StratumDrawing(
            stratum.Name,
            shapes[i],
            Tokens.StratumFills[fills[i]],
            region.Strata.Length > 1 ? NameLabel(stratum.Name, shapes[i], placer) : null));
        return new StrataDrawing([.. strata], ShapeDrawing.Of(region.Exclusions, frame).Path);
    }

    private static Label NameLabel(string name, ShapeDrawing shape, LabelPlacer placer)
    {
        var candidates = shape.RoomiestPlaces(120).Select(place => new Label(Fitted(name, shape, place), place with { Y = place.Y + (NameSize / 3) })).ToArray();
        if (candidates.FirstOrDefault(label => placer.TryPlace(label, NameSize)) is { } free)
        {
            return free;
        }

        // A stratum is never without its name, even where names must touch.
        placer.Place(candidates[0], NameSize);
        return candidates[0];
    }

    private static string Fitted(string name, ShapeDrawing shape, Pixel place)
    {
        var length = LabelPlacer.LengthOf(name, NameSize);
        return length <= LongestName
            ? name
            : PlainText.Shorten(name, (int)(Math.Clamp(shape.WidthAt(place), ShortestCut, LongestName) / length * new StringInfo(name).LengthInTextElements));
    }

    // Neighbours (strata whose edges run over the same spot of the drawing) get different fills as far as four allow, and so do all while there are no more than four.
    private static int[] FillsFor(ShapeDrawing[] shapes)
    {
        var edges = shapes.Select(shape => shape.Rings.SelectMany(Spots).ToHashSet()).ToArray();
        var fills = new int[shapes.Length];
        for (var i = 0; i < shapes.Length; i++)
        {
            var used = Enumerable.Range(0, i).Where(j => edges[i].Overlaps(edges[j])).Select(j => fills[j]).ToArray();
            fills[i] = Enumerable.Range(0, Tokens.StratumFills.Count)
                .OrderBy(fill => used.Count(u => u == fill)).ThenBy(fill => fills.AsSpan(0, i).Count(fill)).ThenBy(fill => fill).First();
        }

        return fills;
    }

    // A step of half a spot's side misses none that the edge runs through for long.
    private static IEnumerable<(int, int)> Spots(Pixel[] ring)
        => from i in Enumerable.Range(0, ring.Length)
           let a = ring[i]
           let b = ring[(i + 1) % ring.Length]
           let steps = Math.Max(1, (int)(a.DistanceTo(b) / (SpotPixels / 2)))
           from step in Enumerable.Range(0, steps)
           select ((int)((a.X + ((b.X - a.X) * step / steps)) / SpotPixels), (int)((a.Y + ((b.Y - a.Y) * step / steps)) / SpotPixels));
}

/// <summary>One stratum on a drawing.</summary>
/// <param name="Name">Its full name.</param>
/// <param name="Shape">Its rings.</param>
/// <param name="Fill">Its colour.</param>
/// <param name="NameLabel">Its name where it stands on the map; null for a lone stratum.</param>
public sealed record StratumDrawing(string Name, ShapeDrawing Shape, string Fill, Label? NameLabel);
