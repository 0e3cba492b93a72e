using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>A pilot season as counted: transects in spatial order within each stratum, and detections where they were written down.</summary>
/// <param name="IsPoints">Whether effort is visits to points (else kilometres of line).</param>
/// <param name="Transects">In the order of the table; neighbours in the table are taken for neighbours on the ground.</param>
/// <param name="Detections">Empty when only counts are known.</param>
/// <param name="Source">The file of the transects, for messages; null when not from a file.</param>
public sealed record PilotTable(
    bool IsPoints,
    ImmutableArray<PilotTransect> Transects,
    ImmutableArray<PilotDetection> Detections,
    string? Source = null)
{
    /// <summary>The file of the detections, for messages; null when not from a file.</summary>
    public string? DetectionsSource { get; init; }

    /// <summary>What was noticed while reading, such as columns that are not used.</summary>
    public ImmutableArray<Notice> Notices { get; init; } = [];

    /// <summary>
    /// The table without detections beyond a distance, its counts lowered to match: what lies beyond the truncation distance counts as not seen.
    /// Without detections the table comes back as it is.
    /// </summary>
    public PilotTable Within(double truncationMetres)
    {
        if (Detections.IsEmpty)
        {
            return this;
        }

        var kept = Detections.Where(detection => detection.DistanceMetres <= truncationMetres).ToImmutableArray();
        var counts = kept.GroupBy(detection => detection.TransectId).ToDictionary(group => group.Key, group => group.Count());
        return this with
        {
            Transects = [.. Transects.Select(transect => transect with { Count = counts.GetValueOrDefault(transect.Id) })],
            Detections = kept,
        };
    }
}

/// <summary>One transect of the pilot.</summary>
/// <param name="Stratum">Its stratum; empty when the pilot names none.</param>
/// <param name="Id">Its name in the table, unique in it.</param>
/// <param name="Effort">Kilometres of line, or visits to the point. Positive.</param>
/// <param name="Count">Number of detections (of clusters, where animals come in clusters) on it. Not negative.</param>
/// <param name="Line">Line of the table it stands in, for messages; null when not from a file.</param>
public sealed record PilotTransect(string Stratum, string Id, double Effort, int Count, int? Line = null);

/// <summary>One detection of the pilot.</summary>
/// <param name="TransectId">The transect it was made from.</param>
/// <param name="DistanceMetres">Perpendicular distance from the line, or radial distance from the point.</param>
/// <param name="Size">Number of animals in the cluster; 1 where animals are alone.</param>
/// <param name="Line">Line of the table it stands in, for messages; null when not from a file.</param>
public sealed record PilotDetection(string TransectId, double DistanceMetres, int Size, int? Line = null);
