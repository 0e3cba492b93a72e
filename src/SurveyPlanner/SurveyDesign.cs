using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;

namespace SurveyPlanner;

/// <summary>
/// A plan file as understood: what to survey and how, in metres, degrees and plain numbers. Holds no file content.
/// </summary>
/// <param name="Name">Name of the survey.</param>
/// <param name="Seed">The seed everything random comes from.</param>
/// <param name="StratumField">Attribute of the boundary that names the strata; null for one stratum.</param>
/// <param name="Strata">Names of the strata to survey, in this order; empty for all that the boundary holds.</param>
/// <param name="Layout">The layout of every stratum that has none of its own.</param>
/// <param name="StratumLayouts">Layouts of single strata, by name, the common keys already filled in.</param>
/// <param name="Effort">Precision asked for, and assumptions.</param>
/// <param name="Coverage">How finely coverage is looked at.</param>
public sealed record SurveyDesign(
    string Name,
    ulong Seed,
    string? StratumField,
    ImmutableArray<string> Strata,
    LayoutDesign Layout,
    ImmutableSortedDictionary<string, LayoutDesign> StratumLayouts,
    EffortDesign Effort,
    CoverageDesign Coverage)
{
    /// <summary>Projection asked for by name; null for the one that distorts least.</summary>
    public string? Projection { get; init; }

    /// <summary>Distance kept from the exclusions, metres.</summary>
    public double ExclusionBufferMetres { get; init; }

    /// <summary>The layout of one stratum.</summary>
    public LayoutDesign LayoutOf(string stratum) => StratumLayouts.GetValueOrDefault(stratum, Layout);
}
