using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// A bounding box as RFC 7946, 5.2 and 5.3 define it: west is greater than east when it reaches over 180°,
/// and a box with a pole goes all the way round.
/// </summary>
internal readonly record struct BoundingBox(double West, double South, double East, double North)
{
    /// <summary>The smallest box round parts that were cut at 180°, longitudes in [-180, 180]; null round nothing.</summary>
    public static BoundingBox? Round(IEnumerable<IReadOnlyList<LonLat>> parts)
    {
        var spans = new List<(double West, double East)>();
        var (south, north) = (double.PositiveInfinity, double.NegativeInfinity);
        foreach (var part in parts)
        {
            spans.Add((part.Min(vertex => vertex.Lon), part.Max(vertex => vertex.Lon)));
            south = Math.Min(south, part.Min(vertex => vertex.Lat));
            north = Math.Max(north, part.Max(vertex => vertex.Lat));
        }

        if (spans.Count == 0)
        {
            return null;
        }

        var (west, east) = south <= -90 || north >= 90 ? (-180, 180) : OutsideWidestGap(spans);
        return new BoundingBox(west, south, east, north);
    }

    /// <summary>Everything but the widest stretch of longitude in which there is nothing.</summary>
    private static (double West, double East) OutsideWidestGap(List<(double West, double East)> spans)
    {
        spans.Sort();
        var reach = spans.Max(span => span.East);
        var (west, east, widest) = (spans[0].West, reach, spans[0].West + 360 - reach);
        var last = spans[0].East;
        foreach (var span in spans)
        {
            if (span.West - last > widest)
            {
                (west, east, widest) = (span.West, last, span.West - last);
            }

            last = Math.Max(last, span.East);
        }

        return (west, east);
    }
}
