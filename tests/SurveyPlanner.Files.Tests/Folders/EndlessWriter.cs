using System.Diagnostics;
using System.Runtime.CompilerServices;
using System.Text;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Tests.Folders;

/// <summary>A child process that replaces one folder again and again until it is killed: this test program under another hat.</summary>
internal static class EndlessWriter
{
    private const string TargetVariable = "SURVEY_PLANNER_TEST_ENDLESS_TARGET";

    public static readonly string[] Names = [OutputNames.Summary, OutputNames.Waypoints, OutputNames.TransectsGpx];

    public static OutputFile[] Files(string content) =>
        [.. Names.Select(name => new OutputFile(name, Encoding.UTF8.GetBytes(content)))];

    public static void Write(string target, OutputFile[] files)
    {
        using var folder = OutputFolder.Reserve(target, force: true);
        folder.Write(files);
    }

    /// <summary>Starts the child and returns once it has written the folder for the first time.</summary>
    public static Process Start(string target)
    {
        var self = Environment.ProcessPath!;
        var isHost = Path.GetFileNameWithoutExtension(self) == "dotnet";
        var start = new ProcessStartInfo(self, isHost ? [typeof(EndlessWriter).Assembly.Location] : []) { RedirectStandardOutput = true };
        start.Environment[TargetVariable] = target;
        var child = Process.Start(start)!;
        child.StandardOutput.ReadLine();
        return child;
    }

    [ModuleInitializer]
    public static void RunIfAskedTo()
    {
        if (Environment.GetEnvironmentVariable(TargetVariable) is not { Length: > 0 } target)
        {
            return;
        }

        for (var round = 0; ; round++)
        {
            Write(target, Files(new string((char)('a' + (round % 26)), 20_000)));
            if (round == 0)
            {
                Console.WriteLine("written");
            }
        }
    }
}
