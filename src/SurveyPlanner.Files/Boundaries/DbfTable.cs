using System.Buffers.Binary;
using System.Collections.Immutable;
using System.Text;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>One row of a .dbf: its attributes as text, empty ones left out.</summary>
internal sealed record DbfRow(bool IsDeleted, ImmutableSortedDictionary<string, string> Attributes);

/// <summary>
/// The attribute table of a shapefile (dBASE III and IV, as far as shapefiles use it). The encoding is that of the .cpg file, else the
/// language byte of the table, else UTF-8 if the bytes are, else Windows-1252; a guess is told.
/// </summary>
internal sealed record DbfTable(IReadOnlyList<DbfRow> Rows)
{
    private const int HeaderBytes = 32;

    public static DbfTable Read(byte[] dbf, byte[]? cpg, string source, RepairLog log)
    {
        if (dbf.Length < HeaderBytes + 1)
        {
            throw CutShort(source);
        }

        var count = BinaryPrimitives.ReadInt32LittleEndian(dbf.AsSpan(4));
        int header = BinaryPrimitives.ReadUInt16LittleEndian(dbf.AsSpan(8));
        int rowBytes = BinaryPrimitives.ReadUInt16LittleEndian(dbf.AsSpan(10));
        if (count < 0 || header < HeaderBytes + 1 || rowBytes < 1 || header + ((long)count * rowBytes) > dbf.Length)
        {
            throw CutShort(source);
        }

        var fields = Fields(dbf, header, rowBytes) ?? throw FileBytes.Refusal(source, "the .dbf is damaged: its columns do not add up to its rows; export the shapefile again");
        var encoding = DbfEncoding.Of(dbf, cpg, header, log);
        var names = UniqueNames(fields, encoding);
        var rows = new List<DbfRow>(count);
        for (var row = 0; row < count; row++)
        {
            var bytes = dbf.AsSpan(header + (row * rowBytes), rowBytes);
            rows.Add(new DbfRow(bytes[0] == '*', Attributes(bytes, fields, names, encoding)));
        }

        if (rows.Exists(row => row.Attributes.Values.Any(value => value.Contains('\uFFFD', StringComparison.Ordinal))))
        {
            log.Warn($"some attributes of the .dbf are not text in {encoding.WebName}; characters that could not be read show as \uFFFD");
        }

        return new DbfTable(rows);
    }

    private sealed record Field(byte[] Name, char Type, int Start, int Length);

    private static List<Field>? Fields(byte[] dbf, int header, int rowBytes)
    {
        var fields = new List<Field>();
        var start = 1;
        for (var at = HeaderBytes; at + 32 <= header && dbf[at] != 0x0D; at += 32)
        {
            var name = dbf.AsSpan(at, 11);
            var end = name.IndexOf((byte)0);
            int length = dbf[at + 16];
            var type = (char)dbf[at + 11];

            // Long text fields keep the high byte of their length where numbers have their decimals.
            if (type == 'C')
            {
                length += 256 * dbf[at + 17];
            }

            fields.Add(new Field(name[..(end < 0 ? 11 : end)].ToArray(), type, start, length));
            start += length;
        }

        return start <= rowBytes ? fields : null;
    }

    private static string[] UniqueNames(List<Field> fields, Encoding encoding)
    {
        var names = new string[fields.Count];
        for (var i = 0; i < names.Length; i++)
        {
            var name = encoding.GetString(fields[i].Name).Trim();
            names[i] = name.Length == 0 || names.Take(i).Contains(name) ? $"{name}_{i + 1}" : name;
        }

        return names;
    }

    private static ImmutableSortedDictionary<string, string> Attributes(ReadOnlySpan<byte> row, List<Field> fields, string[] names, Encoding encoding)
    {
        var attributes = GeoJsonObjects.None.ToBuilder();
        for (var i = 0; i < fields.Count; i++)
        {
            var bytes = row.Slice(fields[i].Start, fields[i].Length);
            var text = encoding.GetString(bytes).Trim('\0', ' ', '\t', '\r', '\n');

            // Numbers that do not fit are written as stars, unknown truth values as a question mark.
            var isEmpty = text.Length == 0 || (fields[i].Type is 'N' or 'F' && text[0] == '*') || (fields[i].Type == 'L' && text == "?");
            if (!isEmpty)
            {
                attributes[names[i]] = text;
            }
        }

        return attributes.ToImmutable();
    }

    private static InputException CutShort(string source)
        => FileBytes.Refusal(source, "the .dbf is cut short: it holds fewer rows than it says; copy or export the shapefile again");
}
