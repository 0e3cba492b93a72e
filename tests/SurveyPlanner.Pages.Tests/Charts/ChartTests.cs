using System.Xml;
using CsCheck;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Pages.Tests.Charts;

public class ChartTests
{
    [Fact]
    public void An_axis_holds_what_it_must_and_has_few_round_ticks()
        => Gen.Select(Gen.Double[-1e6, 1e6], Gen.Double[1e-6, 1e6]).Hold(
            5000, seed: 1,
            sample =>
            {
                var (low, span) = sample;
                var axis = Axis.Covering("x", low, low + span);
                var ticks = axis.Ticks.ToArray();
                var mantissa = axis.Step / Math.Pow(10, Math.Floor(Math.Log10(axis.Step) + 1e-9));
                Assert.True(axis.Min <= low + (1e-8 * axis.Step) && axis.Max >= low + span - (1e-8 * axis.Step) && ticks.Length is >= 2 and <= 9
                    && new[] { 1, 2, 5 }.Any(round => Math.Abs(mantissa - round) < 1e-6));
            });

    [Theory]
    [InlineData(0, 0.35, "0.0", "0.4")]
    [InlineData(0, 50, "0", "50")]
    [InlineData(0, 12000, "0", "12\u202f000")]
    [InlineData(0, 0.02, "0.000", "0.020")]
    public void Ticks_have_as_many_decimals_as_they_need(double low, double high, string first, string last)
    {
        var axis = Axis.Covering("x", low, high);
        Assert.Equal(first, axis.Text(axis.Ticks.First()));
        Assert.Equal(last, axis.Text(axis.Ticks.Last()));
    }

    [Fact]
    public void Values_lie_where_the_axes_put_them()
    {
        var drawing = new ChartDrawing(new Chart("t", "d", new Axis("x", 0, 10, 2), new Axis("y", 0, 100, 20)));
        Assert.Equal((drawing.Left, ChartDrawing.Height - ChartDrawing.Bottom), (drawing.At(0, 0).X, drawing.At(0, 0).Y));
        Assert.Equal((ChartDrawing.Width - drawing.Right, ChartDrawing.Top), (drawing.At(10, 100).X, drawing.At(10, 100).Y));
        Assert.Equal([.. drawing.XTicks.Select(tick => tick.Text)], ["0", "2", "4", "6", "8", "10"]);
    }

    [Fact]
    public void A_chart_with_everything_on_it_is_xml_with_each_part_once()
    {
        var points = Enumerable.Range(1, 10).Select(i => ((double)i, 100.0 / i)).ToArray();
        var chart = new Chart("<title>", "a & b", Axis.Covering("Length of line, km", 0, 10), Axis.Covering("CV, %", 0, 100))
        {
            Bars = [new Bar(0, 1, 20), new Bar(1, 2, 30)],
            Lines =
            [
                new Line("expected", points) { Band = [.. points.Select(p => (p.Item1, p.Item2 * 0.8, p.Item2 * 1.2))] },
                new Line("second", points) { Look = LineLook.Second },
            ],
            Levels = [new Level(20, "target 20 %"), new Level(4, "half-width 4 m", IsUpright: true)],
            Dots = [new Dot(5, 20, "layout as drawn")],
        };
        var document = Parse(RazorText.Render<ChartView>(new() { [nameof(ChartView.Chart)] = chart, [nameof(ChartView.Key)] = "c" }));
        Assert.Equal(2, Count(document, "class"));
        Assert.Equal(1, Count(document, "band"));
        // Each line has a sample beside its name in the margin.
        Assert.Equal(2, Count(document, "curve"));
        Assert.Equal(2, Count(document, "curve2"));
        Assert.Equal(2, Count(document, "target"));
        Assert.Equal(1, Count(document, "dot"));
        Assert.All(new[] { "expected", "second", "target 20 %", "half-width 4 m", "layout as drawn" }, label => Assert.Single(document.GetElementsByTagName("text").Cast<XmlNode>(), text => text.InnerText == label));
    }

    [Fact]
    public void Named_bars_are_as_long_as_their_figures()
    {
        var bars = new NamedBars("t", "d", "km", [("north", 20, "20"), ("south <&>", 10, "10"), ("none", 0, "0")]);
        var document = Parse(RazorText.Render<NamedBarsView>(new() { [nameof(NamedBarsView.Bars)] = bars, [nameof(NamedBarsView.Key)] = "b" }));
        var widths = document.GetElementsByTagName("rect").Cast<XmlElement>().Select(rect => double.Parse(rect.GetAttribute("width"), System.Globalization.CultureInfo.InvariantCulture)).ToArray();
        Assert.Equal(2, widths[0] / widths[1], 1e-9);
        Assert.Equal(0, widths[2]);
    }

    private static XmlDocument Parse(string svg)
    {
        var document = new XmlDocument { XmlResolver = null };
        document.LoadXml(svg);
        return document;
    }

    private static int Count(XmlDocument document, string cssClass)
        => document.GetElementsByTagName("*").Cast<XmlElement>().Count(element => element.GetAttribute("class") == cssClass);
}
