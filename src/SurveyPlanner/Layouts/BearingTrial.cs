using System.Collections.Immutable;

namespace SurveyPlanner.Layouts;

/// <summary>What the layout of one stratum would be like along other bearings.</summary>
public sealed record StratumBearings(string Stratum, ImmutableArray<BearingTrial> Trials);

/// <summary>A layout tried out along one bearing.</summary>
/// <param name="BearingDegrees">True bearing at the stratum's centre, degrees in [0, 180).</param>
/// <param name="Figures">What to expect along it; null where it cannot work.</param>
/// <param name="Refusal">Why it cannot work, one sentence; null where it can.</param>
public sealed record BearingTrial(double BearingDegrees, BearingFigures? Figures, string? Refusal);

/// <summary>What to expect of a layout along a bearing, over its random start.</summary>
/// <param name="SpacingMetres">The spacing that the sizing comes to, metres.</param>
/// <param name="ExpectedTransects">Expected number of lines or points.</param>
/// <param name="Effort">Mean and spread of the total length, metres; for points of their number.</param>
/// <param name="LineLengthCv">
/// Coefficient of variation of the lengths of the lines of one draw, mean over draws: even lengths make good replicates. Null for points.
/// </param>
/// <param name="OffEffortMetres">
/// Expected way between pieces, metres: from the end of each to the start of the next in order of visit, over gaps in lines too, straight in the
/// plane. The way to the first and from the last is not in it.
/// </param>
public sealed record BearingFigures(
    double SpacingMetres,
    double ExpectedTransects,
    EffortSpread Effort,
    double? LineLengthCv,
    double OffEffortMetres);
