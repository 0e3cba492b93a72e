using System.Runtime.CompilerServices;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>Where the reference data of the repository stand, whatever folder the tests run in.</summary>
internal static class ReferenceFiles
{
    public static string Region(string name) => Path.Combine(Root(), "regions", name);

    public static string Dirty(string name) => Path.Combine(Root(), "regions", "dirty", name);

    public static string CoordinateSystems(string name) => Path.Combine(Root(), "coordinate-systems", name);

    private static string Root([CallerFilePath] string here = "")
        => Path.GetFullPath(Path.Combine(Path.GetDirectoryName(here)!, "..", "..", "reference-data"));
}
