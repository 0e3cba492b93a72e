using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;

namespace SurveyPlanner.Files.Plans;

/// <summary>The tables of a plan file as the core's design.</summary>
internal static class DesignBuilder
{
    /// <param name="tables">The tables, without problems.</param>
    /// <param name="layout">The keys that hold where a stratum has none of its own.</param>
    /// <param name="strata">The keys that hold in each stratum that has a table.</param>
    /// <param name="defaultName">Name of a survey that has none.</param>
    public static SurveyDesign Build(
        PlanTables tables, PlanTable layout, ImmutableSortedDictionary<string, PlanTable> strata, string defaultName)
    {
        var (survey, region, coverage) = (tables["survey"], tables["region"], tables["coverage"]);
        return new SurveyDesign(
            survey.Text(PlanKeys.Name) ?? defaultName,
            (ulong)(survey.Value(PlanKeys.Seed) ?? 0),
            region.Text(PlanKeys.StratumField),
            region.Value(PlanKeys.Strata) ?? [],
            LayoutBuilder.Build(layout),
            strata.ToImmutableSortedDictionary(pair => pair.Key, pair => LayoutBuilder.Build(pair.Value), StringComparer.Ordinal),
            Effort(tables, strata),
            new CoverageDesign((int?)coverage.Value(PlanKeys.Cells), (int)coverage.Value(PlanKeys.Replicates)!.Value))
        {
            Projection = region.Text(PlanKeys.Projection),
            ExclusionBufferMetres = region.Value(PlanKeys.ExclusionBuffer)!.Value,
        };
    }

    private static EffortDesign Effort(PlanTables tables, ImmutableSortedDictionary<string, PlanTable> strata)
    {
        var (precision, pilot) = (tables["precision"], tables["pilot"]);
        return new EffortDesign(
            precision.Value(PlanKeys.TargetCv),
            precision.Value(PlanKeys.Assurance),
            precision.Value(PlanKeys.B),
            pilot.Value(PlanKeys.EncounterRate)?.Value,
            pilot.Value(PlanKeys.Estimator),
            precision.Value(PlanKeys.Allocation)!.Value,
            Detection(tables["detection"]),
            pilot.Value(PlanKeys.ClusterSize) is { } mean ? new GivenClusterSize(mean, pilot.Value(PlanKeys.ClusterSizeSd)!.Value) : null,
            Costs(strata),
            (int)precision.Value(PlanKeys.MinLines)!.Value);
    }

    private static DetectionDesign Detection(PlanTable detection) => new(
        detection.Value(PlanKeys.Models) ?? [],
        detection.Value(PlanKeys.Truncation),
        detection.Value(PlanKeys.DetectionCv),
        detection.Value(PlanKeys.DetectionDf),
        detection.Value(PlanKeys.EffectiveHalfWidth) ?? detection.Value(PlanKeys.EffectiveRadius));

    private static ImmutableSortedDictionary<string, double> Costs(ImmutableSortedDictionary<string, PlanTable> strata)
    {
        var costs = ImmutableSortedDictionary.CreateBuilder<string, double>(StringComparer.Ordinal);
        foreach (var (name, table) in strata)
        {
            if ((table.Value(PlanKeys.CostPerKm) ?? table.Value(PlanKeys.CostPerPoint)) is { } cost)
            {
                costs.Add(name, cost.Amount);
            }
        }

        return costs.ToImmutable();
    }
}
