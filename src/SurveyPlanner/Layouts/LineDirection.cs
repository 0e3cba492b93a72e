using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>The mean direction of lines drawn on the map.</summary>
internal static class LineDirection
{
    // Below this share of the whole length the legs cancel out: no direction is better than another.
    private const double LeastAgreement = 0.1;

    /// <summary>
    /// True bearing at the given centre of the mean direction of all legs, weighted by length, degrees in [0, 180). A direction and its opposite
    /// are the same, so angles are doubled before they are averaged (Mardia and Jupp 2000, Directional Statistics, section 1.4.2, from memory).
    /// Measured in an equal-area plane round the centre, where north is north.
    /// </summary>
    /// <exception cref="InputException">The lines have no length, or wind so much that they have no direction.</exception>
    public static double Of(ImmutableArray<ImmutableArray<LonLat>> lines, LonLat centre)
    {
        var plane = new AzimuthalEqualArea(centre);
        var (length, east, north) = (0.0, 0.0, 0.0);
        foreach (var line in lines)
        {
            var points = line.Select(plane.Project).ToList();
            for (var i = 1; i < points.Count; i++)
            {
                var (dx, dy) = (points[i].X - points[i - 1].X, points[i].Y - points[i - 1].Y);
                var leg = Math.Sqrt((dx * dx) + (dy * dy));
                var doubled = 2 * Math.Atan2(dx, dy);
                length += leg;
                north += leg * Math.Cos(doubled);
                east += leg * Math.Sin(doubled);
            }
        }

        if (!(Math.Sqrt((east * east) + (north * north)) > LeastAgreement * length))
        {
            throw new InputException(new Problem(
                "the line that the bearing is to cross has no direction of its own: it has no length, closes on itself or winds too much; draw a simpler one",
                Key: "layout.bearing"));
        }

        return ((Math.Atan2(east, north) * 90 / Math.PI) + 180) % 180;
    }
}
