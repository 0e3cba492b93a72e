using System.Text;
using System.Text.Unicode;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>A boundary file in memory, and its text as UTF-8.</summary>
internal static class FileBytes
{
    /// <summary>A million vertices of GeoJSON take about 40 MB; beyond this a file is no boundary, or should be simplified first.</summary>
    public const long MostBytes = 300L << 20;

    public static byte[] Read(string path, string source, InputFiles files)
    {
        var length = new FileInfo(path).Length;
        if (length > MostBytes)
        {
            throw Refusal(source, $"the file has {length >> 20} MB, more than the {MostBytes >> 20} MB that are read; simplify the boundary in a GIS program");
        }

        return files.Bytes(path);
    }

    /// <summary>
    /// The file as UTF-8 without a byte order mark. UTF-16 with a mark is converted and told; bytes that are not UTF-8 are refused with their place.
    /// </summary>
    public static ReadOnlyMemory<byte> ToUtf8(byte[] bytes, string source, RepairLog log)
    {
        if (bytes is [0xFF, 0xFE, ..] or [0xFE, 0xFF, ..])
        {
            return FromUtf16(bytes, source, log);
        }

        ReadOnlyMemory<byte> text = bytes is [0xEF, 0xBB, 0xBF, ..] ? bytes.AsMemory(3) : bytes;
        if (!Utf8.IsValid(text.Span))
        {
            var offset = FirstInvalid(text.Span);
            var (line, column) = LineAndColumn(text.Span, offset);
            throw new InputException(new Problem(
                $"byte 0x{text.Span[offset]:X2} is not UTF-8 text; save the file again with the encoding UTF-8", source, line, column));
        }

        return text;
    }

    /// <summary>Line and column, in bytes, of an offset; both from 1.</summary>
    public static (int Line, int Column) LineAndColumn(ReadOnlySpan<byte> text, int offset)
    {
        var before = text[..Math.Min(offset, text.Length)];
        return (before.Count((byte)'\n') + 1, before.Length - before.LastIndexOf((byte)'\n'));
    }

    private static byte[] FromUtf16(byte[] bytes, string source, RepairLog log)
    {
        var encoding = new UnicodeEncoding(bigEndian: bytes[0] == 0xFE, byteOrderMark: false, throwOnInvalidBytes: true);
        try
        {
            var text = encoding.GetString(bytes.AsSpan(2));
            log.Warn("the file is in UTF-16 and was read as such; UTF-8 is the usual encoding");
            return Encoding.UTF8.GetBytes(text);
        }
        catch (ArgumentException)
        {
            throw Refusal(source, "the file begins as UTF-16 text but does not go on so, perhaps it is cut short; save it again with the encoding UTF-8");
        }
    }

    private static int FirstInvalid(ReadOnlySpan<byte> text)
    {
        var offset = 0;
        while (offset < text.Length && Rune.DecodeFromUtf8(text[offset..], out _, out var consumed) == System.Buffers.OperationStatus.Done)
        {
            offset += consumed;
        }

        return offset;
    }

    public static InputException Refusal(string source, string message, string? place = null) => new(new Problem(message, source, Key: place));
}
