using System.Globalization;
using System.Text.Json;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Cli;

/// <summary>What other bearings would bring, as a table and as JSON.</summary>
internal static class BearingsText
{
    public static void Write(TextWriter output, IReadOnlyList<StratumBearings> strata)
    {
        foreach (var stratum in strata)
        {
            output.WriteLine(Answer(stratum));
            var isPoints = stratum.Trials.All(trial => trial.Figures?.LineLengthCv is null);
            var table = new TextTable("bearing", "spacing km", "transects", isPoints ? "points" : "expected km", "spread %", "length cv %", "between km");
            foreach (var trial in stratum.Trials.Where(trial => trial.Figures is not null))
            {
                var figures = trial.Figures!;
                table.Add(
                    TextTable.Bearing(trial.BearingDegrees, 180),
                    TextTable.Figure(figures.SpacingMetres / 1000),
                    TextTable.Figure(figures.ExpectedTransects),
                    figures.LineLengthCv is null ? TextTable.Figure(figures.Effort.Mean) : TextTable.Figure(figures.Effort.Mean / 1000),
                    TextTable.Figure(100 * figures.Effort.StandardDeviation / figures.Effort.Mean),
                    figures.LineLengthCv is { } cv ? TextTable.Figure(100 * cv) : "",
                    TextTable.Figure(figures.OffEffortMetres / 1000));
            }

            table.Write(output);
            foreach (var refusal in stratum.Trials.Where(trial => trial.Refusal is not null).GroupBy(trial => trial.Refusal))
            {
                output.WriteLine($"not at {string.Join(", ", refusal.Select(trial => TextTable.Bearing(trial.BearingDegrees, 180)))}: {refusal.Key}");
            }

            output.WriteLine();
        }
    }

    public static void WriteJson(Utf8JsonWriter json, IReadOnlyList<StratumBearings> strata)
    {
        json.WriteStartObject();
        json.WriteNumber("format_version", SummaryWriter.FormatVersion);
        json.WriteStartArray("strata");
        foreach (var stratum in strata)
        {
            json.WriteStartObject();
            json.WriteString("name", stratum.Stratum);
            json.WriteStartArray("bearings");
            foreach (var trial in stratum.Trials)
            {
                WriteTrial(json, trial);
            }

            json.WriteEndArray();
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void WriteTrial(Utf8JsonWriter json, BearingTrial trial)
    {
        json.WriteStartObject();
        json.WriteNumber("bearing_deg", trial.BearingDegrees);
        if (trial.Figures is { } figures)
        {
            json.WriteNumber("spacing_m", figures.SpacingMetres);
            json.WriteNumber("expected_transects", figures.ExpectedTransects);
            if (figures.LineLengthCv is { } cv)
            {
                json.WriteNumber("expected_length_km", figures.Effort.Mean / 1000);
                json.WriteNumber("length_sd_km", figures.Effort.StandardDeviation / 1000);
                json.WriteNumber("line_length_cv", cv);
            }

            json.WriteNumber("between_km", figures.OffEffortMetres / 1000);
        }

        if (trial.Refusal is { } refusal)
        {
            json.WriteString("refusal", refusal);
        }

        json.WriteEndObject();
    }

    private static string Answer(StratumBearings stratum)
    {
        var name = string.Concat(stratum.Stratum.Select(c => char.IsControl(c) ? ' ' : c));
        var best = stratum.Trials.Where(trial => trial.Figures is not null).MinBy(trial => trial.Figures!.OffEffortMetres);
        return best is null
            ? $"{name}: the layout works along no bearing."
            : string.Create(
                CultureInfo.InvariantCulture,
                $"{name}: the shortest way between transects, {TextTable.Figure(best.Figures!.OffEffortMetres / 1000)} km, is along {TextTable.Bearing(best.BearingDegrees, 180)}°; a bearing across the change in numbers matters more.");
    }
}
