using System.Globalization;
using System.Text.RegularExpressions;

namespace SurveyPlanner.Files.Folders;

/// <summary>
/// The hidden folder beside a target in which its next content is put together: <c>.NAME.work-PROCESS-RANDOM</c>, holding
/// <c>new</c>, and while the two are being changed over <c>old</c>. A lock in it, which the system lets go when its run dies,
/// tells one at work from one left behind.
/// </summary>
internal sealed partial class WorkFolder : IDisposable
{
    private readonly IDisk _disk;
    private readonly FileStream _lock;

    private WorkFolder(IDisk disk, string path, FileStream @lock) => (_disk, Path, _lock) = (disk, path, @lock);

    public string Path { get; }

    public string New => System.IO.Path.Combine(Path, "new");

    public string Old => OldIn(Path);

    private string Done => System.IO.Path.Combine(Path, "done");

    /// <summary>Clears away what dead runs left, and puts back a target that one of them had moved aside.</summary>
    /// <exception cref="IOException">Another run is at work on the target now, or the system refuses.</exception>
    public static void Recover(IDisk disk, string target) => Recover(disk, target, mine: null);

    private static void Recover(IDisk disk, string target, string? mine)
    {
        foreach (var path in Directory.EnumerateDirectories(Parent(target), "*", new EnumerationOptions { AttributesToSkip = FileAttributes.ReparsePoint }))
        {
            var name = System.IO.Path.GetFileName(path);
            if (path == mine || !name.StartsWith(Prefix(target), StringComparison.Ordinal) || OwnerPattern().Match(name[Prefix(target).Length..]) is not { Success: true } owner)
            {
                continue;
            }

            using var held = TryLock(path, out var isInUse);
            if (isInUse)
            {
                throw new IOException($"another run (process {owner.Groups[1].Value}) is at work on it now; wait for it, or choose another folder");
            }

            if (Directory.Exists(OldIn(path)) && !System.IO.Path.Exists(target))
            {
                disk.MoveFolder(OldIn(path), target);
            }

            held?.Dispose();
            TryDelete(disk, path);
        }
    }

    /// <summary>Makes one for a target; of two runs that begin in the same moment at most one goes on.</summary>
    public static WorkFolder Begin(IDisk disk, string target)
    {
        var random = Guid.NewGuid().ToString("N")[..8];
        var path = System.IO.Path.Combine(Parent(target), $"{Prefix(target)}{Environment.ProcessId.ToString(CultureInfo.InvariantCulture)}-{random}");
        disk.MakeFolder(path);
        FileStream? held = null;
        try
        {
            held = Lock(path, FileMode.CreateNew);
            Recover(disk, target, path);
            return new WorkFolder(disk, path, held);
        }
        catch (DirectoryNotFoundException exception)
        {
            // Seen by another run before the lock was in it, and cleared away as left behind.
            throw new IOException("another run for it began in the same moment; start again", exception);
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            held?.Dispose();
            TryDelete(disk, path);
            throw;
        }
    }

    /// <summary>Marks the old content as no longer wanted: from here on it is never put back.</summary>
    public void DropOld() => _disk.MoveFolder(Old, Done);

    /// <summary>Deletes the folder. It stays only if it still holds the old content, for the next run to put back.</summary>
    public void Dispose()
    {
        _lock.Dispose();
        if (!Directory.Exists(Old))
        {
            TryDelete(_disk, Path);
        }
    }

    private static FileStream? TryLock(string path, out bool isInUse)
    {
        isInUse = false;
        try
        {
            return Lock(path, FileMode.Open);
        }
        catch (Exception exception) when (exception is FileNotFoundException or DirectoryNotFoundException)
        {
            return null;
        }
        catch (IOException)
        {
            isInUse = true;
            return null;
        }
    }

    private static FileStream Lock(string path, FileMode mode) =>
        new(System.IO.Path.Combine(path, "lock"), mode, FileAccess.ReadWrite, FileShare.None, bufferSize: 0);

    /// <summary>What cannot be deleted now is deleted by the next run: no reason to fail one whose files are in place.</summary>
    private static void TryDelete(IDisk disk, string path)
    {
        try
        {
            disk.DeleteFolder(path);
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
        }
    }

    private static string OldIn(string path) => System.IO.Path.Combine(path, "old");

    private static string Parent(string target) => System.IO.Path.GetDirectoryName(target)!;

    private static string Prefix(string target) => $".{System.IO.Path.GetFileName(target)}.work-";

    [GeneratedRegex("^([0-9]+)-[0-9a-f]{8}$")]
    private static partial Regex OwnerPattern();
}
