using System.Globalization;
using System.Text.Json;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Records;

/// <summary><c>record.json</c>; its keys: docs/outputs.md.</summary>
public static class RecordWriter
{
    internal const string TimeFormat = "yyyy-MM-dd'T'HH:mm:ss'Z'";

    public static OutputFile Write(SurveyRecord record) =>
        new(OutputNames.Record, JsonText.Write(json => WriteTo(json, record), indented: true));

    private static void WriteTo(Utf8JsonWriter json, SurveyRecord record)
    {
        json.WriteStartObject();
        json.WriteNumber("format_version", SurveyRecord.FormatVersion);
        json.Object("program", () => WriteRun(json, record.Run));
        json.Object("survey", () =>
        {
            json.Text("name", record.SurveyName);
            json.WriteNumber("seed", record.Seed);
            json.Text("generator", record.Generator);
        });
        if (record.Draw is { } draw)
        {
            json.Object("draw", () => WriteDraw(json, draw));
        }

        json.Object("layout", () => json.Text("sha256", record.LayoutSha256));
        json.Object("region", () => WriteRegion(json, record.Region));
        json.Object("plan", () => WritePlan(json, record.Plan));
        json.Array("inputs", record.Inputs, input => WriteInput(json, input));
        json.Array("outputs", record.Outputs, output => WriteOutput(json, output));
        SummaryWriter.WriteNotices(json, record.Notices);
        json.WriteEndObject();
    }

    private static void WriteRun(Utf8JsonWriter json, RunInfo run)
    {
        json.WriteString("name", "SurveyPlanner");
        json.Text("version", run.ProgramVersion);
        json.Text("runtime", run.Runtime);
        json.Text("operating_system", run.OperatingSystem);
        json.WriteString("made_utc", run.MadeUtc.UtcDateTime.ToString(TimeFormat, CultureInfo.InvariantCulture));
    }

    private static void WriteDraw(Utf8JsonWriter json, DrawNumber draw)
    {
        json.WriteNumber("number", draw.Number);
        json.WriteNumber("of", draw.Of);
        json.WriteNumber("all_from_this_plan_file", draw.AllFromPlanFile);
        json.Text("reason", draw.Reason);
    }

    private static void WriteRegion(Utf8JsonWriter json, RecordedRegion region)
    {
        json.Text("coordinate_system", region.CoordinateSystem);
        json.Figure("area_km2", Figures.Area(region.AreaKm2));
        json.Figure("geodesic_area_km2", Figures.Area(region.GeodesicAreaKm2));
        json.Object("projection", () =>
        {
            json.Text("method", region.ProjectionMethod);
            json.Text("wkt", region.ProjectionWkt);
            json.Figure("max_scale_error_percent", Figures.Significant(region.MaxScaleErrorPercent, 6));
        });
    }

    private static void WritePlan(Utf8JsonWriter json, RecordedPlan plan)
    {
        json.Text("file", plan.File);
        json.Text("sha256", plan.Sha256);
        json.Text("text", plan.Text);
        json.Text("canonical_text", plan.CanonicalText);
    }

    private static void WriteInput(Utf8JsonWriter json, InputFile input)
    {
        json.WriteStartObject();
        json.Text("key", input.Key);
        json.Text("path", input.Path);
        json.WriteNumber("bytes", input.Bytes);
        json.Text("sha256", input.Sha256);
        json.WriteEndObject();
    }

    private static void WriteOutput(Utf8JsonWriter json, RecordedOutput output)
    {
        json.WriteStartObject();
        json.Text("name", output.Name);
        json.WriteNumber("bytes", output.Bytes);
        json.Text("sha256", output.Sha256);
        json.WriteEndObject();
    }
}
