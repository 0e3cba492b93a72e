using System.Collections.Immutable;

namespace SurveyPlanner.Files;

/// <summary>
/// The files that one run reads, each from the disk once: what is parsed and what the record keeps hashes of are then the same bytes,
/// even where somebody saves a file while the run goes on.
/// </summary>
public sealed class InputFiles
{
    private readonly Shared _shared;
    private readonly string _key;

    public InputFiles()
        : this(new Shared([], []), "")
    {
    }

    private InputFiles(Shared shared, string key) => (_shared, _key) = (shared, key);

    /// <summary>Every file read so far under a key of the plan, in order; one read under two keys counts under both.</summary>
    public ImmutableArray<(string Key, string Path, ReadOnlyMemory<byte> Content)> Read
        => [.. _shared.Order.Where(read => read.Key.Length > 0).Select(read => (read.Key, read.Path, (ReadOnlyMemory<byte>)_shared.Contents[FullPath(read.Path)]))];

    /// <summary>The same files; what is read from here on is noted under a key of the plan, such as <c>region.boundary</c>.</summary>
    public InputFiles Under(string key) => new(_shared, key);

    /// <summary>The bytes of a file.</summary>
    /// <exception cref="IOException">It cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">It may not be read.</exception>
    public byte[] Bytes(string path)
    {
        var full = FullPath(path);
        if (!_shared.Contents.TryGetValue(full, out var content))
        {
            content = File.ReadAllBytes(path);
            _shared.Contents.Add(full, content);
        }

        if (!_shared.Order.Exists(read => read.Key == _key && FullPath(read.Path) == full))
        {
            _shared.Order.Add((_key, path));
        }

        return content;
    }

    private static string FullPath(string path) => Path.GetFullPath(path);

    private sealed record Shared(Dictionary<string, byte[]> Contents, List<(string Key, string Path)> Order);
}
