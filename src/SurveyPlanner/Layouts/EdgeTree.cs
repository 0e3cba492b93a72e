using System.Numerics;
using System.Runtime.Intrinsics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// The edges of a shape under a tree of bounding boxes: a slanted line looks only into the boxes that it passes through, at sixteen of them, or at
/// eight edges, at once. Safe to share between threads.
/// </summary>
/// <remarks>
/// Edges that follow one another lie near each other, so the rings' own order makes small boxes. Rings are put in order along a curve that fills
/// the plane (Morton 1966), so that small islands next to each other share a box.
/// </remarks>
internal sealed class EdgeTree
{
    private const int EdgesPerBox = 8;
    private const int BoxesPerBox = 16;

    // So many boxes are looked at one and all: a level more would not pay.
    private const int MostAtTop = 8 * BoxesPerBox;

    private readonly FrameShape _shape;
    private readonly FrameShape.Edge[] _edges;

    // Ends of the edges, eight by eight: x of their lower ends, y of those, then the same of their upper ends. What is filled up crosses nothing.
    private readonly double[] _ends;

    // From boxes of edges up to a few; and the numbers of all sixteens of those.
    private readonly BoxLevel[] _levels;
    private readonly int[] _top;

    /// <param name="shape">The shape; its edges as its rings run.</param>
    /// <param name="ringStarts">Number of the first edge of each ring, and the number of edges as last entry.</param>
    public EdgeTree(FrameShape shape, ReadOnlySpan<int> ringStarts)
    {
        _shape = shape;
        _edges = InOrder(shape, ringStarts);
        _ends = new double[4 * RoundedUp(_edges.Length, EdgesPerBox)];
        for (var i = 0; i < _edges.Length; i++)
        {
            ref readonly var edge = ref _edges[i];
            Blocks.Set(_ends, i, EdgesPerBox, edge.LowX, edge.LowY, edge.HighX, edge.HighY);
        }

        var boxes = Array.ConvertAll(_edges, edge => new Box(Math.Min(edge.LowX, edge.HighX), Math.Max(edge.LowX, edge.HighX), edge.LowY, edge.HighY));
        var levels = new List<BoxLevel>();
        for (var inEach = EdgesPerBox; inEach == EdgesPerBox || boxes.Length > MostAtTop; inEach = BoxesPerBox)
        {
            boxes = [.. boxes.Chunk(inEach).Select(Box.Round)];
            levels.Add(new BoxLevel(boxes, shape));
        }

        _levels = [.. levels];
        _top = [.. Enumerable.Range(0, (boxes.Length + BoxesPerBox - 1) / BoxesPerBox)];
    }

    /// <summary>Notes where a segment crosses edges, each once, in no order. Returns how many there are.</summary>
    public int Crossings(in Segment segment, PieceBuffer output)
    {
        // Level by level; boxes of one level are independent of each other, so that the processor can look at several at a time.
        var probe = new Probe(segment, _shape);
        var count = Open(_levels[^1], probe, _top, output.FoundBoxes);
        for (var level = _levels.Length - 2; level >= 0; level--)
        {
            count = Open(_levels[level], probe, output.FoundBoxes.AsSpan(0, count), output.MoreBoxes(BoxesPerBox * count));
            output.SwapBoxes();
        }

        return Cross(output.FoundBoxes.AsSpan(0, count), segment, output);
    }

    /// <summary>Finds which boxes inside the given ones the segment meets. Returns how many.</summary>
    private static int Open(BoxLevel level, in Probe probe, ReadOnlySpan<int> boxes, Span<int> found)
    {
        const int atOnce = 64 / BoxesPerBox;
        var count = 0;
        for (var first = 0; first < boxes.Length; first += atOnce)
        {
            var met = 0UL;
            for (var i = first; i < Math.Min(first + atOnce, boxes.Length); i++)
            {
                met |= level.Met(boxes[i], probe) << (BoxesPerBox * (i - first));
            }

            for (; met != 0; met &= met - 1)
            {
                var bit = (uint)BitOperations.TrailingZeroCount(met);
                found[count++] = (boxes[first + (int)(bit / BoxesPerBox)] * BoxesPerBox) + (int)(bit % BoxesPerBox);
            }
        }

        return count;
    }

