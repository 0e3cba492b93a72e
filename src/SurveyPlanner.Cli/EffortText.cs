using System.Globalization;
using SurveyPlanner.Effort;

namespace SurveyPlanner.Cli;

/// <summary>Effort and precision on the terminal.</summary>
internal static class EffortText
{
    public static void Write(TextWriter output, EffortPlan effort)
    {
        output.WriteLine(Answer(effort));
        output.WriteLine();
        WritePilot(output, effort);
        if (effort.Required is not null)
        {
            output.WriteLine();
            WriteStrata(output, effort);
        }

        foreach (var advice in effort.Advice)
        {
            output.WriteLine();
            output.WriteLine(advice.Source is { } source ? $"{advice.Message} ({source})" : advice.Message);
        }
    }

    /// <summary>What the drawn layout delivers, beside the target.</summary>
    public static string Delivered(EffortPlan effort, EffortPrecision delivered)
    {
        var unit = Unit(effort);
        var text = string.Create(
            CultureInfo.InvariantCulture,
            $"Precision: {TextTable.Figure(delivered.Effort)} {unit} as drawn deliver a CV of {100 * delivered.Cv:0.#} % and about {delivered.ExpectedDetections:0} detections");
        return effort.Required is { } required
            ? string.Create(CultureInfo.InvariantCulture, $"{text}; the target of {100 * required.TargetCv:0.#} % needs {TextTable.Figure(required.Effort)} {unit}.")
            : text + ".";
    }

    private static string Answer(EffortPlan effort)
    {
        if (effort.Required is not { } required)
        {
            return string.Create(
                CultureInfo.InvariantCulture,
                $"The encounter rate is {TextTable.Figure(effort.EncounterRate)} detections a {(effort.IsPoints ? "visit" : "kilometre")}; b is {effort.B.Value:0.##}.");
        }

        return string.Create(
            CultureInfo.InvariantCulture,
            $"A CV of {100 * required.TargetCv:0.#} % needs {TextTable.Figure(required.Effort)} {Unit(effort)}, about {required.Precision.ExpectedDetections:0} detections.");
    }

    private static void WritePilot(TextWriter output, EffortPlan effort)
    {
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"Encounter rate {TextTable.Figure(effort.EncounterRate)} per {(effort.IsPoints ? "visit" : "km")}. {effort.B.Explanation}"));
        if (effort.EstimatorReason is { } reason)
        {
            output.WriteLine(reason);
        }

        if (effort.PilotCv is { } cv)
        {
            var table = new TextTable("component", "cv %", "df", "share %");
            foreach (var component in cv.Components)
            {
                table.Add(
                    Name(component.Source),
                    TextTable.Figure(100 * component.Cv),
                    component.DegreesOfFreedom is { } df ? TextTable.Figure(df) : "many",
                    component.Share is { } share ? TextTable.Figure(100 * share) : "");
            }

            output.WriteLine();
            output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"The pilot itself reached a CV of {100 * cv.Cv:0.#} %:"));
            table.Write(output);
        }
    }

    private static void WriteStrata(TextWriter output, EffortPlan effort)
    {
        var table = new TextTable("stratum", Unit(effort), "share %", "detections", "own cv %");
        foreach (var stratum in effort.Strata)
        {
            table.Add(
                stratum.Name,
                stratum.Effort is { } amount ? TextTable.Figure(amount) : "",
                TextTable.Figure(100 * stratum.Share),
                stratum.ExpectedDetections is { } detections ? TextTable.Figure(detections) : "",
                stratum.Cv is { } own ? TextTable.Figure(100 * own) : "");
        }

        table.Write(output);
    }

    private static string Unit(EffortPlan effort) => effort.IsPoints ? "points" : "km";

    private static string Name(CvSource source) => source switch
    {
        CvSource.EncounterRate => "encounter rate",
        CvSource.Detection => "detection",
        CvSource.ClusterSize => "cluster size",
        _ => "rate and detection",
    };
}
