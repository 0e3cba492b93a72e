using SurveyPlanner.Files.Plans;

namespace SurveyPlanner.Files.Tests.Plans;

/// <summary>Every slip is one plain sentence with its place and its remedy.</summary>
public class PlanProblemTests
{
    /// <summary>The problems of the least plan with one line replaced.</summary>
    private static string[] ProblemsWith(string line, string by) => ProblemsOf(SamplePlans.Least.Replace(line, by, StringComparison.Ordinal));

    private static string[] ProblemsOf(string text, params string[] sets)
        => [.. Assert.Throws<InputException>(() => PlanFileReader.Parse(text, "a.toml", sets)).Problems.Select(problem => problem.ToString())];

    [Theory]
    [InlineData("lines = 20", "spacing = 5", "a.toml:6:11: layout.spacing: write layout.spacing = \"5 km\": a length needs its unit")]
    [InlineData("lines = 20", "spacing = \"5\"", "a.toml:6:11: layout.spacing: write layout.spacing = \"5 km\": a length needs its unit")]
    [InlineData("lines = 20", "spacing = \"0 km\"", "a.toml:6:11: layout.spacing: \"0 km\" is not more than 0: write layout.spacing = \"5 km\"")]
    [InlineData("lines = 20", "spacing = \"-5 km\"", "a.toml:6:11: layout.spacing: \"-5 km\" is not more than 0: write layout.spacing = \"5 km\"")]
    [InlineData("lines = 20", "spacing = \"40000 km\"", "a.toml:6:11: layout.spacing: \"40000 km\" is longer than any distance on Earth: write layout.spacing = \"5 km\"")]
    [InlineData("lines = 20", "spacing = \"2,5 km\"", "a.toml:6:11: layout.spacing: \"2,5\" has a comma: the decimal mark is a point, write 2.5")]
    [InlineData("lines = 20", "lines = 0", "a.toml:6:9: layout.lines: 0 is not a whole number from 1 to 100000: write layout.lines = 20")]
    [InlineData("lines = 20", "lines = 20.5", "a.toml:6:9: layout.lines: 20.5 is not a whole number from 1 to 100000: write layout.lines = 20")]
    [InlineData("lines = 20", "points = 20", "a.toml:6:1: layout.points: belongs to kinds made of points, and the kind here is parallel: take it out, or write it under the stratum it is for")]
    [InlineData("lines = 20", "lines = 20\nspacing = \"5 km\"", "a.toml:7:1: layout.spacing: lines is given as well and answers the same question: keep one of them")]
    [InlineData("lines = 20", "lines = 20\nlines = 21", "a.toml:7:1: layout.lines: given twice, first on line 6: keep one")]
    [InlineData("lines = 20", "lines = 20\nturning = \"equal-angle\"", "a.toml:7:1: layout.turning: belongs to zigzag, and the kind here is parallel: take it out, or write it under the stratum it is for")]
    [InlineData("lines = 20", "lines = 20\nbearing = 400", "a.toml:7:11: layout.bearing: a bearing runs from 0 to below 360 degrees, 400 does not: layout.bearing = 40 is the same direction")]
    [InlineData("lines = 20", "lines = 20\nbearing = -0.5", "a.toml:7:11: layout.bearing: a bearing runs from 0 to below 360 degrees, -0.5 does not: layout.bearing = 359.5 is the same direction")]
    [InlineData("lines = 20", "lines = 20\nbearing = \"45\"", "a.toml:7:11: layout.bearing: write layout.bearing = 45 without quotes: degrees are a plain number")]
    [InlineData("lines = 20", "lines = 20\nbearing = \"long axis\"", "a.toml:7:11: layout.bearing: \"long axis\" is not degrees from 0 to below 360, \"long-axis\", \"short-axis\", \"along FILE\" or, for segments, \"random\": did you mean long-axis?")]
    [InlineData("lines = 20", "lines = 20\nedge = true", "a.toml:7:8: layout.edge: true is not \"minus\" or \"plus\": write layout.edge = \"minus\"")]
    [InlineData("lines = 20", "lines = 20\nmin_length = 200", "a.toml:7:14: layout.min_length: write layout.min_length = \"200 m\": a length needs its unit")]
    [InlineData("kind = \"parallel\"", "kind = \"zigzag\"\ncrossed = \"true\"", "a.toml:6:11: layout.crossed: write layout.crossed = true without quotes")]
    [InlineData("kind = \"parallel\"", "kind = \"zigzag\"\ncrossed = 1", "a.toml:6:11: layout.crossed: 1 is not true or false: write layout.crossed = true")]
    [InlineData("lines = 20", "lines = 20\nbearng = 45", "a.toml:7:1: layout.bearng: there is no key of this name in [layout]: did you mean bearing?")]
    [InlineData("lines = 20", "lines = 20\ntarget_cv = 0.2", "a.toml:7:1: layout.target_cv: belongs under [precision], not [layout]")]
    [InlineData("\"parallel\"", "\"paralel\"", "a.toml:5:8: layout.kind: \"paralel\" is none of parallel, random-parallel, zigzag, segments, loops, point-grid, points-on-lines, random-points and balanced-points: did you mean parallel?")]
    [InlineData("half_width", "radius", "a.toml:7:1: layout.radius: belongs to kinds made of points, and the kind here is parallel: write half_width instead")]
    [InlineData("\"moor.geojson\"", "\"moor\\u0000.geojson\"", "a.toml:2:12: region.boundary: \"moor\\u0000.geojson\" holds a control character: no file is called so (a path with \\ stands in single quotes)")]
    [InlineData("\"moor.geojson\"", "\"\"", "a.toml:2:12: region.boundary: is empty: write region.boundary = \"sound.geojson\", or take the key out")]
    public void One_slip_is_one_sentence_with_its_place(string line, string by, string expected)
        => Assert.Equal([expected], ProblemsWith(line, by));

