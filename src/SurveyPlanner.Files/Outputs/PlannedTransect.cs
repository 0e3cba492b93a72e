using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Outputs;

/// <summary>A transect together with the stratum it was drawn in.</summary>
/// <param name="Stratum">The stratum.</param>
/// <param name="Transect">The transect.</param>
/// <param name="Coverage">Mean coverage probability along it; null where that was not worked out or none of it lies in the stratum.</param>
/// <param name="IsReserve">Whether it is a spare point, to be used strictly in its order, rather than one to be visited.</param>
internal sealed record PlannedTransect(StratumPlan Stratum, Transect Transect, double? Coverage, bool IsReserve = false)
{
    public string StratumName => Stratum.Stratum.Name;

    public double HalfWidthMetres => Stratum.Layout.Design.HalfWidthMetres;

    /// <summary>All transects of the survey in order of visit, then the spare points of each stratum in theirs.</summary>
    public static IReadOnlyList<PlannedTransect> InOrder(SurveyPlan plan) =>
    [
        .. plan.Strata
            .SelectMany(InOrder)
            .OrderBy(planned => planned.Transect.Order),
        .. plan.Strata.SelectMany(stratum => stratum.Layout.Reserve.Select(spare => new PlannedTransect(stratum, spare, Coverage: null, IsReserve: true))),
    ];

    private static IEnumerable<PlannedTransect> InOrder(StratumPlan stratum)
    {
        var coverage = stratum.Coverage?.Transects.ToDictionary(along => along.TransectId, along => along.Mean) ?? [];
        return stratum.Layout.Transects.Select(transect => new PlannedTransect(stratum, transect, coverage.GetValueOrDefault(transect.Id)));
    }
}
