using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>The encounter rate of one stratum.</summary>
public sealed record StratumEncounterRate(string Stratum, EncounterRate EncounterRate);

/// <summary>
/// What planning takes from a pilot.
/// </summary>
/// <param name="IsPoints">Whether effort is visits to points (else kilometres of line).</param>
/// <param name="TruncationMetres">Distance beyond which detections were left out; null where no distances were written down.</param>
/// <param name="BeyondTruncation">Number of detections left out for that.</param>
/// <param name="Strata">Encounter rates by stratum, in the order the pilot names them; one with an empty name when it names none.</param>
/// <param name="Pooled">The strata together, weighted by area.</param>
/// <param name="ClusterSize">Null where sizes are unknown or all 1.</param>
public sealed record PilotFigures(
    bool IsPoints,
    double? TruncationMetres,
    int BeyondTruncation,
    ImmutableArray<StratumEncounterRate> Strata,
    EncounterRate Pooled,
    ClusterSize? ClusterSize)
{
    /// <summary>Analyses a checked pilot table.</summary>
    /// <param name="pilot">A table without problems (see <see cref="PilotChecks"/>).</param>
    /// <param name="estimator">Variance estimator of the encounter rate.</param>
    /// <param name="truncationMetres">Distance beyond which detections do not count, where distances are known.</param>
    /// <param name="areasKm2">Area of each stratum by name, the weights of the pooled rate.</param>
    /// <exception cref="InputException">No detection is left within the truncation distance.</exception>
    public static PilotFigures Of(
        PilotTable pilot, EncounterRateEstimator estimator, double truncationMetres, IReadOnlyDictionary<string, double> areasKm2)
    {
        var within = pilot.Within(truncationMetres);
        if (within.Transects.All(transect => transect.Count == 0))
        {
            throw new InputException(new Problem(
                FormattableString.Invariant($"All {pilot.Detections.Length} detections of the pilot lie beyond the truncation distance of {truncationMetres:0.###} m; are the units right?"),
                pilot.DetectionsSource ?? pilot.Source));
        }

        var strata = within.Transects
            .GroupBy(transect => transect.Stratum)
            .Select(group => new StratumEncounterRate(group.Key, EncounterRate.Of([.. group], estimator)))
            .ToImmutableArray();
        var sampledArea = strata.Sum(stratum => areasKm2.GetValueOrDefault(stratum.Stratum, 0));
        return new PilotFigures(
            pilot.IsPoints,
            pilot.Detections.IsEmpty ? null : truncationMetres,
            pilot.Detections.Length - within.Detections.Length,
            strata,
            EncounterRate.Pooled([.. strata.Select(stratum => (stratum.EncounterRate, areasKm2.GetValueOrDefault(stratum.Stratum, 0) / sampledArea))]),
            ClusterSize.Of(within.Detections));
    }
}
