using System.Globalization;
using System.Runtime.InteropServices;
using Microsoft.Data.Sqlite;
using NetTopologySuite.Geometries;
using NetTopologySuite.IO;
using SQLitePCL;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// A GeoPackage 1.3 (OGC 12-128r17) in memory, all layers WGS 84: the tables of the standard and feature tables with geometry blobs.
/// </summary>
internal sealed class GeoPackageFile : IDisposable
{
    private const int Wgs84 = 4326;

    /// <summary>The standard asks for a time of change; a time of day would make the same plan give other bytes, so it is always this.</summary>
    private const string NoTime = "2000-01-01T00:00:00.000Z";

    // Identifier "GPKG" and version 1.3.0, as the standard gives them.
    private const string Tables = """
        PRAGMA application_id = 1196444487;
        PRAGMA user_version = 10300;
        CREATE TABLE gpkg_spatial_ref_sys (
          srs_name TEXT NOT NULL, srs_id INTEGER NOT NULL PRIMARY KEY, organization TEXT NOT NULL,
          organization_coordsys_id INTEGER NOT NULL, definition TEXT NOT NULL, description TEXT);
        CREATE TABLE gpkg_contents (
          table_name TEXT NOT NULL PRIMARY KEY, data_type TEXT NOT NULL, identifier TEXT UNIQUE, description TEXT DEFAULT '',
          last_change DATETIME NOT NULL DEFAULT (strftime('%Y-%m-%dT%H:%M:%fZ','now')),
          min_x DOUBLE, min_y DOUBLE, max_x DOUBLE, max_y DOUBLE, srs_id INTEGER,
          CONSTRAINT fk_gc_r_srs_id FOREIGN KEY (srs_id) REFERENCES gpkg_spatial_ref_sys(srs_id));
        CREATE TABLE gpkg_geometry_columns (
          table_name TEXT NOT NULL, column_name TEXT NOT NULL, geometry_type_name TEXT NOT NULL, srs_id INTEGER NOT NULL,
          z TINYINT NOT NULL, m TINYINT NOT NULL,
          CONSTRAINT pk_geom_cols PRIMARY KEY (table_name, column_name), CONSTRAINT uk_gc_table_name UNIQUE (table_name),
          CONSTRAINT fk_gc_tn FOREIGN KEY (table_name) REFERENCES gpkg_contents(table_name),
          CONSTRAINT fk_gc_srs FOREIGN KEY (srs_id) REFERENCES gpkg_spatial_ref_sys (srs_id));
        INSERT INTO gpkg_spatial_ref_sys VALUES
          ('Undefined Cartesian SRS', -1, 'NONE', -1, 'undefined', 'undefined Cartesian coordinate reference system'),
          ('Undefined geographic SRS', 0, 'NONE', 0, 'undefined', 'undefined geographic coordinate reference system'),
          ('WGS 84 geodetic', 4326, 'EPSG', 4326,
           'GEOGCS["WGS 84",DATUM["WGS_1984",SPHEROID["WGS 84",6378137,298.257223563,AUTHORITY["EPSG","7030"]],AUTHORITY["EPSG","6326"]],PRIMEM["Greenwich",0,AUTHORITY["EPSG","8901"]],UNIT["degree",0.0174532925199433,AUTHORITY["EPSG","9122"]],AUTHORITY["EPSG","4326"]]',
           'longitude/latitude coordinates in decimal degrees on the WGS 84 spheroid');
        """;

    private readonly SqliteConnection _connection = new("Data Source=:memory:;Pooling=False");

    public GeoPackageFile()
    {
        _connection.Open();
        Execute(Tables);
    }

