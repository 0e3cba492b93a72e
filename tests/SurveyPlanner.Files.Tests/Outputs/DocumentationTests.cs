using System.Text;
using System.Text.Json;
using SurveyPlanner.Coverage;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class DocumentationTests
{
    private static readonly string Page = File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "docs", "outputs.md"));

    [Fact]
    public void Every_key_of_the_summary_and_of_the_transects_is_documented()
    {
        var plan = TestPlans.WithEffort();
        using var summary = JsonDocument.Parse(SummaryWriter.Write(plan, draw: 1).Content);
        using var full = JsonDocument.Parse(SummaryWriter.Write(TestPlans.WithDetections(), draw: 1).Content);
        using var points = JsonDocument.Parse(SummaryWriter.Write(TestPlans.WithPoints(), draw: 1).Content);
        using var transects = JsonDocument.Parse(TransectsGeoJson.Write(plan).Content);
        var properties = transects.RootElement.GetProperty("features").EnumerateArray().SelectMany(feature => Keys(feature.GetProperty("properties")));

        PositionCoverage[] asked = [new(new(1, 2), "a", null, 0.25, 0.25, 0.01), new(new(1, 2), "a", 0.25, 0.25, 0.25, 0.01)];
        using var positions = JsonDocument.Parse(JsonDocumentText.Of(json => SummaryWriter.WriteCoverageAt(json, asked)));

        Assert.All(
            new[] { summary, full, points, positions }.SelectMany(document => Keys(document.RootElement)).Concat(properties).Distinct(), AssertDocumented);
    }

    [Fact]
    public void Every_header_of_a_table_is_documented()
    {
        var plan = TestPlans.TwoStrata();
        foreach (var table in new[] { WaypointsCsv.Write(plan), CoverageCsv.Write(plan)! })
        {
            var header = Encoding.UTF8.GetString(table.Content.Span).Split('\n')[0];
            Assert.Contains($"`{header}`", Page, StringComparison.Ordinal);
            Assert.All(header.Split(','), AssertDocumented);
        }
    }

    /// <summary>In code quotes, alone, as the end of a way such as <c>region.area_km2</c>, before the brackets of a list, or with members of its own after it.</summary>
    private static void AssertDocumented(string key) => Assert.Matches($@"`([a-z_\[\]]*\.)*{key}(\[\])?[.`]", Page);

    private static IEnumerable<string> Keys(JsonElement element) => element.ValueKind switch
    {
        JsonValueKind.Object => element.EnumerateObject().SelectMany(member => Keys(member.Value).Prepend(member.Name)),
        JsonValueKind.Array => element.EnumerateArray().SelectMany(Keys),
        _ => [],
    };
}
