namespace SurveyPlanner.Effort;

/// <summary>What effort planning needs to know of a stratum.</summary>
/// <param name="Name">Its name, as the pilot calls it.</param>
/// <param name="AreaKm2">Its area, which weights its density.</param>
/// <param name="IsPoints">Whether it is surveyed at points (else along lines).</param>
/// <param name="HalfWidthMetres">Strip half-width, or radius of a point.</param>
/// <param name="IsSystematic">Whether its transects follow one another at a fixed spacing from a random start (else each is placed by itself).</param>
/// <param name="TransectLengthKm">Mean length of one of its lines, where known: turns kilometres into lines. Null for points.</param>
public sealed record EffortStratum(
    string Name, double AreaKm2, bool IsPoints, double HalfWidthMetres, bool IsSystematic, double? TransectLengthKm = null);
