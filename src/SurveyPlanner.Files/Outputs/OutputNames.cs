using System.Collections.Immutable;

namespace SurveyPlanner.Files.Outputs;

/// <summary>Names of the files this program writes into an output folder.</summary>
public static class OutputNames
{
    public const string TransectsGeoJson = "transects.geojson";
    public const string TransectsGpx = "transects.gpx";
    public const string TransectsKml = "transects.kml";
    public const string SurveyGeoPackage = "survey.gpkg";
    public const string Waypoints = "waypoints.csv";
    public const string Coverage = "coverage.csv";
    public const string CoverageAt = "coverage-at.csv";
    public const string Summary = "summary.json";
    public const string Report = "report.html";
    public const string Record = "record.json";

    /// <summary>All of them: an output folder that holds anything else is not ours to delete.</summary>
    public static readonly ImmutableHashSet<string> All =
    [
        TransectsGeoJson, TransectsGpx, TransectsKml, SurveyGeoPackage, Waypoints, Coverage, CoverageAt, Summary, Report, Record,
    ];
}
