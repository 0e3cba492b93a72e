using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner;

/// <summary>The whole plan: what every output is made from.</summary>
/// <param name="Design">The plan file as understood.</param>
/// <param name="Region">The study region in its plane.</param>
/// <param name="Strata">Each stratum with its layout and coverage, in the region's order.</param>
/// <param name="Effort">Effort and precision; null where the plan neither has a pilot nor gives an encounter rate.</param>
/// <param name="Notices">Everything the user must be told.</param>
public sealed record SurveyPlan(
    SurveyDesign Design,
    Region Region,
    ImmutableArray<StratumPlan> Strata,
    EffortPlan? Effort,
    ImmutableArray<Notice> Notices)
{
    /// <summary>
    /// The precision that the layout as drawn delivers: kilometres of line, or points, of the strata that are surveyed the way the pilot was, as they
    /// fell on each. Null where there is no effort plan, or where a stratum drew nothing.
    /// </summary>
    public EffortPrecision? Delivered => Effort?.PrecisionOf([.. Effort.Model.Strata.Select(stratum => DrawnEffort(stratum.Name))]);

    private double DrawnEffort(string stratum)
    {
        var layout = Strata.Single(one => one.Stratum.Name == stratum).Layout;
        return layout.Design.IsPoints ? layout.Transects.Length : layout.TotalLengthMetres / 1000;
    }
}

/// <summary>The plan of one stratum; coverage is null where only the layout was asked for.</summary>
public sealed record StratumPlan(Stratum Stratum, Layout Layout, StratumCoverage? Coverage);
