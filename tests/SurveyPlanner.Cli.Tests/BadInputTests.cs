using System.Text.Json;

namespace SurveyPlanner.Cli.Tests;

/// <summary>Every kind of bad input: exit 3 (or 2, 4), one clear sentence a problem, nothing written.</summary>
public class BadInputTests
{
    private const string Lines = "kind = \"parallel\"\nbearing = 0\nspacing = \"20 km\"\nhalf_width = \"500 m\"";

    private const string Square =
        """{"type":"Polygon","coordinates":[[[10,50],[11,50],[11,51],[10,51],[10,50]]]}""";

    [Theory]
    [InlineData("layout.spcing=4 km", "spacing")] // wrong key
    [InlineData("layout.spacing=4", "unit")] // missing unit
    [InlineData("layout.spacing=4,5 km", "comma")]
    [InlineData("layout.spacing=500 km", "larger than stratum")]
    [InlineData("layout.spacing=0.5 m", "100000")]
    [InlineData("layout.kind=zigzig", "zigzag")]
    [InlineData("layout.bearing=400", "bearing")]
    [InlineData("region.stratum_field=zone", "zone")]
    [InlineData("region.boundary=missing.geojson", "missing.geojson")]
    [InlineData("coverage.replicates=0", "replicates")]
    [InlineData("coverage.cells=1000000000", "GB")]
    [InlineData("coverage.cells=\"0\"", "cells")]
    [InlineData("precision.target_cv=20", "percent")]
    [InlineData("layout.kind=parallell", "parallel")]
    public void A_wrong_key_or_value(string set, string expected) => Refused(Square, Lines, expected, set);

    [Theory]
    [InlineData("""{"type":"LineString","coordinates":[[10,50],[11,50],[11,51],[10,50]]}""", "polygon")]
    [InlineData("""{"type":"Polygon","coordinates":[[[10,50],[11,51],[11,50],[10,51],[10,50]]]}""", "crosses itself")]
    [InlineData("""{"type":"Polygon","coordinates":[[[500000,5600000],[510000,5600000],[510000,5610000],[500000,5600000]]]}""", "degrees")]
    [InlineData("", "empty")]
    [InlineData("{\"type\":\"Polygon\",\"coordinates\":[[[10,50],[11,50],[11,51", "end")]
    public void A_boundary_that_cannot_be_one(string boundary, string expected) => Refused(boundary, Lines, expected);

    [Theory]
    [InlineData("stratum,transect,length_km,count\nregion,T1,-4,2\nregion,T2,3,1\n", "pilot.csv:2", "length")]
    [InlineData("stratum,transect,length_km,count\nregion,T1,4,0\nregion,T2,3,0\n", "pilot.csv", "detection")]
    [InlineData("stratum,transect,length_km,count\nregion,T1,four,2\n", "four", "length_km")]
    [InlineData("stratum,transect,length_km,count\nelsewhere,T1,4,2\nelsewhere,T2,4,2\n", "elsewhere", "stratum")]
    public void A_pilot_table_that_cannot_be_one(string table, string first, string second)
    {
        using var work = new Workspace();
        File.WriteAllText(work.At("region.geojson"), Square);
        File.WriteAllText(work.At("pilot.csv"), table);
        var plan = work.Plan("region.geojson", Lines, "[pilot]\ntransects = \"pilot.csv\"\n[precision]\ntarget_cv = 0.2");
        var run = ProgramRun.Of("plan", plan, "--out", work.At("out"));
        Assert.Equal(3, run.ExitCode);
        Assert.Contains(first, run.Error, StringComparison.OrdinalIgnoreCase);
        Assert.Contains(second, run.Error, StringComparison.OrdinalIgnoreCase);
        Assert.False(Directory.Exists(work.At("out")));
    }

    [Fact]
    public void Rows_that_are_wrong_alike_are_told_five_times_and_counted()
    {
        using var work = new Workspace();
        File.WriteAllText(work.At("region.geojson"), Square);
        File.WriteAllText(work.At("pilot.csv"), "transect,length_km,count\nT0,1,3\n" + string.Concat(Enumerable.Range(1, 40).Select(i => $"T{i},-{i},3\n")));
        var plan = work.Plan("region.geojson", Lines, "[pilot]\ntransects = \"pilot.csv\"");
        var run = ProgramRun.Of("effort", plan, "--json");

        Assert.Equal(6, run.Error.TrimEnd().Split('\n').Length);
        Assert.EndsWith("pilot.csv: length_km: and 35 more like these", run.Error.TrimEnd(), StringComparison.Ordinal);
        using var document = JsonDocument.Parse(run.Out);
        Assert.Equal(40, document.RootElement.GetProperty("error").GetProperty("problems").GetArrayLength());
    }