    [Theory]
    [InlineData("target_cv = 0", "0 is no coefficient of variation to ask for: it would take endless effort; write precision.target_cv = 0.20")]
    [InlineData("target_cv = 20", "20 is not a coefficient of variation: a number above 0 and at most 1: percent meant? write precision.target_cv = 0.2")]
    [InlineData("target_cv = 150", "150 is not a coefficient of variation: a number above 0 and at most 1: percent meant? even then it is more than 1, a usual one is precision.target_cv = 0.20")]
    [InlineData("target_cv = -0.2", "-0.2 is not a coefficient of variation: a number above 0 and at most 1: write precision.target_cv = 0.20")]
    [InlineData("target_cv = nan", "nan is not a coefficient of variation: a number above 0 and at most 1: write precision.target_cv = 0.20")]
    [InlineData("target_cv = \"0.2\"", "write precision.target_cv = 0.2 without quotes: it is a plain number")]
    [InlineData("target_cv = \"0,2\"", "\"0,2\" has a comma: the decimal mark is a point, write 0.2")]
    [InlineData("assurance = 80", "80 is not a probability: a number from 0.5 to below 1: percent meant? write precision.assurance = 0.8")]
    [InlineData("assurance = 1", "1 is not a probability: a number from 0.5 to below 1: write precision.assurance = 0.80")]
    [InlineData("assurance = 20", "20 is not a probability: a number from 0.5 to below 1: write precision.assurance = 0.80")]
    [InlineData("allocation = \"neyman\"", "\"neyman\" is none of proportional, equal and optimal")]
    public void Shares_that_cannot_be_are_answered_as_a_user_would_wish(string line, string expected)
        => Assert.EndsWith(": " + expected, Assert.Single(ProblemsOf(SamplePlans.Least + "\n[precision]\n" + line)));

    [Theory]
    [InlineData("[coverage]\nreplicates = 0", "a.toml:10:14: coverage.replicates: 0 is not a whole number from 2 to 1000000: write coverage.replicates = 1000")]
    [InlineData("[coverage]\ncells = 10000000000", "a.toml:10:9: coverage.cells: 10000000000 is not a whole number from 1 to 2147483647: write coverage.cells = 10000")]
    [InlineData("[survey]\nseed = -1", "a.toml:10:8: survey.seed: -1 is not a whole number from 0 to 9223372036854775807: write survey.seed = 20270401")]
    [InlineData("[survey]\nseed = 9223372036854775808", "a.toml:10:8: seed: no whole number beyond 9223372036854775807 is read")]
    [InlineData("[lay-out]\nx = 1\ny = 2", "a.toml:9:1: lay-out: there is no table of this name: did you mean [layout]?")]
    [InlineData("[layout]\nedge = \"plus\"", "a.toml:9:1: layout: [layout] stands twice, first on line 4: join the two")]
    [InlineData("[[coverage]]\ncells = 5", "a.toml:9:1: coverage: write [coverage] in single brackets: there is only one such table")]
    [InlineData("[platform]\nspeed = \"100 kn\"", "a.toml:10:1: platform.speed: [platform] takes no keys yet: take this one out")]
    [InlineData("[stratum]\nkind = \"zigzag\"", "a.toml:10:1: stratum.kind: the keys of a stratum stand under its name: write [stratum.\"inner bay\"] above them")]
    [InlineData("[stratum.a.b]\nkind = \"zigzag\"", "a.toml:9:1: stratum.a.b: a name with a dot stands in quotes: write [stratum.\"a.b\"]")]
    [InlineData("[stratum.\"\"]", "a.toml:9:1: stratum.\"\": a stratum needs a name: write [stratum.\"inner bay\"]")]
    [InlineData("[stratum.reef]\nturning = \"equal-angle\"", "a.toml:10:1: stratum.reef.turning: belongs to zigzag, and the kind here is parallel: take it out, or write it under the stratum it is for")]
    [InlineData("[stratum.reef]\nkind = \"point-grid\"", "a.toml:10:1: stratum.reef.spacing: is missing: what [layout] says does not suit the kind of this stratum: write spacing = \"5 km\" (or one of points, size_from, spacing_field) under [stratum.reef]")]
    [InlineData("[stratum.reef]\ncost_per_km = \"3 EUR\"\n[stratum.bank]\ncost_per_km = \"3 NOK\"", "a.toml:10:1: stratum.reef.cost_per_km: is in EUR, and another stratum's cost is in NOK: write all costs in one currency")]
    [InlineData("[pilot]\ndetections = \"d.csv\"", "a.toml:10:1: pilot.detections: needs the table of transects they were made from: write transects = \"pilot-transects.csv\"")]
    [InlineData("[pilot]\nencounter_rate = \"2 /visit\"", "a.toml:10:1: pilot.encounter_rate: does not suit the layout, which is parallel: write encounter_rate = \"0.8 /km\"")]
    [InlineData("[pilot]\nencounter_rate = \"0 /km\"", "a.toml:10:18: pilot.encounter_rate: \"0 /km\" is not more than 0: write pilot.encounter_rate = \"0.8 /km\"")]
    [InlineData("[pilot]\ncluster_size = 0.5", "a.toml:10:16: pilot.cluster_size: 0.5 is not a number from 1 on: write pilot.cluster_size = 2.4")]
    [InlineData("[detection]\nmodels = \"half-normal\"", "a.toml:10:1: detection.models: there are no distances to fit half-normal to: add detections = \"pilot-detections.csv\" under [pilot], or take the key out")]
    [InlineData("[detection]\nmodels = [\"strip\", \"strip\"]", "a.toml:10:10: detection.models: entry 2: \"strip\" stands twice in the list")]
    [InlineData("[detection]\neffective_half_width = \"120 m\"", "a.toml:10:1: detection.effective_half_width: cannot be more than the half_width of the layout, 100 m")]
    public void What_stands_in_further_tables_is_checked(string addition, string expected)
        => Assert.Equal([expected], ProblemsOf(SamplePlans.Least + "\n\n" + addition));

