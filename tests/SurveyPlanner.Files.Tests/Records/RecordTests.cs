using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Files.Records;
using SurveyPlanner.Files.Tests.Folders;
using SurveyPlanner.Files.Tests.Outputs;

namespace SurveyPlanner.Files.Tests.Records;

public sealed class RecordTests : IDisposable
{
    private static readonly RunInfo Run = new("0.1.0", ".NET 10.0.0", "Linux X64", new DateTimeOffset(2027, 4, 1, 6, 30, 0, TimeSpan.Zero));

    private readonly TemporaryFolder _folder = new();

    public RecordTests()
    {
        Directory.CreateDirectory(_folder.At("plans", "data"));
        Directory.CreateDirectory(_folder.At("results", "out"));
        File.WriteAllText(_folder.At("plans", "sound.toml"), "[survey]\nname = \"Høy\"\n");
        File.WriteAllText(_folder.At("plans", "data", "sound.geojson"), "{}");
    }

    private string RecordFile => _folder.At("results", "out", "record.json");

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_record_reads_back_as_it_was_written()
    {
        var record = Made();

        var read = RecordReader.Read(RecordWriter.Write(record).Content, "record.json");

        // Sequences compare by reference in records: compared as text instead, which is all there is to them.
        Assert.Equal(Text(record), Text(read));
        Assert.Equal(record.Run, read.Run);
        Assert.Equal(record.Draw, read.Draw);
        Assert.Equal(record.Plan, read.Plan);
        Assert.Equal(record.Inputs.AsEnumerable(), read.Inputs);
        Assert.Equal(record.Outputs.AsEnumerable(), read.Outputs);
        Assert.Equal(record.Notices.AsEnumerable(), read.Notices);
        Assert.Equal(record.Seed, read.Seed);
    }

    [Fact]
    public void A_record_has_the_documented_keys()
    {
        var root = JsonNode.Parse(RecordWriter.Write(Made()).Content.Span)!.AsObject();

        Assert.Equal(
            ["format_version", "program", "survey", "draw", "layout", "region", "plan", "inputs", "outputs", "repairs", "warnings"],
            root.Select(member => member.Key));
        Assert.Equal("2027-04-01T06:30:00Z", root["program"]!["made_utc"]!.GetValue<string>());
        Assert.Equal("Philox4x32-10", root["survey"]!["generator"]!.GetValue<string>());
        Assert.Equal("../../plans/sound.toml", root["plan"]!["file"]!.GetValue<string>());
        Assert.Equal("[survey]\nname = \"Høy\"\n", root["plan"]!["text"]!.GetValue<string>());
        Assert.Equal("data/sound.geojson", root["inputs"]![0]!["path"]!.GetValue<string>());
        Assert.DoesNotContain(_folder.Path, Text(Made()), StringComparison.Ordinal);
    }

    [Fact]
    public void Hashes_are_those_of_FIPS_180_4()
    {
        // SHA-256 of "abc" and of nothing: NIST, FIPS 180 example values (from memory, and as sha256sum prints them).
        Assert.Equal("ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad", Hashes.Sha256("abc"u8));
        Assert.Equal("e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855", Hashes.Sha256([]));
    }

    [Fact]
    public void Two_records_of_the_same_work_differ_in_the_time_alone()
    {
        var later = Made() with { Run = Run with { MadeUtc = Run.MadeUtc.AddDays(1) } };

        Assert.Equal(Text(Made()), Text(later).Replace("2027-04-02T", "2027-04-01T", StringComparison.Ordinal));
    }

