using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Maps;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>The tables of the section on coverage.</summary>
internal static class CoverageTables
{
    public static Table OfStrata(IEnumerable<StratumCoverage> coverages) => new(
        "Coverage probability by stratum; areas by multiple of nominal",
        [
            new("Stratum", false), new("Finding", false), new("Nominal"), new("Mean"), new("Least"), new("Greatest"), new("CV, %"),
            new("Area under 0.5, %"), new("Area under 0.9, %"), new("Area over 1.1, %"),
        ],
        [
            .. coverages.Select(coverage => (string[])
            [
                coverage.Stratum,
                coverage.Advice is { } advice ? CoverageWords.Name(advice.Finding) : Figures.None,
                Figures.Three(coverage.Nominal),
                Figures.Three(coverage.Mean),
                Figures.Three(coverage.Min),
                Figures.Three(coverage.Max),
                Figures.Three(coverage.Cv * 100),
                Figures.AreaShare(coverage.ShareBelow(0.5)),
                Figures.AreaShare(coverage.ShareBelow(0.9)),
                Figures.AreaShare(coverage.ShareAbove(1.1)),
            ]),
        ]);

    public static Table OfSimulation(IEnumerable<StratumCoverage> coverages) => new(
        "Closed form and simulation",
        [new("Stratum", false), new("Figures from", false), new("Cells"), new("Simulated draws"), new("Mean"), new("Simulated mean"), new("Largest |z|")],
        [
            .. coverages.Select(coverage => (string[])
            [
                coverage.Stratum,
                coverage.MaxAbsZ is null ? "simulation" : "closed form",
                Figures.Count(coverage.Cells.Length),
                Figures.Count(coverage.Replicates),
                Figures.Three(coverage.Mean),
                Figures.Three(coverage.SimulatedMean),
                Figures.Three(coverage.MaxAbsZ),
            ]),
        ]);

    public static Table OfClasses(IEnumerable<CoverageClass> classes) => new(
        "Area by coverage probability",
        [new("Multiple of nominal", false), new("Area, km²"), new("Share, %")],
        [.. classes.Select(one => (string[])[one.Name, Figures.Three(one.AreaKm2), Figures.AreaShare(one.Share)])]);

    public static Table OfEdge(IEnumerable<StratumCoverage> strata) => new(
        "Coverage by distance from the boundary",
        [new("Stratum", false), new("Distance", false), new("Area, km²"), new("Mean coverage"), new("Multiple of nominal")],
        [
            .. strata.SelectMany(stratum => stratum.EdgeProfile, (stratum, one) => (string[])
            [
                stratum.Stratum,
                one.ToMetres is { } to ? $"{Figures.Distance(one.FromMetres)} to {Figures.Distance(to)}" : $"{Figures.Distance(one.FromMetres)} and farther",
                Figures.Three(one.AreaKm2),
                Figures.Three(one.MeanCoverage),
                Figures.Three(one.MeanCoverage / stratum.Nominal),
            ]),
        ]);
}
