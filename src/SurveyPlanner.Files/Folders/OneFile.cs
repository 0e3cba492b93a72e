namespace SurveyPlanner.Files.Folders;

/// <summary>A single file, written whole or not at all.</summary>
public static class OneFile
{
    /// <summary>Writes text as UTF-8 into a file beside, then moves it into place.</summary>
    /// <exception cref="IOException">One sentence that says what stands in the way.</exception>
    public static void Write(string path, string text)
    {
        var target = Path.GetFullPath(path);
        var temporary = $"{target}.{Environment.ProcessId}.tmp";
        try
        {
            File.WriteAllText(temporary, text);
            File.Move(temporary, target, overwrite: true);
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            File.Delete(temporary);
            throw DiskTrouble.Unwritten($"Cannot write {path}", exception);
        }
    }
}