    [Fact]
    public void Strips_that_overlap_are_allowed_with_a_warning_and_counted_right()
    {
        using var work = new Workspace();
        File.WriteAllText(work.At("region.geojson"), Square);
        var plan = work.Plan("region.geojson", Lines, "[coverage]\nreplicates = 200\ncells = 600");
        var run = ProgramRun.Of("coverage", plan, "--json", "--set", "layout.half_width=11 km");
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("overlap", run.Error, StringComparison.Ordinal);
        using var summary = JsonDocument.Parse(run.Out);
        var coverage = summary.RootElement.GetProperty("strata")[0].GetProperty("coverage");
        Assert.Equal(1, coverage.GetProperty("nominal").GetDouble());
        Assert.Equal(1, coverage.GetProperty("max").GetDouble(), 1e-9);
        Assert.Equal(coverage.GetProperty("mean").GetDouble(), coverage.GetProperty("simulated_mean").GetDouble(), 0.01);
    }

    [Theory]
    [InlineData(2, "plna")]
    [InlineData(2, "plan", "x.toml", "--otu", "y")]
    [InlineData(2, "plan", "x.toml")]
    [InlineData(2, "plan", "x.toml", "--out", "y", "--threads", "many")]
    [InlineData(2, "plan", "--angel=5", "--out", "y")]
    [InlineData(2, "layout", "x.toml", "--seed", "1.5")]
    [InlineData(3, "check", "no-such-plan.toml")]
    [InlineData(0, "--help")]
    [InlineData(0, "plan", "--help")]
    [InlineData(0)]
    [InlineData(0, "--version")]
    public void Exit_codes_and_streams(int expected, params string[] args)
    {
        var run = ProgramRun.Of(args);
        Assert.Equal(expected, run.ExitCode);
        Assert.Equal(expected == 0, run.Error.Length == 0);
        Assert.Equal(expected == 0, run.Out.Length > 0);
        Assert.DoesNotContain("   at ", run.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_typing_mistake_gets_the_nearest_right_spelling()
    {
        Assert.Contains("'plan'", ProgramRun.Of("plna").Error, StringComparison.Ordinal);
        Assert.Contains("'--out'", ProgramRun.Of("plan", "x.toml", "--otu", "y").Error, StringComparison.Ordinal);
    }

    [Fact]
    public void With_json_an_error_is_one_document_too()
    {
        var run = ProgramRun.Of("check", "no-such-plan.toml", "--json");
        using var document = JsonDocument.Parse(run.Out);
        Assert.Equal(3, document.RootElement.GetProperty("error").GetProperty("exit_code").GetInt32());
        Assert.NotEmpty(document.RootElement.GetProperty("error").GetProperty("problems").EnumerateArray());
    }

    [Fact]
    public void A_folder_that_exists_is_left_alone()
    {
        using var work = new Workspace();
        File.WriteAllText(work.At("region.geojson"), Square);
        Directory.CreateDirectory(work.At("out"));
        File.WriteAllText(Path.Combine(work.At("out"), "mine.txt"), "mine");
        var plan = work.Plan("region.geojson", Lines);
        Assert.Equal(4, ProgramRun.Of("plan", plan, "--out", work.At("out")).ExitCode);
        Assert.Equal(4, ProgramRun.Of("plan", plan, "--out", work.At("out"), "--force").ExitCode);
        Assert.Equal("mine", File.ReadAllText(Path.Combine(work.At("out"), "mine.txt")));
        Assert.Single(Directory.EnumerateFileSystemEntries(work.At("out")));
    }

    private static void Refused(string boundary, string layout, string expected, params string[] sets)
    {
        using var work = new Workspace();
        File.WriteAllText(work.At("region.geojson"), boundary);
        var plan = work.Plan("region.geojson", layout);
        var before = Directory.EnumerateFileSystemEntries(work.Folder, "*", SearchOption.AllDirectories).Order().ToList();
        var run = ProgramRun.Of(["plan", plan, "--out", work.At("out"), .. sets.SelectMany(set => new[] { "--set", set })]);
        Assert.Equal(3, run.ExitCode);
        Assert.Equal("", run.Out);
        Assert.Contains(expected, run.Error, StringComparison.OrdinalIgnoreCase);
        Assert.Single(run.Error.TrimEnd().Split('\n'));
        Assert.Equal(before, Directory.EnumerateFileSystemEntries(work.Folder, "*", SearchOption.AllDirectories).Order());
    }
}
