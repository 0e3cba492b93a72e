using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>
/// How much effort buys which precision. Effort is kilometres of line, or visits to points (one visit a point). What does not apply, or
/// cannot be estimated, is null and said in <see cref="Advice"/>; no figure is ever NaN.
/// </summary>
/// <param name="IsPoints">Whether effort is visits to points (else kilometres of line).</param>
/// <param name="EncounterRate">Detections per unit of effort over the region, strata weighted by area.</param>
/// <param name="Density">What the pilot's encounter rate comes to; null where the effective width is unknown.</param>
/// <param name="Estimator">Variance estimator of the encounter rate; null without a pilot.</param>
/// <param name="EstimatorReason">Why that one, a sentence; null without a pilot.</param>
/// <param name="Pilot">The pilot's figures; null without a pilot.</param>
/// <param name="B">The constant b of effort = (b / cv²) / encounter rate.</param>
/// <param name="PilotCv">Coefficient of variation of density that the pilot itself reached, by component; null where it cannot be estimated.</param>
/// <param name="Uncertainty">How far the pilot leaves the required effort open; null without a pilot.</param>
/// <param name="Required">Effort for the target; null without a target, or where no effort reaches it.</param>
/// <param name="Strata">The same by stratum, only those surveyed the way the pilot was.</param>
/// <param name="Allocations">Ways to share the effort, side by side; empty with a single stratum or without a required effort.</param>
/// <param name="Curves">Precision against effort, and effort against precision.</param>
/// <param name="Advice">What the user should know, with sources.</param>
/// <param name="Model">The relation of effort and precision that all of this follows from, effort shared as the allocation says before rounding.</param>
public sealed record EffortPlan(
    bool IsPoints,
    double EncounterRate,
    PilotDensity? Density,
    EncounterRateEstimator? Estimator,
    string? EstimatorReason,
    PilotFigures? Pilot,
    BConstant B,
    CvDecomposition? PilotCv,
    EffortUncertainty? Uncertainty,
    RequiredEffort? Required,
    ImmutableArray<StratumEffort> Strata,
    ImmutableArray<AllocationOption> Allocations,
    EffortCurves Curves,
    ImmutableArray<Advice> Advice,
    EffortModel Model)
{
    /// <summary>The precision that a total effort delivers when shared among the strata as planned; null for an effort that is not above 0.</summary>
    public EffortPrecision? CvAt(double effort) => Model.PrecisionAt(effort);

    /// <summary>
    /// The precision that efforts by stratum deliver, however they are shared; null where there is none at all, or none in a stratum that has
    /// detections to count, of which nothing would then be known.
    /// </summary>
    /// <param name="efforts">Kilometres of line or points, in the order of the strata of <see cref="Model"/>.</param>
    public EffortPrecision? PrecisionOf(IReadOnlyList<double> efforts)
    {
        var total = efforts.Sum();
        return total > 0 && Model.Strata.Zip(efforts).All(pair => pair.Second > 0 || pair.First.Rate == 0)
            ? Model.WithShares([.. efforts.Select(effort => effort / total)]).PrecisionAt(total)
            : null;
    }

    /// <summary>The effort that would deliver as much if it were shared among the strata as planned.</summary>
    public double EffortAsPlanned(EffortPrecision precision) => Model.EffortFor(precision.Cv) ?? precision.Effort;
}

/// <summary>Density in the pilot.</summary>
/// <param name="ClustersPerKm2">Detections (clusters, where animals come in clusters) per square kilometre.</param>
/// <param name="AnimalsPerKm2">Animals per square kilometre; the same where animals are alone.</param>
public sealed record PilotDensity(double ClustersPerKm2, double AnimalsPerKm2);

/// <summary>Where b comes from.</summary>
public enum BOrigin
{
    /// <summary>Estimated from the pilot.</summary>
    Pilot,

    /// <summary>Given in the plan.</summary>
    Given,

    /// <summary>The published rule of thumb.</summary>
    RuleOfThumb,
}

