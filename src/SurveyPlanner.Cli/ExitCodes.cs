namespace SurveyPlanner.Cli;

/// <summary>What the process returns; documented in docs/getting-started.md.</summary>
internal static class ExitCodes
{
    public const int Done = 0;

    /// <summary>A fault of the program.</summary>
    public const int OurFault = 1;

    /// <summary>The command line was not understood.</summary>
    public const int CommandLine = 2;

    /// <summary>The input, or the design it asks for, cannot work.</summary>
    public const int Input = 3;

    /// <summary>Something could not be read or written.</summary>
    public const int ReadOrWrite = 4;

    /// <summary>Stopped by the user.</summary>
    public const int Interrupted = 130;
}
