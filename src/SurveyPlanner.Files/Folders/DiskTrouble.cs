namespace SurveyPlanner.Files.Folders;

/// <summary>What the system says when it cannot write, as one plain sentence.</summary>
internal static class DiskTrouble
{
    // Error numbers of Linux and macOS as .NET hands them on, and the Windows code for a full disk.
    public const int FileTooBig = 27;
    private const int NoSpace = 28;
    private const int ReadOnlyFileSystem = 30;
    private const int OverQuotaLinux = 122;
    private const int OverQuotaMac = 69;
    private const int WindowsDiskFull = unchecked((int)0x80070070);

    /// <summary>Whether it is trouble with the disk, which is neither our fault nor the input's.</summary>
    public static bool Is(Exception exception) => exception is IOException or UnauthorizedAccessException;

    /// <summary>A file that cannot be read.</summary>
    public static IOException Unread(string file, Exception trouble) => trouble switch
    {
        FileNotFoundException or DirectoryNotFoundException => new IOException($"{file} does not exist: give the path of a file that does.", trouble),
        UnauthorizedAccessException => new IOException($"{file} cannot be read: there is no permission, or it is a folder.", trouble),
        _ => new IOException($"{file} cannot be read: {Plain(trouble)}.", trouble),
    };

    /// <summary>Something that cannot be written.</summary>
    public static IOException Unwritten(string what, Exception trouble)
    {
        var reason = trouble switch
        {
            PathTooLongException => "the name is too long; choose a shorter one",
            UnauthorizedAccessException => "there is no permission to write there; choose a folder of your own",
            FileNotFoundException => "the system lets nothing be made there; choose a folder of your own",
            DirectoryNotFoundException => "the folder it should be in does not exist; make it first",
            { HResult: NoSpace or WindowsDiskFull } => "the disk is full; make room or choose another disk",
            { HResult: OverQuotaLinux or OverQuotaMac } => "your share of the disk is used up; make room or choose another disk",
            { HResult: FileTooBig } => "the system does not allow a file of that size",
            { HResult: ReadOnlyFileSystem } => "the disk is read-only; choose another",
            _ => Plain(trouble),
        };
        return new IOException($"{what}: {reason}.", trouble);
    }

    private static string Plain(Exception trouble) => trouble.Message.ReplaceLineEndings(" ").TrimEnd('.');
}
