using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// Cuts a path at 180° as RFC 7946, 3.1.9 asks: no part crosses it, and the parts meet on it.
/// Between vertices the path takes the shorter way round and is straight in longitude and latitude (RFC 7946, 3.1.1).
/// </summary>
internal static class AntimeridianCut
{
    /// <summary>Parts shorter than this in both directions vanish in rounding to 7 decimals, degrees.</summary>
    private const double NothingDegrees = 0.5e-7;

    /// <returns>The parts in order of travel, longitudes in [-180, 180]; one part where nothing is cut.</returns>
    public static ImmutableArray<ImmutableArray<LonLat>> Cut(ImmutableArray<LonLat> path)
    {
        var parts = ImmutableArray.CreateBuilder<ImmutableArray<LonLat>>();
        var here = path[0] with { Lon = Longitude.Normalise(path[0].Lon) };
        var part = ImmutableArray.CreateBuilder<LonLat>();
        part.Add(here);
        foreach (var vertex in path.AsSpan()[1..])
        {
            var next = new LonLat(here.Lon + Longitude.Difference(here.Lon, vertex.Lon), vertex.Lat);
            if (next.Lon is > 180 or < -180)
            {
                var side = next.Lon > 180 ? 180 : -180;
                var share = (side - here.Lon) / (next.Lon - here.Lon);
                var crossing = new LonLat(side, here.Lat + (share * (next.Lat - here.Lat)));
                if (part[^1] != crossing)
                {
                    part.Add(crossing);
                }

                parts.Add(part.ToImmutable());
                part.Clear();
                part.Add(crossing with { Lon = -side });
                next = next with { Lon = next.Lon - (2 * side) };
            }

            part.Add(next);
            here = next;
        }

        parts.Add(part.ToImmutable());
        return parts.Count == 1 ? parts.ToImmutable() : WithoutNothings(parts.ToImmutable());
    }

    private static ImmutableArray<ImmutableArray<LonLat>> WithoutNothings(ImmutableArray<ImmutableArray<LonLat>> parts)
    {
        var kept = parts.RemoveAll(part => part.All(vertex =>
            Math.Abs(vertex.Lon - part[0].Lon) < NothingDegrees && Math.Abs(vertex.Lat - part[0].Lat) < NothingDegrees));
        return kept.IsEmpty ? parts[..1] : kept;
    }
}
