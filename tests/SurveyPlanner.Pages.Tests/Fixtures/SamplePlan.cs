using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pilots;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Tests.Fixtures;

/// <summary>Plans for the tests of pages, made by the core.</summary>
internal static class SamplePlan
{
    public static readonly ReportContext Context = new("archipelago.toml", "draw 1 of 1", "0.1.0");

    /// <summary>Lines by boat on a sea with islands as holes, without a pilot.</summary>
    public static readonly SurveyPlan Archipelago = Of(SampleBoundary.Read("marine_archipelago_sea"), Parallel(10_000));

    /// <summary>Two strata with an area closed to survey, a zigzag and points, and an invented pilot of lines in the first.</summary>
    public static readonly SurveyPlan WithPilot = Of(
        SampleBoundary.Boxes(("outer", 20, 60, 21, 61), ("inner", 21, 60, 22, 61)),
        Parallel(8000),
        stratumField: "name",
        stratumLayouts: [("inner", Zigzag(12_000))],
        exclusions: SampleBoundary.Boxes(("closed", 20.6, 60.3, 21.2, 60.5)),
        pilot: InventedPilot("outer", "inner"));

    public static LayoutDesign Parallel(double spacingMetres, double bearing = 20)
        => new(LayoutKind.Parallel, new Sizing.Spacing(spacingMetres), new Bearing.Degrees(bearing), 600);

    public static LayoutDesign Zigzag(double spacingMetres)
        => new(LayoutKind.Zigzag, new Sizing.Spacing(spacingMetres), new Bearing.ShortAxis(), 600);

    public static LayoutDesign Grid(double spacingMetres, double radiusMetres = 1000)
        => new(LayoutKind.PointGrid, new Sizing.Spacing(spacingMetres), new Bearing.Degrees(30), radiusMetres, Grid: GridShape.Triangular);

    public static SurveyPlan Of(
        Boundary boundary,
        LayoutDesign layout,
        string? stratumField = null,
        IEnumerable<(string Stratum, LayoutDesign Layout)>? stratumLayouts = null,
        Boundary? exclusions = null,
        PilotTable? pilot = null,
        int cells = 2000,
        string name = "Archipelago, sea ducks by boat")
    {
        var design = new SurveyDesign(
            name,
            20270401,
            stratumField,
            [],
            layout,
            (stratumLayouts ?? []).ToImmutableSortedDictionary(pair => pair.Stratum, pair => pair.Layout),
            EffortDesign.None with { TargetCv = pilot is null ? null : 0.2 },
            new CoverageDesign(cells, Replicates: 200));
        return PlanSurvey.Run(design, new SurveyInputs(boundary, exclusions is null ? [] : [exclusions], pilot), new RunOptions());
    }

    // Invented: twelve lines a stratum, counts that differ more than chance alone would have it.
    private static PilotTable InventedPilot(params string[] strata)
    {
        int[] counts = [3, 0, 5, 2, 8, 1, 0, 4, 6, 2, 3, 1];
        return new PilotTable(
            IsPoints: false,
            [.. from stratum in strata from i in Enumerable.Range(0, counts.Length) select new PilotTransect(stratum, $"{stratum}-{i}", 8 + (i % 3), counts[i])],
            []);
    }
}