    [Fact]
    public void Size_from_precision_needs_a_target_and_a_pilot()
        => Assert.Equal(
            [
                "a.toml:6:1: layout.size_from: needs a target: write target_cv = 0.20 under [precision]",
                "a.toml:6:1: layout.size_from: needs to know how often animals are met: write transects = \"pilot-transects.csv\" or encounter_rate = \"0.8 /km\" under [pilot]",
            ],
            ProblemsWith("lines = 20", "size_from = \"precision\""));

    [Fact]
    public void What_is_missing_is_named_with_an_example()
        => Assert.Equal(
            [
                "a.toml:1:1: layout.kind: is missing: write kind = \"parallel\" under [layout]",
                "a.toml:1:1: layout.spacing: is missing: write spacing = \"5 km\" (or one of lines, points, total_length, size_from, spacing_field) under [layout]",
                "a.toml:1:1: region.boundary: is missing: write boundary = \"sound.geojson\" under [region]",
            ],
            ProblemsOf(""));

    [Fact]
    public void A_missing_half_width_is_named_once_whatever_the_strata_say()
        => Assert.Equal(
            ["a.toml:5:1: layout.half_width: is missing: write half_width = \"300 m\" (or one of half_width_field) under [layout]"],
            ProblemsOf(SamplePlans.Least.Replace("half_width = \"100 m\"", "[stratum.reef]\nkind = \"zigzag\"", StringComparison.Ordinal)));

    [Fact]
    public void All_problems_of_a_file_come_at_once_in_the_order_of_the_file()
    {
        var problems = ProblemsOf("""
            [survey]
            sed = 4
            [region]
            boundry = "a.geojson"
            [layout]
            kind = parallel
            spacing = 5 km
            half_width = "300"
            """);

        Assert.Equal(
            [
                "a.toml:2:1: survey.sed: there is no key of this name in [survey]: did you mean seed?",
                "a.toml:3:1: region.boundary: is missing: write boundary = \"sound.geojson\" under [region]",
                "a.toml:4:1: region.boundry: there is no key of this name in [region]: did you mean boundary?",
                "a.toml:6:8: write kind = \"parallel\": text stands between quotes",
                "a.toml:7:13: write spacing = \"5 km\": text stands between quotes",
                "a.toml:8:14: layout.half_width: write layout.half_width = \"300 m\": a length needs its unit",
            ],
            problems);
    }

    [Theory]
    [InlineData("layout.spacing", "--set: \"layout.spacing\" is no key=value: write --set layout.spacing=\"4 km\"")]
    [InlineData("layout.spacing=", "--set: \"layout.spacing=\" is no key=value: write --set layout.spacing=\"4 km\"")]
    [InlineData("layout.spacing=4", "--set: layout.spacing: write layout.spacing = \"5 km\": a length needs its unit")]
    [InlineData("layout.spacng=4 km", "--set: layout.spacng: there is no key of this name in [layout]: did you mean spacing?")]
    [InlineData("layot.spacing=4 km", "--set: layot: there is no table of this name: did you mean [layout]?")]
    [InlineData("spacing=4 km", "--set: spacing: stands above the first table: write it under [layout]")]
    [InlineData("layout.turning=equal-angle", "--set: layout.turning: belongs to zigzag, and the kind here is parallel: take it out, or write it under the stratum it is for")]
    public void A_bad_override_names_the_option(string set, string expected)
        => Assert.Equal([expected], ProblemsOf(SamplePlans.Least, set));
}
