using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using System.Text.RegularExpressions;
using System.Xml;
using SurveyPlanner.Pages.Tests.Fixtures;

namespace SurveyPlanner.Pages.Tests;

public partial class ReportTests
{
    // Everything that can go wrong in a name: markup, ends of CDATA and comments, control characters, half a surrogate pair, turned reading direction.
    private const string Hostile = "<script>alert(1)</script>]]>--><img src=x onerror=y>\"'&\u0000\u0001\u0085\ud800\u202e\u2066;</style></title>{}";

    [Fact]
    public void Equal_plans_give_equal_bytes_whatever_the_culture()
    {
        var expected = ReportRenderer.Render(SamplePlan.Archipelago, SamplePlan.Context);
        var culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        culture.NumberFormat.NumberDecimalSeparator = ",";
        culture.NumberFormat.NumberGroupSeparator = "'";
        culture.NumberFormat.NegativeSign = "minus ";
        var before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = culture;
            Assert.Equal(expected, ReportRenderer.Render(SamplePlan.Archipelago, SamplePlan.Context));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void Text_of_unknown_origin_is_harmless_wherever_it_stands()
    {
        var context = new ReportContext(Hostile, Hostile, Hostile)
        {
            Inputs = [new InputFile(Hostile, Hostile)],
            LayoutSha256 = Hostile,
            RecordFileName = Hostile,
        };
        var plan = SamplePlan.Of(
            SampleBoundary.Boxes((Hostile, 20, 60, 21, 61), (Hostile + "2", 21, 60, 22, 61)), SamplePlan.Parallel(20_000), stratumField: "name", name: Hostile);
        plan = plan with { Region = plan.Region with { CoordinateSystem = Hostile }, Notices = [new Notice(NoticeKind.Warning, Hostile), new Notice(NoticeKind.Repair, Hostile)] };

        var page = ReportRenderer.Render(plan, context);
        Assert.DoesNotContain("<script", page, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("<img", page, StringComparison.OrdinalIgnoreCase);
        Assert.Single(StyleElement().Matches(page));
        Assert.Contains("&lt;script&gt;alert(1)&lt;/script&gt;]]&gt;--&gt;&lt;img", page, StringComparison.Ordinal);
        Assert.DoesNotContain(page, c => char.IsControl(c) && c != '\n');
        Assert.DoesNotContain(page, c => c is '\u202e' or '\u2066');
        Assert.DoesNotMatch(ForbiddenReference(), page);

        // An SVG file must also be XML: the parser refuses control characters and loose markup.
        XmlDocument svg = new() { XmlResolver = null };
        svg.LoadXml(MapRenderer.RenderSvg(plan, context));
        Assert.Equal(("svg", "http://www.w3.org/2000/svg"), (svg.DocumentElement!.LocalName, svg.DocumentElement.NamespaceURI));
    }

    [Fact]
    public void The_page_needs_no_network_and_allows_nothing_but_its_own_style()
    {
        var page = ReportRenderer.Render(SamplePlan.Archipelago, SamplePlan.Context);
        Assert.DoesNotContain("http://", page, StringComparison.Ordinal);
        Assert.DoesNotContain("https://", page, StringComparison.Ordinal);
        Assert.DoesNotContain(" src=", page, StringComparison.Ordinal);
        Assert.DoesNotContain(" style=", page, StringComparison.Ordinal);
        Assert.DoesNotMatch(OutsideUrl(), page);

        // Content Security Policy Level 3: the hash is of the exact content of the element.
        var style = StyleElement().Match(page).Groups[1].Value;
        var hash = Convert.ToBase64String(SHA256.HashData(Encoding.UTF8.GetBytes(style))).Replace("+", "&#x2B;", StringComparison.Ordinal);
        Assert.Contains($"default-src 'none'; style-src 'sha256-{hash}'", page.Replace("&#x27;", "'", StringComparison.Ordinal), StringComparison.Ordinal);
    }

    [Fact]
    public void Every_picture_has_a_title_and_a_description_and_every_id_is_unique()
    {
        var page = ReportRenderer.Render(SamplePlan.Archipelago, SamplePlan.Context);
        var ids = Id().Matches(page).Select(match => match.Groups[1].Value).ToArray();
        Assert.Equal(ids.Length, ids.Distinct().Count());
        Assert.Equal(3, Picture().Count(page));
        foreach (Match match in Picture().Matches(page))
        {
            Assert.All(match.Groups[1].Value.Split(' '), id => Assert.Contains(id, ids));
        }

        Assert.All(InnerLink().Matches(page), match => Assert.Contains(match.Groups[1].Value, ids));
    }

    [Fact]
    public void Every_heading_cell_says_what_it_heads()
    {
        var page = ReportRenderer.Render(SamplePlan.Archipelago, SamplePlan.Context);
        var headings = HeadingCell().Matches(page);
        Assert.NotEmpty(headings);
        Assert.All(headings, match => Assert.Contains("scope=", match.Value, StringComparison.Ordinal));
    }

    /// <summary>What a browser cannot break makes a table as wide as it is: no cell holds more than 24 characters without a chance to.</summary>
    [Fact]
    public void A_long_name_without_a_space_does_not_stretch_the_tables()
    {
        const string name = "Administrativebezirkgrenzüberschreitenderzusammenarbeitsgebietnordwestlichersektor";
        var plan = SamplePlan.Of(
            SampleBoundary.Boxes((name + "1", 20, 60, 21, 61), (name + "2", 21, 60, 22, 61)), SamplePlan.Parallel(20_000), stratumField: "name", cells: 200,
            effort: SamplePlan.InventedEffort, pilot: SamplePlan.InventedPilotWithDistances(isPoints: false, name + "1", name + "2"));
        var cells = Cell().Matches(ReportRenderer.Render(plan, SamplePlan.Context)).Select(match => match.Groups[1].Value).ToArray();

        Assert.Contains(cells, cell => Markup().Replace(cell, "") == System.Net.WebUtility.HtmlEncode(name + "2").Replace("&#252;", "ü", StringComparison.Ordinal));
        Assert.All(
            cells.SelectMany(cell => Markup().Replace(cell, " ").Split(' ', '\u00a0', '\n')),
            run => Assert.InRange(System.Net.WebUtility.HtmlDecode(run).Length, 0, 24));
    }

    [Fact]
    public void The_place_of_lowest_coverage_can_be_found()
    {
        var plan = SamplePlan.Archipelago;
        var lowest = plan.Strata.SelectMany(stratum => stratum.Coverage!.Cells).MinBy(cell => cell.Best)!;
        var told = LowestAt().Match(ReportRenderer.Render(plan, SamplePlan.Context));

        Assert.Equal(lowest.Position.Lat, double.Parse(told.Groups[1].Value, CultureInfo.InvariantCulture), 5.1e-6);
        Assert.Equal(lowest.Position.Lon, double.Parse(told.Groups[2].Value, CultureInfo.InvariantCulture), 5.1e-6);
    }

    [Fact]
    public void Every_transect_stands_in_the_table()
    {
        var page = ReportRenderer.Render(SamplePlan.Archipelago, SamplePlan.Context);
        Assert.All(
            SamplePlan.Archipelago.Strata.SelectMany(stratum => stratum.Layout.Transects),
            transect => Assert.Contains($"<th scope=\"row\" data-label=\"Id\">{transect.Id}</th>", page, StringComparison.Ordinal));
    }

    /// <summary>The report repeats the core's figures: those that a director reads first are looked for in the page.</summary>
    [Fact]
    public void The_answer_stands_first_with_the_figures_of_the_plan()
    {
        var plan = SamplePlan.WithPilot;
        var page = ReportRenderer.Render(plan, SamplePlan.Context);
        var answer = Answer().Match(page).Groups[1].Value;
        var transects = plan.Strata.Sum(stratum => stratum.Layout.Transects.Length);
        Assert.StartsWith($"{transects}\u00a0lines, ", answer, StringComparison.Ordinal);
        Assert.Contains($"{Words.FiguresTests.Shown(100 * plan.Delivered!.Cv)}\u00a0%", answer, StringComparison.Ordinal);
        Assert.Contains("the target is 20\u00a0%", answer, StringComparison.Ordinal);
        Assert.Contains($">{Words.FiguresTests.Shown(plan.Effort!.Required!.Effort)}</th>", page, StringComparison.Ordinal);
        Assert.Equal(5, Picture().Count(page));
    }

    [Theory]
    [InlineData("antimeridian_fiji", null)]
    [InlineData("polar_svalbard", null)]
    [InlineData("strata_maine_counties", "name")]
    [InlineData("lake_caspian_with_islands", null)]
    [InlineData("island_iceland", null)]
    public void A_real_region_gives_a_map_that_is_xml_without_a_missing_number(string file, string? stratumField)
    {
        var plan = SamplePlan.Of(SampleBoundary.Read(file), SamplePlan.Parallel(20_000), stratumField, cells: 500);
        foreach (var svg in (string[])[MapRenderer.RenderSvg(plan.Region, file), MapRenderer.RenderSvg(plan, SamplePlan.Context)])
        {
            new XmlDocument { XmlResolver = null }.LoadXml(svg);
            Assert.DoesNotContain("NaN", svg, StringComparison.Ordinal);
            Assert.DoesNotContain("∞", svg, StringComparison.Ordinal);
            Assert.DoesNotContain("E+", svg, StringComparison.Ordinal);
        }
    }

    [GeneratedRegex("<style>(.*?)</style>", RegexOptions.Singleline)]
    private static partial Regex StyleElement();

    [GeneratedRegex("&#x(0?[0-9A-F]|1[0-9A-F]|7F|[89][0-9A-F]|D[89A-F]..);")]
    private static partial Regex ForbiddenReference();

    [GeneratedRegex(@"url\((?!#)")]
    private static partial Regex OutsideUrl();

    [GeneratedRegex("<p class=\"answer\">(.*?)</p>")]
    private static partial Regex Answer();

    [GeneratedRegex(" id=\"([^\"]*)\"")]
    private static partial Regex Id();

    [GeneratedRegex("<svg [^>]*role=\"img\" aria-labelledby=\"([^\"]*)\"")]
    private static partial Regex Picture();

    [GeneratedRegex("href=\"#([^\"]*)\"")]
    private static partial Regex InnerLink();

    [GeneratedRegex("<th[ >][^>]*>")]
    private static partial Regex HeadingCell();

    [GeneratedRegex("<(?:th|td|caption)(?: [^>]*)?>(.*?)</(?:th|td|caption)>", RegexOptions.Singleline)]
    private static partial Regex Cell();

    [GeneratedRegex("<[^>]*>")]
    private static partial Regex Markup();

    [GeneratedRegex(@"It is lowest, [^<]*, at (-?[0-9]+\.[0-9]{5}), (-?[0-9]+\.[0-9]{5}) \(latitude, longitude\)")]
    private static partial Regex LowestAt();
}
