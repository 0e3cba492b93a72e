using System.Collections.Immutable;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Records;

/// <summary>
/// Everything a reviewer needs to re-create a layout and see that it is the same. The program adds no absolute path: those tell names of people and machines.
/// </summary>
/// <param name="Run">What made it, on what, and when.</param>
/// <param name="SurveyName">Name of the survey.</param>
/// <param name="Seed">The seed everything random came from.</param>
/// <param name="Generator">The random generator's published name.</param>
/// <param name="Draw">Which draw it was; null where nothing was drawn that counts.</param>
/// <param name="Plan">The plan file.</param>
/// <param name="Inputs">Every other file that was read.</param>
/// <param name="Region">What the boundary was understood to be.</param>
/// <param name="LayoutSha256">SHA-256 of <see cref="TransectsGeoJson.LayoutBytes"/>.</param>
/// <param name="Outputs">The files written beside the record.</param>
/// <param name="Notices">Repairs made and warnings given.</param>
public sealed record SurveyRecord(
    RunInfo Run,
    string SurveyName,
    ulong Seed,
    string Generator,
    DrawNumber? Draw,
    RecordedPlan Plan,
    ImmutableArray<InputFile> Inputs,
    RecordedRegion Region,
    string LayoutSha256,
    ImmutableArray<RecordedOutput> Outputs,
    ImmutableArray<Notice> Notices)
{
    /// <summary>Raised when a key changes its meaning or goes; a new key does not raise it.</summary>
    public const int FormatVersion = 1;

    /// <summary>Salmon, Moraes, Dror and Shaw (2011), "Parallel random numbers: as easy as 1, 2, 3".</summary>
    public const string PhiloxName = "Philox4x32-10";

    /// <summary>The record of a plan that is about to be written into a folder.</summary>
    /// <param name="plan">The plan.</param>
    /// <param name="source">The files it came from.</param>
    /// <param name="draw">Which draw it is; null where nothing is drawn that counts.</param>
    /// <param name="outputs">All other files of the folder.</param>
    /// <param name="folder">The folder, for the way from it to the plan file.</param>
    /// <param name="run">What makes it, on what, and when.</param>
    public static SurveyRecord Of(
        SurveyPlan plan, PlanSource source, DrawNumber? draw, IEnumerable<OutputFile> outputs, string folder, RunInfo run) => new(
            run,
            plan.Design.Name,
            plan.Design.Seed,
            PhiloxName,
            draw,
            RecordedPlan.Of(source, folder),
            source.Inputs,
            new RecordedRegion(
                plan.Region.CoordinateSystem,
                plan.Region.AreaKm2,
                plan.Region.GeodesicAreaKm2,
                plan.Region.Projection.Method,
                plan.Region.Projection.Wkt,
                plan.Region.MaxScaleErrorPercent),
            Hashes.Sha256(TransectsGeoJson.LayoutBytes(plan).Span),
            [.. outputs.Select(output => new RecordedOutput(output.Name, output.Content.Length, output.Sha256))],
            plan.Notices);
}

/// <summary>The plan file in a record.</summary>
/// <param name="File">Where it was, seen from the folder of the record, with forward slashes.</param>
/// <param name="Sha256">SHA-256 of its bytes.</param>
/// <param name="Text">Its text.</param>
/// <param name="CanonicalText">The plan as it was understood, with what the command line changed in it.</param>
public sealed record RecordedPlan(string File, string Sha256, string Text, string CanonicalText)
{
    internal static RecordedPlan Of(PlanSource source, string folder)
    {
        var way = Path.GetRelativePath(Path.GetFullPath(folder), Path.GetFullPath(source.File)).Replace('\\', '/');
        return new RecordedPlan(way, Hashes.Sha256(source.Content.Span), source.Text, source.CanonicalText);
    }
}

/// <summary>What a boundary was understood to be.</summary>
/// <param name="CoordinateSystem">What coordinates it was read in, in words.</param>
/// <param name="AreaKm2">Area in the plane, square kilometres.</param>
/// <param name="GeodesicAreaKm2">Area on the ellipsoid, square kilometres.</param>
/// <param name="ProjectionMethod">Published name of the projection's method.</param>
/// <param name="ProjectionWkt">The projection as WKT 2.</param>
/// <param name="MaxScaleErrorPercent">Largest error of length in the region, percent.</param>
public sealed record RecordedRegion(
    string CoordinateSystem,
    double AreaKm2,
    double GeodesicAreaKm2,
    string ProjectionMethod,
    string ProjectionWkt,
    double MaxScaleErrorPercent);

/// <summary>A file written beside the record.</summary>
public sealed record RecordedOutput(string Name, long Bytes, string Sha256);
