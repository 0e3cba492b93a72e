using System.Collections.Immutable;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Folders;

/// <summary>
/// A folder of outputs, written whole or not at all: put together in a hidden folder beside it, on the disk before it is renamed.
/// Reserved before any work is done, so that whatever stands in the way, another run for the same folder too, is said at once.
/// A run that is killed leaves the target as it was; the next run for the same target clears away what it left.
/// </summary>
public sealed class OutputFolder : IDisposable
{
    private readonly string _path;
    private readonly string _target;
    private readonly bool _force;
    private readonly IDisk _disk;
    private readonly CancellationToken _stop;
    private readonly CancellationTokenRegistration _whenStopped;
    private readonly Lock _gate = new();
    private readonly ImmutableArray<string> _parentsMade;
    private readonly WorkFolder _work;

    private OutputFolder(string path, string target, bool force, IDisk disk, CancellationToken stop)
    {
        (_path, _target, _force, _disk, _stop) = (path, target, force, disk, stop);
        _parentsMade = MakeParents();
        try
        {
            InOneSentence(() => WorkFolder.Recover(disk, target));
            RefuseFolder(OutputNames.All);
            _work = InOneSentence(() => WorkFolder.Begin(disk, target));
        }
        catch
        {
            RemoveParents();
            throw;
        }

        // Ctrl-C ends the process soon after, whatever the run is at: what is reserved is let go here.
        _whenStopped = stop.Register(Release);
    }

    /// <summary>The folder as the user named it.</summary>
    public string Folder => _path;

    /// <summary>Takes the folder for this run until it is disposed of or stopped.</summary>
    /// <param name="path">The folder to write, as the user named it; folders above it that are missing are made, and taken away again if nothing is written.</param>
    /// <param name="force">Whether a folder of an earlier run may be replaced. One with anything else in it never is.</param>
    /// <param name="stop">Stops the writing, and nothing is left of it.</param>
    /// <exception cref="IOException">One sentence that says what stands in the way; what was there before is there still.</exception>
    public static OutputFolder Reserve(string path, bool force, CancellationToken stop = default) => Reserve(path, force, new Disk(), stop);

    internal static OutputFolder Reserve(string path, bool force, IDisk disk, CancellationToken stop)
    {
        var target = Target(path);
        RefuseLinkOrFile(path, target);
        return new OutputFolder(path, target, force, disk, stop);
    }

    /// <summary>Writes the folder; once.</summary>
    /// <param name="files">Its files; names without folders, all different.</param>
    /// <exception cref="IOException">One sentence that says what stands in the way; what was there before is there still.</exception>
    public void Write(IReadOnlyCollection<OutputFile> files)
    {
        RequirePlainNames(files);
        lock (_gate)
        {
            _stop.ThrowIfCancellationRequested();

            // Hours may have passed since it was reserved.
            RefuseLinkOrFile(_path, _target);
            RefuseFolder(OutputNames.All.Union(files.Select(file => file.Name)));
            InOneSentence(() =>
            {
                _disk.MakeFolder(_work.New);
                foreach (var file in files)
                {
                    _stop.ThrowIfCancellationRequested();
                    _disk.WriteFile(Path.Combine(_work.New, file.Name), file.Content);
                }

                _disk.SyncFolder(_work.New);
                _stop.ThrowIfCancellationRequested();
                ChangeOver();
                _disk.SyncFolder(Path.GetDirectoryName(_target)!);
            });
        }
    }

    public void Dispose()
    {
        _whenStopped.Dispose();
        Release();
    }

    private void Release()
    {
        lock (_gate)
        {
            _work.Dispose();
            RemoveParents();
        }
    }

    private void InOneSentence(Action action) => InOneSentence(() =>
    {
        action();
        return true;
    });

    private T InOneSentence<T>(Func<T> action)
    {
        try
        {
            return action();
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            throw DiskTrouble.Unwritten($"Cannot write {_path}", exception);
        }
    }

    /// <summary>Makes the folders above that are missing, the outermost first.</summary>
    private ImmutableArray<string> MakeParents()
    {
        var missing = new Stack<string>();
        for (var folder = Path.GetDirectoryName(_target); folder is not null && !Directory.Exists(folder); folder = Path.GetDirectoryName(folder))
        {
            if (File.Exists(folder))
            {
                throw new IOException($"Cannot write {_path}: {folder} is a file, not a folder; name another place.");
            }

            missing.Push(folder);
        }

        InOneSentence(() =>
        {
            foreach (var folder in missing)
            {
                _disk.MakeFolder(folder);
            }
        });
        return [.. missing];
    }

    /// <summary>Takes away those folders above that were made and hold nothing; whatever cannot be is harmless.</summary>
    private void RemoveParents()
    {
        foreach (var folder in _parentsMade.Reverse())
        {
            try
            {
                Directory.Delete(folder);
            }
            catch (Exception exception) when (DiskTrouble.Is(exception))
            {
                return;
            }
        }
    }

    private void ChangeOver()
    {
        var isReplacing = _force && Directory.Exists(_target);
        if (isReplacing)
        {
            _disk.MoveFolder(_target, _work.Old);
        }

        try
        {
            _disk.MoveFolder(_work.New, _target);
        }
        catch when (isReplacing)
        {
            _disk.MoveFolder(_work.Old, _target);
            throw;
        }

        if (isReplacing)
        {
            try
            {
                _work.DropOld();
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
        return Path.GetDirectoryName(target) is null ? throw new IOException($"{path} is the root of a disk: name a folder in it.") : target;
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

    private void RefuseFolder(ImmutableHashSet<string> ours)
    {
        if (!Directory.Exists(_target))
        {
            return;
        }

        if (!_force)
        {
            throw new IOException($"{_path} exists already: name another folder, or replace it with --force.");
        }

        var foreign = Foreign(_path, _target, ours);
        if (foreign.Count > 0)
        {
            throw new IOException(
                $"{_path} holds files this program did not write ({string.Join(", ", foreign)}), so it is not replaced: move them away, or name another folder.");
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
