using SurveyPlanner.Coverage;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Maps;

/// <summary>Everything on the map of coverage probability, in pixels.</summary>
public sealed record CoverageMapDrawing(
    MapSheet Sheet,
    IReadOnlyList<(ShapeDrawing Shape, CellsDrawing Cells)> Strata,
    IReadOnlyList<Label> Names,
    IReadOnlyList<CoverageClass> Classes,
    string Title,
    string Description)
{
    /// <summary>The coverage of all strata that have one; null when none has.</summary>
    public static CoverageMapDrawing? Of(SurveyPlan plan, bool nauticalMiles)
    {
        StratumCoverage[] coverages = [.. plan.Strata.Select(stratum => stratum.Coverage).OfType<StratumCoverage>()];
        if (coverages.Length == 0)
        {
            return null;
        }

        var region = plan.Region;
        var frame = MapFrame.Around(region.Strata.Select(stratum => stratum.Shape), []);
        var placer = new LabelPlacer(frame.Width, frame.Height);
        var drawing = StrataDrawing.Of(region, frame, placer);
        var shapes = drawing.Strata.ToDictionary(stratum => stratum.Name, stratum => stratum.Shape, StringComparer.Ordinal);
        var classes = CoverageClasses.Tally(coverages);
        return new CoverageMapDrawing(
            MapSheet.For(region, frame, placer, nauticalMiles),
            [.. coverages.Select(coverage => (shapes[coverage.Stratum], CellsDrawing.Of(coverage, frame)))],
            [.. drawing.Strata.Select(stratum => stratum.NameLabel).OfType<Label>()],
            classes,
            "Coverage probability of " + plan.Design.Name,
            Sentences.OfCoverage(coverages, classes));
    }
}
