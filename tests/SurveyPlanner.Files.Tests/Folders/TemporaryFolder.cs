namespace SurveyPlanner.Files.Tests.Folders;

/// <summary>A folder that is gone after the test.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    public string Path { get; } = Directory.CreateTempSubdirectory("survey-planner-test-").FullName;

    /// <summary>Everything in it, as sorted paths from it.</summary>
    public string[] Entries => [.. Directory
        .EnumerateFileSystemEntries(Path, "*", new EnumerationOptions { RecurseSubdirectories = true, AttributesToSkip = FileAttributes.None })
        .Select(entry => System.IO.Path.GetRelativePath(Path, entry))
        .Order(StringComparer.Ordinal)];

    public string At(params string[] names) => System.IO.Path.Combine([Path, .. names]);

    public void Dispose() => Directory.Delete(Path, recursive: true);
}
