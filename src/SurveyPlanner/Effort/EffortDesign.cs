using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>How total effort is shared among strata.</summary>
public enum Allocation
{
    /// <summary>In proportion to area.</summary>
    Proportional,

    /// <summary>The same to each.</summary>
    Equal,

    /// <summary>Neyman's, with costs where given.</summary>
    Optimal,
}

/// <summary>What the plan file says about precision and what it may take as given instead of from a pilot.</summary>
/// <param name="TargetCv">The coefficient of variation of density that the decision needs; null when none is asked for.</param>
/// <param name="Assurance">How sure to be of reaching it, a probability; null for the plain estimate.</param>
/// <param name="B">Published rule-of-thumb constant b of L = (b / cv²)(L0 / n0); null to take it from the pilot.</param>
/// <param name="GivenEncounterRate">Detections per kilometre (points: per visit), where no pilot table is given.</param>
/// <param name="Estimator">Variance estimator of the encounter rate; null for the one that suits the layout.</param>
/// <param name="Allocation">How effort is shared among strata.</param>
/// <param name="Detection">Detection component.</param>
/// <param name="ClusterSize">Cluster size where given as figures; null to take it from the pilot's detections, if any.</param>
/// <param name="CostPerUnit">Cost of one kilometre (points: one visit) by stratum, any one currency; empty when not given.</param>
/// <param name="MinLines">Least number of replicate lines (or points) a stratum gets.</param>
public sealed record EffortDesign(
    double? TargetCv,
    double? Assurance,
    double? B,
    double? GivenEncounterRate,
    EncounterRateEstimator? Estimator,
    Allocation Allocation,
    DetectionDesign Detection,
    GivenClusterSize? ClusterSize,
    ImmutableSortedDictionary<string, double> CostPerUnit,
    int MinLines = EffortDesign.DefaultMinLines)
{
    /// <summary>Common advice is 10 to 20 replicate lines a stratum; 10 is its lower end.</summary>
    public const int DefaultMinLines = 10;

    /// <summary>No target, no pilot, nothing given.</summary>
    public static readonly EffortDesign None = new(
        null, null, null, null, null, Allocation.Proportional, DetectionDesign.None, null, ImmutableSortedDictionary<string, double>.Empty);
}

/// <summary>What is known or assumed of detection.</summary>
/// <param name="Models">
/// Models to fit to the pilot's distances. Empty: half-normal, hazard-rate and uniform-cosine where the pilot has distances and no figure of
/// detection is given; otherwise none. Everything seen out to the half-width: <see cref="DetectionModel.Strip"/> alone.
/// </param>
/// <param name="TruncationMetres">Distance beyond which detections are left out; null for the half-width of the layout.</param>
/// <param name="GivenCv">Coefficient of variation of the effective strip half-width (points: effective area) where given as a figure.</param>
/// <param name="GivenDegreesOfFreedom">Its degrees of freedom; null for many.</param>
/// <param name="GivenEffectiveWidthMetres">Effective strip half-width or effective radius where given as a figure.</param>
public sealed record DetectionDesign(
    ImmutableArray<DetectionModel> Models,
    double? TruncationMetres,
    double? GivenCv,
    double? GivenDegreesOfFreedom,
    double? GivenEffectiveWidthMetres)
{
    public static readonly DetectionDesign None = new([], null, null, null, null);

    /// <summary>Whether each stratum has a detection function of its own; else one serves all.</summary>
    public bool ByStratum { get; init; }
}

/// <summary>Cluster size as given figures.</summary>
/// <param name="Mean">Mean number of animals in a cluster, at least 1.</param>
/// <param name="StandardDeviation">Standard deviation of cluster size, not negative.</param>
public sealed record GivenClusterSize(double Mean, double StandardDeviation);
