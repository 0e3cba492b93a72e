using System.Buffers.Binary;
using System.Collections.Immutable;
using System.Globalization;
using System.Runtime.InteropServices;
using Microsoft.Data.Sqlite;
using SQLitePCL;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Reads polygons from a layer of a GeoPackage (OGC 12-128). The database is opened in memory, from the bytes that were read, so that
/// nothing is ever written beside it, and its schema is not trusted.
/// </summary>
internal static class GeoPackageBoundary
{
    private const int HeaderBytes = 100;

    // Places and values in the header: sqlite.org, "Database File Format", 1.3.3.
    private const int WriteVersion = 18;
    private const int ReadVersion = 19;
    private const byte KeepsNoLog = 1;
    private const byte KeepsLog = 2;

    public static RawBoundary Read(string path, byte[] bytes, string source, BoundaryOptions options, RepairLog log)
    {
        DemandWhole(path, bytes, source);
        var content = WithoutLog(bytes);
        var pinned = GCHandle.Alloc(content, GCHandleType.Pinned);
        try
        {
            using var connection = Open(pinned, content.Length);
            DemandSound(connection, source);
            var layer = GeoPackageLayers.Choose(connection, source, options, log);
            return ReadLayer(connection, layer, source, log);
        }
        catch (SqliteException error)
        {
            throw FileBytes.Refusal(source, $"the GeoPackage is damaged or cut short ({Wording.Harmless(error.Message.TrimEnd('.'), longest: 100)}); copy or export it again");
        }
        catch (Exception error) when (error is InvalidCastException or FormatException or OverflowException)
        {
            throw FileBytes.Refusal(source, "the GeoPackage is damaged: a table holds something else than the standard says; export it again");
        }
        finally
        {
            pinned.Free();
        }
    }

