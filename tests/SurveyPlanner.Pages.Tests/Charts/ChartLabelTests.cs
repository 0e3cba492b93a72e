using CsCheck;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Pages.Tests.Charts;

public class ChartLabelTests
{
    private static readonly Axis X = new("x", 0, 10, 2);
    private static readonly Axis Y = new("y", 0, 100, 20);

    [Fact]
    public void Names_beside_the_lines_keep_their_order_and_never_touch_or_leave_the_plot()
        => Gen.Double[-50, 150].Array[2, 8].Hold(
            2000, seed: 1,
            ends =>
            {
                var names = Drawing([.. ends.Select((end, i) => new Line($"line {i}", [(0, 50), (10, end)]))]).Names;
                Assert.Equal(ends.Length, names.Count);
                Assert.All(names.Zip(names.Skip(1)), pair =>
                {
                    Assert.True(pair.Second.Y - pair.First.Y >= 16.9);
                    Assert.True(pair.First.End.Y <= pair.Second.End.Y);
                });
                Assert.True(names[^1].Y <= ChartDrawing.Base);
            });

    [Fact]
    public void A_lone_line_has_its_name_clear_of_it()
    {
        var line = new Line("expected", [.. Enumerable.Range(1, 100).Select(i => (i / 10.0, 100.0 / i))]);
        var drawing = Drawing(line);
        var name = Assert.Single(drawing.Labels);
        var curve = line.Points.Where(point => drawing.At(point.X, 0).X > name.Place.X - 60).Select(point => drawing.At(point.X, point.Y).Y).ToArray();
        Assert.True(name.Place.Y < curve.Min() - 2 || name.Place.Y > curve.Max() + 8);
    }

    [Fact]
    public void A_level_is_named_where_no_line_runs()
    {
        var rising = new Line("", [(0, 0), (8, 80), (10, 100)]);
        var drawing = new ChartDrawing(new Chart("t", "d", X, Y) { Lines = [rising], Levels = [new Level(80, "power asked for")] });
        var label = Assert.Single(drawing.Labels);

        // Above its right end the line would run through it.
        Assert.True(label.Place.Y > drawing.At(0, 80).Y + 8);
    }

    [Fact]
    public void The_margin_has_room_for_long_ticks()
    {
        var small = new ChartDrawing(new Chart("t", "d", X, Y));
        var large = new ChartDrawing(new Chart("t", "d", X, Axis.Covering("y", 0, 0.00015)));
        Assert.True(large.Left > small.Left + 15);
    }

    private static ChartDrawing Drawing(params Line[] lines) => new(new Chart("t", "d", X, Y) { Lines = lines });
}
