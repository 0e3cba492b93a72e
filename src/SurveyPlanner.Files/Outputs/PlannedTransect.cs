using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Outputs;

/// <summary>A transect together with the stratum it was drawn in.</summary>
internal sealed record PlannedTransect(StratumPlan Stratum, Transect Transect)
{
    public string StratumName => Stratum.Stratum.Name;

    public double HalfWidthMetres => Stratum.Layout.Design.HalfWidthMetres;

    /// <summary>All transects of the survey in order of visit.</summary>
    public static IReadOnlyList<PlannedTransect> InOrder(SurveyPlan plan) =>
    [
        .. plan.Strata
            .SelectMany(stratum => stratum.Layout.Transects.Select(transect => new PlannedTransect(stratum, transect)))
            .OrderBy(planned => planned.Transect.Order),
    ];
}
