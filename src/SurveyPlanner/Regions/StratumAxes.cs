using System.Collections.Immutable;

namespace SurveyPlanner.Regions;

/// <summary>
/// The narrowest rectangle round a shape: how long, how wide, and which way it lies.
/// Method: the narrowest strip round a convex polygon has one side along an edge of it (rotating calipers).
/// </summary>
internal static class StratumAxes
{
    /// <summary>Length and width in metres, and the direction of the long side, radians anticlockwise from plane east.</summary>
    public static (double Long, double Short, double LongAngle) Of(ImmutableArray<PlanePoint> hull)
    {
        var (bestWidth, bestLength, bestAngle) = (double.PositiveInfinity, 0.0, 0.0);
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
            var (low, high, width) = (double.PositiveInfinity, double.NegativeInfinity, 0.0);
            foreach (var point in hull)
            {
                var along = ((point.X - from.X) * ux) + ((point.Y - from.Y) * uy);
                low = Math.Min(low, along);
                high = Math.Max(high, along);
                width = Math.Max(width, Math.Abs(((point.Y - from.Y) * ux) - ((point.X - from.X) * uy)));
            }

            // Strictly narrower by more than rounding: equal candidates keep the first, whatever the last digit says.
            if (width < bestWidth * (1 - 1e-9))
            {
                (bestWidth, bestLength, bestAngle) = (width, high - low, Math.Atan2(uy, ux));
            }
        }

        return bestLength >= bestWidth
            ? (bestLength, bestWidth, bestAngle)
            : (bestWidth, bestLength, bestAngle + (Math.PI / 2));
    }
}
