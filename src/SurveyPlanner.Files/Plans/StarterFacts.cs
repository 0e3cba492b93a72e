using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Plans;

/// <summary>What a starter plan is fitted to.</summary>
/// <param name="SurveyName">Name of the survey to begin with.</param>
/// <param name="AreaKm2">Area of the region, square kilometres.</param>
/// <param name="LongAxisKm">Long side of the narrowest rectangle round it, kilometres.</param>
/// <param name="ShortAxisKm">Short side, kilometres.</param>
/// <param name="StratumFields">Attributes of the boundary that could name strata, the likeliest first.</param>
public sealed record StarterFacts(
    string SurveyName,
    double AreaKm2,
    double LongAxisKm,
    double ShortAxisKm,
    ImmutableArray<StratumFieldCandidate> StratumFields)
{
    /// <summary>More parts than this are features of a map, not strata of a survey.</summary>
    private const int MostStrata = 50;

    private const int MostCandidates = 5;

    /// <summary>The facts of a boundary that was read as one stratum.</summary>
    /// <param name="surveyName">Name of the survey to begin with, such as the file's name without its extension.</param>
    /// <param name="boundary">The boundary.</param>
    /// <param name="region">The region built from it without a stratum field.</param>
    public static StarterFacts Of(string surveyName, Boundary boundary, Region region)
    {
        var largest = region.Strata.MaxBy(stratum => stratum.AreaKm2)!;
        return new StarterFacts(surveyName, region.AreaKm2, largest.LongAxisKm, largest.ShortAxisKm, Candidates(boundary));
    }

    /// <summary>Attributes that every feature has and that tell at least two groups of them apart, the fewest groups first.</summary>
    private static ImmutableArray<StratumFieldCandidate> Candidates(Boundary boundary)
        =>
        [
            .. boundary.Features
                .SelectMany(feature => feature.Attributes.Keys)
                .Distinct()
                .Where(field => !string.IsNullOrWhiteSpace(field))
                .Select(field => new StratumFieldCandidate(field, [.. boundary.Features.Select(feature => feature.Attributes.GetValueOrDefault(field, "")).Distinct()]))
                .Where(candidate => candidate.Values.Length is >= 2 and <= MostStrata && !candidate.Values.Any(string.IsNullOrWhiteSpace))
                .OrderBy(candidate => candidate.Values.Length)
                .ThenBy(candidate => candidate.Field, StringComparer.Ordinal)
                .Take(MostCandidates),
        ];
}

/// <summary>An attribute of the boundary, and the strata it would make.</summary>
public sealed record StratumFieldCandidate(string Field, ImmutableArray<string> Values);
