using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>The sentences of the section on coverage.</summary>
internal static class CoverageWords
{
    /// <summary>More strata than this are told together, a finding at a time.</summary>
    private const int MostStrata = 4;

    /// <summary>More names than this are left to the table.</summary>
    private const int MostNames = 6;

    /// <summary>Coverage within a tenth of nominal counts as even, as in the core's advice.</summary>
    private const double Tenth = 0.1;

    /// <summary>What coverage means for the survey: a sentence or two a stratum, with its name where there are several; of many strata, a finding at a time.</summary>
    public static IReadOnlyList<(string? Heading, string Sentence)> Advice(IReadOnlyCollection<StratumCoverage> coverages)
    {
        var judged = coverages.Where(coverage => coverage.Advice is not null).ToArray();
        if (judged.Length <= MostStrata)
        {
            return [.. judged.Select(coverage => (coverages.Count == 1 ? null : coverage.Stratum, coverage.Advice!.Sentence))];
        }

        var never = judged.Where(coverage => coverage.Advice!.NeverCoveredKm2 > 0).ToArray();
        return
        [
            .. judged.GroupBy(coverage => coverage.Advice!.Finding).OrderBy(group => group.Key).Select(group => Of(group.Key, [.. group], judged.Length)),
            .. never.Length == 0
                ? Array.Empty<(string?, string)>()
                : [("Without coverage", $"{Figures.Three(never.Sum(coverage => coverage.Advice!.NeverCoveredKm2))} km² in {Names(never)}: no estimate speaks for those places.")],
        ];
    }

    // What to do is the same within a finding; the most uneven stratum says it with its figures.
    private static (string? Heading, string Sentence) Of(CoverageFinding finding, IReadOnlyList<StratumCoverage> strata, int all)
    {
        var heading = $"{Capital(Name(finding))}, {strata.Count} of {Figures.Counted(all, "stratum", "strata")}";
        var worst = strata.MaxBy(coverage => coverage.Advice!.UnevenShare)!;
        return (heading, finding == CoverageFinding.Even ? Names(strata) + "."
            : strata.Count == 1 ? $"{worst.Stratum}. {worst.Advice!.Sentence}"
            : $"{Names(strata)}. The most uneven is {worst.Stratum}. {worst.Advice!.Sentence}");
    }

    private static string Names(IReadOnlyList<StratumCoverage> strata) => string.Join(", ", strata.Take(MostNames).Select(coverage => coverage.Stratum))
        + (strata.Count > MostNames ? $" and {strata.Count - MostNames} more" : "");

    /// <summary>What the finding is called in a table.</summary>
    public static string Name(CoverageFinding finding) => finding switch
    {
        CoverageFinding.Even => "even",
        CoverageFinding.UnevenAtEdge => "uneven at the edge",
        CoverageFinding.UnevenAlongAxis => "changes along the axis",
        CoverageFinding.UnevenInside => "uneven inside",
        CoverageFinding.TooFewDraws => "too few draws to tell",
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
        return profile.Length == 1 ? near
            : even < profile.Length ? $"{near}, and from {Figures.Distance(profile[even].FromMetres)} inwards it is within a tenth of nominal"
            : $"{near}, and farther in than {Figures.Distance(profile[^1].FromMetres)} it still averages {Figures.Three(profile[^1].MeanCoverage / coverage.Nominal)} of nominal";
    }

    private static string Capital(string sentence) => char.ToUpperInvariant(sentence[0]) + sentence[1..];
}
