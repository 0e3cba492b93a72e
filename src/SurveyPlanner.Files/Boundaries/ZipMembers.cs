using System.Collections.ObjectModel;
using System.IO.Compression;
using System.Text;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// The files of a zip archive, in memory: nothing is ever written. Hostile archives are refused before anything is unpacked: names that
/// lead out of the archive, too many members, members that unpack to far more than they should.
/// </summary>
internal sealed class ZipMembers : IDisposable
{
    private const int MostMembers = 2000;

    // Coordinates as text shrink ten times at best; zeros shrink a thousand times.
    private const int MostRatio = 100;
    private const long FreeBytes = 1 << 20;

    private readonly string _source;
    private readonly ZipArchive _archive;

    public ZipMembers(byte[] bytes, string source)
    {
        _source = source;
        try
        {
            _archive = new ZipArchive(new MemoryStream(bytes, writable: false), ZipArchiveMode.Read, leaveOpen: false, Encoding.UTF8);
            Demand(_archive.Entries);
        }
        catch (Exception error) when (error is InvalidDataException or EndOfStreamException or NotSupportedException or ArgumentException or IOException)
        {
            throw Damaged();
        }
    }

    /// <summary>Full names of all members that are files, without those that one operating system adds for itself.</summary>
    public IReadOnlyList<string> Names => [.. _archive.Entries.Select(entry => entry.FullName).Where(IsFile)];

    /// <summary>Unpacks a member into memory and checks it against its checksum.</summary>
    public byte[] Read(string name)
    {
        var entry = _archive.Entries.First(entry => entry.FullName == name);
        var content = new byte[entry.Length];
        try
        {
            using var stream = entry.Open();
            stream.ReadExactly(content);
            if (stream.ReadByte() >= 0 || Crc32.Of(content) != entry.Crc32)
            {
                throw Damaged();
            }
        }
        catch (Exception error) when (error is InvalidDataException or EndOfStreamException or NotSupportedException or IOException)
        {
            throw Damaged();
        }

        return content;
    }

    public void Dispose() => _archive.Dispose();

    private static bool IsFile(string name)
        => !name.EndsWith('/') && !name.StartsWith("__MACOSX/", StringComparison.Ordinal) && !Path.GetFileName(name).StartsWith("._", StringComparison.Ordinal);

    private void Demand(ReadOnlyCollection<ZipArchiveEntry> entries)
    {
        if (entries.Count > MostMembers)
        {
            throw FileBytes.Refusal(_source, $"the archive holds {entries.Count} files, more than the {MostMembers} that are looked at; put the boundary alone into an archive");
        }

        foreach (var entry in entries)
        {
            if (LeadsOut(entry.FullName))
            {
                throw FileBytes.Refusal(_source, $"the archive holds a file named {Wording.Quote(entry.FullName)}, which leads out of the archive; it is not safe and was not unpacked");
            }

            if (entry.Length > FreeBytes && entry.Length > MostRatio * entry.CompressedLength)
            {
                throw FileBytes.Refusal(_source, $"the file {Wording.Quote(entry.FullName)} in the archive unpacks to more than {MostRatio} times its size; no boundary does, and it was not unpacked");
            }
        }

        if (entries.Sum(entry => entry.Length) > FileBytes.MostBytes)
        {
            throw FileBytes.Refusal(_source, $"the archive unpacks to more than {FileBytes.MostBytes >> 20} MB; put the boundary alone into an archive");
        }
    }

    private static bool LeadsOut(string name)
        => name.StartsWith('/') || name.StartsWith('\\') || name.Contains(':', StringComparison.Ordinal) || name.Split('/', '\\').Contains("..");

    private InputException Damaged() => FileBytes.Refusal(_source, "the archive is damaged or cut short; copy or download it again");
}

/// <summary>The checksum of zip members (ISO 3309), which the run-time library does not check.</summary>
internal static class Crc32
{
    private static readonly uint[] Table = [.. Enumerable.Range(0, 256).Select(Entry)];

    public static uint Of(ReadOnlySpan<byte> bytes)
    {
        var crc = uint.MaxValue;
        foreach (var b in bytes)
        {
            crc = Table[(byte)(crc ^ b)] ^ (crc >> 8);
        }

        return ~crc;
    }

    private static uint Entry(int index)
    {
        var value = (uint)index;
        for (var bit = 0; bit < 8; bit++)
        {
            value = (value & 1) == 1 ? 0xEDB88320 ^ (value >> 1) : value >> 1;
        }

        return value;
    }
}
