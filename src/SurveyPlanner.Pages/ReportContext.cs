using System.Collections.Immutable;

namespace SurveyPlanner.Pages;

/// <summary>
/// What the report tells besides the plan itself. Holds no time of day: the same plan gives the same bytes.
/// </summary>
/// <param name="PlanFileName">The plan file as the user named it.</param>
/// <param name="DrawLine">Which draw under this plan this is: <c>draw 1 of 1</c>.</param>
/// <param name="Version">Version of the program.</param>
public sealed record ReportContext(string PlanFileName, string DrawLine, string Version)
{
    /// <summary>Files that the plan was made from, with their SHA-256 in hexadecimal.</summary>
    public ImmutableArray<InputFile> Inputs { get; init; } = [];

    /// <summary>SHA-256 of the layout as the record holds it; null when there is none.</summary>
    public string? LayoutSha256 { get; init; }

    /// <summary>The record beside the report, which <c>replay</c> reads.</summary>
    public string RecordFileName { get; init; } = "record.json";

    /// <summary>Whether scale bars count in nautical miles, because the plan does.</summary>
    public bool UsesNauticalMiles { get; init; }
}

/// <summary>A file that went into a plan.</summary>
/// <param name="Name">As the user named it.</param>
/// <param name="Sha256">SHA-256 of its bytes, hexadecimal.</param>
public sealed record InputFile(string Name, string Sha256);