    /// <summary>A database in memory over bytes that stay where they are until it is closed.</summary>
    private static SqliteConnection Open(GCHandle content, int bytes)
    {
        var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = ":memory:", Pooling = false }.ConnectionString);
        connection.Open();
        var code = raw.sqlite3_deserialize(connection.Handle, "main", content.AddrOfPinnedObject(), bytes, bytes, raw.SQLITE_DESERIALIZE_READONLY);
        SqliteException.ThrowExceptionForRC(code, connection.Handle);
        Execute(connection, "PRAGMA trusted_schema=OFF; PRAGMA cell_size_check=ON; PRAGMA query_only=ON;");
        return connection;
    }

    /// <summary>
    /// A database that keeps its changes in a second file says so in its header, and has no such file in memory: a copy says that it
    /// keeps none (sqlite.org, "Deserialize a database": bytes 18 and 19 from 2 to 1). That no change is lost has been looked at before.
    /// </summary>
    private static byte[] WithoutLog(byte[] bytes)
    {
        if (bytes[WriteVersion] != KeepsLog && bytes[ReadVersion] != KeepsLog)
        {
            return bytes;
        }

        byte[] copy = [.. bytes];
        (copy[WriteVersion], copy[ReadVersion]) = (KeepsNoLog, KeepsNoLog);
        return copy;
    }

    private static void Execute(SqliteConnection connection, string sql)
    {
        using var command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }

    /// <summary>The header says how many pages there are: a file cut between pages would otherwise lose rows without a word.</summary>
    private static void DemandWhole(string path, byte[] bytes, string source)
    {
        if (bytes.Length < HeaderBytes)
        {
            throw FileBytes.Refusal(source, "the GeoPackage is cut short; copy or export it again");
        }

        int page = BinaryPrimitives.ReadUInt16BigEndian(bytes.AsSpan(16));
        var pageBytes = page == 1 ? 65536L : page;
        long pages = BinaryPrimitives.ReadUInt32BigEndian(bytes.AsSpan(28));
        if (pageBytes < 512 || bytes.Length % pageBytes != 0 || (pages != 0 && pages * pageBytes != bytes.Length))
        {
            throw FileBytes.Refusal(source, $"the GeoPackage should have {pages * pageBytes} bytes but has {bytes.Length}, so it is cut short (malformed); copy or export it again");
        }

        var changes = new FileInfo(path + "-wal");
        if (changes.Exists && changes.Length > 0)
        {
            throw FileBytes.Refusal(source, "another program has the GeoPackage open, or closed it badly, and its last changes stand in a second file (-wal); close it there, or export the layer again");
        }
    }

    private static void DemandSound(SqliteConnection connection, string source)
    {
        using var command = connection.CreateCommand();
        command.CommandText = "PRAGMA quick_check(1)";
        var verdict = command.ExecuteScalar() as string;
        if (verdict != "ok")
        {
            throw FileBytes.Refusal(source, "the GeoPackage is damaged (malformed database); copy or export it again");
        }
    }

    private static RawBoundary ReadLayer(SqliteConnection connection, GeoPackageLayer layer, string source, RepairLog log)
    {
        var geometries = new WkbPolygons(source, new VertexBudget(source));
        var features = new List<RawFeature>();
        using var command = connection.CreateCommand();
        command.CommandText = $"SELECT * FROM {GeoPackageLayers.Quoted(layer.Table)}";
        using var reader = command.ExecuteReader();
        var geometry = GeometryColumn(reader, layer, source);
        var number = 0;
        while (reader.Read())
        {
            number++;
            var place = Place.Feature(number);
            var polygons = reader.IsDBNull(geometry) ? [] : Polygons(geometries, reader, geometry, layer, place, source);
            if (polygons.Count == 0)
            {
                log.Warn("left out, because the geometry is empty or no polygon", place);
                continue;
            }

            features.Add(new RawFeature(number, Attributes(reader, geometry), RawPolygon.From(polygons, number)));
        }

        if (features.Count == 0)
        {
            throw FileBytes.Refusal(source, NoPolygons.Sentence(number, geometries.Lines, 0, geometries.Points));
        }

        var (system, origin) = GeoPackageLayers.System(connection, layer, features, source);
        return new RawBoundary(features, system, origin, []);
    }

    private static int GeometryColumn(SqliteDataReader reader, GeoPackageLayer layer, string source)
    {
        for (var i = 0; i < reader.FieldCount; i++)
        {
            if (string.Equals(reader.GetName(i), layer.Column, StringComparison.OrdinalIgnoreCase))
            {
                return i;
            }
        }

        throw FileBytes.Refusal(source, $"layer {Wording.Quote(layer.Table)} has no column {Wording.Quote(layer.Column)}; export the GeoPackage again");
    }

    private static List<List<List<FilePoint>>> Polygons(WkbPolygons geometries, SqliteDataReader reader, int column, GeoPackageLayer layer, string place, string source)
    {
        if (reader.GetValue(column) is not byte[] blob)
        {
            throw FileBytes.Refusal(source, "the geometry is no geometry; export the GeoPackage again", place);
        }

        var (polygons, system) = geometries.Read(blob, place);
        var isLayers = system == layer.SystemId || system is 0 or -1 || layer.SystemId is 0 or -1;
        return isLayers
            ? [.. polygons.Where(rings => rings.Count > 0 && rings[0].Count > 0)]
            : throw FileBytes.Refusal(source, $"the geometry says srs_id {system} where its layer says {layer.SystemId}; save the layer again in one coordinate system", place);
    }

    private static ImmutableSortedDictionary<string, string> Attributes(SqliteDataReader reader, int geometry)
    {
        var attributes = GeoJsonObjects.None.ToBuilder();
        for (var i = 0; i < reader.FieldCount; i++)
        {
            var text = i == geometry ? null : reader.GetValue(i) switch
            {
                string value => value,
                long value => value.ToString(CultureInfo.InvariantCulture),
                double value => Wording.Number(value),
                _ => null,
            };
            if (text is not null)
            {
                attributes[reader.GetName(i)] = text;
            }
        }

        return attributes.ToImmutable();
    }
}
