using System.Runtime.InteropServices;
using System.Text;

namespace SurveyPlanner.Files.Folders;

/// <summary>The real disk.</summary>
internal sealed class Disk : IDisk
{
    /// <summary>
    /// Where the system limits the size of files it ends the process by this signal, unless someone hears it: then writing fails
    /// with an error that can be told. 25 on Linux and macOS (signal.h).
    /// </summary>
    private const PosixSignal FileSizeExceeded = (PosixSignal)25;

    private static readonly PosixSignalRegistration? Hearing =
        OperatingSystem.IsWindows() ? null : PosixSignalRegistration.Create(FileSizeExceeded, context => context.Cancel = true);

    public Disk() => _ = Hearing;

    public void MakeFolder(string path) => Directory.CreateDirectory(path);

    public void WriteFile(string path, ReadOnlyMemory<byte> content)
    {
        using var stream = new FileStream(path, FileMode.CreateNew, FileAccess.Write, FileShare.None, bufferSize: 0);
        WriteThrough(stream, content.Span);
    }

    public void MoveFolder(string from, string to) => Directory.Move(from, to);

    public void DeleteFolder(string path) => Directory.Delete(path, recursive: true);

    public void SyncFolder(string path)
    {
        // .NET opens no folders. Some file systems cannot sync one either: then the rename is as safe as they make it.
        if (OperatingSystem.IsWindows())
        {
            return;
        }

        var descriptor = Open([.. Encoding.UTF8.GetBytes(path), 0], ReadOnly);
        if (descriptor >= 0)
        {
            _ = Sync(descriptor);
            _ = Close(descriptor);
        }
    }

    /// <summary>Writes at the stream's position and has it on the disk before returning.</summary>
    public static void WriteThrough(FileStream stream, ReadOnlySpan<byte> content)
    {
        try
        {
            stream.Write(content);
        }
        catch (ArgumentOutOfRangeException limit)
        {
            // What .NET makes of the system's "file too large".
            throw new IOException(limit.Message, DiskTrouble.FileTooBig);
        }

        stream.Flush(flushToDisk: true);
    }

    private const int ReadOnly = 0;

    [DllImport("libc", EntryPoint = "open")]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern int Open(byte[] path, int flags);

    [DllImport("libc", EntryPoint = "fsync")]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern int Sync(int descriptor);

    [DllImport("libc", EntryPoint = "close")]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern int Close(int descriptor);
}
