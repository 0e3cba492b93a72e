using System.Text.Json;
using SurveyPlanner.Effort;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Pilots;

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
            [
                "name", "area_km2", "geodesic_area_km2", "kind", "bearing_deg", "spacing_m", "half_width_m",
                "transects", "expected_transects", "total_length_km", "expected_length_km", "length_km_over_draws", "coverage",
            ],
            Keys(root.GetProperty("strata")[0]));
        Assert.Equal(
            [
                "nominal", "mean", "min", "max", "cv", "simulated_mean", "area_share_below_0_5_nominal", "area_share_below_0_9_nominal", "area_share_above_1_1_nominal",
                "advice", "edge_profile", "transects",
            ],
            Keys(root.GetProperty("strata")[0].GetProperty("coverage")));
        Assert.Equal(
            ["name", "area_km2", "geodesic_area_km2", "kind", "bearing_deg", "spacing_m", "half_width_m", "points", "expected_points", "points_over_draws"],
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
    public void Effort_has_its_figures_with_units_and_leaves_out_what_does_not_apply()
    {
        using var document = JsonDocument.Parse(SummaryWriter.Write(TestPlans.WithEffort(), draw: 1).Content);
        var effort = document.RootElement.GetProperty("effort");

        Assert.Equal(
            ["encounter_rate_per_km", "variance_estimator", "variance_estimator_reason", "b", "pilot", "uncertainty", "required", "delivered", "curves", "advice"],
            Keys(effort));
        Assert.Equal("random-lines", effort.GetProperty("variance_estimator").GetString());
        Assert.Equal("pilot", effort.GetProperty("b").GetProperty("origin").GetString());
        Assert.Equal(
            [
                "target_cv", "length_km", "expected_detections", "cv", "degrees_of_freedom", "interval_factor_95", "components",
                "length_km_interval_95", "length_km_interval_95_by_delta_method", "length_km_planned",
            ],
            Keys(effort.GetProperty("required")));
        Assert.Equal("encounter-rate", effort.GetProperty("required").GetProperty("components")[0].GetProperty("source").GetString());
        Assert.Equal(
            ["transects", "length_km", "detections", "encounter_rate_per_km", "variance", "cv", "degrees_of_freedom", "dispersion", "density"],
            Keys(effort.GetProperty("pilot")));
        Assert.Equal(
            ["encounter_rate_per_km", "share", "length_km", "lines", "expected_detections", "cv", "length_km_for_own_target"],
            Keys(document.RootElement.GetProperty("strata")[0].GetProperty("effort")));
        Assert.False(document.RootElement.GetProperty("strata")[1].TryGetProperty("effort", out _));
    }

    [Fact]
    public void Effort_figures_are_those_of_the_plan()
    {
        var plan = TestPlans.WithEffort();
        using var document = JsonDocument.Parse(SummaryWriter.Write(plan, draw: 1).Content);
        var effort = document.RootElement.GetProperty("effort");

        // Counts 4, 6, 8 on 2 km each: 18 detections on 6 km.
        Assert.Equal(3, effort.GetProperty("encounter_rate_per_km").GetDouble(), 1e-8);
        Assert.Equal(plan.Effort!.Required!.Effort, effort.GetProperty("required").GetProperty("length_km").GetDouble(), plan.Effort.Required.Effort * 1e-8);
        Assert.Equal(66.86837, effort.GetProperty("delivered").GetProperty("length_km").GetDouble(), 1e-6);
        Assert.Equal(plan.Delivered!.Cv, effort.GetProperty("delivered").GetProperty("cv").GetDouble(), 1e-8);
    }

    [Fact]
    public void The_uncertainty_of_the_effort_the_allocations_and_the_fits_are_those_of_the_plan()
    {
        var plan = TestPlans.WithDetections();
        using var document = JsonDocument.Parse(SummaryWriter.Write(plan, draw: 1).Content);
        var (effort, asked) = (document.RootElement.GetProperty("effort"), plan.Effort!.Required!);

        var required = effort.GetProperty("required");
        AssertFigure(asked.Interval!.Lower, required.GetProperty("length_km_interval_95").GetProperty("lower"));
        AssertFigure(asked.Interval.Upper, required.GetProperty("length_km_interval_95").GetProperty("upper"));
        AssertFigure(asked.AssuredEffort!.Value, required.GetProperty("length_km_assured"));
        AssertFigure(asked.AssuredEffort.Value, required.GetProperty("length_km_planned"));
        AssertFigure(0.935, effort.GetProperty("uncertainty").GetProperty("measured").GetProperty("share_of_intervals_that_held"));

        var planned = Assert.Single(plan.Effort.Allocations, option => option.Allocation == plan.Design.Effort.Allocation);
        Assert.Equal(planned.Allocation.ToString().ToLowerInvariant(), effort.GetProperty("planned_allocation").GetString());
        Assert.Equal(["proportional", "equal", "optimal"], effort.GetProperty("allocations").EnumerateArray().Select(option => option.GetProperty("allocation").GetString()));
        var (optimal, written) = (plan.Effort.Allocations[2], effort.GetProperty("allocations")[2]);
        AssertFigure(optimal.Cost!.Value, written.GetProperty("cost"));
        AssertFigure(optimal.Precision.Cv, written.GetProperty("cv"));
        Assert.Equal(optimal.Strata[1].Transects, written.GetProperty("strata")[1].GetProperty("lines").GetInt32());

        var (fits, detection) = (plan.Effort.Pilot!.Detection!, effort.GetProperty("pilot").GetProperty("detection"));
        Assert.Equal(["half-normal", "hazard-rate", "uniform-cosine"], detection.GetProperty("fits").EnumerateArray().Select(fit => fit.GetProperty("model").GetString()));
        AssertFigure(fits.Fits[0].Aic!.Value, detection.GetProperty("fits")[0].GetProperty("aic"));
        AssertFigure(fits.Fits[0].EffectiveMetres!.Value, detection.GetProperty("fits")[0].GetProperty("effective_half_width_m"));
        Assert.Equal(fits.Histogram.Sum(bar => bar.Count), detection.GetProperty("histogram").EnumerateArray().Sum(bar => bar.GetProperty("detections").GetInt32()));
        Assert.True(document.RootElement.GetProperty("strata")[1].GetProperty("effort").GetProperty("pilot").TryGetProperty("detection", out _));
    }

    [Fact]
    public void Which_allocation_was_planned_is_said_where_there_is_something_to_share()
    {
        var plan = TestPlans.WithDetections();
        foreach (var allocation in Enum.GetValues<Allocation>())
        {
            var planned = plan with { Design = plan.Design with { Effort = plan.Design.Effort with { Allocation = allocation } } };
            using var document = JsonDocument.Parse(SummaryWriter.Write(planned, draw: 1).Content);
            Assert.Equal(allocation.ToString(), document.RootElement.GetProperty("effort").GetProperty("planned_allocation").GetString(), ignoreCase: true);
        }

        using var one = JsonDocument.Parse(SummaryWriter.Write(plan with { Effort = plan.Effort! with { Strata = plan.Effort.Strata[..1] } }, draw: 1).Content);
        Assert.False(one.RootElement.GetProperty("effort").TryGetProperty("planned_allocation", out _));
    }

    [Fact]
    public void A_fit_that_did_not_converge_is_told_without_figures()
    {
        var plan = TestPlans.WithDetections();
        var failed = new DetectionFit(DetectionModel.HazardRate, FitStatus.NotConverged, "No maximum was found.", 45, null, [], null, null, null);
        var fits = plan.Effort!.Pilot!.Detection! with { Fits = [failed], Chosen = null, Histogram = [] };
        using var document = JsonDocument.Parse(SummaryWriter.Write(
            plan with { Effort = plan.Effort with { Pilot = plan.Effort.Pilot with { Detection = fits } } }, draw: 1).Content);
        var detection = document.RootElement.GetProperty("effort").GetProperty("pilot").GetProperty("detection");

        Assert.Equal(["fits", "histogram"], Keys(detection));
        Assert.Equal(["model", "status", "explanation", "detections", "parameters"], Keys(detection.GetProperty("fits")[0]));
        Assert.Equal("not-converged", detection.GetProperty("fits")[0].GetProperty("status").GetString());
    }

    /// <summary>The shares by hand: in the fixture half of the area has 0.1 and half 0.3, where nominal is 0.2.</summary>
    [Fact]
    public void Coverage_tells_shares_of_area_the_edge_and_each_transect()
    {
        using var document = JsonDocument.Parse(SummaryWriter.Write(TestPlans.TwoStrata(), draw: 1).Content);
        var coverage = document.RootElement.GetProperty("strata")[0].GetProperty("coverage");

        Assert.Equal(0, coverage.GetProperty("area_share_below_0_5_nominal").GetDouble());
        Assert.Equal(0.5, coverage.GetProperty("area_share_below_0_9_nominal").GetDouble());
        Assert.Equal(0.5, coverage.GetProperty("area_share_above_1_1_nominal").GetDouble());
        Assert.Equal("uneven-inside", coverage.GetProperty("advice").GetProperty("finding").GetString());
        Assert.Equal(["from_m", "to_m", "area_km2", "mean_coverage"], Keys(coverage.GetProperty("edge_profile")[0]));
        Assert.Equal(["from_m", "area_km2", "mean_coverage"], Keys(coverage.GetProperty("edge_profile")[1]));
        Assert.Equal(["id", "mean_coverage", "is_exact"], Keys(coverage.GetProperty("transects")[0]));
        Assert.Equal(["id", "is_exact"], Keys(coverage.GetProperty("transects")[1]));
    }

    [Fact]
    public void Effort_alone_has_the_same_form()
    {
        using var document = JsonDocument.Parse(JsonDocumentText.Of(json => SummaryWriter.WriteEffortDocument(json, TestPlans.WithDetections().Effort!, Allocation.Optimal)));

        Assert.Equal(["format_version", "strata", "effort"], Keys(document.RootElement));
        Assert.Equal(["name", "effort"], Keys(document.RootElement.GetProperty("strata")[0]));
        Assert.Equal("optimal", document.RootElement.GetProperty("effort").GetProperty("planned_allocation").GetString());
    }

    [Fact]
    public void A_check_has_the_same_form_with_repairs_and_warnings()
    {
        var plan = TestPlans.TwoStrata();
        using var document = JsonDocument.Parse(JsonDocumentText.Of(json => SummaryWriter.WriteCheck(json, plan.Region, plan.Notices)));
        var root = document.RootElement;
        Assert.Equal(["format_version", "projection", "region", "strata", "repairs", "warnings"], Keys(root));
        Assert.Equal("A ring was closed.", root.GetProperty("repairs")[0].GetString());
        Assert.Equal(1, root.GetProperty("warnings").GetArrayLength());
    }

    [Fact]
    public void All_files_of_a_plan_come_together_and_are_the_same_each_time()
    {
        var files = SurveyFiles.Of(TestPlans.TwoStrata(), draw: 1);

        Assert.Equal(["transects.geojson", "transects.gpx", "transects.kml", "survey.gpkg", "waypoints.csv", "coverage.csv", "summary.json"], files.Select(file => file.Name));
        Assert.All(files, file => Assert.Contains(file.Name, OutputNames.All));
        Assert.Equal(files.Select(file => file.Sha256), SurveyFiles.Of(TestPlans.TwoStrata(), draw: 1).Select(file => file.Sha256));
    }

    // Written to 9 digits.
    private static void AssertFigure(double expected, JsonElement written) => Assert.Equal(expected, written.GetDouble(), Math.Abs(expected) * 1e-8);

    private static IEnumerable<string> Keys(JsonElement element) => element.EnumerateObject().Select(member => member.Name);
}
