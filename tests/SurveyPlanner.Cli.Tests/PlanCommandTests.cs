using System.IO.Compression;
using System.Text.Json;

namespace SurveyPlanner.Cli.Tests;

public class PlanCommandTests
{
    private static readonly string[] Files =
        ["coverage.csv", "record.json", "report.html", "summary.json", "survey.gpkg", "transects.geojson", "transects.gpx", "transects.kml", "waypoints.csv"];

    [Theory]
    [InlineData("island_iceland", "kind = \"parallel\"\nbearing = \"short-axis\"\nspacing = \"20 km\"\nhalf_width = \"500 m\"", 102356.769487)]
    [InlineData("antimeridian_fiji", "kind = \"parallel\"\nbearing = 30\nspacing = \"10 km\"\nhalf_width = \"500 m\"", 18935.933489)]
    [InlineData("polar_svalbard", "kind = \"zigzag\"\nbearing = \"short-axis\"\nspacing = \"25 km\"\nhalf_width = \"500 m\"", 61892.324191)]
    [InlineData("lake_caspian_with_islands", "kind = \"point-grid\"\nbearing = 0\nspacing = \"40 km\"\nradius = \"2 km\"", 396301.311613)]
    public void The_whole_job_on_a_boundary_that_nobody_here_drew(string region, string layout, double areaKm2)
    {
        using var work = new Workspace();
        var plan = work.Plan(ReferenceData.Path("regions", region + ".geojson"), layout, "[coverage]\nreplicates = 200");
        var run = ProgramRun.Of("plan", plan, "--out", work.At("out"), "--quiet");
        Assert.Equal((0, ""), (run.ExitCode, run.Error));
        Assert.Equal(Files, Directory.EnumerateFiles(work.At("out")).Select(Path.GetFileName).Order(StringComparer.Ordinal));

        using var summary = JsonDocument.Parse(File.ReadAllText(Path.Combine(work.At("out"), "summary.json")));
        var stratum = summary.RootElement.GetProperty("strata")[0];
        Assert.Equal(1, stratum.GetProperty("area_km2").GetDouble() / areaKm2, 1e-6);

        // Cells carry the whole area, and coverage stays a probability.
        var cells = File.ReadLines(Path.Combine(work.At("out"), "coverage.csv")).Skip(1).Select(line => line.Split(',')).ToList();
        Assert.Equal(1, cells.Sum(cell => Number(cell[3])) / areaKm2, 1e-5);
        Assert.All(cells, cell => Assert.InRange(Number(cell[5]), 0, 1));
    }

    [Fact]
    public void Strata_by_attribute_each_get_their_layout()
    {
        using var work = new Workspace();
        var plan = work.Plan(
            ReferenceData.Path("regions", "strata_maine_counties.geojson"),
            "kind = \"parallel\"\nbearing = \"short-axis\"\nspacing = \"10 km\"\nhalf_width = \"300 m\"",
            "[stratum.\"York County\"]\nkind = \"zigzag\"\n[coverage]\nreplicates = 50");
        File.WriteAllText(plan, File.ReadAllText(plan).Replace("[layout]", "stratum_field = \"name\"\n\n[layout]", StringComparison.Ordinal));
        var run = ProgramRun.Of("plan", plan, "--out", work.At("out"), "--json");
        Assert.Equal(0, run.ExitCode);
        using var summary = JsonDocument.Parse(run.Out);
        var strata = summary.RootElement.GetProperty("strata").EnumerateArray().ToDictionary(
            stratum => stratum.GetProperty("name").GetString()!, stratum => stratum.GetProperty("kind").GetString());
        Assert.Equal(16, strata.Count);
        Assert.Equal("zigzag", strata["York County"]);
        Assert.Equal("parallel", strata["Knox County"]);
    }

