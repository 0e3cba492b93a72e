using System.Runtime.InteropServices;

namespace SurveyPlanner.Files.Records;

/// <summary>What made a record, on what, and when: all that may differ between two runs that do the same.</summary>
/// <param name="ProgramVersion">Version of this program.</param>
/// <param name="Runtime">Version of .NET.</param>
/// <param name="OperatingSystem">Operating system and processor.</param>
/// <param name="MadeUtc">Time of making, to the second.</param>
public sealed record RunInfo(string ProgramVersion, string Runtime, string OperatingSystem, DateTimeOffset MadeUtc)
{
    /// <summary>This run, by the clock that is passed in.</summary>
    public static RunInfo Of(string programVersion, TimeProvider clock)
    {
        var now = clock.GetUtcNow();
        return new RunInfo(
            programVersion,
            RuntimeInformation.FrameworkDescription,
            $"{RuntimeInformation.OSDescription} {RuntimeInformation.OSArchitecture}",
            now.AddTicks(-(now.Ticks % TimeSpan.TicksPerSecond)));
    }
}
