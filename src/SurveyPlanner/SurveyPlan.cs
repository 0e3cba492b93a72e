using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner;

/// <summary>The whole plan: what every output is made from.</summary>
public sealed record SurveyPlan(
    SurveyDesign Design,
    Region Region,
    ImmutableArray<StratumPlan> Strata,
    ImmutableArray<Notice> Notices);

/// <summary>The plan of one stratum.</summary>
public sealed record StratumPlan(Stratum Stratum, Layout Layout, StratumCoverage? Coverage);
