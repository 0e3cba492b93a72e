using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>The encounter rate of one stratum, and its own detection fits where asked for.</summary>
public sealed record StratumEncounterRate(string Stratum, EncounterRate EncounterRate, DetectionFits? Detection = null);

/// <summary>How a pilot is analysed.</summary>
/// <param name="Estimator">Variance estimator of the encounter rate.</param>
/// <param name="TruncationMetres">Distance beyond which detections do not count, where distances are known.</param>
/// <param name="Models">Detection models to fit to the distances; empty to fit none.</param>
/// <param name="DetectionByStratum">Whether each stratum gets detection fits of its own beside the pooled ones.</param>
public sealed record PilotAnalysis(
    EncounterRateEstimator Estimator, double TruncationMetres, ImmutableArray<DetectionModel> Models, bool DetectionByStratum = false);

/// <summary>
/// What planning takes from a pilot.
/// </summary>
/// <param name="IsPoints">Whether effort is visits to points (else kilometres of line).</param>
/// <param name="TruncationMetres">Distance beyond which detections were left out; null where no distances were written down.</param>
/// <param name="BeyondTruncation">Number of detections left out for that.</param>
/// <param name="Strata">Encounter rates by stratum, in the order the pilot names them; one with an empty name when it names none.</param>
/// <param name="Pooled">The strata together, weighted by area.</param>
/// <param name="ClusterSize">Null where sizes are unknown or all 1.</param>
/// <param name="Detection">Detection fits, strata pooled; null where distances are unknown or no model was asked for.</param>
public sealed record PilotFigures(
    bool IsPoints,
    double? TruncationMetres,
    int BeyondTruncation,
    ImmutableArray<StratumEncounterRate> Strata,
    EncounterRate Pooled,
    ClusterSize? ClusterSize,
    DetectionFits? Detection)
{
    /// <summary>Analyses a checked pilot table.</summary>
    /// <param name="pilot">A table without problems (see <see cref="PilotChecks"/>).</param>
    /// <param name="analysis">How.</param>
    /// <param name="areasKm2">Area by name of each stratum that is surveyed the way the pilot was, the weights of the pooled rate. At least one is in the pilot, if that names any.</param>
    /// <exception cref="InputException">No detection is left within the truncation distance, or in the strata with a weight.</exception>
    public static PilotFigures Of(PilotTable pilot, PilotAnalysis analysis, IReadOnlyDictionary<string, double> areasKm2)
    {
        var truncationMetres = analysis.TruncationMetres;
        var within = pilot.Within(truncationMetres);
        var strata = within.Transects
            .GroupBy(transect => transect.Stratum)
            .Select(group => new StratumEncounterRate(
                group.Key,
                EncounterRate.Of([.. group], analysis.Estimator),
                analysis.DetectionByStratum ? Fits(within, analysis, group.Select(transect => transect.Id)) : null))
            .ToImmutableArray();
        // A pilot that names no strata is one sample of the whole; strata surveyed another way have no weight.
        var weighted = strata.Where(stratum => stratum.Stratum.Length == 0 || areasKm2.ContainsKey(stratum.Stratum)).ToList();
        if (weighted.All(stratum => stratum.EncounterRate.Count == 0))
        {
            throw new InputException(NothingLeft(pilot, truncationMetres));
        }

        var sampledArea = weighted.Sum(stratum => areasKm2.GetValueOrDefault(stratum.Stratum, 1));
        return new PilotFigures(
            pilot.IsPoints,
            pilot.Detections.IsEmpty ? null : truncationMetres,
            pilot.Detections.Length - within.Detections.Length,
            strata,
            EncounterRate.Pooled([.. weighted.Select(stratum => (stratum.EncounterRate, areasKm2.GetValueOrDefault(stratum.Stratum, 1) / sampledArea))]),
            ClusterSize.Of(within.Detections),
            Fits(within, analysis, within.Transects.Select(transect => transect.Id)));
    }

    private static Problem NothingLeft(PilotTable pilot, double truncationMetres)
        => pilot.Detections.IsEmpty || pilot.Detections.Any(detection => detection.DistanceMetres <= truncationMetres)
            ? new Problem("The pilot has no detection in any stratum that is surveyed the way it was; give a pilot with detections there.", pilot.Source)
            : new Problem(
                FormattableString.Invariant($"All {pilot.Detections.Length} detections of the pilot lie beyond the truncation distance of {truncationMetres:0.###} m; are the units right?"),
                pilot.DetectionsSource ?? pilot.Source);

    private static DetectionFits? Fits(PilotTable within, PilotAnalysis analysis, IEnumerable<string> transects)
    {
        var ids = transects.ToHashSet();
        var distances = within.Detections.Where(detection => ids.Contains(detection.TransectId)).Select(detection => detection.DistanceMetres);
        return within.Detections.IsEmpty || analysis.Models.IsEmpty
            ? null
            : DetectionFitting.Fit([.. distances], analysis.TruncationMetres, within.IsPoints, analysis.Models);
    }
}