/// <summary>The constant b and its parts; parts are null where b was given whole.</summary>
/// <param name="Value">b, cluster size included.</param>
/// <param name="Origin">Where it comes from.</param>
/// <param name="EncounterRatePart">Share of the encounter rate: the variance-to-mean ratio of counts under the variance estimator used.</param>
/// <param name="DetectionPart">Share of the detection function that falls with effort.</param>
/// <param name="ClusterSizePart">Share of cluster size, (sd / mean)².</param>
/// <param name="Explanation">One sentence for the reader.</param>
public sealed record BConstant(
    double Value, BOrigin Origin, double? EncounterRatePart, double? DetectionPart, double? ClusterSizePart, string Explanation);

/// <summary>What an effort delivers.</summary>
/// <param name="Effort">Kilometres of line or visits to points.</param>
/// <param name="ExpectedDetections">Detections expected at the pilot's encounter rate.</param>
/// <param name="Decomposition">The coefficient of variation of density and its parts.</param>
public sealed record EffortPrecision(double Effort, double ExpectedDetections, CvDecomposition Decomposition)
{
    /// <summary>Coefficient of variation of density.</summary>
    public double Cv => Decomposition.Cv;
}

/// <summary>Effort for the target precision.</summary>
/// <param name="TargetCv">The coefficient of variation asked for.</param>
/// <param name="Effort">The plain estimate: kilometres of line (not rounded), or points (rounded up).</param>
/// <param name="Precision">What that effort delivers.</param>
/// <param name="Interval">95 % interval of the effort that the truth asks for; null without a pilot.</param>
/// <param name="DeltaInterval">The same by the delta method, for comparison.</param>
/// <param name="Assurance">How sure to be of reaching the target; null where not asked for.</param>
/// <param name="AssuredEffort">Effort that reaches the target with that assurance; null without assurance or without a pilot.</param>
public sealed record RequiredEffort(
    double TargetCv,
    double Effort,
    EffortPrecision Precision,
    EffortInterval? Interval,
    EffortInterval? DeltaInterval,
    double? Assurance,
    double? AssuredEffort)
{
    /// <summary>What is planned for: the assured effort where there is one, otherwise the plain estimate.</summary>
    public double Planned => AssuredEffort ?? Effort;
}

/// <summary>Effort in one stratum.</summary>
/// <param name="Name">The stratum.</param>
/// <param name="EncounterRate">The encounter rate assumed for it.</param>
/// <param name="Pilot">Its own encounter rate in the pilot; null when the pilot has none of its own for it.</param>
/// <param name="Share">Its share of the total effort under the allocation, 0 to 1, before rounding.</param>
/// <param name="Effort">
/// Kilometres of line, or points, of the planned total, rounded up to whole transects and to the least number of them where the length of a
/// transect is known; null without a required total.
/// </param>
/// <param name="Transects">Lines or points that makes; null when the length of a line is unknown or without a required total.</param>
/// <param name="ExpectedDetections">On that effort.</param>
/// <param name="Cv">Coefficient of variation of the stratum's own density on that effort; null where nothing was seen in it.</param>
/// <param name="EffortForOwnTarget">Effort that would bring the stratum's own density to the target; null where nothing was seen in it, or no effort does.</param>
public sealed record StratumEffort(
    string Name,
    double EncounterRate,
    EncounterRate? Pilot,
    double Share,
    double? Effort,
    int? Transects,
    double? ExpectedDetections,
    double? Cv,
    double? EffortForOwnTarget);

/// <summary>A sentence the user should read.</summary>
/// <param name="Message">The sentence.</param>
/// <param name="Source">Where the advice comes from; null when it is plain arithmetic on the input.</param>
public sealed record Advice(string Message, string? Source = null)
{
    /// <summary>
    /// Whether it only puts into words the interval, the assured effort and the reliability measured: who shows those as figures need not repeat it.
    /// </summary>
    public bool RepeatsFigures { get; init; }
}