    /// <summary>Adds a layer.</summary>
    /// <param name="name">Its table.</param>
    /// <param name="description">What it is, for people.</param>
    /// <param name="geometryType">GEOMETRY, POINT, MULTILINESTRING or MULTIPOLYGON.</param>
    /// <param name="columns">Columns beside the geometry: name and SQL type. Names are ours and never a user's.</param>
    /// <param name="rows">Geometry and values in the order of the columns, null where one does not apply.</param>
    public void AddLayer(
        string name, string description, string geometryType, IReadOnlyList<(string Name, string Type)> columns, IEnumerable<(Geometry Geometry, object?[] Values)> rows)
    {
        var declared = string.Concat(columns.Select(column => $", \"{column.Name}\" {column.Type}"));
        Execute($"CREATE TABLE \"{name}\" (fid INTEGER PRIMARY KEY AUTOINCREMENT NOT NULL, geom {geometryType}{declared})");
        var extent = new Envelope();
        using (var transaction = _connection.BeginTransaction())
        {
            using var insert = Insert(name, columns, transaction);
            var writer = new GeoPackageGeoWriter { HandleOrdinates = Ordinates.XY };
            foreach (var (geometry, values) in rows)
            {
                geometry.SRID = Wgs84;
                extent.ExpandToInclude(geometry.EnvelopeInternal);
                insert.Parameters[0].Value = writer.Write(geometry);
                for (var i = 0; i < values.Length; i++)
                {
                    insert.Parameters[i + 1].Value = values[i] ?? DBNull.Value;
                }

                insert.ExecuteNonQuery();
            }

            transaction.Commit();
        }

        Register(name, description, geometryType, extent);
    }

    /// <summary>The database as the bytes of a file.</summary>
    public byte[] ToBytes()
    {
        var memory = raw.sqlite3_serialize(_connection.Handle, "main", out var size, 0);
        try
        {
            var bytes = new byte[size];
            Marshal.Copy(memory, bytes, 0, bytes.Length);
            return bytes;
        }
        finally
        {
            raw.sqlite3_free(memory);
        }
    }

    public void Dispose() => _connection.Dispose();

    private SqliteCommand Insert(string name, IReadOnlyList<(string Name, string Type)> columns, SqliteTransaction transaction)
    {
        var command = _connection.CreateCommand();
        command.Transaction = transaction;
        var names = string.Concat(columns.Select(column => $", \"{column.Name}\""));
        var places = string.Concat(columns.Select((_, i) => $", $p{(i + 1).ToString(CultureInfo.InvariantCulture)}"));
        command.CommandText = $"INSERT INTO \"{name}\" (geom{names}) VALUES ($p0{places})";
        for (var i = 0; i <= columns.Count; i++)
        {
            command.Parameters.Add(new SqliteParameter($"$p{i.ToString(CultureInfo.InvariantCulture)}", value: null));
        }

        return command;
    }

    private void Register(string name, string description, string geometryType, Envelope extent)
    {
        using var command = _connection.CreateCommand();
        command.CommandText = """
            INSERT INTO gpkg_contents VALUES ($name, 'features', $name, $description, $time, $west, $south, $east, $north, $srs);
            INSERT INTO gpkg_geometry_columns VALUES ($name, 'geom', $type, $srs, 0, 0);
            """;
        command.Parameters.AddWithValue("$name", name);
        command.Parameters.AddWithValue("$description", description);
        command.Parameters.AddWithValue("$type", geometryType);
        command.Parameters.AddWithValue("$time", NoTime);
        command.Parameters.AddWithValue("$srs", Wgs84);
        command.Parameters.AddWithValue("$west", extent.IsNull ? DBNull.Value : extent.MinX);
        command.Parameters.AddWithValue("$south", extent.IsNull ? DBNull.Value : extent.MinY);
        command.Parameters.AddWithValue("$east", extent.IsNull ? DBNull.Value : extent.MaxX);
        command.Parameters.AddWithValue("$north", extent.IsNull ? DBNull.Value : extent.MaxY);
        command.ExecuteNonQuery();
    }

    private void Execute(string sql)
    {
        using var command = _connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }
}
