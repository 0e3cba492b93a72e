using System.Globalization;
using SurveyPlanner.Effort;

namespace SurveyPlanner.Cli;

/// <summary>Effort and precision on the terminal.</summary>
internal static class EffortText
{
    /// <summary>The parts of more strata than this fit into no cell; the table of the report and summary.json have them.</summary>
    private const int MostParts = 3;

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

        WriteAllocations(output, effort);
        foreach (var advice in effort.Advice.Where(advice => !advice.RepeatsFigures))
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
            $"Precision: {Amount(effort, delivered.Effort)} {unit} as drawn deliver a CV of {100 * delivered.Cv:0.#} % and about {delivered.ExpectedDetections:0} detections");
        return effort.Required is { } required
            ? string.Create(CultureInfo.InvariantCulture, $"{text}; the target of {100 * required.TargetCv:0.#} % needs {Amount(effort, required.Effort)} {unit}.")
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

        return string.Join(' ', new[] { Assured(required, Unit(effort)), Estimate(required, Unit(effort)), Reliability(effort) }.Where(part => part.Length > 0));
    }

    /// <summary>With a pilot of a few lines this is the most honest number, so it comes first.</summary>
    private static string Assured(RequiredEffort required, string unit)
        => required is { Assurance: { } assurance, AssuredEffort: { } assured }
            ? string.Create(
                CultureInfo.InvariantCulture,
                $"To be {100 * assurance:0.#} % sure of a CV of {100 * required.TargetCv:0.#} %, plan {TextTable.Figure(assured)} {unit}.")
            : "";

    private static string Estimate(RequiredEffort required, string unit)
    {
        var interval = required.Interval is { } range
            ? string.Create(CultureInfo.InvariantCulture, $"; the pilot leaves it between {TextTable.Figure(range.Lower)} and {TextTable.Figure(range.Upper)} {unit} (95 %)")
            : "";
        return string.Create(
            CultureInfo.InvariantCulture,
            $"By the plain estimate a CV of {100 * required.TargetCv:0.#} % needs {TextTable.Figure(required.Effort)} {unit}, about {required.Precision.ExpectedDetections:0} detections{interval}.");
    }

    /// <summary>What simulated pilots like this one have shown of such intervals.</summary>
    private static string Reliability(EffortPlan effort)
        => effort.Uncertainty?.Measured is { } measured
            ? string.Create(
                CultureInfo.InvariantCulture,
                $"In {MeasuredReliability.Pilots} simulated pilots of {measured.Transects} transects such intervals held the truth in {100 * measured.Coverage:0} %.")
            : "";

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
        // What rounding up to whole lines, and to the least number of them, makes of a share can be far from it: both are shown.
        var hasLines = !effort.IsPoints && effort.Strata.Any(stratum => stratum.Transects is not null);
        string[] whole = hasLines ? ["lines", "km in whole lines"] : [Unit(effort)];
        var table = new TextTable(["stratum", "share asked %", .. whole, "detections", "own cv %"]);
        foreach (var stratum in effort.Strata)
        {
            var amount = stratum.Effort is { } known ? Amount(effort, known) : "";
            string[] planned = hasLines ? [stratum.Transects is { } lines ? TextTable.Number(lines) : "", amount] : [amount];
            table.Add([
                stratum.Name,
                TextTable.Figure(100 * stratum.Share),
                .. planned,
                stratum.ExpectedDetections is { } detections ? TextTable.Figure(detections) : "",
                stratum.Cv is { } own ? TextTable.Figure(100 * own) : "",
            ]);
        }

        table.Write(output);
    }

    /// <summary>What each way to share the effort costs and buys, side by side.</summary>
    private static void WriteAllocations(TextWriter output, EffortPlan effort)
    {
        if (effort.Allocations.Length == 0)
        {
            return;
        }

        var hasCosts = effort.Allocations.Any(option => option.Cost is not null);
        var hasParts = effort.Strata.Length <= MostParts;
        string[] header = ["allocation", Unit(effort), "cv %", .. (string[])(hasParts ? ["by stratum"] : []), .. (string[])(hasCosts ? ["cost"] : [])];
        var table = new TextTable(header);
        foreach (var option in effort.Allocations)
        {
            table.Add([
                option.Allocation.ToString().ToLowerInvariant(),
                Amount(effort, option.Effort),
                TextTable.Figure(100 * option.Precision.Cv),
                .. (string[])(hasParts ? [string.Join(" + ", option.Strata.Select(stratum => Amount(effort, stratum.Effort)))] : []),
                .. (string[])(hasCosts ? [option.Cost is { } cost ? cost.ToString("#,0", CultureInfo.InvariantCulture) : ""] : []),
            ]);
        }

        output.WriteLine();
        table.Write(output);
    }

    /// <summary>Points are whole.</summary>
    private static string Amount(EffortPlan effort, double value)
        => effort.IsPoints && value == Math.Round(value) ? value.ToString("#,0", CultureInfo.InvariantCulture) : TextTable.Figure(value);

    private static string Unit(EffortPlan effort) => effort.IsPoints ? "points" : "km";

    private static string Name(CvSource source) => source switch
    {
        CvSource.EncounterRate => "encounter rate",
        CvSource.Detection => "detection",
        CvSource.ClusterSize => "cluster size",
        _ => "rate and detection",
    };
}
