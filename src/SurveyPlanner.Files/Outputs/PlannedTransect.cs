using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Outputs;

/// <summary>A transect together with the stratum it was drawn in.</summary>
/// <param name="Stratum">The stratum.</param>
/// <param name="Transect">The transect.</param>
/// <param name="Coverage">Mean coverage probability along it; null where that was not worked out or none of it lies in the stratum.</param>
internal sealed record PlannedTransect(StratumPlan Stratum, Transect Transect, double? Coverage)
{
    public string StratumName => Stratum.Stratum.Name;

    public double HalfWidthMetres => Stratum.Layout.Design.HalfWidthMetres;

    /// <summary>All transects of the survey in order of visit.</summary>
    public static IReadOnlyList<PlannedTransect> InOrder(SurveyPlan plan) =>
    [
        .. plan.Strata
            .SelectMany(InOrder)
            .OrderBy(planned => planned.Transect.Order),
    ];

    private static IEnumerable<PlannedTransect> InOrder(StratumPlan stratum)
    {
        var coverage = stratum.Coverage?.Transects.ToDictionary(along => along.TransectId, along => along.Mean) ?? [];
        return stratum.Layout.Transects.Select(transect => new PlannedTransect(stratum, transect, coverage.GetValueOrDefault(transect.Id)));
    }
}
