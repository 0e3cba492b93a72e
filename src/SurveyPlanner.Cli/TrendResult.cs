using System.Collections.Immutable;
using System.Globalization;
using System.Text.Json;
using SurveyPlanner.Effort;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Cli;

/// <summary>What <c>trend</c> found out.</summary>
/// <param name="Design">The programme.</param>
/// <param name="CvSource">Where its CV comes from.</param>
/// <param name="Surveys">Number of surveys.</param>
/// <param name="WantedPower">Power asked for.</param>
/// <param name="Rows">For each change: the power of the surveys, and the surveys that reach the power asked for.</param>
/// <param name="SmallestDecline">Smallest decline that the surveys show with that power; null where none is.</param>
/// <param name="SmallestIncrease">Smallest increase.</param>
internal sealed record TrendResult(
    TrendDesign Design,
    string CvSource,
    int Surveys,
    double WantedPower,
    ImmutableArray<TrendRow> Rows,
    TrendFigure? SmallestDecline,
    TrendFigure? SmallestIncrease)
{
    public static TrendResult Of(TrendDesign design, string cvSource, int surveys, double power, IEnumerable<double> changes) => new(
        design,
        cvSource,
        surveys,
        power,
        [.. changes.Select(change => new TrendRow(change, TrendPower.At(design, change, surveys), TrendPower.SurveysNeeded(design, change, power)))],
        TrendPower.SmallestChange(design, surveys, power, decline: true),
        TrendPower.SmallestChange(design, surveys, power, decline: false));

    public void WriteText(TextWriter output)
    {
        output.WriteLine(Answer());
        output.WriteLine();
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"CV of a survey {100 * Design.FirstCv:0.#} % ({CvSource}), {(Design.OneSided ? "one" : "two")}-sided test at {Design.SignificanceLevel:0.###}, a survey every {(Design.YearsBetweenSurveys == 1 ? "year" : $"{Design.YearsBetweenSurveys:0.##} years")}."));
        output.WriteLine();
        var table = new TextTable("change a year %", "surveys", "years", "total change %", "power", $"surveys for {WantedPower.ToString("0.##", CultureInfo.InvariantCulture)}");
        foreach (var row in Rows)
        {
            table.Add(
                (100 * row.ChangePerYear).ToString("+0.##;-0.##", CultureInfo.InvariantCulture),
                TextTable.Number(Surveys),
                row.Figure is { } years ? years.Years.ToString("0.##", CultureInfo.InvariantCulture) : "",
                row.Figure is { } total ? (100 * total.TotalChange).ToString("+0.0;-0.0", CultureInfo.InvariantCulture) : "nothing left",
                row.Figure is { } figure ? figure.Power.ToString("0.000", CultureInfo.InvariantCulture) : "",
                row.Needed is { } needed ? TextTable.Number(needed.Surveys) : "over 100");
        }

        table.Write(output);
        output.WriteLine();
        output.WriteLine(Design.IsExact
            ? "Power by the noncentral t, exact for this model (Gerrodette 1987, 1991; Link and Hatfield 1990)."
            : FormattableString.Invariant($"Power by {TrendPower.Replicates} simulated series, standard error at most 0.004."));
    }

    public void WriteJson(Utf8JsonWriter json)
    {
        json.WriteStartObject();
        json.WriteNumber("format_version", SummaryWriter.FormatVersion);
        json.WriteNumber("cv", Design.FirstCv);
        json.WriteString("cv_source", CvSource);
        json.WriteString("shape", Design.Shape == TrendShape.Linear ? "linear" : "exponential");
        json.WriteNumber("significance_level", Design.SignificanceLevel);
        json.WriteBoolean("one_sided", Design.OneSided);
        json.WriteNumber("years_between_surveys", Design.YearsBetweenSurveys);
        json.WriteNumber("surveys", Surveys);
        json.WriteNumber("wanted_power", WantedPower);
        WriteIfKnown(json, "smallest_decline_per_year", SmallestDecline?.ChangePerYear);
        WriteIfKnown(json, "smallest_increase_per_year", SmallestIncrease?.ChangePerYear);
        json.WriteStartArray("changes");
        foreach (var row in Rows)
        {
            json.WriteStartObject();
            json.WriteNumber("change_per_year", row.ChangePerYear);
            WriteIfKnown(json, "power", row.Figure?.Power);
            WriteIfKnown(json, "standard_error", row.Figure?.StandardError);
            WriteIfKnown(json, "total_change", row.Figure?.TotalChange);
            WriteIfKnown(json, "surveys_needed", row.Needed?.Surveys);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }

    private string Answer()
    {
        static string Percent(TrendFigure? figure)
            => figure is null ? "none that can be shown" : Math.Abs(100 * figure.ChangePerYear).ToString("0.0", CultureInfo.InvariantCulture) + " % a year";
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{Surveys} surveys show with a power of {WantedPower:0.##}: a decline of {Percent(SmallestDecline)}, an increase of {Percent(SmallestIncrease)}.");
    }

    private static void WriteIfKnown(Utf8JsonWriter json, string key, double? value)
    {
        if (value is { } known)
        {
            json.WriteNumber(key, known);
        }
    }
}

/// <summary>One change: the power of the surveys asked about, and how many surveys would reach the power asked for. Null where nothing is left to count.</summary>
internal sealed record TrendRow(double ChangePerYear, TrendFigure? Figure, TrendFigure? Needed);
