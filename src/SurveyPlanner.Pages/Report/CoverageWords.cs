using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>The sentences of the section on coverage.</summary>
internal static class CoverageWords
{
    /// <summary>More strata than this are a list of their own: those that are even are only counted.</summary>
    private const int MostStrata = 4;

    /// <summary>Coverage within a tenth of nominal counts as even, as in the core's advice.</summary>
    private const double Tenth = 0.1;

    /// <summary>What coverage means for the survey, a sentence or two each, with the stratum's name where there are several.</summary>
    public static IReadOnlyList<(string? Stratum, string Sentence)> Advice(IReadOnlyCollection<StratumCoverage> coverages)
    {
        var judged = coverages.Where(coverage => coverage.Advice is not null).ToArray();
        if (judged.Length <= MostStrata)
        {
            return [.. judged.Select(coverage => (coverages.Count == 1 ? null : coverage.Stratum, coverage.Advice!.Sentence))];
        }

        var good = judged.Where(coverage => coverage.Advice is { Finding: CoverageFinding.Even, NeverCoveredKm2: 0 }).ToArray();
        return
        [
            (null, $"Coverage is even, and no place is without it, in {Figures.Count(good.Length)} of {Figures.Counted(judged.Length, "stratum", "strata")}."),
            .. judged.Except(good).Select(coverage => ((string?)coverage.Stratum, coverage.Advice!.Sentence)),
        ];
    }

    /// <summary>What the finding is called in a table.</summary>
    public static string Name(CoverageFinding finding) => finding switch
    {
        CoverageFinding.Even => "even",
        CoverageFinding.UnevenAtEdge => "uneven at the edge",
        CoverageFinding.UnevenAlongAxis => "changes along the axis",
        CoverageFinding.UnevenInside => "uneven inside",
        _ => throw new ArgumentOutOfRangeException(nameof(finding), finding, null),
    };

    /// <summary>What the edge profile shows; of many strata the one with the least coverage at its boundary.</summary>
    public static string EdgeFinding(IReadOnlyCollection<StratumCoverage> coverages)
    {
        if (coverages.Count > MostStrata)
        {
            var lowest = coverages.MinBy(Nearest)!;
            return $"Of {Figures.Counted(coverages.Count, "stratum", "strata")}, {lowest.Stratum} has the least coverage at its boundary: {Edge(lowest)}.";
        }

        return string.Join(" ", coverages.Select(coverage => coverages.Count == 1 ? Capital(Edge(coverage)) + "." : $"{coverage.Stratum}: {Edge(coverage)}."));
    }

    /// <summary>Coverage of the places nearest to the boundary, as a multiple of nominal.</summary>
    public static double Nearest(StratumCoverage coverage) => coverage.EdgeProfile[0].MeanCoverage / coverage.Nominal;

    private static string Edge(StratumCoverage coverage)
    {
        var profile = coverage.EdgeProfile;
        var even = profile.Length;
        while (even > 0 && Math.Abs((profile[even - 1].MeanCoverage / coverage.Nominal) - 1) <= Tenth)
        {
            even--;
        }

        if (even == 0)
        {
            return "coverage is within a tenth of nominal right up to the boundary";
        }

        var near = profile[0].ToMetres is { } to
            ? $"within {Figures.Distance(to)} of the boundary coverage averages {Figures.Three(Nearest(coverage))} of nominal"
            : $"coverage averages {Figures.Three(Nearest(coverage))} of nominal";
        return even < profile.Length
            ? $"{near}, and from {Figures.Distance(profile[even].FromMetres)} inwards it is within a tenth of nominal"
            : $"{near}, and farther in than {Figures.Distance(profile[^1].FromMetres)} it still averages {Figures.Three(profile[^1].MeanCoverage / coverage.Nominal)}";
    }

    private static string Capital(string sentence) => char.ToUpperInvariant(sentence[0]) + sentence[1..];
}
