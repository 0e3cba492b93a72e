using System.Text.Json;

namespace SurveyPlanner.Cli.Tests;

public class OtherCommandsTests
{
    [Fact]
    public void The_next_command_can_be_typed_as_it_is_shown()
    {
        using var work = new Workspace();
        File.Copy(ReferenceData.Path("regions", "marine_archipelago_sea.geojson"), work.At("see & strand.geojson"));
        var plan = work.At("see & strand.toml");
        Assert.EndsWith($"survey-planner check \"{plan}\"", ProgramRun.Of("new", work.At("see & strand.geojson")).Out.TrimEnd(), StringComparison.Ordinal);
    }

    [Fact]
    public void New_writes_a_plan_that_check_accepts_and_plan_carries_out()
    {
        using var work = new Workspace();
        File.Copy(ReferenceData.Path("regions", "marine_archipelago_sea.geojson"), work.At("sea.geojson"));
        Assert.Equal(0, ProgramRun.Of("new", work.At("sea.geojson")).ExitCode);
        Assert.Equal(0, ProgramRun.Of("check", work.At("sea.toml")).ExitCode);
        var plan = ProgramRun.Of("plan", work.At("sea.toml"), "--out", work.At("out"), "--json", "--set", "coverage.replicates=50");
        Assert.Equal(0, plan.ExitCode);
        using var summary = JsonDocument.Parse(plan.Out);
        Assert.InRange(summary.RootElement.GetProperty("strata")[0].GetProperty("transects").GetInt32(), 10, 40);

        // Nothing is overwritten unasked.
        Assert.Equal(4, ProgramRun.Of("new", work.At("sea.geojson")).ExitCode);
    }

    [Fact]
    public void Check_prints_what_was_understood_and_draws_it()
    {
        using var work = new Workspace();
        work.CopySamples();
        var plan = work.At("sample-regions/sea-ducks-sound/plan.toml");
        var run = ProgramRun.Of("check", plan, "--map", work.At("map.svg"));
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("2 strata", run.Out, StringComparison.Ordinal);
        Assert.Contains("inner bay", run.Out, StringComparison.Ordinal);
        Assert.Contains("EPSG:4326", run.Out, StringComparison.Ordinal);
        Assert.StartsWith("<svg", File.ReadAllText(work.At("map.svg")), StringComparison.Ordinal);
        using var json = JsonDocument.Parse(ProgramRun.Of("check", plan, "--json").Out);
        Assert.Equal(2, json.RootElement.GetProperty("strata").GetArrayLength());
        Assert.True(json.RootElement.TryGetProperty("repairs", out _));
        Assert.True(json.RootElement.TryGetProperty("warnings", out _));
    }

    /// <summary>Areas of the samples by two ways that share no code with the program: sample-regions/README.md.</summary>
    [Theory]
    [InlineData("sea-ducks-sound", 925.235)]
    [InlineData("ground-birds-hills", 54.976)]
    [InlineData("marine-mammals-shelf", 7821.682)]
    public void Samples_have_their_known_area(string sample, double km2)
    {
        var run = ProgramRun.Of("check", Path.Combine(ReferenceData.Root, "sample-regions", sample, "plan.toml"), "--json");
        using var json = JsonDocument.Parse(run.Out);
        var area = json.RootElement.GetProperty("strata").EnumerateArray().Sum(stratum => stratum.GetProperty("area_km2").GetDouble());
        Assert.Equal(km2, area, 5.1e-4 + (1e-6 * km2));
    }

    [Fact]
    public void Coverage_at_positions_keeps_the_table_and_marks_what_lies_outside()
    {
        using var work = new Workspace();
        work.CopySamples();
        File.WriteAllText(work.At("points.csv"), "id,lon,lat\na,-30.9,52.6\nb,0,0\n");
        var plan = work.At("sample-regions/sea-ducks-sound/plan.toml");
        var run = ProgramRun.Of("coverage", plan, "--at", work.At("points.csv"), "--set", "coverage.replicates=100");
        Assert.Equal(0, run.ExitCode);
        var lines = run.Out.Trim().Split('\n').Select(line => line.Trim().Split(',')).ToList();
        Assert.Equal(["id", "lon", "lat", "stratum", "coverage", "standard_error", "times_covered", "method"], lines[0]);
        Assert.Equal(["a", "-30.9", "52.6", "outer sound", "0.24"], lines[1][..5]);
        Assert.Equal("outside", lines[2][^1]);
        var written = ProgramRun.Of("coverage", plan, "--at", work.At("points.csv"), "--out", work.At("out"), "--set", "coverage.replicates=100");
        Assert.Equal(0, written.ExitCode);
        Assert.Contains("1 of 2 positions lie in the region", written.Out, StringComparison.Ordinal);
        Assert.Equal(run.Out, File.ReadAllText(Path.Combine(work.At("out"), "coverage-at.csv")));
        using var json = JsonDocument.Parse(ProgramRun.Of("coverage", plan, "--at", work.At("points.csv"), "--json", "--set", "coverage.replicates=100").Out);
        var positions = json.RootElement.GetProperty("positions").EnumerateArray().ToList();
        Assert.Equal(["lon", "lat", "stratum", "coverage", "times_covered", "method"], positions[0].EnumerateObject().Select(member => member.Name));
        Assert.Equal(("outer sound", 0.24, "exact"), (positions[0].GetProperty("stratum").GetString(), positions[0].GetProperty("coverage").GetDouble(), positions[0].GetProperty("method").GetString()));
        Assert.Equal(["lon", "lat", "method"], positions[1].EnumerateObject().Select(member => member.Name));
    }

