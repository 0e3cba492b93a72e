using System.Globalization;
using System.Text.RegularExpressions;
using System.Xml;
using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Trends;

namespace SurveyPlanner.Pages.Tests;

public partial class TrendTests
{
    private static readonly TrendSheet Sheet = TrendSheet.Of("Sea ducks <b>&", new TrendDesign(0.2), "the plan's target", 10, 0.8);

    [Fact]
    public void Chart_and_table_have_the_core_s_powers()
    {
        var years = TrendCharts.OfYears(Sheet);
        var expected = TrendPower.At(Sheet.Design, -0.05, 10)!;
        Assert.Contains((expected.Years, 100 * expected.Power), years.Lines[1].Points);
        var row = TrendCharts.TableOfYears(Sheet).Rows.Single(row => row[0] == "10");
        Assert.Equal((100 * expected.Power).ToString("0.0", CultureInfo.InvariantCulture), row[3]);
    }

    [Fact]
    public void The_smallest_changes_lie_on_their_line_at_the_power_asked_for()
    {
        var chart = TrendCharts.OfChange(Sheet);
        Assert.Equal("10\u00a0surveys", chart.Lines[0].Label);
        Assert.Equal(2, chart.Dots.Count);
        Assert.All(chart.Dots, dot => Assert.Equal(80, dot.Y, 0.5));
        Assert.Contains(chart.Lines[0].Points, point => point.X == 0 && Math.Abs(point.Y - 5) < 1e-6);
    }

    [Fact]
    public void A_decline_that_leaves_nothing_is_told_and_not_drawn()
    {
        var linear = TrendSheet.Of("Sea ducks", new TrendDesign(0.2, TrendShape.Linear), "as given", 8, 0.8, [-0.25, -0.02]);
        Assert.Contains(TrendCharts.TableOfYears(linear).Rows, row => row[2] == "nothing left");
        Assert.Contains("after which nothing is left", TrendWords.YearsFinding(linear), StringComparison.Ordinal);
        Assert.DoesNotContain("NaN", TrendRenderer.RenderHtml(linear, "0.1.0"), StringComparison.Ordinal);
    }

    [Fact]
    public void The_page_is_the_same_each_time_and_its_text_harmless()
    {
        var page = TrendRenderer.RenderHtml(Sheet, "<script>");
        Assert.Equal(page, TrendRenderer.RenderHtml(Sheet, "<script>"));
        Assert.DoesNotContain("<script", page, StringComparison.OrdinalIgnoreCase);
        Assert.Contains("<h1>Sea ducks &lt;b&gt;&amp;: trend</h1>", page, StringComparison.Ordinal);
        Assert.DoesNotContain("://", page, StringComparison.Ordinal);
        var ids = Id().Matches(page).Select(match => match.Groups[1].Value).ToArray();
        Assert.Equal(ids.Length, ids.Distinct().Count());
    }

    [Fact]
    public void The_picture_is_an_svg_file_of_its_own()
    {
        var document = new XmlDocument { XmlResolver = null };
        document.LoadXml(TrendRenderer.RenderSvg(Sheet));
        Assert.Equal("http://www.w3.org/2000/svg", document.DocumentElement!.NamespaceURI);
        Assert.Single(document.GetElementsByTagName("style").Cast<XmlNode>());
    }

    [GeneratedRegex(" id=\"([^\"]*)\"")]
    private static partial Regex Id();
}
