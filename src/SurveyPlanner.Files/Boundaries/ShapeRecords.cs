using System.Buffers.Binary;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>One polygon record: all its points, and where its rings begin.</summary>
internal sealed record Shape(IReadOnlyList<FilePoint> Points, IReadOnlyList<int> RingStarts);

/// <summary>The records of a .shp file, null for null shapes.</summary>
internal static class ShapeRecords
{
    private const int HeaderBytes = 100;

    public static IReadOnlyList<Shape?> Read(byte[] shp, string source)
    {
        if (shp.Length < HeaderBytes || BinaryPrimitives.ReadInt32BigEndian(shp) != 9994)
        {
            throw FileBytes.Refusal(source, "the .shp is cut short or does not begin like one; copy or export it again");
        }

        var stated = 2L * BinaryPrimitives.ReadInt32BigEndian(shp.AsSpan(24));
        if (stated != shp.Length)
        {
            throw FileBytes.Refusal(source, $"the .shp should have {stated} bytes but has {shp.Length}, so it is cut short or damaged; copy or export it again");
        }

        DemandPolygons(BinaryPrimitives.ReadInt32LittleEndian(shp.AsSpan(32)), source);
        var records = new List<Shape?>();
        for (var at = HeaderBytes; at < shp.Length;)
        {
            var place = Place.Feature(records.Count + 1);
            var length = at + 8 <= shp.Length ? 2L * BinaryPrimitives.ReadInt32BigEndian(shp.AsSpan(at + 4)) : -1;
            if (length < 4 || at + 8 + length > shp.Length)
            {
                throw Damaged(source, place, at);
            }

            records.Add(Record(shp.AsSpan(at + 8, (int)length)) ?? throw Damaged(source, place, at));
            at += 8 + (int)length;
        }

        return [.. records.Select(record => record!.Points.Count == 0 ? null : record)];
    }

    private static void DemandPolygons(int type, string source)
    {
        var kind = type switch
        {
            0 or 5 or 15 or 25 => null,
            1 or 11 or 21 or 8 or 18 or 28 => "points",
            3 or 13 or 23 => "lines",
            31 => "surfaces in space (multipatch)",
            _ => $"shapes of the unknown type {type}",
        };
        if (kind is not null)
        {
            throw FileBytes.Refusal(source, $"there is no polygon in the file, it holds {kind}; a study region needs polygons: turn them into polygons in a GIS program");
        }
    }

    /// <summary>One record; without points for a null shape; null when its lengths contradict each other.</summary>
    private static Shape? Record(ReadOnlySpan<byte> content)
    {
        var type = BinaryPrimitives.ReadInt32LittleEndian(content);
        if (type == 0)
        {
            return new Shape([], []);
        }

        if (type is not (5 or 15 or 25) || content.Length < 44)
        {
            return null;
        }

        var parts = BinaryPrimitives.ReadInt32LittleEndian(content[36..]);
        var points = BinaryPrimitives.ReadInt32LittleEndian(content[40..]);
        var plain = 44 + (4L * parts) + (16L * points);
        var extra = 16 + (8L * points);
        var fits = parts >= 0 && points >= 0 && type switch
        {
            5 => content.Length == plain,
            15 => content.Length == plain + extra || content.Length == plain + (2 * extra),
            _ => content.Length == plain || content.Length == plain + extra,
        };
        return fits ? Rings(content, parts, points) : null;
    }

    private static Shape? Rings(ReadOnlySpan<byte> content, int parts, int points)
    {
        var starts = new int[parts];
        for (var part = 0; part < parts; part++)
        {
            starts[part] = BinaryPrimitives.ReadInt32LittleEndian(content[(44 + (4 * part))..]);
            if (starts[part] >= points || (part == 0 ? starts[part] != 0 : starts[part] <= starts[part - 1]))
            {
                return null;
            }
        }

        if (parts == 0 && points > 0)
        {
            return null;
        }

        var list = new FilePoint[points];
        var coordinates = content[(44 + (4 * parts))..];
        for (var i = 0; i < points; i++)
        {
            var x = BinaryPrimitives.ReadDoubleLittleEndian(coordinates[(16 * i)..]);
            var y = BinaryPrimitives.ReadDoubleLittleEndian(coordinates[((16 * i) + 8)..]);
            if (!double.IsFinite(x) || !double.IsFinite(y))
            {
                return null;
            }

            list[i] = new FilePoint(x, y);
        }

        return new Shape(list, starts);
    }

    private static InputException Damaged(string source, string place, int at)
        => FileBytes.Refusal(source, $"the .shp is damaged at byte {at}: a record does not hold what it says; copy or export it again", place);
}