    /// <summary>Power of an exponential decline of 5 %, 10 surveys, CV 0.2 as in the core's published check (noncentral t): 0.50 for an increase of 5 %.</summary>
    [Fact]
    public void Trend_answers_with_the_power_of_the_noncentral_t()
    {
        var plan = Path.Combine(ReferenceData.Root, "sample-regions", "sea-ducks-sound", "plan.toml");
        var run = ProgramRun.Of("trend", plan, "--cv", "0.2", "--change", "0.05", "--surveys", "10", "--json");
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        using var json = JsonDocument.Parse(run.Out);
        Assert.Equal(0.50305360, json.RootElement.GetProperty("changes")[0].GetProperty("power").GetDouble(), 1e-7);
        Assert.Contains("a survey every year.", ProgramRun.Of("trend", plan, "--cv", "0.2").Out, StringComparison.Ordinal);
        Assert.Contains("a survey every 2 years.", ProgramRun.Of("trend", plan, "--cv", "0.2", "--interval", "2").Out, StringComparison.Ordinal);
        Assert.Equal(2, ProgramRun.Of("trend", plan, "--cv", "20%").ExitCode);
        Assert.Equal(2, ProgramRun.Of("trend", plan, "--cv-model", "none").ExitCode);
    }

    [Fact]
    public void Effort_prints_the_answer_first_and_the_same_as_json()
    {
        var plan = Path.Combine(ReferenceData.Root, "sample-regions", "sea-ducks-sound", "plan.toml");
        Assert.Contains("a CV of 15 % needs", ProgramRun.Of("effort", plan).Out, StringComparison.Ordinal);
        using var json = JsonDocument.Parse(ProgramRun.Of("effort", plan, "--json").Out);
        Assert.True(json.RootElement.GetProperty("effort").GetProperty("encounter_rate_per_km").GetDouble() > 0);
        Assert.Contains(
            "sure of a CV", ProgramRun.Of("effort", plan, "--set", "precision.assurance=0.8").Out, StringComparison.Ordinal);
    }

    [Fact]
    public void Bearings_are_tried_without_drawing()
    {
        using var work = new Workspace();
        work.CopySamples();
        var plan = work.At("sample-regions/sea-ducks-sound/plan.toml");
        var run = ProgramRun.Of("layout", plan, "--try-bearings", "--every", "45", "--chart", work.At("bearings.svg"), "--json");
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        using var json = JsonDocument.Parse(run.Out);
        var strata = json.RootElement.GetProperty("strata").EnumerateArray().ToList();
        Assert.Equal(2, strata.Count);
        Assert.Equal([0, 45, 90, 135], strata[0].GetProperty("bearings").EnumerateArray().Select(trial => trial.GetProperty("bearing_deg").GetDouble()));

        // Area over spacing, whatever the bearing: 683.39 km² every 2.5 km.
        Assert.All(
            strata[0].GetProperty("bearings").EnumerateArray(),
            trial => Assert.Equal(683.39 / 2.5, trial.GetProperty("expected_length_km").GetDouble(), 0.5));
        Assert.StartsWith("<svg", File.ReadAllText(work.At("bearings.svg")), StringComparison.Ordinal);
        Assert.False(File.Exists(Path.ChangeExtension(plan, ".draws.jsonl")));
    }

