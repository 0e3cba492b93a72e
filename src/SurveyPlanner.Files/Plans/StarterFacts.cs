using System.Collections.Immutable;
using SurveyPlanner.Files.Units;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Plans;

/// <summary>What a starter plan is fitted to.</summary>
/// <param name="SurveyName">Name of the survey to begin with.</param>
/// <param name="AreaKm2">Area of the region, square kilometres.</param>
/// <param name="LongAxisKm">Long side of the narrowest rectangle round it, kilometres.</param>
/// <param name="ShortAxisKm">Short side, kilometres.</param>
/// <param name="LinesAcrossKm">
/// How much of the long side lines along the short axis can fall on, kilometres; gaps between parts of the region are left out, so that
/// the expected number of lines is this over their spacing.
/// </param>
/// <param name="StratumFields">Attributes of the boundary that could name strata, the likeliest first.</param>
public sealed record StarterFacts(
    string SurveyName,
    double AreaKm2,
    double LongAxisKm,
    double ShortAxisKm,
    double LinesAcrossKm,
    ImmutableArray<StratumFieldCandidate> StratumFields)
{
    /// <summary>What there is to tell of how the boundary was read as a region.</summary>
    public ImmutableArray<Notice> Notices { get; init; } = [];

    /// <summary>More parts than this are features of a map, not strata of a survey.</summary>
    private const int MostStrata = 50;

    private const int MostCandidates = 5;

    /// <summary>Lines laid out to see how many a spacing brings; any number would do.</summary>
    private const string TrialPlan = """
        [survey]
        seed = 1
        [region]
        boundary = "trial"
        [layout]
        kind = "parallel"
        bearing = "short-axis"
        lines = 20
        half_width = "1 m"
        """;

    /// <summary>The facts of a boundary that was read as one stratum.</summary>
    /// <param name="surveyName">Name of the survey to begin with, such as the file's name without its extension.</param>
    /// <param name="boundary">The boundary.</param>
    /// <exception cref="InputException">The boundary makes no region.</exception>
    public static StarterFacts Of(string surveyName, Boundary boundary)
    {
        var trial = PlanSurvey.DrawOnly(PlanFileReader.Parse(TrialPlan, "trial.toml", []).Design, new SurveyInputs(boundary, [], null));
        var (region, layout) = (trial.Strata[0].Stratum, trial.Strata[0].Layout);
        return new StarterFacts(
            surveyName,
            region.AreaKm2,
            region.LongAxisKm,
            region.ShortAxisKm,
            layout.ExpectedCount * layout.SpacingMetres / 1000,
            Candidates(boundary))
        {
            Notices = trial.Region.Notices,
        };
    }

    /// <summary>Attributes that every feature has and that tell at least two groups of them apart: names before numbers, the fewest groups first.</summary>
    private static ImmutableArray<StratumFieldCandidate> Candidates(Boundary boundary)
        =>
        [
            .. boundary.Features
                .SelectMany(feature => feature.Attributes.Keys)
                .Distinct()
                .Where(field => !string.IsNullOrWhiteSpace(field))
                .Select(field => new StratumFieldCandidate(field, [.. boundary.Features.Select(feature => feature.Attributes.GetValueOrDefault(field, "")).Distinct()]))
                .Where(candidate => candidate.Values.Length is >= 2 and <= MostStrata && !candidate.Values.Any(string.IsNullOrWhiteSpace))
                .OrderBy(candidate => candidate.Values.All(value => DecimalText.Read(value).Complaint is null))
                .ThenBy(candidate => candidate.Values.Length)
                .ThenBy(candidate => candidate.Field, StringComparer.Ordinal)
                .Take(MostCandidates),
        ];
}

/// <summary>An attribute of the boundary, and the strata it would make.</summary>
public sealed record StratumFieldCandidate(string Field, ImmutableArray<string> Values);
