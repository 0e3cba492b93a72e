using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Pages.Report;

/// <summary>The tables of the section on effort.</summary>
internal static class EffortTables
{
    /// <summary>The curve at the ticks of its axis, at the effort required and at the effort drawn.</summary>
    public static Table OfCurve(SurveyPlan plan, EffortPlan effort, Axis axis) => new(
        "Precision by effort",
        [new(EffortWords.Unit(effort, capital: true), false), new("CV, %"), new("Expected detections"), new("Remark", false)],
        [
            .. axis.Ticks.Select(tick => (Effort: tick, Remark: ""))
                .Append((Effort: effort.Required?.Effort ?? 0, Remark: "target"))
                .Append((Effort: plan.Delivered?.Effort ?? 0, Remark: "layout as drawn"))
                .OrderBy(row => row.Effort)
                .Select(row => (row.Remark, Precision: effort.CvAt(row.Effort)))
                .Where(row => row.Precision is not null)
                .Select(row => (string[])
                [
                    Figures.Three(row.Precision!.Effort), Figures.Three(100 * row.Precision.Cv), Figures.Three(row.Precision.ExpectedDetections), row.Remark,
                ]),
        ]);

    public static Table OfComponents(EffortPrecision delivered) => new(
        "Where the uncertainty of the layout as drawn comes from",
        [new("Component", false), new("CV, %"), new("Degrees of freedom"), new("Share of CV², %")],
        [
            .. delivered.Decomposition.Components.Select(component => (string[])
            [
                Name(component.Source), Figures.Three(100 * component.Cv), Freedom(component.DegreesOfFreedom), Figures.Three(100 * component.Share),
            ]),
            ["together", Figures.Three(100 * delivered.Cv), Freedom(delivered.Decomposition.DegreesOfFreedom), "100"],
        ]);

    public static Table OfStrata(EffortPlan effort) => new(
        "Effort by stratum",
        [
            new("Stratum", false), new(effort.IsPoints ? "Detections per visit" : "Detections per km"), new("Share of effort, %"),
            new(EffortWords.Unit(effort, capital: true)), new("Expected detections"), new("CV of its own density, %"), new("Effort for the target in itself"),
        ],
        [
            .. effort.Strata.Select(stratum => (string[])
            [
                stratum.Name,
                Figures.Three(stratum.EncounterRate),
                Figures.Three(100 * stratum.Share),
                Figures.Three(stratum.Effort),
                Figures.Three(stratum.ExpectedDetections),
                Figures.Three(100 * stratum.Cv),
                Figures.Three(stratum.EffortForOwnTarget),
            ]),
        ]);

    public static Table OfPilot(PilotFigures pilot) => new(
        "The pilot",
        [
            new("Stratum", false), new("Transects"), new(pilot.IsPoints ? "Visits" : "Length, km"), new("Detections"),
            new(pilot.IsPoints ? "Detections per visit" : "Detections per km"), new("CV of that, %"), new("Degrees of freedom"), new("Variance-to-mean ratio"),
        ],
        [
            .. pilot.Strata.Select(stratum => PilotRow(stratum.Stratum.Length == 0 ? "whole region" : stratum.Stratum, stratum.EncounterRate)),
            .. pilot.Strata.Length > 1 ? [PilotRow("together", pilot.Pooled)] : Array.Empty<string[]>(),
        ]);

    private static string[] PilotRow(string name, EncounterRate rate) =>
    [
        name,
        Figures.Count(rate.Transects),
        Figures.Three(rate.Effort),
        Figures.Count(rate.Count),
        Figures.Three(rate.Rate),
        Figures.Three(100 * rate.Cv),
        rate.DegreesOfFreedom is null ? Figures.None : Freedom(rate.DegreesOfFreedom),
        Figures.Three(rate.Dispersion),
    ];

    private static string Freedom(double? degrees) => degrees is null ? "many" : Figures.Three(degrees);

    private static string Name(CvSource source) => source switch
    {
        CvSource.EncounterRate => "encounter rate",
        CvSource.Detection => "detection",
        CvSource.ClusterSize => "cluster size",
        CvSource.EncounterRateAndDetection => "encounter rate and detection",
        _ => throw new ArgumentOutOfRangeException(nameof(source), source, null),
    };
}
