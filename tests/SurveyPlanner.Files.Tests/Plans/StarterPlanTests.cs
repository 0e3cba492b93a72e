using System.Text.RegularExpressions;
using CsCheck;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Files.Plans;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Files.Tests.Plans;

public partial class StarterPlanTests
{
    private static readonly StarterFacts Sound = new("sound", 1234.5, 56, 30, 56, [new StratumFieldCandidate("zone", ["inner bay", "outer sound"])]);

    [Fact]
    public void It_reads_without_a_problem_and_fits_the_region()
    {
        var plan = PlanFileReader.Parse(StarterPlan.For("sound.geojson", Sound), "sound.toml", []);

        Assert.Equal(("sound", "sound.geojson", false), (plan.Design.Name, Assert.Single(plan.BoundaryPaths), plan.SeedGiven));
        Assert.Equal(new LayoutDesign(LayoutKind.Parallel, new Sizing.Spacing(3000), new Bearing.ShortAxis(), 300), plan.Design.Layout);
    }

    [Fact]
    public void Its_notes_read_too_once_their_marks_are_taken_away()
    {
        var text = CommentedToml().Replace(StarterPlan.For("sound.geojson", Sound), "");
        var plan = PlanFileReader.Parse(text, "sound.toml", []);

        Assert.Equal((20270401UL, "zone", 0.2), (plan.Design.Seed, plan.Design.StratumField, plan.Design.Effort.TargetCv));
        Assert.Equal(new Sizing.Spacing(1500), plan.Design.LayoutOf("inner bay").Sizing);
        Assert.Equal("pilot-detections.csv", plan.PilotDetectionsPath);
        Assert.Equal(500, plan.Design.ExclusionBufferMetres);
    }

    [Fact]
    public void Whatever_the_region_it_gives_about_twenty_lines_with_strips_far_apart()
        => Gen.Double[-3, 4].Hold(
            500, seed: 1,
            exponent =>
            {
                var longAxisKm = Math.Pow(10, exponent);
                var design = PlanFileReader.Parse(StarterPlan.For("a.geojson", new StarterFacts("a", 1, longAxisKm, longAxisKm, longAxisKm, [])), "a.toml", []).Design.Layout;
                var spacing = Assert.IsType<Sizing.Spacing>(design.Sizing).Metres;

                // The widest step between round lengths is a third: half of it, on a ratio scale, is 15.5 percent.
                Assert.InRange(longAxisKm * 1000 / spacing, 20 / 1.156, 20 * 1.156);
                Assert.InRange(design.HalfWidthMetres, Math.Min(240, spacing * 0.079), Math.Min(300, spacing * 0.1) * (1 + 1e-12));
            });

    [Fact]
    public void Whatever_the_names_it_reads_and_says_them_back()
        => Gen.Select(Gen.String, Gen.String, Gen.String.Array[0, 3]).Hold(
            300, seed: 1,
            names =>
            {
                var (survey, field, values) = names;
                var facts = new StarterFacts(survey, 1, 10, 5, 10, [new StratumFieldCandidate(field, [.. values]), new StratumFieldCandidate(field + "x", [.. values])]);
                var design = PlanFileReader.Parse(StarterPlan.For("a.geojson", facts), "a.toml", []).Design;
                Assert.Equal(string.IsNullOrWhiteSpace(survey) ? "survey" : WholeCharacters(survey), design.Name);
            });

    [Fact]
    public void A_file_name_that_no_plan_can_hold_is_refused_in_words()
        => Assert.Contains("rename the file", Assert.Throws<InputException>(() => StarterPlan.For("a\nb.geojson", Sound)).Message);

    [Fact]
    public void Names_come_before_numbers_as_strata()
    {
        var square = Islands("[[[10,0],[10.1,0],[10.1,0.1],[10,0.1],[10,0]]]", "[[[10.9,0],[11,0],[11,0.1],[10.9,0.1],[10.9,0]]]").Features[0];
        BoundaryFeature Feature(int number, string area, string zone)
            => square with { Number = number, Attributes = square.Attributes.SetItem("area", area).SetItem("zone", zone) };
        var boundary = new Boundary("a", [Feature(1, "1", "bay"), Feature(2, "2.5", "bank"), Feature(3, "1", "shelf")], "degrees", []);

        Assert.Equal(["zone", "area"], StarterFacts.Of("a", boundary).StratumFields.Select(candidate => candidate.Field));
    }

