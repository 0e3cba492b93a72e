using System.Collections.Immutable;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Folders;

/// <summary>
/// A folder of outputs, written whole or not at all: put together in a hidden folder beside it, on the disk before it is renamed.
/// A run that is killed leaves the target as it was; the next run for the same target clears away what it left.
/// </summary>
public static class OutputFolder
{
    /// <summary>Refuses, before any work is done, what <see cref="Write(string, IReadOnlyCollection{OutputFile}, bool, CancellationToken)"/> would refuse.</summary>
    /// <param name="path">The folder to write, as the user named it.</param>
    /// <param name="force">Whether a folder of an earlier run may be replaced.</param>
    /// <exception cref="IOException">One sentence that says what stands in the way.</exception>
    public static void Check(string path, bool force) => Begin(path, force, OutputNames.All, new Disk(), (_, _) => { });

    /// <summary>Writes the folder.</summary>
    /// <param name="path">The folder to write, as the user named it; its parent must exist.</param>
    /// <param name="files">Its files; names without folders, all different.</param>
    /// <param name="force">Whether a folder of an earlier run may be replaced. One with anything else in it never is.</param>
    /// <param name="cancellation">Stops the writing, and nothing is left of it.</param>
    /// <exception cref="IOException">One sentence that says what stands in the way; what was there before is there still.</exception>
    public static void Write(string path, IReadOnlyCollection<OutputFile> files, bool force, CancellationToken cancellation = default) =>
        Write(path, files, force, new Disk(), cancellation);

    internal static void Write(string path, IReadOnlyCollection<OutputFile> files, bool force, IDisk disk, CancellationToken cancellation)
    {
        RequirePlainNames(files);
        Begin(path, force, OutputNames.All.Union(files.Select(file => file.Name)), disk, (work, target) =>
        {
            disk.MakeFolder(work.New);
            foreach (var file in files)
            {
                cancellation.ThrowIfCancellationRequested();
                disk.WriteFile(Path.Combine(work.New, file.Name), file.Content);
            }

            disk.SyncFolder(work.New);
            cancellation.ThrowIfCancellationRequested();
            ChangeOver(disk, work, target, force);
            disk.SyncFolder(Path.GetDirectoryName(target)!);
        });
    }

    /// <summary>Does something with a work folder once nothing stands in the target's way.</summary>
    private static void Begin(string path, bool force, ImmutableHashSet<string> ours, IDisk disk, Action<WorkFolder, string> write)
    {
        var target = Target(path);
        RefuseLinkOrFile(path, target);
        InOneSentence(path, () => WorkFolder.Recover(disk, target));
        RefuseFolder(path, target, force, ours);
        InOneSentence(path, () =>
        {
            using var work = WorkFolder.Begin(disk, target);
            write(work, target);
        });
    }

    private static void InOneSentence(string path, Action action)
    {
        try
        {
            action();
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            throw DiskTrouble.Unwritten($"Cannot write {path}", exception);
        }
    }

    private static void ChangeOver(IDisk disk, WorkFolder work, string target, bool force)
    {
        var isReplacing = force && Directory.Exists(target);
        if (isReplacing)
        {
            disk.MoveFolder(target, work.Old);
        }

        try
        {
            disk.MoveFolder(work.New, target);
        }
        catch when (isReplacing)
        {
            disk.MoveFolder(work.Old, target);
            throw;
        }

        if (isReplacing)
        {
            try
            {
                work.DropOld();
            }
            catch (Exception exception) when (DiskTrouble.Is(exception))
            {
                // The new files are in place; the old ones wait in the hidden folder for the next run to delete.
            }
        }
    }

    private static string Target(string path)
    {
        if (string.IsNullOrWhiteSpace(path) || path.Contains('\0', StringComparison.Ordinal))
        {
            throw new IOException("The output folder has no name: give one.");
        }

        var target = Path.TrimEndingDirectorySeparator(Path.GetFullPath(path));
        if (Path.GetDirectoryName(target) is not { } parent)
        {
            throw new IOException($"{path} is the root of a disk: name a folder in it.");
        }

        return Directory.Exists(parent)
            ? target
            : throw new IOException($"The folder {parent}, in which {Path.GetFileName(target)} is to be made, does not exist: make it first.");
    }

    private static void RefuseLinkOrFile(string path, string target)
    {
        if (new FileInfo(target).LinkTarget is not null)
        {
            throw new IOException($"{path} is a link to somewhere else: name the folder itself, or another one.");
        }

        if (File.Exists(target))
        {
            throw new IOException($"{path} is a file: name a folder that does not exist yet.");
        }
    }

    private static void RefuseFolder(string path, string target, bool force, ImmutableHashSet<string> ours)
    {
        if (!Directory.Exists(target))
        {
            return;
        }

        if (!force)
        {
            throw new IOException($"{path} exists already: name another folder, or replace it with --force.");
        }

        var foreign = Foreign(path, target, ours);
        if (foreign.Count > 0)
        {
            throw new IOException(
                $"{path} holds files this program did not write ({string.Join(", ", foreign)}), so it is not replaced: move them away, or name another folder.");
        }
    }

    /// <summary>Up to three names in the folder that are not ours, sorted.</summary>
    private static List<string> Foreign(string path, string target, ImmutableHashSet<string> ours)
    {
        try
        {
            return
            [
                .. new DirectoryInfo(target)
                    .EnumerateFileSystemInfos("*", new EnumerationOptions { AttributesToSkip = FileAttributes.None })
                    .Where(entry => entry is not FileInfo { LinkTarget: null } || !ours.Contains(entry.Name))
                    .Select(entry => PlainText.Clean(entry.Name))
                    .Order(StringComparer.Ordinal)
                    .Take(3),
            ];
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            throw DiskTrouble.Unwritten($"Cannot read {path}", exception);
        }
    }

    private static void RequirePlainNames(IReadOnlyCollection<OutputFile> files)
    {
        var seen = new HashSet<string>(StringComparer.OrdinalIgnoreCase);
        foreach (var name in files.Select(file => file.Name))
        {
            if (name.Length == 0 || name is "." or ".." || name != Path.GetFileName(name) || name.AsSpan().ContainsAny('/', '\\') || !seen.Add(name))
            {
                throw new ArgumentException($"'{name}' is no plain file name, or is given twice.", nameof(files));
            }
        }
    }
}
