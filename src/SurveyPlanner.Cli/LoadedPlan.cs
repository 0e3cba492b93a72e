using System.Collections.Immutable;
using System.Security.Cryptography;
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
            throw new InputException(new Problem($"this is a boundary file, not a plan; make a plan for it with: survey-planner new {path}", path));
        }

        return Complete(PlanFileReader.Read(path, sets), System.IO.File.ReadAllBytes(path));
    }

    /// <summary>The plan of a record, its inputs taken from a folder.</summary>
    public static LoadedPlan FromRecord(SurveyRecord record, string folder)
    {
        var path = Path.Combine(folder, Path.GetFileName(record.Plan.File));
        var seed = record.Seed.ToString(System.Globalization.CultureInfo.InvariantCulture);
        var file = PlanFileReader.Parse(record.Plan.CanonicalText, path, [$"survey.seed={seed}"]);
        return Complete(file, System.Text.Encoding.UTF8.GetBytes(record.Plan.Text));
    }

    private static LoadedPlan Complete(PlanFile file, byte[] content)
    {
        var boundary = BoundarySet.Read(file.BoundaryPaths, file.Layers, file.Crs);
        var exclusions = file.ExclusionPaths.Select(path => BoundaryReader.Read(path, new BoundaryOptions())).ToImmutableArray();
        var pilot = file.PilotTransectsPath is { } transects ? PilotTableReader.Read(transects, file.PilotDetectionsPath) : null;
        var lines = LinesToCross(file);
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
            new PlanSource(file.Path, content, file.CanonicalText, InputFiles(file)));
    }

    /// <summary>The files of lines that layouts run across, each read once.</summary>
    private static ImmutableSortedDictionary<string, ImmutableArray<ImmutableArray<LonLat>>> LinesToCross(PlanFile file)
        => file.Design.StratumLayouts.Values.Prepend(file.Design.Layout)
            .Select(layout => layout.Bearing)
            .OfType<Bearing.AcrossFile>()
            .Select(bearing => bearing.Path)
            .Distinct()
            .ToImmutableSortedDictionary(path => path, path => LineFile.Read(Resolved(file, path)), StringComparer.Ordinal);

    private static string Resolved(PlanFile file, string path) => Path.Combine(Path.GetDirectoryName(file.Path) ?? "", path);

    private static LayoutDesign WithLines(LayoutDesign design, ImmutableSortedDictionary<string, ImmutableArray<ImmutableArray<LonLat>>> lines)
        => design.Bearing is Bearing.AcrossFile across ? design with { Bearing = new Bearing.Across(lines[across.Path]) } : design;

    /// <summary>Short enough to be read out over a radio, long enough that nobody meets the same one twice.</summary>
    private static ulong SeedOfSystem() => (ulong)RandomNumberGenerator.GetInt32(1_000_000, int.MaxValue);

    private static ImmutableArray<InputFile> InputFiles(PlanFile file)
    {
        var named = file.BoundaryPaths.Select(path => (Key: "region.boundary", Path: (string?)path)).ToList();
        named.AddRange(file.ExclusionPaths.Select(path => ("region.exclusions", (string?)path)));
        named.AddRange(LinesToCross(file).Keys.Select(path => ("layout.bearing", (string?)Resolved(file, path))));
        named.Add(("pilot.transects", file.PilotTransectsPath));
        named.Add(("pilot.detections", file.PilotDetectionsPath));
        var folder = Path.GetDirectoryName(Path.GetFullPath(file.Path))!;
        return
        [
            .. from entry in named
               where entry.Path is not null
               from part in Parts(entry.Path!)
               select InputFile.Of(
                   entry.Key,
                   Path.GetRelativePath(folder, Path.GetFullPath(part)).Replace('\\', '/'),
                   System.IO.File.ReadAllBytes(part)),
        ];
    }

    /// <summary>A boundary may be a folder, or a shapefile with its companions: every file of it counts.</summary>
    private static IEnumerable<string> Parts(string path)
    {
        if (Directory.Exists(path))
        {
            return Directory.EnumerateFiles(path).Order(StringComparer.Ordinal);
        }

        if (!path.EndsWith(".shp", StringComparison.OrdinalIgnoreCase))
        {
            return [path];
        }

        var stem = Path.GetFileNameWithoutExtension(path);
        return Directory.EnumerateFiles(Path.GetDirectoryName(Path.GetFullPath(path))!)
            .Where(file => Path.GetFileNameWithoutExtension(file) == stem)
            .Order(StringComparer.Ordinal);
    }
}
