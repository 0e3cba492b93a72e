using System.Buffers.Binary;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Polygons from the geometry blobs of a GeoPackage (OGC 12-128, clause 2.1.3: a header, then well-known binary), heights and measures passed
/// over. Own code: counts are held against the bytes that are there before anything is allocated, and open rings come through to be mended.
/// </summary>
internal sealed class WkbPolygons(string source, VertexBudget budget)
{
    private const int MostLevels = 10;

    /// <summary>What was met that is no polygon.</summary>
    public int Lines { get; private set; }

    public int Points { get; private set; }

    /// <summary>Polygons of one blob, each a list of rings; empty for null or empty geometries. Also the reference system that the blob names.</summary>
    public (List<List<List<FilePoint>>> Polygons, int SystemId) Read(byte[] blob, string place)
    {
        if (blob.Length < 8 || blob[0] != 'G' || blob[1] != 'P')
        {
            throw Damaged(place);
        }

        var flags = blob[3];
        var envelope = ((flags >> 1) & 7) switch { 0 => 0, 1 => 32, 2 or 3 => 48, 4 => 64, _ => throw Damaged(place) };
        var id = (flags & 1) == 1 ? BinaryPrimitives.ReadInt32LittleEndian(blob.AsSpan(4)) : BinaryPrimitives.ReadInt32BigEndian(blob.AsSpan(4));
        if ((flags & 0x20) != 0)
        {
            throw FileBytes.Refusal(source, "the geometry is of an extended kind that is not read; convert it to polygons in a GIS program", place);
        }

        var polygons = new List<List<List<FilePoint>>>();
        var reader = new Cursor(blob, 8 + envelope);
        if ((flags & 0x10) == 0)
        {
            Geometry(ref reader, polygons, place, 0);
            if (reader.Left != 0)
            {
                throw Damaged(place);
            }
        }

        return (polygons, id);
    }

    private void Geometry(ref Cursor reader, List<List<List<FilePoint>>> polygons, string place, int level)
    {
        if (level > MostLevels || reader.Left < 5)
        {
            throw Damaged(place);
        }

        reader.LittleEndian = reader.Byte() == 1;
        var (type, ordinates) = Type(reader.UInt32());
        switch (type)
        {
            case 3:
                polygons.Add(Polygon(ref reader, ordinates, place));
                break;
            case 4 or 5 or 6 or 7:
                var members = Count(ref reader, 5, place);
                for (var i = 0; i < members; i++)
                {
                    Geometry(ref reader, polygons, place, level + 1);
                }

                break;
            case 1:
                Points++;
                reader.Skip(ordinates * 8L, () => Damaged(place));
                break;
            case 2:
                Lines++;
                reader.Skip(Count(ref reader, ordinates * 8, place) * ordinates * 8L, () => Damaged(place));
                break;
            case >= 8 and <= 17:
                throw FileBytes.Refusal(source, "the geometry has curves, which are not read; convert it to plain polygons in a GIS program", place);
            default:
                throw Damaged(place);
        }
    }

    /// <summary>Type without its dimensions, which are written in two ways: thousands (ISO) or high bits.</summary>
    private static (uint Type, int Ordinates) Type(uint code)
    {
        var extra = (code & 0x80000000) != 0 ? 1 : 0;
        extra += (code & 0x40000000) != 0 ? 1 : 0;
        var plain = code & 0x0FFFFFFF;
        extra += (plain / 1000) switch { 0 => 0, 1 or 2 => 1, _ => 2 };
        return (plain % 1000, 2 + Math.Min(extra, 2));
    }

    private List<List<FilePoint>> Polygon(ref Cursor reader, int ordinates, string place)
    {
        var rings = Count(ref reader, 4, place);
        var polygon = new List<List<FilePoint>>();
        for (var ring = 0; ring < rings; ring++)
        {
            var count = Count(ref reader, ordinates * 8, place);
            budget.Spend(count);
            var points = new List<FilePoint>(count);
            for (var i = 0; i < count; i++)
            {
                var (x, y) = (reader.Double(), reader.Double());
                reader.Skip((ordinates - 2) * 8, () => Damaged(place));
                points.Add(double.IsFinite(x) && double.IsFinite(y) ? new FilePoint(x, y) : throw Damaged(place));
            }

            polygon.Add(points);
        }

        return polygon;
    }

    /// <summary>A count of things that take at least so many bytes each: more than fit is a lie.</summary>
    private int Count(ref Cursor reader, int leastBytes, string place)
    {
        if (reader.Left < 4)
        {
            throw Damaged(place);
        }

        var count = reader.UInt32();
        return count * (long)leastBytes <= reader.Left ? (int)count : throw Damaged(place);
    }

    private InputException Damaged(string place) => FileBytes.Refusal(source, "the geometry is damaged; export the GeoPackage again", place);

    private ref struct Cursor(byte[] bytes, int start)
    {
        private int _at = start;

        public bool LittleEndian { get; set; }

        public readonly long Left => bytes.Length - _at;

        public byte Byte() => bytes[_at++];

        public uint UInt32()
        {
            var span = bytes.AsSpan(_at, 4);
            _at += 4;
            return LittleEndian ? BinaryPrimitives.ReadUInt32LittleEndian(span) : BinaryPrimitives.ReadUInt32BigEndian(span);
        }

        public double Double()
        {
            var span = bytes.AsSpan(_at, 8);
            _at += 8;
            return LittleEndian ? BinaryPrimitives.ReadDoubleLittleEndian(span) : BinaryPrimitives.ReadDoubleBigEndian(span);
        }

        public void Skip(long count, Func<Exception> fault)
        {
            if (count > Left)
            {
                throw fault();
            }

            _at += (int)count;
        }
    }
}
