using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Maps;
using SurveyPlanner.Pages.Report;
using SurveyPlanner.Pages.Tests.Fixtures;
using SurveyPlanner.Pages.Tests.Words;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Tests.Report;

public class CoverageReportTests
{
    [Fact]
    public void The_section_opens_with_the_advice_of_each_stratum()
    {
        var page = ReportRenderer.Render(SamplePlan.WithDistances, SamplePlan.Context);
        var section = page[page.IndexOf("<h2>Coverage probability</h2>", StringComparison.Ordinal)..];
        var (first, second) = (section.IndexOf("outer: </b>", StringComparison.Ordinal), section.IndexOf("inner: </b>", StringComparison.Ordinal));
        Assert.InRange(first, 0, second);
        Assert.InRange(second, 0, section.IndexOf("<table", StringComparison.Ordinal));
        Assert.All(
            SamplePlan.WithDistances.Strata,
            stratum => Assert.Contains(System.Net.WebUtility.HtmlEncode(stratum.Coverage!.Advice!.Sentence)[..40], section, StringComparison.Ordinal));
    }

    [Fact]
    public void Many_strata_are_told_a_finding_at_a_time_and_places_without_coverage_apart()
    {
        var strata = Enumerable.Range(1, 7).Select(i => Profile($"s{i}", 1, 1)).ToArray();
        StratumCoverage Judged(int i, CoverageFinding finding, double share, double never) => strata[i] with
        {
            Advice = new CoverageAdvice(finding, share, never, $"Advice {i}."),
        };
        StratumCoverage[] judged =
        [
            Judged(0, CoverageFinding.Even, 0, 0), Judged(1, CoverageFinding.Even, 0.01, 0), Judged(2, CoverageFinding.UnevenAtEdge, 0.1, 0), Judged(3, CoverageFinding.UnevenAtEdge, 0.3, 2),
            Judged(4, CoverageFinding.Even, 0, 0), Judged(5, CoverageFinding.UnevenInside, 0.4, 3), Judged(6, CoverageFinding.Even, 0, 0),
        ];
        Assert.Equal(
            [
                ("Even, 4 of 7\u00a0strata", "s1, s2, s5, s7."),
                ("Uneven at the edge, 2 of 7\u00a0strata", "s3, s4. The most uneven is s4. Advice 3."),
                ("Uneven inside, 1 of 7\u00a0strata", "s6. Advice 5."),
                ("Without coverage", "5.00 km² in s4, s6: no estimate speaks for those places."),
            ],
            CoverageWords.Advice(judged));
    }

    /// <summary>Where the draws are too few no sentence of the report speaks of single places as if they were known.</summary>
    [Fact]
    public void Too_few_draws_are_said_to_be_so_wherever_coverage_is_told()
    {
        var plan = SamplePlan.Archipelago;
        var coverage = plan.Strata[0].Coverage!;
        var rare = coverage with
        {
            // No draw of 1,000 covered anything: one could have been missed, 0.001 where nominal is 0.002.
            Nominal = 0.002,
            Replicates = 1000,
            Cells = [.. coverage.Cells.Select(cell => cell with { Exact = null, Simulated = 0, StandardError = 0.001 })],
            Min = 0,
            MaxAbsZ = null,
            Advice = new CoverageAdvice(CoverageFinding.TooFewDraws, 0, null, "Too few draws."),
        };
        var few = plan with { Strata = [plan.Strata[0] with { Coverage = rare }] };

        Assert.EndsWith("; the simulated draws are too few to tell whether every place has a chance of being covered.", Sentences.OfPlan(few), StringComparison.Ordinal);
        Assert.Equal(
            "The simulated draws are too few to tell coverage cell by cell: most of what differs from cell to cell is chance. 100\u00a0% of the area was covered by none of them (hatched).",
            Sentences.OfCoverage([rare], CoverageClasses.Tally([rare])));
        Assert.Contains("a standard error of about 50.0\u00a0% of nominal in a cell", Sentences.OfNoise([rare]), StringComparison.Ordinal);
        Assert.Equal("too few draws to tell", CoverageTables.OfStrata([rare]).Rows[0][1]);
    }

