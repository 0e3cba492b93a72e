using SurveyPlanner.Effort;
using SurveyPlanner.Files.Plans;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Files.Tests.Plans;

public class PlanFileReaderTests
{
    [Fact]
    public void A_full_plan_is_read_into_metres_degrees_and_plain_numbers()
    {
        var plan = PlanFileReader.Parse(SamplePlans.Full, "plans/sound.toml", []);
        var design = plan.Design;

        Assert.Equal("Merrow Sound, sea ducks by boat", design.Name);
        Assert.Equal(20270401UL, design.Seed);
        Assert.True(plan.SeedGiven);
        Assert.Equal("zone", design.StratumField);
        Assert.Equal(["inner bay", "outer sound", "reef"], design.Strata);
        Assert.Equal(
            new LayoutDesign(LayoutKind.Parallel, new Sizing.Spacing(5000), new Bearing.ShortAxis(), 300) { MinLengthMetres = 200 },
            design.Layout);
        Assert.Equal(
            new LayoutDesign(LayoutKind.Zigzag, new Sizing.Spacing(5000), new Bearing.Degrees(45.5), 300, EdgeRule.Plus, Turning: ZigzagTurning.AdjustedAngle) { Crossed = true, MinLengthMetres = 200 },
            design.LayoutOf("inner bay"));
        Assert.Equal(
            new LayoutDesign(LayoutKind.PointGrid, new Sizing.Number(60), new Bearing.ShortAxis(), 300, Grid: GridShape.Triangular),
            design.LayoutOf("reef"));
        Assert.Same(design.Layout, design.LayoutOf("outer sound"));
        Assert.Equal((10000, 500), (design.Coverage.Cells, design.Coverage.Replicates));
    }

    [Fact]
    public void Precision_pilot_detection_and_costs_are_read()
    {
        var effort = PlanFileReader.Parse(SamplePlans.Full, "plans/sound.toml", []).Design.Effort;

        Assert.Equal((0.2, 0.8, 3.0), (effort.TargetCv, effort.Assurance, effort.B));
        Assert.Equal((Allocation.Optimal, 12), (effort.Allocation, effort.MinLines));
        Assert.Equal(EncounterRateEstimator.AdjacentPairs, effort.Estimator);
        Assert.Equal(new GivenClusterSize(2.4, 1.7), effort.ClusterSize);
        Assert.Equal([DetectionModel.HalfNormal, DetectionModel.HazardRate], effort.Detection.Models);
        Assert.Equal((250.0, 0.12, 60.0, 180.0), (effort.Detection.TruncationMetres, effort.Detection.GivenCv, effort.Detection.GivenDegreesOfFreedom, effort.Detection.GivenEffectiveWidthMetres));
        Assert.Equal([("inner bay", 35.0), ("reef", 20.0)], effort.CostPerUnit.Select(pair => (pair.Key, pair.Value)));
    }

    [Fact]
    public void Paths_start_from_the_folder_of_the_plan()
    {
        var plan = PlanFileReader.Parse(SamplePlans.Full, "plans/sound.toml", []);

        Assert.Equal([Path.Combine("plans", "sound.gpkg")], plan.BoundaryPaths);
        Assert.Equal(["zones"], plan.Layers);
        Assert.Equal("EPSG:25832", plan.Crs);
        Assert.Equal([Path.Combine("plans", "closed.geojson"), "/shared/range.geojson"], plan.ExclusionPaths);
        Assert.Equal(500, plan.Design.ExclusionBufferMetres);
        Assert.Equal(Path.Combine("plans", "pilot/transects.csv"), plan.PilotTransectsPath);
        Assert.Equal(Path.Combine("plans", "pilot/detections.csv"), plan.PilotDetectionsPath);
        Assert.Equal(SamplePlans.Full, plan.RawText);
    }

    [Fact]
    public void The_least_plan_has_the_documented_defaults()
    {
        var plan = PlanFileReader.Parse(SamplePlans.Least, "north-moor.toml", []);

        Assert.Equal("north-moor", plan.Design.Name);
        Assert.False(plan.SeedGiven);
        Assert.Empty(plan.Design.Strata);
        Assert.Equal(new LayoutDesign(LayoutKind.Parallel, new Sizing.Number(20), new Bearing.ShortAxis(), 100), plan.Design.Layout);
        Assert.Equal(EffortDesign.None, plan.Design.Effort with { Detection = DetectionDesign.None, CostPerUnit = EffortDesign.None.CostPerUnit });
        Assert.Empty(plan.Design.Effort.CostPerUnit);
        Assert.Empty(plan.Design.Effort.Detection.Models);
        Assert.Equal(new SurveyPlanner.Coverage.CoverageDesign(), plan.Design.Coverage);
        Assert.Equal(["moor.geojson"], plan.BoundaryPaths);
        Assert.Empty(plan.ExclusionPaths);
        Assert.Null(plan.PilotTransectsPath);
    }

    [Fact]
    public void Inline_tables_and_dotted_keys_mean_the_same_as_tables()
    {
        const string Inline = """
            region = { boundary = "moor.geojson" }
            layout.kind = "parallel"
            layout.lines = 20
            layout.half_width = "100 m"
            """;

        Assert.Equal(
            PlanFileReader.Parse(SamplePlans.Least, "a.toml", []).CanonicalText,
            PlanFileReader.Parse(Inline, "a.toml", []).CanonicalText);
    }

    [Theory]
    [InlineData("layout.spacing=4 km")]
    [InlineData("layout.spacing=\"4 km\"")]
    [InlineData(" layout.spacing = 4000 m ")]
    public void An_override_replaces_every_other_way_of_sizing(string set)
        => Assert.Equal(new Sizing.Spacing(4000), PlanFileReader.Parse(SamplePlans.Least, "a.toml", [set]).Design.Layout.Sizing);

    [Theory]
    [InlineData("stratum.inner bay.kind=point-grid")]
    [InlineData("stratum.\"inner bay\".kind=\"point-grid\"")]
    [InlineData("stratum.'inner bay'.kind='point-grid'")]
    public void An_override_can_change_the_kind_of_one_stratum_and_drops_what_no_longer_suits(string set)
    {
        var design = PlanFileReader.Parse(SamplePlans.Full, "a.toml", [set, "stratum.inner bay.cost_per_point=9 EUR"]).Design;

        Assert.Equal(
            new LayoutDesign(LayoutKind.PointGrid, new Sizing.Spacing(5000), new Bearing.Degrees(45.5), 300, EdgeRule.Plus),
            design.LayoutOf("inner bay"));
        Assert.Equal(9, design.Effort.CostPerUnit["inner bay"]);
    }

    [Fact]
    public void An_override_of_a_text_key_needs_no_quotes_even_when_it_looks_like_a_number()
    {
        var plan = PlanFileReader.Parse(SamplePlans.Least, "a.toml", ["survey.name=2027", "survey.seed=5", "layout.bearing=45", "layout.bearing=46"]);

        Assert.Equal(("2027", 5UL, true), (plan.Design.Name, plan.Design.Seed, plan.SeedGiven));
        Assert.Equal(new Bearing.Degrees(46), plan.Design.Layout.Bearing);
    }

    [Fact]
    public void A_good_override_saves_a_bad_value_in_the_file()
        => Assert.Equal(
            100,
            PlanFileReader.Parse(SamplePlans.Least.Replace("\"100 m\"", "\"wide\"", StringComparison.Ordinal), "a.toml", ["layout.half_width=100 m"]).Design.Layout.HalfWidthMetres);
}
