using System.Text.Json;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class SummaryWriterTests
{
    [Fact]
    public void The_document_has_the_documented_keys_in_order()
    {
        using var document = JsonDocument.Parse(SummaryWriter.Write(TestPlans.TwoStrata(), draw: 2).Content);
        var root = document.RootElement;

        Assert.Equal(["format_version", "survey", "projection", "region", "strata"], Keys(root));
        Assert.Equal(["name", "seed", "draw"], Keys(root.GetProperty("survey")));
        Assert.Equal(["method", "wkt", "max_scale_error_percent"], Keys(root.GetProperty("projection")));
        Assert.Equal(["area_km2", "geodesic_area_km2"], Keys(root.GetProperty("region")));
        Assert.Equal(
            ["name", "area_km2", "geodesic_area_km2", "kind", "bearing_deg", "spacing_m", "half_width_m", "transects", "total_length_km", "expected_length_km", "coverage"],
            Keys(root.GetProperty("strata")[0]));
        Assert.Equal(["nominal", "mean", "min", "max", "cv", "simulated_mean"], Keys(root.GetProperty("strata")[0].GetProperty("coverage")));
        Assert.Equal(
            ["name", "area_km2", "geodesic_area_km2", "kind", "bearing_deg", "spacing_m", "half_width_m", "points"],
            Keys(root.GetProperty("strata")[1]));
    }

    [Fact]
    public void Figures_keep_enough_digits_to_be_checked()
    {
        using var document = JsonDocument.Parse(SummaryWriter.Write(TestPlans.TwoStrata(), draw: 2).Content);
        var stratum = document.RootElement.GetProperty("strata")[0];

        Assert.Equal(2, document.RootElement.GetProperty("survey").GetProperty("draw").GetInt32());
        Assert.Equal(20270401UL, document.RootElement.GetProperty("survey").GetProperty("seed").GetUInt64());
        Assert.Equal("800.000001235", stratum.GetProperty("geodesic_area_km2").GetRawText());
        Assert.Equal("parallel", stratum.GetProperty("kind").GetString());
        Assert.Equal("66.86837", stratum.GetProperty("total_length_km").GetRawText());
        Assert.Equal("66.86962", stratum.GetProperty("expected_length_km").GetRawText());
        Assert.Equal("point-grid", document.RootElement.GetProperty("strata")[1].GetProperty("kind").GetString());
        Assert.Equal("182.88", document.RootElement.GetProperty("strata")[1].GetProperty("half_width_m").GetRawText());
    }

    [Fact]
    public void Work_that_draws_nothing_that_counts_has_no_draw()
    {
        using var document = JsonDocument.Parse(SummaryWriter.Write(TestPlans.TwoStrata(), draw: null).Content);

        Assert.Equal(["name", "seed"], Keys(document.RootElement.GetProperty("survey")));
    }

    [Fact]
    public void A_check_has_the_same_form_with_repairs_and_warnings()
    {
        var plan = TestPlans.TwoStrata();
        using var stream = new MemoryStream();
        using (var json = new Utf8JsonWriter(stream))
        {
            SummaryWriter.WriteCheck(json, plan.Region, plan.Notices);
        }

        using var document = JsonDocument.Parse(stream.ToArray());
        var root = document.RootElement;
        Assert.Equal(["format_version", "projection", "region", "strata", "repairs", "warnings"], Keys(root));
        Assert.Equal("A ring was closed.", root.GetProperty("repairs")[0].GetString());
        Assert.Equal(1, root.GetProperty("warnings").GetArrayLength());
    }

    [Fact]
    public void All_files_of_a_plan_come_together_and_are_the_same_each_time()
    {
        var files = SurveyFiles.Of(TestPlans.TwoStrata(), draw: 1);

        Assert.Equal(["transects.geojson", "transects.gpx", "waypoints.csv", "coverage.csv", "summary.json"], files.Select(file => file.Name));
        Assert.All(files, file => Assert.Contains(file.Name, OutputNames.All));
        Assert.Equal(files.Select(file => file.Sha256), SurveyFiles.Of(TestPlans.TwoStrata(), draw: 1).Select(file => file.Sha256));
    }

    private static IEnumerable<string> Keys(JsonElement element) => element.EnumerateObject().Select(member => member.Name);
}
