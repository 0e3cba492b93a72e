namespace SurveyPlanner.Files.Folders;

/// <summary>The steps in which a folder comes to be, one method each, so that tests can make any of them fail.</summary>
internal interface IDisk
{
    public void MakeFolder(string path);

    /// <summary>Writes a new file and has it on the disk before returning.</summary>
    public void WriteFile(string path, ReadOnlyMemory<byte> content);

    /// <summary>Renames a folder within its file system; never onto something that exists.</summary>
    public void MoveFolder(string from, string to);

    /// <summary>Deletes a folder and all in it, following no links.</summary>
    public void DeleteFolder(string path);

    /// <summary>Has the folder's list of names on the disk before returning, where the system can do that.</summary>
    public void SyncFolder(string path);
}
