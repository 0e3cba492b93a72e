using System.Text.Json;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Files.Tables;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// <c>summary.json</c>: every figure of the report, its unit in its key; what does not apply is left out, never 0.
/// Layout and digits: docs/outputs.md.
/// </summary>
public static class SummaryWriter
{
    /// <summary>Raised when a key changes its meaning or goes; a new key does not raise it.</summary>
    public const int FormatVersion = 1;

    private const int Digits = 9;

    /// <param name="plan">The plan.</param>
    /// <param name="draw">Which draw under this plan it is; null for work that draws nothing that counts.</param>
    public static OutputFile Write(SurveyPlan plan, int? draw) =>
        new(OutputNames.Summary, JsonText.Write(json => WriteTo(json, plan, draw), indented: true));

    /// <summary>The same document into a writer, for the command line's <c>--json</c>.</summary>
    public static void WriteTo(Utf8JsonWriter json, SurveyPlan plan, int? draw)
    {
        json.WriteStartObject();
        json.WriteNumber("format_version", FormatVersion);
        json.Object("survey", () => WriteSurvey(json, plan.Design, draw));
        json.Object("projection", () => WriteProjection(json, plan.Region));
        json.Object("region", () => WriteRegion(json, plan.Region));
        json.Array("strata", plan.Strata, stratum => WriteStratum(json, stratum, plan.Effort));
        if (plan.Effort is { } effort)
        {
            json.Object("effort", () => new EffortSummary(json, effort).WriteWhole(plan.Design.Effort.Allocation, plan.Delivered));
        }

        json.WriteEndObject();
    }

    /// <summary>What <c>effort --json</c> prints: the effort of each stratum and as a whole, in the same form.</summary>
    /// <param name="json">The writer.</param>
    /// <param name="effort">The effort.</param>
    /// <param name="planned">How the plan shares it among several strata.</param>
    public static void WriteEffortDocument(Utf8JsonWriter json, EffortPlan effort, Allocation planned)
    {
        json.WriteStartObject();
        json.WriteNumber("format_version", FormatVersion);
        json.Array("strata", effort.Strata, stratum =>
        {
            json.WriteStartObject();
            json.Text("name", stratum.Name);
            WriteEffort(json, stratum.Name, effort);
            json.WriteEndObject();
        });
        json.Object("effort", () => new EffortSummary(json, effort).WriteWhole(planned, delivered: null));
        json.WriteEndObject();
    }

    /// <summary>What <c>coverage --at --json</c> prints: the table of positions, a member a column.</summary>
    public static void WriteCoverageAt(Utf8JsonWriter json, IEnumerable<PositionCoverage> positions)
    {
        json.WriteStartObject();
        json.WriteNumber("format_version", FormatVersion);
        json.Array("positions", positions, one =>
        {
            json.WriteStartObject();
            json.Figure("lon", Figures.Longitude(one.Position.Lon));
            json.Figure("lat", Figures.Degrees(one.Position.Lat));
            json.Text("stratum", one.Stratum);
            json.Number("coverage", one.Best);
            json.Number("standard_error", one.Exact is null ? one.StandardError : null);
            json.Number("times_covered", one.ExpectedTimes);
            json.WriteString("method", CoverageAtTable.Method(one));
            json.WriteEndObject();
        });
        json.WriteEndObject();
    }

    /// <summary>What <c>check --json</c> prints: projection, region and strata in the same form, with repairs and warnings.</summary>
    public static void WriteCheck(Utf8JsonWriter json, Region region, IEnumerable<Notice> notices)
    {
        var all = notices.ToList();
        json.WriteStartObject();
        json.WriteNumber("format_version", FormatVersion);
        json.Object("projection", () => WriteProjection(json, region));
        json.Object("region", () => WriteRegion(json, region));
        json.Array("strata", region.Strata, stratum =>
        {
            json.WriteStartObject();
            WriteArea(json, stratum);
            json.WriteEndObject();
        });
        WriteNotices(json, all);
        json.WriteEndObject();
    }