    [Fact]
    public void The_time_of_making_comes_from_the_clock_that_is_passed_in()
    {
        var run = RunInfo.Of("0.1.0", new StoppedClock(new DateTimeOffset(2027, 4, 1, 8, 30, 0, 123, TimeSpan.FromHours(2))));

        Assert.Equal(Run.MadeUtc, run.MadeUtc);
        Assert.StartsWith(".NET ", run.Runtime, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_key_taken_away_is_named_or_was_not_needed()
    {
        var whole = JsonNode.Parse(RecordWriter.Write(Made()).Content.Span)!.AsObject();
        foreach (var key in whole.Select(member => member.Key).Where(key => key != "draw").ToList())
        {
            var broken = whole.DeepClone().AsObject();
            broken.Remove(key);

            var trouble = Assert.Throws<InputException>(() => RecordReader.Read(Bytes(broken), "record.json"));
            Assert.Contains($"'{key}' is missing", trouble.Message, StringComparison.Ordinal);
            Assert.StartsWith("record.json: ", trouble.Message, StringComparison.Ordinal);
        }
    }

    [Theory]
    [InlineData("survey.seed", "-1")]
    [InlineData("survey.seed", "1.5")]
    [InlineData("survey.seed", "\"7\"")]
    [InlineData("layout.sha256", "\"abc\"")]
    [InlineData("program.made_utc", "\"yesterday\"")]
    [InlineData("draw.number", "-1")]
    [InlineData("draw.of", "3000000000")]
    [InlineData("region.area_km2", "\"large\"")]
    [InlineData("region.projection", "[]")]
    [InlineData("inputs", "{}")]
    [InlineData("plan.file", "\"a\\u0000b\"")]
    [InlineData("plan.file", "\"\"")]
    [InlineData("format_version", "2")]
    public void A_value_that_makes_no_sense_is_named_with_its_place(string path, string value)
    {
        var root = JsonNode.Parse(RecordWriter.Write(Made()).Content.Span)!.AsObject();
        var keys = path.Split('.');
        var holder = keys.SkipLast(1).Aggregate((JsonNode)root, (node, key) => node[key]!);
        holder[keys[^1]] = JsonNode.Parse(value);

        var trouble = Assert.Throws<InputException>(() => RecordReader.Read(Bytes(root), "record.json"));

        Assert.Contains(path, Assert.Single(trouble.Problems).Key, StringComparison.Ordinal);
    }

    [Fact]
    public void A_record_cut_at_any_byte_is_refused()
    {
        var whole = RecordWriter.Write(Made()).Content;
        for (var length = 0; length < whole.Length - 2; length++)
        {
            Assert.Throws<InputException>(() => RecordReader.Read(whole[..length], "record.json"));
        }
    }

    [Theory]
    [InlineData("{\"format_version\":1,\"format_version\":1}")]
    [InlineData("[]")]
    [InlineData("null")]
    [InlineData("not json")]
    public void What_is_no_record_is_refused(string text) =>
        Assert.Throws<InputException>(() => RecordReader.Read(Encoding.UTF8.GetBytes(text), "record.json"));

    [Fact]
    public void A_deeply_nested_file_is_refused_and_does_not_end_the_program() =>
        Assert.Throws<InputException>(() => RecordReader.Read(Encoding.UTF8.GetBytes(new string('[', 100_000)), "record.json"));

    [Fact]
    public void A_record_that_is_not_there_is_trouble_with_reading()
    {
        var trouble = Assert.Throws<IOException>(() => RecordReader.Read(_folder.At("none.json")));
        Assert.EndsWith("does not exist: give the path of a file that does.", trouble.Message, StringComparison.Ordinal);
        Assert.Contains("has no name", Assert.Throws<IOException>(() => RecordReader.Read("")).Message, StringComparison.Ordinal);
        Assert.Contains("give the record.json in it", Assert.Throws<InputException>(() => RecordReader.Read(_folder.Path)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Inputs_are_found_from_where_the_plan_was() =>
        Assert.Equal(_folder.At("plans"), Replay.FindInputs(Made(), RecordFile));

    [Fact]
    public void Inputs_moved_beside_the_record_or_to_a_given_folder_are_found()
    {
        var record = Made();
        Directory.Move(_folder.At("plans", "data"), _folder.At("results", "out", "data"));
        Assert.Equal(_folder.At("results", "out"), Replay.FindInputs(record, RecordFile));

        Directory.Move(_folder.At("results", "out", "data"), _folder.At("data"));
        Assert.Equal(_folder.Path, Replay.FindInputs(record, RecordFile, _folder.Path));
        Assert.Contains("is not in", Assert.Throws<InputException>(() => Replay.FindInputs(record, RecordFile)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void An_input_that_has_changed_is_named()
    {
        var record = Made();
        File.WriteAllText(_folder.At("plans", "data", "sound.geojson"), "[]");

        var trouble = Assert.Throws<InputException>(() => Replay.FindInputs(record, RecordFile));

        var problem = Assert.Single(trouble.Problems);
        Assert.Equal("region.boundary", problem.Key);
        Assert.Contains("'data/sound.geojson'", problem.Message, StringComparison.Ordinal);
        Assert.Contains("has changed since the record was made", problem.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_replay_finds_the_same_layout_and_files_and_tells_when_they_are_not()
    {
        var plan = TestPlans.TwoStrata();
        var record = Made();

        var same = Replay.Compare(record, plan, SurveyFiles.Of(plan, draw: 2));
        Assert.True(same.IsSameLayout);
        Assert.Empty(same.ChangedOutputs);

        var renamed = plan with { Design = plan.Design with { Name = "Another" } };
        var sameLayout = Replay.Compare(record, renamed, SurveyFiles.Of(renamed, draw: 2));
        Assert.True(sameLayout.IsSameLayout);
        Assert.Equal(["transects.gpx", "transects.kml", "summary.json"], sameLayout.ChangedOutputs);

        // One vertex moved by a centimetre: 1e-7 degrees.
        var moved = TestPlans.Plan(
            TestPlans.Centre, plan.Strata[0] with { Layout = plan.Strata[0].Layout with { Transects = [TestPlans.Line("A001", 1, 0, TestPlans.Path(-150.6, 63.0, -150.6, 63.2000001))] } });
        var original = TestPlans.Plan(
            TestPlans.Centre, plan.Strata[0] with { Layout = plan.Strata[0].Layout with { Transects = [TestPlans.Line("A001", 1, 0, TestPlans.Path(-150.6, 63.0, -150.6, 63.2))] } });
        Assert.False(Replay.Compare(record with { LayoutSha256 = Hashes.Sha256(TransectsGeoJson.LayoutBytes(original).Span) }, moved, []).IsSameLayout);
    }

    private SurveyRecord Made()
    {
        var plan = TestPlans.TwoStrata();
        var planFile = _folder.At("plans", "sound.toml");
        var source = new PlanSource(
            planFile,
            "[survey]\nname = \"Høy\"\n"u8.ToArray(),
            "[survey]\nname = \"Høy\"\nseed = 20270401\n",
            [InputFile.Of("region.boundary", "data/sound.geojson", "{}"u8)]);
        return SurveyRecord.Of(plan, source, new DrawNumber(2, 3, 4, "boat changed"), SurveyFiles.Of(plan, draw: 2), _folder.At("results", "out"), Run);
    }

    private static string Text(SurveyRecord record) => Encoding.UTF8.GetString(RecordWriter.Write(record).Content.Span);

    private static byte[] Bytes(JsonNode node) => JsonSerializer.SerializeToUtf8Bytes(node);

    private sealed class StoppedClock(DateTimeOffset now) : TimeProvider
    {
        public override DateTimeOffset GetUtcNow() => now.ToUniversalTime();
    }
}
