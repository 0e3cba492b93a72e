using System.Collections.Immutable;
using System.Security.Cryptography;
using SurveyPlanner.Files;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Files.Plans;
using SurveyPlanner.Files.Records;
using SurveyPlanner.Files.Tables;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Cli;

/// <summary>A plan file with everything it names read.</summary>
/// <param name="File">The plan file.</param>
/// <param name="Design">Its design, a seed always filled in.</param>
/// <param name="SeedFromSystem">Whether the seed was taken from the system, because neither plan nor command line gave one.</param>
/// <param name="Inputs">The files it names, read.</param>
/// <param name="Source">The same files as the record keeps them.</param>
internal sealed record LoadedPlan(PlanFile File, SurveyDesign Design, bool SeedFromSystem, SurveyInputs Inputs, PlanSource Source)
{
    private static readonly string[] BoundaryEndings = [".geojson", ".json", ".kml", ".kmz", ".gpkg", ".shp", ".zip", ".csv"];

    /// <summary>Reads a plan file and all that it names.</summary>
    public static LoadedPlan Read(string path, IReadOnlyList<string> sets)
    {
        if (BoundaryEndings.Contains(Path.GetExtension(path).ToLowerInvariant()) && System.IO.File.Exists(path))
        {
            throw new InputException(new Problem($"this is a boundary file, not a plan; make a plan for it with: survey-planner new {Usage.Typed(path)}", path));
        }

        var files = new InputFiles();
        var plan = PlanFileReader.Read(path, sets, files);
        return Complete(plan, files.Bytes(path), files);
    }

    /// <summary>The plan of a record, its inputs taken from a folder.</summary>
    /// <exception cref="InputException">An input is not, or no longer, the one that the record tells of.</exception>
    public static LoadedPlan FromRecord(SurveyRecord record, string folder)
    {
        var path = Path.Combine(folder, Path.GetFileName(record.Plan.File));
        var seed = record.Seed.ToString(System.Globalization.CultureInfo.InvariantCulture);
        var file = PlanFileReader.Parse(record.Plan.CanonicalText, path, [$"survey.seed={seed}"]);
        var loaded = Complete(file, System.Text.Encoding.UTF8.GetBytes(record.Plan.Text), new InputFiles());
        Replay.RequireRecorded(record, loaded.Source.Inputs);
        return loaded;
    }

    private static LoadedPlan Complete(PlanFile file, byte[] content, InputFiles files)
    {
        var boundary = BoundarySet.Read(file.BoundaryPaths, file.Layers, file.Crs, files.Under("region.boundary"));
        var closed = files.Under("region.exclusions");
        var exclusions = file.ExclusionPaths.Select(path => BoundaryReader.Read(path, new BoundaryOptions(), closed)).ToImmutableArray();
        var lines = LinesToCross(file, files.Under("layout.bearing"));
        var pilot = file.PilotTransectsPath is { } transects ? PilotTableReader.Read(transects, file.PilotDetectionsPath, files) : null;
        var design = file.Design with
        {
            Layout = WithLines(file.Design.Layout, lines),
            StratumLayouts = file.Design.StratumLayouts.ToImmutableSortedDictionary(pair => pair.Key, pair => WithLines(pair.Value, lines)),
            Seed = file.SeedGiven ? file.Design.Seed : SeedOfSystem(),
            StratumField = file.Design.StratumField ?? boundary.StratumField,
        };
        return new LoadedPlan(
            file,
            design,
            !file.SeedGiven,
            new SurveyInputs(boundary.Boundary, exclusions, pilot),
            new PlanSource(file.Path, content, file.CanonicalText, InputsOf(file, files)));
    }

    /// <summary>The files of lines that layouts run across.</summary>
    private static ImmutableSortedDictionary<string, ImmutableArray<ImmutableArray<LonLat>>> LinesToCross(PlanFile file, InputFiles files)
        => file.Design.StratumLayouts.Values.Prepend(file.Design.Layout)
            .Select(layout => layout.Bearing)
            .OfType<Bearing.AcrossFile>()
            .Select(bearing => bearing.Path)
            .Distinct()
            .ToImmutableSortedDictionary(path => path, path => LineFile.Read(Resolved(file, path), files), StringComparer.Ordinal);

    private static string Resolved(PlanFile file, string path) => Path.Combine(Path.GetDirectoryName(file.Path) ?? "", path);

    private static LayoutDesign WithLines(LayoutDesign design, ImmutableSortedDictionary<string, ImmutableArray<ImmutableArray<LonLat>>> lines)
        => design.Bearing is Bearing.AcrossFile across ? design with { Bearing = new Bearing.Across(lines[across.Path]) } : design;

    /// <summary>Short enough to be read out over a radio, long enough that nobody meets the same one twice.</summary>
    private static ulong SeedOfSystem() => (ulong)RandomNumberGenerator.GetInt32(1_000_000, int.MaxValue);

    /// <summary>Every file that was read beside the plan, its path seen from the plan's folder.</summary>
    private static ImmutableArray<InputFile> InputsOf(PlanFile file, InputFiles files)
    {
        var folder = Path.GetDirectoryName(Path.GetFullPath(file.Path))!;
        return
        [
            .. files.Read.Select(read => InputFile.Of(
                read.Key, Path.GetRelativePath(folder, Path.GetFullPath(read.Path)).Replace('\\', '/'), read.Content.Span)),
        ];
    }
}