    /// <summary>Repairs and warnings as two lists of sentences.</summary>
    internal static void WriteNotices(Utf8JsonWriter json, IReadOnlyCollection<Notice> notices)
    {
        void List(string key, NoticeKind kind) => json.Array(
            key, notices.Where(notice => notice.Kind == kind), notice => json.WriteStringValue(PlainText.WellFormed(notice.Message)));

        List("repairs", NoticeKind.Repair);
        List("warnings", NoticeKind.Warning);
    }

    private static void WriteSurvey(Utf8JsonWriter json, SurveyDesign design, int? draw)
    {
        json.Text("name", design.Name);
        json.WriteNumber("seed", design.Seed);
        if (draw is { } number)
        {
            json.WriteNumber("draw", number);
        }
    }

    private static void WriteProjection(Utf8JsonWriter json, Region region)
    {
        json.Text("method", region.Projection.Method);
        json.Text("wkt", region.Projection.Wkt);
        json.Figure("max_scale_error_percent", Figures.Significant(region.MaxScaleErrorPercent, 6));
    }

    private static void WriteRegion(Utf8JsonWriter json, Region region)
    {
        json.Figure("area_km2", Figures.Area(region.AreaKm2));
        json.Figure("geodesic_area_km2", Figures.Area(region.GeodesicAreaKm2));
    }

    private static void WriteArea(Utf8JsonWriter json, Stratum stratum)
    {
        json.Text("name", stratum.Name);
        json.Figure("area_km2", Figures.Area(stratum.AreaKm2));
        json.Figure("geodesic_area_km2", Figures.Area(stratum.GeodesicAreaKm2));
    }

    private static void WriteEffort(Utf8JsonWriter json, string stratum, EffortPlan? effort)
    {
        if (effort?.Strata.FirstOrDefault(one => one.Name == stratum) is { } own)
        {
            json.Object("effort", () => new EffortSummary(json, effort).WriteStratum(own));
        }
    }

    private static void WriteStratum(Utf8JsonWriter json, StratumPlan stratum, EffortPlan? effort)
    {
        json.WriteStartObject();
        WriteArea(json, stratum.Stratum);
        WriteLayout(json, stratum.Layout);
        if (stratum.Coverage is { } coverage)
        {
            json.Object("coverage", () => CoverageSummary.Write(json, coverage));
        }

        WriteEffort(json, stratum.Stratum.Name, effort);
        json.WriteEndObject();
    }

    private static void WriteLayout(Utf8JsonWriter json, Layout layout)
    {
        json.WriteString("kind", ChoiceWord.Of(layout.Design.Kind));
        json.Figure("bearing_deg", Figures.Bearing(layout.BearingDegrees, fullTurn: 180));
        json.Figure("spacing_m", Figures.Metres(layout.SpacingMetres));
        json.Figure("half_width_m", Figures.Metres(layout.Design.HalfWidthMetres));
        if (layout.Design.IsPoints)
        {
            json.WriteNumber("points", layout.Transects.Length);
            json.Figure("expected_points", Figures.Significant(layout.ExpectedCount, Digits));
            json.Object("points_over_draws", () => WriteSpread(json, layout.Spread, count => Figures.Significant(count, Digits)));
            return;
        }

        json.WriteNumber("transects", layout.Transects.Length);
        json.Figure("expected_transects", Figures.Significant(layout.ExpectedCount, Digits));
        json.Figure("total_length_km", Figures.KilometresOf(layout.TotalLengthMetres));
        if (layout.ExpectedLengthMetres is { } expected)
        {
            json.Figure("expected_length_km", Figures.KilometresOf(expected));
        }

        json.Object("length_km_over_draws", () => WriteSpread(json, layout.Spread, Figures.KilometresOf));
    }

    private static void WriteSpread(Utf8JsonWriter json, EffortSpread spread, Func<double, string> figure)
    {
        json.Figure("mean", figure(spread.Mean));
        json.Figure("standard_deviation", figure(spread.StandardDeviation));
        json.Figure("smallest", figure(spread.Smallest));
        json.Figure("largest", figure(spread.Largest));
    }

    /// <summary>A figure to 9 digits; what is not known or does not apply is left out.</summary>
    internal static void Number(this Utf8JsonWriter json, string key, double? value)
    {
        if (value is { } number)
        {
            json.Figure(key, Figures.Significant(number, Digits));
        }
    }
}