    [Theory]
    [InlineData(new[] { 0.95, 1.0, 1.02 }, "Coverage is within a tenth of nominal right up to the boundary.")]
    [InlineData(new[] { 0.6, 0.85, 0.97 }, "Within 100\u00a0m of the boundary coverage averages 0.600 of nominal, and from 200\u00a0m inwards it is within a tenth of nominal.")]
    [InlineData(new[] { 0.6, 1.0, 1.3 }, "Within 100\u00a0m of the boundary coverage averages 0.600 of nominal, and farther in than 200\u00a0m it still averages 1.30 of nominal.")]
    [InlineData(new[] { 0.6 }, "Coverage averages 0.600 of nominal.")]
    public void The_edge_is_told_in_a_sentence(double[] multiples, string expected) => Assert.Equal(expected, CoverageWords.EdgeFinding([Profile("all", multiples)]));

    [Fact]
    public void The_edge_chart_has_a_line_a_stratum_and_names_the_four_lowest()
    {
        var strata = Enumerable.Range(0, 6).Select(i => Profile($"s{i}", 0.9 - (0.1 * i), 1, 1)).ToArray();
        var chart = EdgeChart.For(strata)!;
        Assert.Equal(6, chart.Lines.Count);
        Assert.Equal(["s2", "s3", "s4", "s5"], chart.Lines.Where(line => line.Label.Length > 0).Select(line => line.Label));
        Assert.Equal(2, chart.Lines.Count(line => line.Look == LineLook.Quiet));

        // A class stands at its middle, the open one half a class beyond its beginning; nominal is 0.2.
        Assert.Equal([(50.0, 0.9), (150, 1), (250, 1)], chart.Lines[0].Points);
        Assert.Equal(1, Assert.Single(chart.Levels).At);
    }

    [Fact]
    public void A_profile_of_one_class_or_without_nominal_coverage_has_no_chart()
    {
        Assert.Null(EdgeChart.For([Profile("all", 0.8)]));
        Assert.Null(EdgeChart.For([]));
        Assert.Empty(EdgeChart.Strata([Profile("all", 0.8, 1) with { Nominal = 0 }]));
    }

    [Fact]
    public void The_table_has_the_shares_of_area_that_the_core_counts()
    {
        var coverage = SamplePlan.Archipelago.Strata[0].Coverage!;
        var row = CoverageTables.OfStrata([coverage]).Rows[0];
        Assert.True(coverage.ShareBelow(0.9) > 0);
        Assert.Equal(
            [FiguresTests.Shown(100 * coverage.ShareBelow(0.5)), FiguresTests.Shown(100 * coverage.ShareBelow(0.9)), "0"],
            row.Skip(7).Select(cell => cell.Replace("\u202f", "", StringComparison.Ordinal)));
        Assert.Equal(0, coverage.ShareAbove(1.1));
    }

    [Fact]
    public void Each_transect_has_the_coverage_along_it()
    {
        var plan = SamplePlan.Archipelago;
        var table = TransectTables.Of(plan, 2000);
        Assert.Equal("Mean coverage", table.Columns[^1].Heading);
        var expected = plan.Strata[0].Coverage!.Transects.ToDictionary(one => one.TransectId, one => FiguresTests.Shown(one.Mean!.Value));
        Assert.All(table.Rows, row => Assert.Equal(expected[row[0]], row[^1]));

        var drawn = TransectTables.Of(plan with { Strata = [.. plan.Strata.Select(stratum => stratum with { Coverage = null })] }, 2000);
        Assert.DoesNotContain(drawn.Columns, column => column.Heading.Contains("overage", StringComparison.Ordinal));
    }

    /// <summary>Classes of 100 m, the last open; nominal coverage 0.2.</summary>
    private static StratumCoverage Profile(string name, params double[] multiples) => new(name, 0.2, 100, 0, 100, [], 0.2, 0.2, 0.2, 0, 0.2, null)
    {
        EdgeProfile = [.. multiples.Select((multiple, i) => new EdgeClass(100 * i, i < multiples.Length - 1 ? 100 * (i + 1) : null, 1, 0.2 * multiple))],
    };
}
