using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Cli;

/// <summary>The folder a command writes: what stands in its way is said before any work is done.</summary>
internal sealed class OutputTarget
{
    private readonly string _folder;
    private readonly bool _force;

    public OutputTarget(string folder, bool force)
    {
        (_folder, _force) = (folder, force);
        if (Directory.Exists(Parent))
        {
            OutputFolder.Check(folder, force);
        }
    }

    /// <summary>Folders above it are made only now, so that a run that fails leaves none behind.</summary>
    public void Write(IReadOnlyCollection<OutputFile> files, CancellationToken stop)
    {
        Directory.CreateDirectory(Parent);
        OutputFolder.Write(_folder, files, _force, stop);
    }

    private string Parent => Path.GetDirectoryName(Path.TrimEndingDirectorySeparator(Path.GetFullPath(_folder))) ?? _folder;
}