    /// <summary>
    /// Two squares of a tenth of a degree on the equator, nine tenths apart: 1° of longitude is 111.3195 km there (WGS 84, a × π/180), so
    /// lines running north can fall on 22.2639 km of 111.3195.
    /// </summary>
    [Fact]
    public void Of_scattered_parts_only_their_own_widths_count()
    {
        var boundary = Islands("[[[10,0],[10.1,0],[10.1,0.1],[10,0.1],[10,0]]]", "[[[10.9,0],[11,0],[11,0.1],[10.9,0.1],[10.9,0]]]");
        var facts = StarterFacts.Of("islands", boundary);

        Assert.Equal(111.3195, facts.LongAxisKm, 0.02);
        Assert.Equal(22.2639, facts.LinesAcrossKm, 0.02);
        var line = StarterPlan.For("a.geojson", facts).Split('\n').Single(line => line.StartsWith("spacing = ", StringComparison.Ordinal));
        Assert.StartsWith("spacing = \"1.2 km\" ", line, StringComparison.Ordinal);
        Assert.Contains(" # about 19 lines in the region as a whole", line, StringComparison.Ordinal);
    }

    /// <summary>The sentence of the plan against what is drawn: a systematic layout is never more than a line for each part from its mean.</summary>
    [Theory]
    [InlineData("polar_svalbard.geojson")]
    [InlineData("antimeridian_fiji.geojson")]
    [InlineData("lake_caspian_with_islands.geojson")]
    public void The_number_of_lines_it_speaks_of_is_the_number_drawn(string name)
    {
        var boundary = BoundaryReader.Read(ReferenceData.Path("regions", name));
        var text = StarterPlan.For("a.geojson", StarterFacts.Of("a", boundary));
        var said = int.Parse(LinesSaid().Match(text).Groups[1].Value, System.Globalization.CultureInfo.InvariantCulture);
        var design = PlanFileReader.Parse(text, "a.toml", ["survey.seed=3"]).Design;
        var drawn = PlanSurvey.DrawOnly(design, new SurveyInputs(boundary, [], null)).Strata[0].Layout;

        Assert.InRange(said, 17, 23);
        Assert.InRange(drawn.Transects.Length, said - 3, said + 3);
        Assert.Equal(said, drawn.ExpectedCount, 0.51);
    }

    [Fact]
    public void The_facts_come_from_the_boundary_and_its_region()
    {
        var boundary = BoundaryReader.Read(ReferenceData.Path("regions", "strata_maine_counties.geojson"));
        var region = RegionBuilder.Build(boundary, new RegionDesign(), []);
        var facts = StarterFacts.Of("counties", boundary);

        Assert.Equal(region.AreaKm2, facts.AreaKm2);
        Assert.Equal((region.Strata[0].LongAxisKm, region.Strata[0].ShortAxisKm), (facts.LongAxisKm, facts.ShortAxisKm));
        var candidate = facts.StratumFields[0];
        Assert.Equal(boundary.Features.Select(feature => feature.Attributes[candidate.Field]).Distinct(), candidate.Values);
        var plan = PlanFileReader.Parse(StarterPlan.For("counties.geojson", facts), "a.toml", [$"region.stratum_field={candidate.Field}"]);
        Assert.Equal(candidate.Values.Length, RegionBuilder.Build(boundary, new RegionDesign(plan.Design.StratumField), []).Strata.Length);
    }

    /// <summary>A text file cannot hold half a surrogate pair.</summary>
    private static string WholeCharacters(string text) => string.Concat(text.EnumerateRunes());

    [GeneratedRegex(@"^# (?=\[[a-z]|[a-z_]+ = )", RegexOptions.Multiline)]
    private static partial Regex CommentedToml();

    [GeneratedRegex("# about ([0-9]+) lines")]
    private static partial Regex LinesSaid();

    private static Boundary Islands(params string[] polygons)
    {
        var path = Path.Combine(Directory.CreateTempSubdirectory("islands-").FullName, "islands.geojson");
        File.WriteAllText(path, $$"""{"type":"MultiPolygon","coordinates":[{{string.Join(",", polygons)}}]}""");
        try
        {
            return BoundaryReader.Read(path);
        }
        finally
        {
            Directory.Delete(Path.GetDirectoryName(path)!, recursive: true);
        }
    }
}
