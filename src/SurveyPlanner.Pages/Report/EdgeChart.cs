using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Charts;

namespace SurveyPlanner.Pages.Report;

/// <summary>Coverage against distance from the boundary, a line a stratum.</summary>
internal static class EdgeChart
{
    /// <summary>As many as can be told apart; of more strata those with the least coverage at their boundary are named, the others drawn faintly.</summary>
    private const int MostNamed = 4;

    private const double MetresPerKm = 1000;

    /// <summary>The strata that have a profile to show.</summary>
    public static IReadOnlyList<StratumCoverage> Strata(IEnumerable<StratumCoverage> coverages)
        => [.. coverages.Where(coverage => coverage.Nominal > 0 && coverage.EdgeProfile.Length > 0)];

    /// <summary>Null where no stratum has more than one class of distance.</summary>
    public static Chart? For(IReadOnlyList<StratumCoverage> strata)
    {
        if (!strata.Any(stratum => stratum.EdgeProfile.Length > 1))
        {
            return null;
        }

        var points = strata.ToDictionary(stratum => stratum.Stratum, Points);
        var far = points.Values.Max(one => one[^1].Metres);
        var (unit, scale) = far > 2 * MetresPerKm ? ("km", MetresPerKm) : ("m", 1);
        var named = strata.OrderBy(CoverageWords.Nearest).Take(MostNamed).Select(stratum => stratum.Stratum).ToList();
        return new Chart(
            "Coverage against distance from the boundary",
            CoverageWords.EdgeFinding(strata) + " The table has the figures.",
            Axis.Covering($"Distance from the boundary, {unit}", 0, far / scale),
            Axis.Covering("Coverage as a multiple of nominal", 0, Math.Max(1.1, points.Values.Max(one => one.Max(point => point.Multiple)))))
        {
            Lines =
            [
                .. strata.Select(stratum => stratum.Stratum).Select(name => new Line(
                    named.Contains(name) ? name : "",
                    [.. points[name].Select(point => (point.Metres / scale, point.Multiple))])
                {
                    Look = named.IndexOf(name) is >= 0 and var place ? (LineLook)place : LineLook.Quiet,
                }),
            ],
            Levels = [new Level(1, "nominal")],
        };
    }

    /// <summary>A class is drawn at its middle; the last, of all that is farther in, half a class beyond its beginning.</summary>
    private static List<(double Metres, double Multiple)> Points(StratumCoverage coverage)
    {
        var first = coverage.EdgeProfile[0];
        var half = ((first.ToMetres ?? (2 * first.FromMetres)) - first.FromMetres) / 2;
        return [.. coverage.EdgeProfile.Select(one => (((one.FromMetres + one.ToMetres) / 2) ?? (one.FromMetres + half), one.MeanCoverage / coverage.Nominal))];
    }
}