    /// <summary>Lines in one stratum and scattered points, with spare ones, in the other: each drawn and told as what it is.</summary>
    [Fact]
    public void Lines_and_points_in_one_plan()
    {
        using var work = new Workspace();
        File.WriteAllText(work.At("region.geojson"), """
            {"type":"FeatureCollection","features":[
            {"type":"Feature","properties":{"zone":"a"},"geometry":{"type":"Polygon","coordinates":[[[10,50],[11,50],[11,51],[10,51],[10,50]]]}},
            {"type":"Feature","properties":{"zone":"b"},"geometry":{"type":"Polygon","coordinates":[[[11,50],[12,50],[12,51],[11,51],[11,50]]]}}]}
            """);
        var plan = work.Plan(
            "region.geojson\"\nstratum_field = \"zone",
            "kind = \"parallel\"\nbearing = 0\nspacing = \"20 km\"\nhalf_width = \"500 m\"",
            "[stratum.\"b\"]\nkind = \"random-points\"\npoints = 12\nreserve = 5\nradius = \"500 m\"\n[coverage]\nreplicates = 50");
        var run = ProgramRun.Of("plan", plan, "--out", work.At("out"));
        Assert.Equal((0, ""), (run.ExitCode, run.ExitCode == 0 ? "" : run.Error));

        var report = File.ReadAllText(work.At("out/report.html"));
        var dots = report[report.IndexOf("class=\"dots\"", StringComparison.Ordinal)..];
        Assert.Equal(12, dots[..dots.IndexOf("</g>", StringComparison.Ordinal)].Split("class=\"line\"").Length - 1);
        Assert.Contains("b: random-points, 12 points. ", report.Replace('\u00a0', ' '), StringComparison.Ordinal);
        Assert.Contains("5 spare points", report.Replace('\u00a0', ' '), StringComparison.Ordinal);
        var row = run.Out.Split('\n').Single(line => line.StartsWith("b ", StringComparison.Ordinal) && line.Contains("random-points", StringComparison.Ordinal));
        Assert.DoesNotContain("°", row, StringComparison.Ordinal);
    }

    [Fact]
    public void Threads_and_replay_give_the_same_bytes()
    {
        using var work = new Workspace();
        work.CopySamples();
        var plan = work.At("sample-regions/sea-ducks-sound/plan.toml");
        foreach (var threads in new[] { "1", "2", "8" })
        {
            Assert.Equal(0, ProgramRun.Of("plan", plan, "--out", work.At("out" + threads), "--threads", threads, "--quiet").ExitCode);
        }

        var replay = ProgramRun.Of("replay", Path.Combine(work.At("out1"), "record.json"), "--out", work.At("again"));
        Assert.Equal(0, replay.ExitCode);
        foreach (var other in new[] { "out2", "out8", "again" })
        {
            foreach (var file in Files.Except(["record.json"]))
            {
                Assert.Equal(File.ReadAllBytes(Path.Combine(work.At("out1"), file)), File.ReadAllBytes(Path.Combine(work.At(other), file)));
            }
        }
    }

    /// <summary>
    /// The executable itself, where comma is the decimal sign and the day begins elsewhere, and on processors without the widest vectors or with
    /// hardly any. (On a processor without them those runs are the same; .NET documents the switches.)
    /// </summary>
    [Fact]
    public async Task Locale_time_zone_and_processor_change_nothing()
    {
        using var work = new Workspace();
        work.CopySamples();
        var plan = work.At("sample-regions/marine-mammals-shelf/plan.toml");
        (string Folder, (string Name, string Value)[] Variables)[] runs =
        [
            ("a", [("LC_ALL", "C"), ("TZ", "UTC")]),
            ("b", [("LC_ALL", "de_DE.UTF-8"), ("TZ", "Asia/Tokyo")]),
            ("c", [("DOTNET_EnableAVX512", "0"), ("DOTNET_EnableAVX512F", "0")]),
            ("d", [("DOTNET_EnableAVX", "0")]),
        ];
        foreach (var (folder, variables) in runs)
        {
            var start = new System.Diagnostics.ProcessStartInfo("dotnet", [typeof(Application).Assembly.Location, "plan", plan, "--out", work.At(folder)])
            {
                RedirectStandardOutput = true,
                RedirectStandardError = true,
            };
            foreach (var (name, value) in variables)
            {
                start.Environment[name] = value;
            }

            using var process = System.Diagnostics.Process.Start(start)!;
            var error = process.StandardError.ReadToEndAsync(TestContext.Current.CancellationToken);
            await process.StandardOutput.ReadToEndAsync(TestContext.Current.CancellationToken);
            await process.WaitForExitAsync(TestContext.Current.CancellationToken);
            Assert.True(process.ExitCode == 0, await error);
        }

        foreach (var (folder, _) in runs[1..])
        {
            foreach (var file in Files.Except(["record.json"]))
            {
                Assert.Equal(File.ReadAllBytes(Path.Combine(work.At("a"), file)), File.ReadAllBytes(Path.Combine(work.At(folder), file)));
            }
        }
    }

