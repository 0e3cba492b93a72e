using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Pages.Report;

/// <summary>The tables of the pilot season.</summary>
internal static class PilotTables
{
    public static Table OfRates(PilotFigures pilot) => new(
        "Encounter rates of the pilot",
        [
            new("Stratum", false), new("Transects"), new(pilot.IsPoints ? "Visits" : "Length, km"), new("Detections"),
            new(EffortTables.RateHeading(pilot.IsPoints)), new("CV of that, %"), new("Degrees of freedom"), new("Variance-to-mean ratio"),
        ],
        [
            .. pilot.Strata.Select(stratum => Row(stratum.Stratum.Length == 0 ? "whole region" : stratum.Stratum, stratum.EncounterRate, pilot.IsPoints)),
            .. pilot.Strata.Length > 1 ? [Row("together", pilot.Pooled, pilot.IsPoints)] : Array.Empty<string[]>(),
        ]);

    private static string[] Row(string name, EncounterRate rate, bool isPoints) =>
    [
        name,
        Figures.Count(rate.Transects),
        rate.Effort % 1 == 0 && isPoints ? Figures.Count((long)rate.Effort) : Figures.Three(rate.Effort),
        Figures.Count(rate.Count),
        Figures.Three(rate.Rate),
        Figures.Three(100 * rate.Cv),
        rate.DegreesOfFreedom is null ? Figures.None : ComponentTables.Freedom(rate.DegreesOfFreedom),
        Figures.Three(rate.Dispersion),
    ];

    /// <summary>What the pilot came to: density and cluster size, as far as they are known.</summary>
    public static string? Finding(EffortPlan effort, PilotFigures pilot)
    {
        var size = pilot.ClusterSize is { } cluster
            ? $"Clusters had {Figures.Three(cluster.Mean)} animals on average (standard deviation {Figures.Three(cluster.StandardDeviation)})."
            : null;
        var density = effort.Density switch
        {
            null => null,
            { } found when pilot.ClusterSize is null => $"Its density was {Figures.Three(found.AnimalsPerKm2)} animals per km².",
            { } found => $"Its density was {Figures.Three(found.ClustersPerKm2)} clusters, {Figures.Three(found.AnimalsPerKm2)} animals per km².",
        };
        var sentences = string.Join(" ", new[] { density, size }.OfType<string>());
        return sentences.Length > 0 ? sentences : null;
    }
}