    private int Cross(ReadOnlySpan<int> boxes, in Segment segment, PieceBuffer output)
    {
        const int atOnce = 64 / EdgesPerBox;
        var count = 0;
        for (var first = 0; first < boxes.Length; first += atOnce)
        {
            var met = 0UL;
            for (var i = first; i < Math.Min(first + atOnce, boxes.Length); i++)
            {
                met |= Straddles(boxes[i], segment) << (EdgesPerBox * (i - first));
            }

            for (; met != 0; met &= met - 1)
            {
                var bit = (uint)BitOperations.TrailingZeroCount(met);
                ref readonly var edge = ref _edges[(boxes[first + (int)(bit / EdgesPerBox)] * EdgesPerBox) + (int)(bit % EdgesPerBox)];
                if (segment.Crosses(edge, out var along, out var leaves))
                {
                    output.SetCrossing(count++, along, leaves);
                }
            }
        }

        return count;
    }

    /// <summary>Of the eight edges in a box, one bit for each whose ends lie on different sides of the segment's line.</summary>
    private ulong Straddles(int box, in Segment segment)
    {
        ref var ends = ref _ends[4 * EdgesPerBox * box];
        var low = segment.HeightsOf(Vector512.LoadUnsafe(ref ends), Vector512.LoadUnsafe(ref ends, EdgesPerBox));
        var high = segment.HeightsOf(Vector512.LoadUnsafe(ref ends, 2 * EdgesPerBox), Vector512.LoadUnsafe(ref ends, 3 * EdgesPerBox));
        return (Vector512.LessThanOrEqual(low, Vector512<double>.Zero) ^ Vector512.LessThanOrEqual(high, Vector512<double>.Zero))
            .ExtractMostSignificantBits();
    }

