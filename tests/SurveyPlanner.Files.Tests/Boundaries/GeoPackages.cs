using Microsoft.Data.Sqlite;
using NetTopologySuite.IO;
using SurveyPlanner.Files.Boundaries;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>GeoPackages written here with the least set of tables of OGC 12-128, geometries by NetTopologySuite's own writer.</summary>
public sealed class GeoPackages : IDisposable
{
    private const string Square = "POLYGON((10 0,10.1 0,10.1 0.1,10 0.1,10 0))";
    private const string Wgs84Text = "GEOGCS[\"WGS 84\",DATUM[\"WGS_1984\",SPHEROID[\"WGS 84\",6378137,298.257223563]],PRIMEM[\"Greenwich\",0],UNIT[\"degree\",0.0174532925199433]]";

    private readonly string _folder = Directory.CreateTempSubdirectory("gpkg-").FullName;

    private static double SquareArea => AreaOf.SquareKilometres(InMemory.Read(InMemory.Polygon("10 0, 10.1 0, 10.1 0.1, 10 0.1")));

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public void Of_several_layers_the_only_one_with_polygons_is_read_and_told()
    {
        var boundary = BoundaryReader.Read(Write(("areas", "POLYGON", [Square]), ("tracks", "LINESTRING", ["LINESTRING(0 0,1 1)"])));

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(boundary), 1e-9);
        Assert.Contains("the GeoPackage holds 2 layers; 'areas' was read", InMemory.Told(boundary), StringComparison.Ordinal);
    }

    [Fact]
    public void Of_several_layers_with_polygons_the_user_says_which()
    {
        var path = Write(("a \"quoted\" name", "POLYGON", [Square]), ("b", "MULTIPOLYGON", ["MULTIPOLYGON(((20 0,21 0,21 1,20 0)))"]), ("c", "GEOMETRY", [Square]));

        Assert.Contains("'a \"quoted\" name', 'b', 'c'; say which with layer in [region]", Refusal(path), StringComparison.Ordinal);
        Assert.Equal(20, BoundaryReader.Read(path, new BoundaryOptions { Layer = "B" }).Features[0].Polygons[0].Shell[0].Lon);
        Assert.Equal(10, BoundaryReader.Read(path, new BoundaryOptions { Layer = "a \"quoted\" name" }).Features[0].Polygons[0].Shell[0].Lon);
        Assert.Equal(20, BoundaryReader.Read(path, new BoundaryOptions { Layer = "the b layer" }).Features[0].Polygons[0].Shell[0].Lon);
        Assert.Contains("there is no layer 'd' in it", Refusal(path, new BoundaryOptions { Layer = "d" }), StringComparison.Ordinal);
    }

    [Fact]
    public void Attributes_of_every_kind_come_as_text()
    {
        var boundary = BoundaryReader.Read(Write(("a", "POLYGON", [Square])));

        Assert.Equal([("count", "7"), ("fid", "1"), ("name", "Ås"), ("share", "0.1")], boundary.Features[0].Attributes.Select(pair => (pair.Key, pair.Value)));
    }

    [Theory]
    [InlineData("POLYGON Z((10 0 5,10.1 0 5,10.1 0.1 5,10 0.1 5,10 0 5))")]
    [InlineData("GEOMETRYCOLLECTION(POINT(1 2),LINESTRING(0 0,1 1),MULTIPOLYGON(((10 0,10.1 0,10.1 0.1,10 0.1,10 0))))")]
    public void Heights_and_collections_are_read(string geometry)
        => Assert.Equal(SquareArea, AreaOf.SquareKilometres(BoundaryReader.Read(Write(("a", "GEOMETRY", [geometry])))), 1e-9);

    [Fact]
    public void Rows_without_polygons_are_left_out_and_told_and_a_layer_of_lines_is_refused()
    {
        var boundary = BoundaryReader.Read(Write(("a", "GEOMETRY", ["POINT(1 2)", Square, "POLYGON EMPTY"])));

        Assert.Equal(2, Assert.Single(boundary.Features).Number);
        Assert.Contains("left out, because the geometry is empty or no polygon (feature 1; feature 3)", InMemory.Told(boundary), StringComparison.Ordinal);
        Assert.Contains("only 1 line", Refusal(Write(("a", "LINESTRING", ["LINESTRING(0 0,1 1)"]))), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("UPDATE gpkg_spatial_ref_sys SET organization_coordsys_id = 32633", "two different coordinate systems")]
    [InlineData("UPDATE gpkg_spatial_ref_sys SET organization = 'NONE', organization_coordsys_id = 7, definition = 'undefined'", "is not known here, and its definition is not understood")]
    [InlineData("DELETE FROM gpkg_spatial_ref_sys", "is not among its spatial reference systems")]
    [InlineData("DELETE FROM gpkg_contents", "no layer of features")]
    [InlineData("DROP TABLE gpkg_contents", "no GeoPackage")]
    [InlineData("DROP TABLE a", "damaged")]
    [InlineData("UPDATE gpkg_geometry_columns SET column_name = 'gone'", "has no column 'gone'")]
    [InlineData("UPDATE gpkg_geometry_columns SET srs_id = 'x'", "srs_id")]
    [InlineData("UPDATE a SET geom = 'text'", "the geometry is no geometry")]
    [InlineData("UPDATE a SET geom = x'4750'", "the geometry is damaged")]
    [InlineData("UPDATE a SET geom = x'47500001E610000001030000000100000000000010'", "the geometry is damaged")]
    [InlineData("UPDATE a SET geom = x'47500001E6100000010A00000001000000'", "the geometry has curves")]
    [InlineData("UPDATE a SET geom = CAST(substr(geom, 1, 4) || x'19190000' || substr(geom, 9) AS BLOB)", "the geometry says srs_id")]
    public void A_GeoPackage_that_contradicts_itself_is_refused(string sql, string words)
    {
        var path = Write(("a", "POLYGON", [Square]));
        Execute(path, sql);

        Assert.Contains(words, Refusal(path), StringComparison.Ordinal);
    }

    [Fact]
    public void A_system_without_a_known_code_is_read_from_its_definition()
    {
        var path = Write(("a", "POLYGON", [Square]));
        Execute(path, "UPDATE gpkg_spatial_ref_sys SET organization = 'NONE', organization_coordsys_id = 7");

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(BoundaryReader.Read(path)), 1e-9);
    }

    [Fact]
    public void Reading_leaves_nothing_beside_the_file_even_when_its_name_is_odd()
    {
        var path = Write(("a", "POLYGON", [Square]));
        var odd = Path.Combine(_folder, "ä b#c?d%41;e=f.gpkg");
        File.Move(path, odd);
        Execute(odd, "PRAGMA journal_mode=WAL");
        var before = Directory.GetFiles(_folder);

        Assert.Equal(SquareArea, AreaOf.SquareKilometres(BoundaryReader.Read(odd)), 1e-9);
        Assert.Equal(before, Directory.GetFiles(_folder));
    }

    [Fact]
    public void Changes_that_stand_in_a_second_file_are_not_passed_over()
    {
        var path = Write(("a", "POLYGON", [Square]));
        File.WriteAllText(path + "-wal", "changes");

        Assert.Contains("-wal", Refusal(path), StringComparison.Ordinal);
    }

    private static string Refusal(string path, BoundaryOptions? options = null) => Assert.Throws<InputException>(() => BoundaryReader.Read(path, options)).Message;

    private string Write(params (string Name, string Type, string[] Geometries)[] layers)
    {
        var path = Path.Combine(_folder, Path.GetRandomFileName() + ".gpkg");
        Execute(
            path,
            "PRAGMA application_id = 1196444487; PRAGMA user_version = 10300;"
            + "CREATE TABLE gpkg_spatial_ref_sys (srs_name TEXT, srs_id INTEGER PRIMARY KEY, organization TEXT, organization_coordsys_id INTEGER, definition TEXT, description TEXT);"
            + "CREATE TABLE gpkg_contents (table_name TEXT PRIMARY KEY, data_type TEXT, identifier TEXT, srs_id INTEGER);"
            + "CREATE TABLE gpkg_geometry_columns (table_name TEXT, column_name TEXT, geometry_type_name TEXT, srs_id INTEGER, z TINYINT, m TINYINT);"
            + $"INSERT INTO gpkg_spatial_ref_sys VALUES ('WGS 84', 4326, 'EPSG', 4326, '{Wgs84Text}', '')");
        foreach (var (name, type, geometries) in layers)
        {
            var quoted = GeoPackageLayers.Quoted(name);
            Execute(path, $"CREATE TABLE {quoted} (fid INTEGER PRIMARY KEY, geom BLOB, name TEXT, count INTEGER, share REAL, blank TEXT, picture BLOB)");
            Execute(path, "INSERT INTO gpkg_contents VALUES ($p0, 'features', $p1, 4326)", name, $"the {name} layer");
            Execute(path, "INSERT INTO gpkg_geometry_columns VALUES ($p0, 'geom', $p1, 4326, 0, 0)", name, type);
            foreach (var geometry in geometries)
            {
                Execute(path, $"INSERT INTO {quoted} (geom, name, count, share, picture) VALUES ($p0, 'Ås', 7, 0.1, x'00')", Blob(geometry));
            }
        }

        return path;
    }

    private static byte[] Blob(string text)
    {
        var geometry = new WKTReader().Read(text);
        geometry.SRID = 4326;
        return new GeoPackageGeoWriter { HandleOrdinates = text.Contains(" Z", StringComparison.Ordinal) ? NetTopologySuite.Geometries.Ordinates.XYZ : NetTopologySuite.Geometries.Ordinates.XY }.Write(geometry);
    }

    private static void Execute(string path, string sql, params object[] values)
    {
        using var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = path, Pooling = false }.ConnectionString);
        connection.Open();
        using var command = connection.CreateCommand();
        command.CommandText = sql;
        for (var i = 0; i < values.Length; i++)
        {
            command.Parameters.AddWithValue($"$p{i}", values[i]);
        }

        command.ExecuteNonQuery();
    }
}
