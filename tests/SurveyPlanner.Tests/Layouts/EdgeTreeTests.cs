using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>Held against looking at every edge.</summary>
public class EdgeTreeTests
{
    [Fact]
    public void Lines_find_all_edges_that_they_cross_and_each_once()
    {
        var crossings = 0;
        foreach (var stratum in RandomShapes.Sample(100).Append(Islands(3000)))
        {
            var shape = new FrameShape(stratum.Shape, new TurnedFrame(0.4));
            var lines = new SlantedLines();
            foreach (var batch in Lines(shape, 300).Chunk(37))
            {
                lines.Clear();
                foreach (var (fromX, fromY, toX, toY) in batch)
                {
                    lines.Add(leg: 0, fromX, fromY, toX, toY);
                }

                crossings += Find(shape, lines);
            }
        }

        Assert.True(crossings > 10_000);
    }

    /// <summary>
    /// As draw follows draw: small moves, to and fro, with a jump, a line less, one more, or another shape now and then. What was found for the draws
    /// before must not be what is found now.
    /// </summary>
    [Fact]
    public void Lines_that_move_find_their_new_crossings()
    {
        var random = new PhiloxStream(3, 99, 0, 0);
        var shapes = new[] { Islands(3000), RandomShapes.Sample(1).Single() }.Select(stratum => new FrameShape(stratum.Shape, new TurnedFrame(0.4))).ToArray();
        var lines = new SlantedLines();
        var (shape, crossings) = (shapes[0], 0);
        var (shiftX, shiftY, count) = (0.0, 0.0, 20);
        for (var draw = 0; draw < 2000; draw++)
        {
            shape = draw % 97 == 0 ? shapes[draw % 2] : shape;
            var width = shape.MaxX - shape.MinX;
            var step = width * (draw % 50 == 0 ? 0.3 : draw % 400 < 200 ? 1e-4 : 1e-3);
            (shiftX, shiftY) = (draw % 50 == 0 ? 0 : shiftX + (step * (random.NextDouble() - 0.3)), shiftY + (step * (random.NextDouble() - 0.5)));
            count = draw % 31 == 0 ? 15 + (draw % 11) : count;
            lines.Clear();
            for (var line = 0; line < count; line++)
            {
                var y = shape.MinY + ((line + 0.5) / 20 * (shape.MaxY - shape.MinY)) + shiftY;
                lines.Add(leg: 0, shape.MinX + shiftX, y, shape.MaxX + shiftX, y + (step * 20) + (width / 20));
            }

            crossings += Find(shape, lines);
        }

        Assert.True(crossings > 100_000);
    }

    /// <summary>Looks for the crossings of lines and holds them against those with every edge. Returns how many there are.</summary>
    private static int Find(FrameShape shape, SlantedLines lines)
    {
        var crossings = 0;
        shape.Tree.FindCrossings(lines);
        for (var line = 0; line < lines.Count; line++)
        {
            var expected = new List<(double Along, bool Leaves)>();
            foreach (ref readonly var edge in shape.Edges)
            {
                if (lines.Lines[line].Crosses(edge, out var along, out var leaves))
                {
                    expected.Add((along, leaves));
                }
            }

            lines.CrossingsOf(line, out var found, out var foundLeaves);
            Assert.Equal(expected.Select(one => one.Along).Order(), found.ToArray());
            Assert.Equal(expected.Count(one => one.Leaves), foundLeaves.ToArray().Count(leaves => leaves));
            crossings += found.Length;
        }

        return crossings;
    }

    /// <summary>Squares of 10 m on a grid of 100 m, in a shuffled order.</summary>
    private static Stratum Islands(int count)
    {
        var random = new PhiloxStream(2, 99, 0, 0);
        var numbers = Enumerable.Range(0, count).Select(i => (Key: random.NextDouble(), X: 100.0 * (i % 60), Y: 100.0 * (i / 60))).OrderBy(i => i.Key);
        return PlaneStrata.Of([.. numbers.Select(i => new[] { new[] { (i.X, i.Y), (i.X + 10, i.Y), (i.X + 10, i.Y + 10), (i.X, i.Y + 10) } })]);
    }

    /// <summary>Long and short ones, some through vertices, along x and y, from outside, and far away.</summary>
    private static IEnumerable<(double FromX, double FromY, double ToX, double ToY)> Lines(FrameShape shape, int count)
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
            yield return (fromX, fromY, toX, toY);
        }
    }
}