    [Fact]
    public void Bearing_spacing_and_half_width_may_come_from_a_drawn_line_and_from_attributes()
    {
        using var work = new Workspace();
        File.WriteAllText(work.At("zones.geojson"), """
            {"type":"FeatureCollection","features":[
            {"type":"Feature","properties":{"zone":"a","gap":2,"strip":150,"heading":40},"geometry":{"type":"Polygon","coordinates":[[[10,50],[10.5,50],[10.5,50.5],[10,50.5],[10,50]]]}},
            {"type":"Feature","properties":{"zone":"b","gap":4,"strip":250,"heading":80},"geometry":{"type":"Polygon","coordinates":[[[11,50],[11.5,50],[11.5,50.5],[11,50.5],[11,50]]]}}]}
            """);

        // A coast that runs due east: lines across it run north.
        File.WriteAllText(work.At("coast.geojson"), """{"type":"LineString","coordinates":[[10,49.9],[11.5,49.9]]}""");
        var plan = work.Plan("zones.geojson", "kind = \"parallel\"\nspacing_field = \"gap in km\"\nhalf_width_field = \"strip in m\"\nbearing = \"along coast.geojson\"", "[coverage]\nreplicates = 20");
        File.WriteAllText(plan, File.ReadAllText(plan).Replace("[layout]", "stratum_field = \"zone\"\n\n[layout]", StringComparison.Ordinal));
        var run = ProgramRun.Of("plan", plan, "--out", work.At("out"), "--json");
        Assert.Equal(0, run.ExitCode);
        using var json = JsonDocument.Parse(run.Out);
        var strata = json.RootElement.GetProperty("strata").EnumerateArray().ToList();
        Assert.Equal([2000, 4000], strata.Select(stratum => stratum.GetProperty("spacing_m").GetDouble()));
        Assert.Equal([150, 250], strata.Select(stratum => stratum.GetProperty("half_width_m").GetDouble()));
        Assert.All(strata, stratum => Assert.Equal(0, Math.Sin(stratum.GetProperty("bearing_deg").GetDouble() * Math.PI / 180), 0.02));
        Assert.Equal(0, ProgramRun.Of("replay", Path.Combine(work.At("out"), "record.json")).ExitCode);

        var headed = ProgramRun.Of("layout", plan, "--json", "--set", "layout.bearing_field=heading");
        using var turned = JsonDocument.Parse(headed.Out);
        Assert.Equal([40, 80], turned.RootElement.GetProperty("strata").EnumerateArray().Select(stratum => stratum.GetProperty("bearing_deg").GetDouble()));

        File.WriteAllText(work.At("coast.geojson"), """{"type":"Point","coordinates":[10,49.9]}""");
        var refused = ProgramRun.Of("check", plan);
        Assert.Equal(3, refused.ExitCode);
        Assert.Contains("holds no line", refused.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_boundary_given_for_a_plan_is_answered_with_the_way_on()
    {
        var run = ProgramRun.Of("plan", ReferenceData.Path("regions", "island_iceland.geojson"), "--out", "never");
        Assert.Equal(3, run.ExitCode);
        Assert.Contains("survey-planner new", run.Error, StringComparison.Ordinal);
    }

    /// <summary>Lines that run on past the boundary may leave the stratum, but never for a closed area or its buffer.</summary>
    [Fact]
    public void Plus_lines_keep_out_of_closed_areas()
    {
        using var work = new Workspace();
        work.CopySamples();
        var plan = work.At("sample-regions/sea-ducks-sound/plan.toml");
        var minus = LoadedPlan.Read(plan, ["layout.spacing=300 m"]);
        var plus = LoadedPlan.Read(plan, ["layout.spacing=300 m", "layout.edge=plus"]);
        var (inside, beyond) = (PlanSurvey.DrawOnly(minus.Design, minus.Inputs), PlanSurvey.DrawOnly(plus.Design, plus.Inputs));
        Assert.True(beyond.Strata[0].Layout.TotalLengthMetres > inside.Strata[0].Layout.TotalLengthMetres);
        var closed = beyond.Region.Strata[0].Closed;
        Assert.All(
            from stratum in beyond.Strata
            from transect in stratum.Layout.Transects
            from piece in transect.Pieces
            from share in new[] { 0.001, 0.25, 0.5, 0.75, 0.999 }
            select Between(piece.Plane[0], piece.Plane[^1], share),
            place => Assert.False(Inside(closed, place.X, place.Y)));
    }

    [Fact]
    public void Closed_areas_that_miss_the_region_are_told()
    {
        using var work = new Workspace();
        work.CopySamples();
        File.WriteAllText(work.At("far.geojson"), """{"type":"Polygon","coordinates":[[[10,50],[11,50],[11,51],[10,51],[10,50]]]}""");
        var plan = work.At("sample-regions/sea-ducks-sound/plan.toml");
        var run = ProgramRun.Of("check", plan, "--set", $"region.exclusions=\"{work.At("far.geojson")}\"");
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("wholly outside the region", run.Error, StringComparison.Ordinal);
    }

    private static (double X, double Y) Between(SurveyPlanner.Regions.PlanePoint a, SurveyPlanner.Regions.PlanePoint b, double share)
        => (a.X + (share * (b.X - a.X)), a.Y + (share * (b.Y - a.Y)));

    /// <summary>Plain ray casting over all edges, written apart from the program's own.</summary>
    private static bool Inside(SurveyPlanner.Regions.PlaneShape shape, double x, double y)
    {
        var inside = false;
        for (var ring = 0; ring < shape.RingCount; ring++)
        {
            var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
            for (int i = start, j = end - 1; i < end; j = i++)
            {
                inside ^= shape.Y[i] > y != shape.Y[j] > y
                    && x < ((shape.X[j] - shape.X[i]) * (y - shape.Y[i]) / (shape.Y[j] - shape.Y[i])) + shape.X[i];
            }
        }

        return inside;
    }
}
