using SurveyPlanner.Files.Plans;

namespace SurveyPlanner.Files.Tests.Plans;

public class CanonicalPlanTests
{
    private static string Canonical(string text, params string[] sets) => PlanFileReader.Parse(text, "a.toml", sets).CanonicalText;

    [Fact]
    public void It_holds_every_key_with_the_value_that_holds_in_base_units()
        => Assert.Equal(
            """
            coverage.replicates = 1000
            layout.bearing = "short-axis"
            layout.edge = "minus"
            layout.half_width = "100 m"
            layout.kind = "parallel"
            layout.lines = 20
            layout.min_length = "0 m"
            precision.allocation = "proportional"
            precision.min_lines = 10
            region.boundary = ["moor.geojson"]
            survey.name = "a"

            """,
            Canonical(SamplePlans.Least));

    [Theory]
    [InlineData("\"5 km\"", "\"5000 m\"")]
    [InlineData("target_cv = 0.20", "target_cv = 2e-1")]
    [InlineData("edge = \"minus\"\n", "")]
    [InlineData("# a comment", "")]
    [InlineData("10_000", "10000")]
    [InlineData("seed = 20270401", "seed = 7")]
    [InlineData("seed = 20270401", "")]
    [InlineData("[stratum.reef]", "[stratum.\"reef\"]")]
    [InlineData("[platform]\n", "")]
    public void What_means_the_same_has_the_same_text(string written, string otherwise)
    {
        Assert.Contains(written, SamplePlans.Full);
        Assert.Equal(Canonical(SamplePlans.Full), Canonical(SamplePlans.Full.Replace(written, otherwise, StringComparison.Ordinal)));
    }

    [Theory]
    [InlineData("layout.spacing=5001 m")]
    [InlineData("stratum.reef.grid=square")]
    [InlineData("region.exclusion_buffer=501 m")]
    [InlineData("stratum.inner bay.cost_per_km=36 EUR")]
    public void What_means_something_else_has_another_text(string set)
        => Assert.NotEqual(Canonical(SamplePlans.Full), Canonical(SamplePlans.Full, set));

    [Fact]
    public void The_order_of_tables_and_keys_does_not_matter()
    {
        var tables = SamplePlans.Full.Split("\n\n");
        var reversed = tables.Select(table => table.Split('\n')).Select(lines => string.Join('\n', lines.Take(1).Concat(lines.Skip(1).Reverse())));
        Assert.Equal(Canonical(SamplePlans.Full), Canonical(string.Join("\n\n", reversed.Reverse())));
    }

    [Theory]
    [InlineData(SamplePlans.Full)]
    [InlineData(SamplePlans.Least)]
    public void It_reads_back_to_itself(string text) => Assert.Equal(Canonical(text), Canonical(Canonical(text)));
}
