using System.Numerics;
using System.Runtime.Intrinsics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// The edges of a shape under a tree of bounding boxes: a slanted line looks only into the boxes that it passes through, at sixteen of them, or at
/// eight edges, at once. Safe to share between threads.
/// </summary>
internal sealed class EdgeTree
{
    private const int EdgesPerBox = 8;
    private const int BoxesPerBox = 16;

    private readonly FrameShape _shape;

    // Ends of the edges, eight by eight: x of their lower ends, y of those, then the same of their upper ends. What is filled up crosses nothing.
    private readonly double[] _ends;
    private readonly bool[] _insideLeft;

    // Mean side of the boxes of edges.
    private readonly double _boxMetres;

    // From boxes of edges up to at most sixteen.
    private readonly BoxLevel[] _levels;

    /// <param name="shape">The shape; its edges as its rings run.</param>
    /// <param name="ringStarts">Number of the first edge of each ring, and the number of edges as last entry.</param>
    public EdgeTree(FrameShape shape, ReadOnlySpan<int> ringStarts)
    {
        _shape = shape;
        var order = EdgeOrder.Of(shape, ringStarts, together: EdgesPerBox * BoxesPerBox);
        _insideLeft = new bool[order.Length];
        _ends = new double[4 * EdgesPerBox * Shares(order.Length, EdgesPerBox)];
        var boxes = new Box[order.Length];
        for (var i = 0; i < order.Length; i++)
        {
            ref readonly var edge = ref shape.Edges[order[i]];
            _insideLeft[i] = edge.InsideLeft;
            Blocks.Set(_ends, i, EdgesPerBox, edge.LowX, edge.LowY, edge.HighX, edge.HighY);
            boxes[i] = new Box(Math.Min(edge.LowX, edge.HighX), Math.Max(edge.LowX, edge.HighX), edge.LowY, edge.HighY);
        }

        boxes = Box.RoundEvery(EdgesPerBox, boxes);
        _boxMetres = boxes.Average(box => (box.HighX - box.LowX + box.HighY - box.LowY) / 2);
        var levels = new List<BoxLevel> { new(boxes, shape) };
        while (boxes.Length > BoxesPerBox)
        {
            boxes = Box.RoundEvery(BoxesPerBox, boxes);
            levels.Add(new BoxLevel(boxes, shape));
        }

        _levels = [.. levels];
    }

    /// <summary>Finds where lines cross edges, each edge once.</summary>
    public void FindCrossings(SlantedLines lines)
    {
        if (!lines.Boxes.StillHold(this, lines.Lines))
        {
            lines.Boxes.Begin(this, lines.Lines, _shape, _boxMetres);
            for (var level = _levels.Length - 1; level >= 0; level--)
            {
                lines.Boxes.NextLevel(BoxesPerBox, out var boxes, out var found);
                lines.Boxes.EndLevel(Open(_levels[level], lines.Boxes.Probes, boxes, found));
            }
        }

        Cross(lines.Boxes.Met, lines);
        lines.Sort();
    }

    /// <summary>Finds which boxes inside the given ones each line meets, in the same order. Returns how many.</summary>
    private static int Open(BoxLevel level, SegmentProbe[] probes, ReadOnlySpan<(int Line, int Box)> boxes, Span<(int Line, int Box)> found)
    {
        const int atOnce = 64 / BoxesPerBox;
        var count = 0;
        for (var first = 0; first < boxes.Length; first += atOnce)
        {
            var met = 0UL;
            for (var i = first; i < Math.Min(first + atOnce, boxes.Length); i++)
            {
                met |= level.Met(boxes[i].Box, probes[boxes[i].Line]) << (BoxesPerBox * (i - first));
            }

            for (; met != 0; met &= met - 1)
            {
                var bit = (uint)BitOperations.TrailingZeroCount(met);
                var (line, box) = boxes[first + (int)(bit / BoxesPerBox)];
                found[count++] = (line, (box * BoxesPerBox) + (int)(bit % BoxesPerBox));
            }
        }

        return count;
    }

    private void Cross(ReadOnlySpan<(int Line, int Box)> boxes, SlantedLines lines)
    {
        const int atOnce = 64 / EdgesPerBox;
        var segments = lines.Lines;
        var begun = 0;
        for (var first = 0; first < boxes.Length; first += atOnce)
        {
            var met = 0UL;
            for (var i = first; i < Math.Min(first + atOnce, boxes.Length); i++)
            {
                met |= Straddles(boxes[i].Box, segments[boxes[i].Line]) << (EdgesPerBox * (i - first));
            }

            for (; met != 0; met &= met - 1)
            {
                var bit = (uint)BitOperations.TrailingZeroCount(met);
                var (line, box) = boxes[first + (int)(bit / EdgesPerBox)];
                for (; begun <= line; begun++)
                {
                    lines.BeginCrossings(begun);
                }

                if (segments[line].Crosses(EdgeAt(box, (int)(bit % EdgesPerBox)), out var along, out var leaves))
                {
                    lines.AddCrossing(along, leaves);
                }
            }
        }

        for (; begun < lines.Count; begun++)
        {
            lines.BeginCrossings(begun);
        }
    }

    private FrameShape.Edge EdgeAt(int box, int number)
    {
        var ends = _ends.AsSpan((4 * EdgesPerBox * box) + number);
        return new FrameShape.Edge(
            ends[0], ends[EdgesPerBox], ends[2 * EdgesPerBox], ends[3 * EdgesPerBox], _insideLeft[(box * EdgesPerBox) + number]);
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

    /// <summary>How many shares of so many there are, the last perhaps smaller.</summary>
    private static int Shares(int count, int inEach) => (count + inEach - 1) / inEach;

    private readonly record struct Box(double LowX, double HighX, double LowY, double HighY)
    {
        /// <summary>The boxes round the first so many, round as many after them, and so on.</summary>
        public static Box[] RoundEvery(int inEach, Box[] boxes)
        {
            var round = new Box[Shares(boxes.Length, inEach)];
            for (var i = 0; i < boxes.Length; i++)
            {
                var (box, into) = (boxes[i], i / inEach);
                round[into] = i % inEach == 0 ? box : round[into].With(box);
            }

            return round;
        }

        private Box With(Box other)
            => new(Math.Min(LowX, other.LowX), Math.Max(HighX, other.HighX), Math.Min(LowY, other.LowY), Math.Max(HighY, other.HighY));
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
            _boxes = new float[4 * BoxesPerBox * Shares(boxes.Length, BoxesPerBox)];
            Array.Fill(_boxes, float.NaN);
            for (var i = 0; i < boxes.Length; i++)
            {
                var box = boxes[i];
                Blocks.Set(
                    _boxes,
                    i,
                    BoxesPerBox,
                    (float)(((box.LowX + box.HighX) / 2) - shape.MiddleX),
                    (float)(((box.LowY + box.HighY) / 2) - shape.MiddleY),
                    (float)((box.HighX - box.LowX) / 2),
                    (float)((box.HighY - box.LowY) / 2));
            }
        }

        /// <summary>Of the sixteen boxes in a box, one bit for each that the segment meets.</summary>
        public ulong Met(int box, in SegmentProbe probe)
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
