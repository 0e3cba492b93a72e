using System.Collections.Immutable;

namespace SurveyPlanner.Files.Plans;

/// <summary>
/// A plan file as read: the design it asks for, and the files it names.
/// </summary>
/// <param name="Path">The plan file as the user named it.</param>
/// <param name="Design">The design; its seed is 0 when the file gives none.</param>
/// <param name="SeedGiven">Whether the file (or <c>--set</c>) gives a seed; if not, the caller takes one from the system.</param>
/// <param name="BoundaryPaths">The boundary files, resolved against the plan's folder; at least one.</param>
/// <param name="Layers">The layers of them to read; empty when none is named.</param>
/// <param name="Crs">Its coordinate system as the plan states it; null when it does not.</param>
/// <param name="ExclusionPaths">Files of excluded areas, resolved; empty when there are none.</param>
/// <param name="PilotTransectsPath">Table of pilot transects, resolved; null when there is none.</param>
/// <param name="PilotDetectionsPath">Table of pilot detections, resolved; null when there is none.</param>
/// <param name="CanonicalText">Every key with the value that holds, in one fixed form: what a hash of the plan is taken of. Holds no seed.</param>
/// <param name="RawText">The file as it is.</param>
public sealed record PlanFile(
    string Path,
    SurveyDesign Design,
    bool SeedGiven,
    ImmutableArray<string> BoundaryPaths,
    ImmutableArray<string> Layers,
    string? Crs,
    ImmutableArray<string> ExclusionPaths,
    string? PilotTransectsPath,
    string? PilotDetectionsPath,
    string CanonicalText,
    string RawText);
