namespace SurveyPlanner;

/// <summary>Files under tests/reference-data, found from wherever the tests run.</summary>
internal static class ReferenceData
{
    /// <summary>The repository's root: the folder above the test assembly that holds the solution.</summary>
    public static string Root { get; } = FindRoot();

    public static string Path(params string[] parts) => System.IO.Path.Combine([Root, "tests", "reference-data", .. parts]);

    private static string FindRoot()
    {
        var folder = AppContext.BaseDirectory;
        while (!File.Exists(System.IO.Path.Combine(folder, "SurveyPlanner.sln")))
        {
            folder = System.IO.Path.GetDirectoryName(folder.TrimEnd('/')) ?? throw new InvalidOperationException("SurveyPlanner.sln is not above the tests");
        }

        return folder;
    }
}
