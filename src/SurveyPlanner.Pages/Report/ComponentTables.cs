using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Report;

/// <summary>The coefficient of variation by component: in the pilot, at the effort required, and as drawn.</summary>
internal static class ComponentTables
{
    /// <summary>What the bars and the sentence are about: the layout as drawn, or else the effort required, or else the pilot.</summary>
    public static (string Of, CvDecomposition Parts)? Main(SurveyPlan plan, EffortPlan effort)
        => plan.Delivered is { } delivered ? ("the layout as drawn", delivered.Decomposition)
            : effort.Required is { } required ? ("the effort required", required.Precision.Decomposition)
            : effort.PilotCv is { } pilot ? ("the pilot", pilot)
            : null;

    public static Table Of(SurveyPlan plan, EffortPlan effort)
    {
        var shown = new (string Name, CvDecomposition? Parts)[]
        {
            ("Pilot", effort.PilotCv), ("Required", effort.Required?.Precision.Decomposition), ("As drawn", plan.Delivered?.Decomposition),
        }.Where(one => one.Parts is not null).Select(one => (one.Name, Parts: one.Parts!)).ToArray();
        var sources = shown.SelectMany(one => one.Parts.Components).Select(component => component.Source).Distinct().Order();
        return new Table(
            "Coefficient of variation of density by component, with its degrees of freedom",
            [new("Component", false), .. shown.SelectMany(one => (Column[])[new($"{one.Name}: CV, %"), new($"{one.Name}: share of CV², %"), new($"{one.Name}: degrees of freedom")])],
            [
                .. sources.Select(source => (string[])[Name(source), .. shown.SelectMany(one => Cells(one.Parts, source))]),
                ["together", .. shown.SelectMany(one => (string[])[Figures.Three(100 * one.Parts.Cv), "100", Freedom(one.Parts.DegreesOfFreedom)])],
                ["95\u00a0% interval, times and divided by", .. shown.SelectMany(one => (string[])[Figures.Three(one.Parts.IntervalFactor), "", ""])],
            ]);
    }

    public static NamedBars Bars(string of, CvDecomposition parts) => new(
        "Shares of the squared coefficient of variation",
        Finding(of, parts) + " The table has the figures.",
        "Share of CV², %",
        [.. parts.Components.Where(component => component.Share is not null).Select(component => (Name(component.Source), 100 * component.Share!.Value, Figures.Percent(component.Share)))]);

    /// <summary>The largest component, and what lowers it.</summary>
    public static string Finding(string of, CvDecomposition parts)
    {
        var largest = parts.Components.MaxBy(component => component.Share ?? 0)!;
        var remedy = largest.Source switch
        {
            CvSource.Detection when largest.DegreesOfFreedom is null => "more effort does not lower what is taken over from elsewhere",
            CvSource.Detection => "more detections lower it",
            CvSource.ClusterSize => "more detections lower it",
            _ => "more transects lower it",
        };
        return $"Of the squared coefficient of variation of {of}, {Figures.Percent(largest.Share)} come from {Name(largest.Source)}; {remedy}.";
    }

    /// <summary>Degrees of freedom, which are many where they are not known to be few.</summary>
    public static string Freedom(double? degrees) => degrees is null ? "many" : Figures.Three(degrees);

    private static string[] Cells(CvDecomposition parts, CvSource source) => parts.Components.FirstOrDefault(component => component.Source == source) is { } one
        ? [Figures.Three(100 * one.Cv), Figures.Three(100 * one.Share), Freedom(one.DegreesOfFreedom)]
        : [Figures.None, Figures.None, Figures.None];

    private static string Name(CvSource source) => source switch
    {
        CvSource.EncounterRate => "encounter rate",
        CvSource.Detection => "detection",
        CvSource.ClusterSize => "cluster size",
        CvSource.EncounterRateAndDetection => "encounter rate and detection",
        _ => throw new ArgumentOutOfRangeException(nameof(source), source, null),
    };
}
