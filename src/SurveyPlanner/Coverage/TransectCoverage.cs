namespace SurveyPlanner.Coverage;

/// <summary>Coverage probability along one transect.</summary>
/// <param name="TransectId">The transect's id.</param>
/// <param name="Mean">
/// Mean, over the length of the transect that lies in the stratum, of the coverage of the places on it; at a point, the coverage there.
/// Null where no part of it lies in the stratum (plus sampling), and where the simulated draws are too few to tell: never 0, since it was drawn.
/// </param>
/// <param name="IsExact">Whether it comes from the closed form; otherwise from the same simulated draws as the cells.</param>
public sealed record TransectCoverage(string TransectId, double? Mean, bool IsExact);
