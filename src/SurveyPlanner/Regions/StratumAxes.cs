using System.Collections.Immutable;

namespace SurveyPlanner.Regions;

/// <summary>
/// The narrowest rectangle round a shape: how long, how wide, and which way it lies.
/// Method: the narrowest strip round a convex polygon has one side along an edge of it (rotating calipers).
/// </summary>
internal static class StratumAxes
{
    /// <summary>Length and width in metres, and the direction of the long side, radians anticlockwise from plane east.</summary>
    /// <param name="hull">Vertices of a convex polygon, anticlockwise, not closed.</param>
    public static (double Long, double Short, double LongAngle) Of(ImmutableArray<PlanePoint> hull)
    {
        var (bestWidth, bestLength, bestAngle) = (double.PositiveInfinity, 0.0, 0.0);

        // While the edge turns once round the polygon, the vertices furthest ahead, across and behind turn once with it: linear in all.
        var (ahead, across, behind) = (1, 1, 1);
        for (var i = 0; i < hull.Length; i++)
        {
            var (from, to) = (hull[i], hull[(i + 1) % hull.Length]);
            var (dx, dy) = (to.X - from.X, to.Y - from.Y);
            var norm = Math.Sqrt((dx * dx) + (dy * dy));
            if (norm == 0)
            {
                continue;
            }

            var (ux, uy) = (dx / norm, dy / norm);
            double Along(int vertex) => ((hull[vertex % hull.Length].X - from.X) * ux) + ((hull[vertex % hull.Length].Y - from.Y) * uy);
            double Across(int vertex) => ((hull[vertex % hull.Length].Y - from.Y) * ux) - ((hull[vertex % hull.Length].X - from.X) * uy);
            ahead = Furthest(Math.Max(ahead, i + 1), hull.Length, Along);
            across = Furthest(Math.Max(across, ahead), hull.Length, Across);
            behind = Furthest(Math.Max(behind, across), hull.Length, vertex => -Along(vertex));

            // Strictly narrower by more than rounding: equal candidates keep the first, whatever the last digit says.
            if (Across(across) < bestWidth * (1 - 1e-9))
            {
                (bestWidth, bestLength, bestAngle) = (Across(across), Along(ahead) - Along(behind), Math.Atan2(uy, ux));
            }
        }

        return bestLength >= bestWidth
            ? (bestLength, bestWidth, bestAngle)
            : (bestWidth, bestLength, bestAngle + (Math.PI / 2));
    }

    /// <summary>Goes on round the polygon from a vertex as long as the next one is further.</summary>
    private static int Furthest(int vertex, int count, Func<int, double> distance)
    {
        for (var steps = 0; steps < count && distance(vertex + 1) >= distance(vertex); steps++)
        {
            vertex++;
        }

        return vertex;
    }
}
