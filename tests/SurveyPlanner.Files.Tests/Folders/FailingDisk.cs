using SurveyPlanner.Files.Folders;

namespace SurveyPlanner.Files.Tests.Folders;

/// <summary>The real disk until its n-th step, which fails, a file half-written; n counts from 1, and 0 never fails.</summary>
internal sealed class FailingDisk(int failAt, bool forGood = false) : IDisk
{
    private readonly Disk _disk = new();

    public int Steps { get; private set; }

    public void MakeFolder(string path) => Step(() => _disk.MakeFolder(path));

    public void WriteFile(string path, ReadOnlyMemory<byte> content)
    {
        try
        {
            Step(() => _disk.WriteFile(path, content));
        }
        catch (IOException)
        {
            _disk.WriteFile(path, content[..(content.Length / 2)]);
            throw;
        }
    }

    public void MoveFolder(string from, string to) => Step(() => _disk.MoveFolder(from, to));

    public void DeleteFolder(string path) => Step(() => _disk.DeleteFolder(path));

    public void SyncFolder(string path) => _disk.SyncFolder(path);

    private void Step(Action action)
    {
        Steps++;
        if (failAt > 0 && (Steps == failAt || (forGood && Steps > failAt)))
        {
            throw new IOException("the disk broke");
        }

        action();
    }
}
