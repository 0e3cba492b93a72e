using System.Buffers.Binary;
using System.Text;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>Shapefiles made up here by the technical description, right and wrong.</summary>
public sealed class Shapefiles : IDisposable
{
    private static readonly (double X, double Y)[] Clockwise = [(10, 0), (10, 0.1), (10.1, 0.1), (10.1, 0), (10, 0)];

    private static readonly (double X, double Y)[] Hole = [(10.02, 0.02), (10.04, 0.02), (10.04, 0.04), (10.02, 0.04), (10.02, 0.02)];

    private static readonly byte[] Prj = Encoding.ASCII.GetBytes("GEOGCS[\"GCS_WGS_1984\",DATUM[\"D_WGS_1984\",SPHEROID[\"WGS_1984\",6378137.0,298.257223563]],PRIMEM[\"Greenwich\",0.0],UNIT[\"Degree\",0.0174532925199433]]");

    private readonly string _folder = Directory.CreateTempSubdirectory("shp-").FullName;

    private static double SquareArea => AreaOf.SquareKilometres(InMemory.Read(InMemory.Polygon("10 0, 10.1 0, 10.1 0.1, 10 0.1")));

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Theory]
    [InlineData(5, 0)]
    [InlineData(15, 1)]
    [InlineData(15, 2)]
    [InlineData(25, 0)]
    [InlineData(25, 1)]
    public void Polygons_with_and_without_heights_and_measures_are_read(int type, int extras)
        => Assert.Equal(0.96 * SquareArea, AreaOf.SquareKilometres(Read(Shp(type, extras, Shape(Clockwise, Hole)))), 1e-5 * SquareArea);

    [Fact]
    public void A_ring_wound_the_wrong_way_that_lies_in_no_other_is_ground()
    {
        var far = Hole.Select(point => (point.X + 1, point.Y)).ToArray();
        var boundary = Read(Shp(5, 0, Shape(Clockwise, far)));

        Assert.Equal(2, boundary.Features[0].Polygons.Length);
        Assert.Contains("wound the wrong way", InMemory.Told(boundary), StringComparison.Ordinal);
        Assert.Empty(Read(Shp(5, 0, Shape([.. Clockwise.Reverse()]))).Notices.Where(notice => notice.Message.Contains("wound", StringComparison.Ordinal)));
    }

    [Fact]
    public void An_island_in_a_lake_on_an_island_is_a_part_and_the_lake_belongs_to_the_smallest_ring_round_it()
    {
        var island = new[] { (10.025, 0.025), (10.025, 0.035), (10.035, 0.035), (10.035, 0.025), (10.025, 0.025) };
        var boundary = Read(Shp(5, 0, Shape(island, Hole, Clockwise)));

        Assert.Equal(2, boundary.Features[0].Polygons.Length);
        Assert.Equal(0.97 * SquareArea, AreaOf.SquareKilometres(boundary), 1e-5 * SquareArea);
    }

    [Fact]
    public void Null_shapes_and_deleted_rows_are_left_out_and_told()
    {
        var shp = Shp(5, 0, Shape(Clockwise), null, Shape([.. Clockwise.Select(point => (point.X + 1, point.Y))]));
        var dbf = Dbf("name", "a", "b", "c");
        var deleted = (byte[])dbf.Clone();
        deleted[HeaderOf(dbf) + (2 * 11)] = (byte)'*';

        Assert.Equal(["a", "c"], Read(shp, dbf).Features.Select(feature => feature.Attributes["name"]));
        var boundary = Read(shp, deleted);
        Assert.Equal(["a"], boundary.Features.Select(feature => feature.Attributes["name"]));
        Assert.Contains("marked as deleted (feature 3)", InMemory.Told(boundary), StringComparison.Ordinal);
        Assert.Contains("null or empty (feature 2)", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(1, "points")]
    [InlineData(3, "lines")]
    [InlineData(23, "lines")]
    [InlineData(31, "surfaces in space")]
    [InlineData(99, "unknown type 99")]
    public void Other_shapes_are_named(int type, string words)
    {
        var shp = Shp(5, 0, Shape(Clockwise));
        BinaryPrimitives.WriteInt32LittleEndian(shp.AsSpan(32), type);

        Assert.Contains(words, Assert.Throws<InputException>(() => Read(shp)).Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(44 + 8 + 100, 5)]
    [InlineData(36 + 8 + 100, 7)]
    [InlineData(40 + 8 + 100, 1_000_000)]
    [InlineData(40 + 8 + 100, -1)]
    public void A_record_that_contradicts_itself_is_refused_with_its_place(int at, int value)
    {
        var shp = Shp(5, 0, Shape(Clockwise));
        BinaryPrimitives.WriteInt32LittleEndian(shp.AsSpan(at), value);

        Assert.Contains("feature 1: the .shp is damaged at byte 100", Assert.Throws<InputException>(() => Read(shp)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_text_without_system_or_with_a_damaged_one_asks_for_it()
    {
        Assert.Contains("it has no .prj file", RefusalWithPrj(null), StringComparison.Ordinal);
        Assert.Contains("its .prj file is not understood: it is cut short", RefusalWithPrj(Prj[..50]), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("UTF-8", "c3a5", "å")]
    [InlineData("65001", "c3a5", "å")]
    [InlineData("ISO-8859-1", "e5", "å")]
    [InlineData("ISO 8859-2", "b1", "ą")]
    [InlineData("1251", "e0", "а")]
    [InlineData("ANSI 1252", "80", "€")]
    [InlineData("CP437", "86", "å")]
    [InlineData("no such thing", "c3a5", "å")]
    [InlineData("no such thing", "e5", "å")]
    [InlineData("UTF-8", "e5", "\uFFFD")]
    public void Text_is_read_in_the_encoding_that_the_cpg_names_or_that_the_bytes_show(string cpg, string bytes, string expected)
    {
        var dbf = Dbf("name", "xx");
        var text = Convert.FromHexString(bytes);
        dbf.AsSpan(HeaderOf(dbf) + 1, 10).Fill((byte)' ');
        text.CopyTo(dbf.AsSpan(HeaderOf(dbf) + 1));

        var parts = new ShapefileParts("x", Shp(5, 0, Shape(Clockwise)), null, dbf, Prj, Encoding.ASCII.GetBytes(cpg));

        Assert.Equal(expected, Read(parts).Features[0].Attributes["name"]);
    }

    [Fact]
    public void A_folder_is_read_by_its_only_shapefile_or_by_the_one_named()
    {
        Write("One", Shp(5, 0, Shape(Clockwise)));
        Assert.Equal(SquareArea, AreaOf.SquareKilometres(BoundaryReader.Read(_folder)), 1e-9);
        Assert.Equal(SquareArea, AreaOf.SquareKilometres(BoundaryReader.Read(Path.Combine(_folder, "One.SHP"))), 1e-9);

        Write("two", Shp(5, 0, Shape([.. Clockwise.Select(point => (point.X + 5, point.Y))])));
        Assert.Contains("'One', 'two'; say which with layer", Assert.Throws<InputException>(() => BoundaryReader.Read(_folder)).Message, StringComparison.Ordinal);
        Assert.Equal(15, BoundaryReader.Read(_folder, new BoundaryOptions { Layer = "TWO" }).Features[0].Polygons[0].Shell[0].Lon);
    }

    [Fact]
    public void A_folder_without_a_shapefile_is_refused()
        => Assert.Contains("holds no .shp file", Assert.Throws<InputException>(() => BoundaryReader.Read(_folder)).Message, StringComparison.Ordinal);

    private void Write(string name, byte[] shp)
    {
        File.WriteAllBytes(Path.Combine(_folder, name + ".SHP"), shp);
        File.WriteAllBytes(Path.Combine(_folder, name + ".dbf"), Dbf("name", "a"));
        File.WriteAllBytes(Path.Combine(_folder, name + ".Prj"), Prj);
    }

    private static Boundary Read(byte[] shp, byte[]? dbf = null) => Read(new ShapefileParts("x", shp, null, dbf, Prj, null));

    private static string RefusalWithPrj(byte[]? prj)
        => Assert.Throws<InputException>(() => Read(new ShapefileParts("x", Shp(5, 0, Shape(Clockwise)), null, null, prj, null))).Message;

    private static Boundary Read(ShapefileParts parts)
    {
        var log = new RepairLog();
        return BoundaryAssembly.Assemble(ShapefileBoundary.Read(parts, "x.shp", log), "x.shp", BoundaryOptions.Default, log);
    }

    private static (double X, double Y)[][] Shape(params (double X, double Y)[][] rings) => rings;

    private static byte[] Shp(int type, int extras, params (double X, double Y)[][]?[] shapes)
    {
        using var stream = new MemoryStream();
        stream.SetLength(100);
        stream.Position = 100;
        for (var i = 0; i < shapes.Length; i++)
        {
            var content = shapes[i] is { } rings ? Content(type, extras, rings) : new byte[4];
            var header = new byte[8];
            BinaryPrimitives.WriteInt32BigEndian(header, i + 1);
            BinaryPrimitives.WriteInt32BigEndian(header.AsSpan(4), content.Length / 2);
            stream.Write(header);
            stream.Write(content);
        }

        var shp = stream.ToArray();
        BinaryPrimitives.WriteInt32BigEndian(shp, 9994);
        BinaryPrimitives.WriteInt32BigEndian(shp.AsSpan(24), shp.Length / 2);
        BinaryPrimitives.WriteInt32LittleEndian(shp.AsSpan(28), 1000);
        BinaryPrimitives.WriteInt32LittleEndian(shp.AsSpan(32), type);
        return shp;
    }

    private static byte[] Content(int type, int extras, (double X, double Y)[][] rings)
    {
        var points = rings.Sum(ring => ring.Length);
        var content = new byte[44 + (4 * rings.Length) + (16 * points) + (extras * (16 + (8 * points)))];
        BinaryPrimitives.WriteInt32LittleEndian(content, type);
        BinaryPrimitives.WriteInt32LittleEndian(content.AsSpan(36), rings.Length);
        BinaryPrimitives.WriteInt32LittleEndian(content.AsSpan(40), points);
        var (start, at) = (0, 44 + (4 * rings.Length));
        for (var ring = 0; ring < rings.Length; ring++)
        {
            BinaryPrimitives.WriteInt32LittleEndian(content.AsSpan(44 + (4 * ring)), start);
            start += rings[ring].Length;
            foreach (var (x, y) in rings[ring])
            {
                BinaryPrimitives.WriteDoubleLittleEndian(content.AsSpan(at), x);
                BinaryPrimitives.WriteDoubleLittleEndian(content.AsSpan(at + 8), y);
                at += 16;
            }
        }

        return content;
    }

    /// <summary>A table with one text column of ten letters.</summary>
    private static byte[] Dbf(string column, params string[] values)
    {
        var dbf = new byte[65 + (11 * values.Length) + 1];
        dbf[0] = 3;
        BinaryPrimitives.WriteInt32LittleEndian(dbf.AsSpan(4), values.Length);
        BinaryPrimitives.WriteUInt16LittleEndian(dbf.AsSpan(8), 65);
        BinaryPrimitives.WriteUInt16LittleEndian(dbf.AsSpan(10), 11);
        Encoding.ASCII.GetBytes(column).CopyTo(dbf, 32);
        dbf[32 + 11] = (byte)'C';
        dbf[32 + 16] = 10;
        dbf[64] = 0x0D;
        for (var i = 0; i < values.Length; i++)
        {
            Encoding.ASCII.GetBytes(" " + values[i].PadRight(10)).CopyTo(dbf, 65 + (11 * i));
        }

        dbf[^1] = 0x1A;
        return dbf;
    }

    private static int HeaderOf(byte[] dbf) => BinaryPrimitives.ReadUInt16LittleEndian(dbf.AsSpan(8));
}
