namespace SurveyPlanner.Layouts;

/// <summary>An order of a shape's edges in which neighbours lie near each other, for <see cref="EdgeTree"/>.</summary>
/// <remarks>
/// Edges that follow one another do, so rings keep their own order. Rings are put in order along a curve that fills the plane (Morton 1966), so that
/// small islands next to each other come together. The stretches that this makes are put in order of their height: most slanted lines are legs of a
/// zigzag, which run along x more than along y, and so meet few of several stretches.
/// </remarks>
internal static class EdgeOrder
{
    /// <param name="shape">The shape; its edges as its rings run.</param>
    /// <param name="ringStarts">Number of the first edge of each ring, and the number of edges as last entry.</param>
    /// <param name="together">Edges of a stretch.</param>
    /// <returns>Numbers of edges.</returns>
    public static int[] Of(FrameShape shape, ReadOnlySpan<int> ringStarts, int together)
    {
        var order = AlongCurve(shape, ringStarts);
        var heights = new double[order.Length / together];
        var stretches = new int[heights.Length];
        for (var stretch = 0; stretch < heights.Length; stretch++)
        {
            var (low, high) = (double.PositiveInfinity, double.NegativeInfinity);
            foreach (var number in order.AsSpan(stretch * together, together))
            {
                (low, high) = (Math.Min(low, shape.Edges[number].LowY), Math.Max(high, shape.Edges[number].HighY));
            }

            (heights[stretch], stretches[stretch]) = (low + high, stretch);
        }

        // What is left over, less than a stretch, stays at the end.
        Array.Sort(heights, stretches);
        var ordered = (int[])order.Clone();
        for (var i = 0; i < stretches.Length; i++)
        {
            order.AsSpan(stretches[i] * together, together).CopyTo(ordered.AsSpan(i * together));
        }

        return ordered;
    }

    private static int[] AlongCurve(FrameShape shape, ReadOnlySpan<int> ringStarts)
    {
        var (codes, rings) = (new uint[ringStarts.Length - 1], new int[ringStarts.Length - 1]);
        var scale = ushort.MaxValue / Math.Max(Math.Max(shape.MaxX - shape.MinX, shape.MaxY - shape.MinY), double.Epsilon);
        for (var ring = 0; ring < rings.Length; ring++)
        {
            ref readonly var edge = ref shape.Edges[ringStarts[ring]];
            var (column, row) = ((ushort)((edge.LowX - shape.MinX) * scale), (ushort)((edge.LowY - shape.MinY) * scale));
            (codes[ring], rings[ring]) = (Spread(column) | (Spread(row) << 1), ring);
        }

        Array.Sort(codes, rings);
        var (order, next) = (new int[shape.Edges.Length], 0);
        foreach (var ring in rings)
        {
            for (var edge = ringStarts[ring]; edge < ringStarts[ring + 1]; edge++)
            {
                order[next++] = edge;
            }
        }

        return order;
    }

    /// <summary>The sixteen bits of a number with a gap after each.</summary>
    private static uint Spread(ushort number)
    {
        uint bits = number;
        bits = (bits | (bits << 8)) & 0x00FF00FF;
        bits = (bits | (bits << 4)) & 0x0F0F0F0F;
        bits = (bits | (bits << 2)) & 0x33333333;
        return (bits | (bits << 1)) & 0x55555555;
    }
}
