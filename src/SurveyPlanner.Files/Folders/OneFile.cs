using System.Text;

namespace SurveyPlanner.Files.Folders;

/// <summary>A single file, written whole or not at all: beside its place first, on the disk, then renamed.</summary>
public static class OneFile
{
    /// <summary>Writes text as UTF-8 without a mark, over what may be there; asking first is up to the caller.</summary>
    /// <exception cref="IOException">One sentence that says what stands in the way; what was there before is there still.</exception>
    public static void Write(string path, string text)
    {
        if (string.IsNullOrWhiteSpace(path) || path.Contains('\0', StringComparison.Ordinal))
        {
            throw new IOException("The file to write has no name: give one.");
        }

        if (Directory.Exists(path))
        {
            throw new IOException($"{path} is a folder: name a file in it.");
        }

        if (new FileInfo(path).LinkTarget is not null)
        {
            throw new IOException($"{path} is a link to somewhere else: name the file itself, or another one.");
        }

        var draft = $"{path}.{Guid.NewGuid().ToString("N")[..8]}.part";
        try
        {
            new Disk().WriteFile(draft, Encoding.UTF8.GetBytes(text));
            File.Move(draft, path, overwrite: true);
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            if (File.Exists(draft))
            {
                File.Delete(draft);
            }

            throw DiskTrouble.Unwritten($"Cannot write {path}", exception);
        }
    }
}
