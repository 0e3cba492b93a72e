using System.Collections.Immutable;

namespace SurveyPlanner.Files.Outputs;

/// <summary>All files that are made from the plan alone; the report and the record are added by who makes them.</summary>
public static class SurveyFiles
{
    /// <param name="plan">The plan.</param>
    /// <param name="draw">Which draw under this plan it is; null for work that draws nothing that counts.</param>
    public static ImmutableArray<OutputFile> Of(SurveyPlan plan, int? draw)
    {
        OutputFile?[] files =
        [
            TransectsGeoJson.Write(plan),
            TransectsGpx.Write(plan),
            TransectsKml.Write(plan),
            SurveyGeoPackage.Write(plan),
            WaypointsCsv.Write(plan),
            CoverageCsv.Write(plan),
            SummaryWriter.Write(plan, draw),
        ];
        return [.. files.OfType<OutputFile>()];
    }
}
