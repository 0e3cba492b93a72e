using SurveyPlanner.Files.Plans;

namespace SurveyPlanner.Files.Tests.Plans;

/// <summary>Lines that are no TOML, as people write them.</summary>
public class BrokenLineTests
{
    [Theory]
    [InlineData("kind = parallel", "write kind = \"parallel\": text stands between quotes", "kind = \"parallel\"")]
    [InlineData("kind = parallel # ours", "write kind = \"parallel\": text stands between quotes", "kind = \"parallel\"")]
    [InlineData("kind: \"parallel\"", "write kind = \"parallel\": a key and its value are joined by one =", "kind = \"parallel\"")]
    [InlineData("kind == 'parallel'", "write kind = 'parallel': a key and its value are joined by one =", "kind = 'parallel'")]
    [InlineData("kind = “parallel”", "write kind = \"parallel\": straight quotes, not curly ones", "kind = \"parallel\"")]
    [InlineData("kind = „parallel“", "write kind = \"parallel\": straight quotes, not curly ones", "kind = \"parallel\"")]
    [InlineData("kind = \"parallel", "kind: the closing \" is missing", "kind = \"parallel\"")]
    [InlineData("kind = \"parallel\" or zigzag", "something stands after the closing \" of kind: take it out, or put it behind a #", "kind = \"parallel\"")]
    [InlineData("kind =", "kind has no value", "kind =")]
    [InlineData("spacing = 5 km", "write spacing = \"5 km\": text stands between quotes", "spacing = \"5 km\"")]
    [InlineData("target_cv = 20%", "write target_cv = 0.2: a share of 1, not percent", "target_cv = 0.2")]
    [InlineData("target_cv = 0,20", "target_cv: \"0,20\" has a comma: the decimal mark is a point, write 0.20", "target_cv = 0.20")]
    [InlineData("target_cv = .2", "write target_cv = 0.2: the number in its plain form", "target_cv = 0.2")]
    [InlineData("bearing = 045", "write bearing = 45: the number in its plain form", "bearing = 45")]
    [InlineData("bearing = 45°", "write bearing = 45: degrees as a plain number", "bearing = 45")]
    [InlineData("strata = [\"a\", \"b\"", "strata: the closing ] is missing", "strata = [\"a\", \"b\"]")]
    [InlineData("strata = [a, b]", "this list cannot be read: write strata = [\"first\", \"second\"]", "strata = [a, b]")]
    [InlineData(@"boundary = ""C:\data\a.geojson""", @"a backslash between double quotes means something else: write boundary = 'C:\data\a.geojson' in single quotes, or / instead of \", @"boundary = 'C:\data\a.geojson'")]
    [InlineData("[layout", "write [layout], one bracket on each side, alone on its line", "[layout]")]
    [InlineData("[stratum.inner bay]", "write [stratum.\"inner bay\"]: the name of a stratum stands in quotes", "[stratum.\"inner bay\"]")]
    [InlineData("[two words]", "this table name cannot be read: write it as [layout] or [stratum.\"name\"]", "[two words]")]
    [InlineData("spacing 5 km", "this line is neither a [table] nor key = value", "spacing 5 km")]
    [InlineData("name = \"a\u0007b\"", "a control character stands in this line: take it out", "name = \"ab\"")]
    public void The_slip_is_named_and_mended_where_the_meaning_is_plain(string line, string complaint, string mended)
        => Assert.Equal((complaint, mended), BrokenLine.Explain(line));

    [Fact]
    public void A_bracket_left_open_further_up_is_found_there()
    {
        const string Text = """
            [region]
            boundary = "a.geojson"
            stratum_field = "zone"
            strata = ["inner bay",
            [layout]
            kind = "parallel"
            lines = 20
            half_width = "100 m"
            """;
        var problem = Assert.Single(Assert.Throws<InputException>(() => PlanFileReader.Parse(Text, "a.toml", [])).Problems);
        Assert.Equal("a.toml:4:1: strata: the closing ] is missing", problem.ToString());
    }

    [Fact]
    public void A_key_on_a_line_that_cannot_be_mended_is_not_called_missing()
    {
        var text = SamplePlans.Least.Replace("lines = 20", "lines = \"", StringComparison.Ordinal).Replace("half_width = \"100 m\"", "half_width 100", StringComparison.Ordinal);
        Assert.Equal(
            ["a.toml:6:10: lines: the closing \" is missing", "a.toml:6:9: layout.lines: \"\" is not a whole number from 1 to 100000: write layout.lines = 20", "a.toml:7:12: this line is neither a [table] nor key = value"],
            Assert.Throws<InputException>(() => PlanFileReader.Parse(text, "a.toml", [])).Problems.Select(problem => problem.ToString()).Order());
    }

    [Fact]
    public void What_is_no_plan_at_all_is_given_up_after_some_lines()
        => Assert.Equal(31, Assert.Throws<InputException>(() => PlanFileReader.Parse(string.Concat(Enumerable.Repeat("It was a dark night.\n", 1000)), "a.toml", [])).Problems.Count);

    [Theory]
    [InlineData("layout.kind = \"parallel\"\n[layout]\nlines = 20\nhalf_width = \"1 m\"\n[region]\nboundary = \"a\"", 2)]
    [InlineData("[region]\nboundary = \"a\"\n[layout]\nlines = 20\nlines.x = 4\nkind = \"parallel\"\nhalf_width = \"1 m\"", 5)]
    public void What_is_defined_in_two_ways_is_told(string text, int line)
        => Assert.Contains(Assert.Throws<InputException>(() => PlanFileReader.Parse(text, "a.toml", [])).Problems, problem => problem.Line == line);
}