    private static FrameShape.Edge[] InOrder(FrameShape shape, ReadOnlySpan<int> ringStarts)
    {
        var edges = shape.Edges;
        var rings = new (uint Code, int Start, int End)[ringStarts.Length - 1];
        var scale = ushort.MaxValue / Math.Max(Math.Max(shape.MaxX - shape.MinX, shape.MaxY - shape.MinY), double.Epsilon);
        for (var ring = 0; ring < rings.Length; ring++)
        {
            ref readonly var edge = ref edges[ringStarts[ring]];
            var (column, row) = ((ushort)((edge.LowX - shape.MinX) * scale), (ushort)((edge.LowY - shape.MinY) * scale));
            rings[ring] = (Spread(column) | (Spread(row) << 1), ringStarts[ring], ringStarts[ring + 1]);
        }

        Array.Sort(rings);
        var ordered = new FrameShape.Edge[edges.Length];
        var next = 0;
        foreach (var (_, start, end) in rings)
        {
            edges[start..end].CopyTo(ordered.AsSpan(next));
            next += end - start;
        }

        return ordered;
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

    private static int RoundedUp(int count, int to) => (count + to - 1) / to * to;

    private readonly record struct Box(double LowX, double HighX, double LowY, double HighY)
    {
        public static Box Round(Box[] boxes)
            => new(boxes.Min(box => box.LowX), boxes.Max(box => box.HighX), boxes.Min(box => box.LowY), boxes.Max(box => box.HighY));
    }

    /// <summary>
    /// A segment as boxes see it, in single precision, which is enough to tell what can be skipped. From the middle of the shape, metres.
    /// </summary>
    private readonly struct Probe
    {
        // Far above what single precision rounds off, in parts of the lengths it is reckoned from.
        private const double Margin = 4e-6;

        private readonly float _middleX;
        private readonly float _middleY;
        private readonly float _directionX;
        private readonly float _directionY;
        private readonly float _steepness;
        private readonly float _flatness;
        private readonly float _reachX;
        private readonly float _reachY;
        private readonly float _reachBeside;

        public Probe(in Segment segment, FrameShape shape)
        {
            var (x, y) = (segment.MiddleX - ((shape.MinX + shape.MaxX) / 2), segment.MiddleY - ((shape.MinY + shape.MaxY) / 2));
            var margin = Margin * ((shape.MaxX - shape.MinX) + (shape.MaxY - shape.MinY) + segment.Length + Math.Abs(x) + Math.Abs(y));
            (_middleX, _middleY) = ((float)x, (float)y);
            (_directionX, _directionY) = ((float)segment.DirectionX, (float)segment.DirectionY);
            (_steepness, _flatness) = (Math.Abs(_directionY), Math.Abs(_directionX));
            _reachX = (float)((Math.Abs(segment.DirectionX) * segment.Length / 2) + margin);
            _reachY = (float)((Math.Abs(segment.DirectionY) * segment.Length / 2) + margin);
            _reachBeside = (float)margin;
        }

        /// <summary>One bit for each of sixteen boxes that the segment meets.</summary>
        public ulong Meets(Vector512<float> boxX, Vector512<float> boxY, Vector512<float> halfX, Vector512<float> halfY)
        {
            // A segment misses a box where a line along x, along y or along the segment parts them.
            var fromX = boxX - Vector512.Create(_middleX);
            var fromY = boxY - Vector512.Create(_middleY);
            var beside = Vector512.MultiplyAddEstimate(fromY, Vector512.Create(_directionX), fromX * Vector512.Create(-_directionY));
            var reach = Vector512.MultiplyAddEstimate(halfX, Vector512.Create(_steepness), Vector512.Create(_reachBeside));
            reach = Vector512.MultiplyAddEstimate(halfY, Vector512.Create(_flatness), reach);
            return (Vector512.LessThanOrEqual(Vector512.Abs(beside), reach)
                & Vector512.LessThanOrEqual(Vector512.Abs(fromX), halfX + Vector512.Create(_reachX))
                & Vector512.LessThanOrEqual(Vector512.Abs(fromY), halfY + Vector512.Create(_reachY)))
                .ExtractMostSignificantBits();
        }
    }

    /// <summary>
    /// Boxes by their middles, from the middle of the shape, and half sides, metres, sixteen by sixteen: x and y of middles, then halves along x and y.
    /// What is filled up meets nothing.
    /// </summary>
    private sealed class BoxLevel
    {
        private readonly float[] _boxes;

        public BoxLevel(Box[] boxes, FrameShape shape)
        {
            var (centreX, centreY) = ((shape.MinX + shape.MaxX) / 2, (shape.MinY + shape.MaxY) / 2);
            _boxes = new float[4 * RoundedUp(boxes.Length, BoxesPerBox)];
            Array.Fill(_boxes, float.NaN);
            for (var i = 0; i < boxes.Length; i++)
            {
                var box = boxes[i];
                Blocks.Set(
                    _boxes,
                    i,
                    BoxesPerBox,
                    (float)(((box.LowX + box.HighX) / 2) - centreX),
                    (float)(((box.LowY + box.HighY) / 2) - centreY),
                    (float)((box.HighX - box.LowX) / 2),
                    (float)((box.HighY - box.LowY) / 2));
            }
        }

        /// <summary>Of the sixteen boxes in a box, one bit for each that the segment meets.</summary>
        public ulong Met(int box, in Probe probe)
        {
            ref var first = ref _boxes[4 * BoxesPerBox * box];
            return probe.Meets(
                Vector512.LoadUnsafe(ref first),
                Vector512.LoadUnsafe(ref first, BoxesPerBox),
                Vector512.LoadUnsafe(ref first, 2 * BoxesPerBox),
                Vector512.LoadUnsafe(ref first, 3 * BoxesPerBox));
        }
    }

    /// <summary>Four numbers of each of many things, kept in blocks: the first of eight or sixteen of them, then the second, and so on.</summary>
    private static class Blocks
    {
        public static void Set<T>(T[] blocks, int index, int perBlock, T first, T second, T third, T fourth)
        {
            var at = (4 * (index - (index % perBlock))) + (index % perBlock);
            (blocks[at], blocks[at + perBlock], blocks[at + (2 * perBlock)], blocks[at + (3 * perBlock)]) = (first, second, third, fourth);
        }
    }
}
