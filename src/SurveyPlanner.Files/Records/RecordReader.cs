using System.Globalization;
using System.Text.Json;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Records;

/// <summary>Reads a <c>record.json</c> back.</summary>
public static class RecordReader
{
    private const long MaxBytes = 64 * 1024 * 1024;

    /// <param name="file">The record file.</param>
    /// <exception cref="InputException">It is no record, or one that this version cannot read.</exception>
    /// <exception cref="IOException">It cannot be read at all.</exception>
    public static SurveyRecord Read(string file)
    {
        if (string.IsNullOrWhiteSpace(file) || file.Contains('\0', StringComparison.Ordinal))
        {
            throw new IOException($"The record has no name: give the {OutputNames.Record} in an output folder.");
        }

        byte[] bytes;
        try
        {
            if (Directory.Exists(file))
            {
                throw new InputException(new Problem($"This is a folder; give the {OutputNames.Record} in it.", file));
            }

            if (new FileInfo(file).Length > MaxBytes)
            {
                throw new InputException(new Problem("This file is too large to be a record.", file));
            }

            bytes = File.ReadAllBytes(file);
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            throw DiskTrouble.Unread(file, exception);
        }

        return Read(bytes, file);
    }

    /// <summary>From bytes that came from a file of this name.</summary>
    public static SurveyRecord Read(ReadOnlyMemory<byte> bytes, string file)
    {
        try
        {
            using var document = JsonDocument.Parse(bytes, new JsonDocumentOptions { AllowDuplicateProperties = false });
            return Record(new Member(document.RootElement, "", file));
        }
        catch (JsonException exception)
        {
            var line = exception.LineNumber is { } number ? (int?)(number + 1) : null;
            throw new InputException(new Problem("This is no record: it cannot be read as JSON; give the record.json of an output folder.", file, line));
        }
    }

    private static SurveyRecord Record(Member root)
    {
        var version = root.Get("format_version").Whole();
        if (version != SurveyRecord.FormatVersion)
        {
            throw root.Get("format_version").Trouble(
                $"is {version.ToString(CultureInfo.InvariantCulture)}, and this version of the program reads {SurveyRecord.FormatVersion}; use the version that made the record");
        }

        var (survey, plan) = (root.Get("survey"), root.Get("plan"));
        return new SurveyRecord(
            Run(root.Get("program")),
            survey.Get("name").Text(),
            survey.Get("seed").Seed(),
            survey.Get("generator").Text(),
            root.Find("draw") is { } draw ? Draw(draw) : null,
            new RecordedPlan(plan.Get("file").Way(), plan.Get("sha256").Hash(), plan.Get("text").Text(), plan.Get("canonical_text").Text()),
            [.. root.Get("inputs").Items().Select(Input)],
            Region(root.Get("region")),
            root.Get("layout").Get("sha256").Hash(),
            [.. root.Get("outputs").Items().Select(Output)],
            [.. Notices(root, "repairs", NoticeKind.Repair), .. Notices(root, "warnings", NoticeKind.Warning)]);
    }

    private static RunInfo Run(Member program) => new(
        program.Get("version").Text(),
        program.Get("runtime").Text(),
        program.Get("operating_system").Text(),
        program.Get("made_utc").Time());

    private static DrawNumber Draw(Member draw) => new(
        (int)draw.Get("number").Whole(),
        (int)draw.Get("of").Whole(),
        (int)draw.Get("all_from_this_plan_file").Whole(),
        draw.Find("reason")?.Text());

    private static InputFile Input(Member input) => new(
        input.Get("key").Text(), input.Get("path").Way(), input.Get("bytes").Whole(), input.Get("sha256").Hash());

    private static RecordedOutput Output(Member output) => new(
        output.Get("name").Text(), output.Get("bytes").Whole(), output.Get("sha256").Hash());

    private static RecordedRegion Region(Member region)
    {
        var projection = region.Get("projection");
        return new RecordedRegion(
            region.Get("coordinate_system").Text(),
            region.Get("area_km2").Number(),
            region.Get("geodesic_area_km2").Number(),
            projection.Get("method").Text(),
            projection.Get("wkt").Text(),
            projection.Get("max_scale_error_percent").Number());
    }

    private static IEnumerable<Notice> Notices(Member root, string key, NoticeKind kind) =>
        root.Get(key).Items().Select(sentence => new Notice(kind, sentence.Text()));

    /// <summary>A value of the document and the way to it, for messages.</summary>
    private readonly record struct Member(JsonElement Element, string Key, string File)
    {
        public Member Get(string key) => Find(key) ?? throw Missing(key);

        public Member? Find(string key)
        {
            if (Element.ValueKind != JsonValueKind.Object)
            {
                throw Trouble("should be an object in braces");
            }

            return Element.TryGetProperty(key, out var value) ? new Member(value, Key.Length == 0 ? key : $"{Key}.{key}", File) : null;
        }

        public IEnumerable<Member> Items()
        {
            if (Element.ValueKind != JsonValueKind.Array)
            {
                throw Trouble("should be a list");
            }

            var (key, file) = (Key, File);
            return Element.EnumerateArray().Select((item, index) => new Member(item, $"{key}[{index + 1}]", file));
        }

        public string Text() => Element.ValueKind == JsonValueKind.String ? Element.GetString()! : throw Trouble("should be text");

        public string Way() => Text() is { Length: > 0 } text && !text.Contains('\0', StringComparison.Ordinal) ? text : throw Trouble("should be a path");

        public string Hash() => Text() is { Length: 64 } text && text.All(char.IsAsciiHexDigitLower)
            ? text
            : throw Trouble("should be a SHA-256 of 64 lower-case hexadecimal digits");

        public ulong Seed() => Element.ValueKind == JsonValueKind.Number && Element.TryGetUInt64(out var seed)
            ? seed
            : throw Trouble("should be a whole number from 0 to 18446744073709551615");

        public long Whole() => Element.ValueKind == JsonValueKind.Number && Element.TryGetInt64(out var whole) && whole is >= 0 and <= int.MaxValue
            ? whole
            : throw Trouble("should be a whole number from 0 to 2147483647");

        public double Number() => Element.ValueKind == JsonValueKind.Number && Element.TryGetDouble(out var number) && double.IsFinite(number)
            ? number
            : throw Trouble("should be a number");

        public DateTimeOffset Time() => DateTimeOffset.TryParseExact(
            Text(), RecordWriter.TimeFormat, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out var time)
            ? time
            : throw Trouble("should be a time such as 2027-04-01T06:30:00Z");

        public InputException Trouble(string what) => new(new Problem($"This {what}; the record was changed or is not ours.", File, Key: Key));

        private InputException Missing(string key) =>
            new(new Problem($"'{key}' is missing; the record was changed or is not ours.", File, Key: Key));
    }
}
