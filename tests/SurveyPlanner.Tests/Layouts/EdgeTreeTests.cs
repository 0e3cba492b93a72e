using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>Held against looking at every edge.</summary>
public class EdgeTreeTests
{
    [Fact]
    public void A_segment_finds_all_edges_that_it_crosses_and_each_once()
    {
        var crossings = 0;
        foreach (var stratum in RandomShapes.Sample(100).Append(Islands(3000)))
        {
            var shape = new FrameShape(stratum.Shape, new TurnedFrame(0.4));
            var output = new PieceBuffer();
            foreach (var segment in Segments(shape, 300))
            {
                var found = shape.Tree.Crossings(segment, output);
                output.SortCrossings(found);
                var expected = new List<(double Along, bool Leaves)>();
                foreach (ref readonly var edge in shape.Edges)
                {
                    if (segment.Crosses(edge, out var along, out var leaves))
                    {
                        expected.Add((along, leaves));
                    }
                }

                Assert.Equal(expected.Select(one => one.Along).Order(), output.Crossings[..found]);
                Assert.Equal(expected.Count(one => one.Leaves), output.Leaves[..found].ToArray().Count(leaves => leaves));
                crossings += found;
            }
        }

        Assert.True(crossings > 10_000);
    }

    /// <summary>Squares of 10 m on a grid of 100 m, in a shuffled order.</summary>
    private static Stratum Islands(int count)
    {
        var random = new PhiloxStream(2, 99, 0, 0);
        var numbers = Enumerable.Range(0, count).Select(i => (Key: random.NextDouble(), X: 100.0 * (i % 60), Y: 100.0 * (i / 60))).OrderBy(i => i.Key);
        return PlaneStrata.Of([.. numbers.Select(i => new[] { new[] { (i.X, i.Y), (i.X + 10, i.Y), (i.X + 10, i.Y + 10), (i.X, i.Y + 10) } })]);
    }

    /// <summary>Long and short ones, some through vertices, along x and y, from outside, and far away.</summary>
    private static IEnumerable<Segment> Segments(FrameShape shape, int count)
    {
        var random = new PhiloxStream(1, 99, 0, 0);
        var (width, height) = (shape.MaxX - shape.MinX, shape.MaxY - shape.MinY);
        var edges = shape.Edges.ToArray();
        (double X, double Y) Place(int n)
        {
            var (x, y) = (shape.MinX + (((1.6 * random.NextDouble()) - 0.3) * width), shape.MinY + (((1.6 * random.NextDouble()) - 0.3) * height));
            var edge = edges[(int)random.NextBelow((uint)edges.Length)];
            return (n % 5) switch
            {
                0 => (edge.LowX, edge.LowY),
                1 => (x + (100 * width), y + (100 * height)),
                _ => (x, y),
            };
        }

        for (var n = 0; n < count; n++)
        {
            var (fromX, fromY) = Place(n);
            var (toX, toY) = Place(n / 5);
            if (n % 4 == 0)
            {
                (toX, toY) = (fromX + ((toX - fromX) / 50), fromY + ((toY - fromY) / 50));
            }

            (toX, toY) = (n % 7 == 0 ? fromX : toX, n % 11 == 0 ? fromY : toY);
            var length = Math.Sqrt(((toX - fromX) * (toX - fromX)) + ((toY - fromY) * (toY - fromY)));
            if (length > 0)
            {
                yield return new Segment(fromX, fromY, (toX - fromX) / length, (toY - fromY) / length, length);
            }
        }
    }
}
