using System.Collections.Immutable;
using System.Reflection;
using System.Text;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Files.Records;
using SurveyPlanner.Pages;

namespace SurveyPlanner.Cli;

/// <summary>From a plan to the files of its folder.</summary>
internal static class DrawnPlan
{
    public static string Version { get; } =
        typeof(DrawnPlan).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()!.InformationalVersion;

    /// <summary>Counts the draw beside the plan file; it is taken back unless kept.</summary>
    public static DrawsFile Count(SurveyPlan plan, LoadedPlan loaded) => DrawsFile.Add(
        loaded.File.Path,
        new Draw(
            Hashes.Sha256(Encoding.UTF8.GetBytes(loaded.File.CanonicalText)),
            plan.Design.Seed,
            Hashes.Sha256(TransectsGeoJson.LayoutBytes(plan).Span)));

    /// <summary>All files of the folder, the record last.</summary>
    public static ImmutableArray<OutputFile> Files(SurveyPlan plan, LoadedPlan loaded, DrawNumber draw, string folder, bool withReport)
    {
        var files = SurveyFiles.Of(plan, draw.Number);
        if (withReport)
        {
            files = files.Add(Report(plan, loaded, draw));
        }

        var run = RunInfo.Of(Version, TimeProvider.System);
        return files.Add(RecordWriter.Write(SurveyRecord.Of(plan, loaded.Source, draw, files, folder, run)));
    }

    /// <summary>The report alone.</summary>
    public static OutputFile Report(SurveyPlan plan, LoadedPlan loaded, DrawNumber draw)
    {
        var context = new ReportContext(Path.GetFileName(loaded.File.Path), draw.ToString(), Version)
        {
            Inputs = [.. loaded.Source.Inputs.Select(input => new SurveyPlanner.Pages.InputFile(input.Path, input.Sha256))],
            LayoutSha256 = Hashes.Sha256(TransectsGeoJson.LayoutBytes(plan).Span),
            UsesNauticalMiles = loaded.File.CanonicalText.Contains(" nmi\"", StringComparison.Ordinal),
        };
        return new OutputFile(OutputNames.Report, Encoding.UTF8.GetBytes(ReportRenderer.Render(plan, context)));
    }
}
