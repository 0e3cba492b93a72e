using System.Globalization;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>Finds what is wrong with the precision asked for and the figures given, before anything is computed.</summary>
internal static class EffortChecks
{
    /// <summary>No survey of wild animals comes near this.</summary>
    private const double SmallestTarget = 0.001;

    public static IEnumerable<Problem> Problems(EffortDesign design, PilotTable? pilot, IReadOnlyList<EffortStratum> strata)
    {
        if (design.TargetCv is { } target && !(target >= SmallestTarget && target <= 1))
        {
            yield return new Problem(
                $"The target coefficient of variation is {Text(target)}; give a fraction from {Text(SmallestTarget)} to 1, such as 0.2"
                    + (target is > 1 and <= 100 ? $" ({Text(target)} % is {Text(target / 100)})." : "."),
                Key: "precision.target_cv");
        }

        if (design.Assurance is { } assurance && !(assurance >= 0.5 && assurance < 1))
        {
            yield return new Problem(
                $"The assurance is {Text(assurance)}; give a probability from 0.5 to below 1, such as 0.8.", Key: "precision.assurance");
        }

        if (design.MinLines < 1)
        {
            yield return new Problem($"The least number of lines in a stratum is {design.MinLines}; give 1 or more.", Key: "precision.min_lines");
        }

        foreach (var problem in GivenProblems(design).Concat(CostProblems(design, strata)).Concat(BasisProblems(design, pilot, strata)))
        {
            yield return problem;
        }
    }

    private static IEnumerable<Problem> GivenProblems(EffortDesign design)
    {
        var detection = design.Detection;
        (string Key, string Name, double? Value, double Least)[] figures =
        [
            ("precision.b", "b", design.B, 0),
            ("pilot.encounter_rate", "the encounter rate", design.GivenEncounterRate, 0),
            ("detection.cv", "the coefficient of variation of detection", detection.GivenCv, -1),
            ("detection.df", "the degrees of freedom of detection", detection.GivenDegreesOfFreedom, 0),
            ("detection.effective_half_width", "the effective half-width", detection.GivenEffectiveWidthMetres, 0),
            ("detection.truncation", "the truncation distance", detection.TruncationMetres, 0),
        ];
        foreach (var (key, name, value, least) in figures)
        {
            if (value is { } number && !(number > least && double.IsFinite(number) && number >= 0))
            {
                yield return new Problem($"{char.ToUpperInvariant(name[0])}{name[1..]} is {Text(number)}; give {(least < 0 ? "0 or more" : "a number above 0")}.", Key: key);
            }
        }

        if (design.ClusterSize is { } size && !(size.Mean >= 1 && double.IsFinite(size.Mean) && size.StandardDeviation >= 0 && double.IsFinite(size.StandardDeviation)))
        {
            yield return new Problem(
                $"The cluster size has mean {Text(size.Mean)} and standard deviation {Text(size.StandardDeviation)}; give a mean of at least 1 and a standard deviation of at least 0.",
                Key: "pilot.cluster_size");
        }
    }

    private static IEnumerable<Problem> CostProblems(EffortDesign design, IReadOnlyList<EffortStratum> strata)
    {
        foreach (var (name, cost) in design.CostPerUnit)
        {
            if (!(cost > 0) || !double.IsFinite(cost))
            {
                yield return new Problem($"The cost in stratum '{name}' is {Text(cost)}; give an amount above 0.", Key: "stratum.cost_per_km");
            }
        }

        var missing = strata.Where(stratum => !design.CostPerUnit.ContainsKey(stratum.Name)).Select(stratum => $"'{stratum.Name}'").ToList();
        if (!design.CostPerUnit.IsEmpty && missing.Count > 0)
        {
            yield return new Problem(
                $"Costs are given for some strata but not for {string.Join(", ", missing)}; give all or none.", Key: "stratum.cost_per_km");
        }
    }

    private static IEnumerable<Problem> BasisProblems(EffortDesign design, PilotTable? pilot, IReadOnlyList<EffortStratum> strata)
    {
        if (pilot is not null && design.GivenEncounterRate is not null)
        {
            yield return new Problem("Both a pilot and an encounter rate are given; keep one of them.", Key: "pilot.encounter_rate");
        }

        if (pilot is null && design.GivenEncounterRate is null && (design.TargetCv is not null || design.B is not null))
        {
            yield return new Problem(
                "A target precision needs an encounter rate to turn it into effort; give a pilot, or an encounter rate with b.", Key: "precision.target_cv");
        }

        if (pilot is not null && !strata.Any(stratum => stratum.IsPoints == pilot.IsPoints))
        {
            yield return new Problem(
                pilot.IsPoints
                    ? "The pilot counts visits to points, but the layout has lines; give a pilot of lines with their lengths."
                    : "The pilot counts along lines with lengths, but the layout has points; give a pilot of points with their visits.",
                pilot.Source);
        }
        else if (pilot is not null && pilot.Transects.All(transect => transect.Stratum.Length > 0) && !pilot.Transects.Any(SurveyedAlike))
        {
            yield return new Problem(
                $"The pilot has no transects in any stratum that is surveyed {(pilot.IsPoints ? "at points" : "along lines")}; give transects of such a stratum.",
                pilot.Source);
        }

        bool SurveyedAlike(PilotTransect transect)
            => strata.Any(stratum => stratum.Name == transect.Stratum && stratum.IsPoints == pilot!.IsPoints);
    }

    private static string Text(double value) => value.ToString("G6", CultureInfo.InvariantCulture);
}