    /// <summary>A plan beside a shapefile of the same name is no part of it; a companion that came later is.</summary>
    [Fact]
    public void Replay_of_a_shapefile_looks_at_what_was_read()
    {
        using var work = new Workspace();
        using (var archive = ZipFile.OpenRead(ReferenceData.Path("regions", "dirty/shp_esri_albers_maine.zip")))
        {
            foreach (var entry in archive.Entries.Where(entry => !entry.Name.EndsWith(".cpg", StringComparison.Ordinal)))
            {
                entry.ExtractToFile(work.At("zones" + Path.GetExtension(entry.Name)));
            }
        }

        var plan = work.Plan("zones.shp", "kind = \"parallel\"\nlines = 10\nhalf_width = \"100 m\"", name: "zones.toml");
        Assert.Equal(0, ProgramRun.Of("layout", plan, "--out", work.At("out")).ExitCode);
        var record = Path.Combine(work.At("out"), "record.json");
        File.AppendAllText(plan, "# a thought after the draw\n");
        Assert.Equal(0, ProgramRun.Of("replay", record).ExitCode);

        File.WriteAllText(work.At("zones.cpg"), "UTF-8");
        var replay = ProgramRun.Of("replay", record);
        Assert.Equal(3, replay.ExitCode);
        Assert.Contains("zones.cpg", replay.Error, StringComparison.Ordinal);
        Assert.Contains("was not there when the record was made", replay.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_changed_input_is_named_by_replay()
    {
        using var work = new Workspace();
        work.CopySamples();
        var plan = work.At("sample-regions/ground-birds-hills/plan.toml");
        Assert.Equal(0, ProgramRun.Of("plan", plan, "--out", work.At("out"), "--quiet", "--set", "coverage.replicates=50").ExitCode);
        File.AppendAllText(work.At("sample-regions/ground-birds-hills/boundary.geojson"), " ");
        var replay = ProgramRun.Of("replay", Path.Combine(work.At("out"), "record.json"));
        Assert.Equal(3, replay.ExitCode);
        Assert.Contains("boundary.geojson", replay.Error, StringComparison.Ordinal);
        Assert.Contains("has changed", replay.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void Draws_are_counted_and_the_same_seed_is_the_same_draw()
    {
        using var work = new Workspace();
        work.CopySamples();
        var plan = work.At("sample-regions/ground-birds-hills/plan.toml");
        Assert.Contains("draw 1 of 1", ProgramRun.Of("layout", plan).Out, StringComparison.Ordinal);
        Assert.Contains("draw 1 of 1", ProgramRun.Of("layout", plan).Out, StringComparison.Ordinal);
        Assert.Contains("draw 2 of 2", ProgramRun.Of("layout", plan, "--seed", "12").Out, StringComparison.Ordinal);
        Assert.Equal(0, ProgramRun.Of("coverage", plan, "--seed", "99", "--set", "coverage.replicates=20").ExitCode);
        Assert.Contains("draw 2 of 2", ProgramRun.Of("layout", plan, "--seed", "12").Out, StringComparison.Ordinal);
    }

    private static double Number(string text) => double.Parse(text, System.Globalization.CultureInfo.InvariantCulture);
}
