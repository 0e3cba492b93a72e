using System.Globalization;
using Microsoft.Data.Sqlite;
using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>A feature table of a GeoPackage.</summary>
internal sealed record GeoPackageLayer(string Table, string? Identifier, string Column, string GeometryType, long SystemId);

/// <summary>The layers of a GeoPackage, which of them is meant, and the coordinate system of that one.</summary>
internal static class GeoPackageLayers
{
    // Two readings of one system may differ by the datum shift that each believes in; anything more is another system.
    private const double MostDisagreementMetres = 100;

    private static readonly string[] NoPolygonTypes = ["POINT", "MULTIPOINT", "LINESTRING", "MULTILINESTRING", "CURVE", "MULTICURVE", "CIRCULARSTRING", "COMPOUNDCURVE"];

    public static GeoPackageLayer Choose(SqliteConnection connection, string source, BoundaryOptions options, RepairLog log)
    {
        var layers = All(connection, source);
        if (layers.Count == 0)
        {
            throw FileBytes.Refusal(source, "the GeoPackage holds no layer of features; export the boundary again");
        }

        if (options.Layer is { } wanted)
        {
            // People may know a layer by its table or by the identifier that programs show.
            var byTable = layers.Exists(layer => Same(layer.Table, wanted));
            return LayerChoice.Of(layers, wanted, layer => byTable ? layer.Table : layer.Identifier ?? layer.Table, source, "layer");
        }

        if (layers.Count == 1)
        {
            return layers[0];
        }

        var polygonal = layers.Where(layer => !NoPolygonTypes.Contains(layer.GeometryType.ToUpperInvariant())).ToList();
        if (polygonal.Count != 1)
        {
            throw FileBytes.Refusal(source, $"the GeoPackage holds several layers: {LayerChoice.Listed(layers.Select(layer => layer.Table))}; say which with layer in [region]");
        }

        log.Warn($"the GeoPackage holds {layers.Count} layers; {Wording.Quote(polygonal[0].Table)} was read, the only one that can hold polygons");
        return polygonal[0];
    }

    public static string Quoted(string identifier) => "\"" + identifier.Replace("\"", "\"\"", StringComparison.Ordinal) + "\"";

    /// <summary>The system that the layer's srs_id stands for: by its code, held against its text, or by its text alone.</summary>
    public static (CoordinateSystem? System, string Origin) System(SqliteConnection connection, GeoPackageLayer layer, IReadOnlyList<RawFeature> features, string source)
    {
        var id = layer.SystemId.ToString(CultureInfo.InvariantCulture);
        if (layer.SystemId is 0 or -1)
        {
            return (null, $"srs_id {id} says that its coordinate system is undefined");
        }

        using var command = connection.CreateCommand();
        command.CommandText = "SELECT organization, organization_coordsys_id, definition FROM gpkg_spatial_ref_sys WHERE srs_id = $id";
        command.Parameters.AddWithValue("$id", layer.SystemId);
        using var reader = command.ExecuteReader();
        if (!reader.Read())
        {
            return (null, $"srs_id {id} is not among its spatial reference systems");
        }

        var (organization, code, definition) = (reader.GetString(0), reader.GetInt64(1), reader.GetString(2));
        var origin = string.Create(CultureInfo.InvariantCulture, $"srs_id {id} ({organization}:{code})");
        var byCode = SystemNames.Find(string.Create(CultureInfo.InvariantCulture, $"{organization}:{code}"));
        var byText = ByText(definition, out var fault);
        if (byCode is not null && byText is not null && SystemAgreement.Metres(byCode, byText, features) is var apart && !(apart <= MostDisagreementMetres))
        {
            throw FileBytes.Refusal(
                source,
                $"{origin} and its definition are two different coordinate systems, {Wording.Length(apart)} apart here; save the layer again, or correct gpkg_spatial_ref_sys");
        }

        return (byCode ?? byText, byCode is null && byText is null ? $"{origin} is not known here, and its definition is not understood: {fault}" : origin);
    }

    private static CoordinateSystem? ByText(string definition, out string? fault)
    {
        try
        {
            fault = null;
            return WktSystem.Parse(definition);
        }
        catch (FormatException error)
        {
            fault = error.Message;
            return null;
        }
    }

    private static List<GeoPackageLayer> All(SqliteConnection connection, string source)
    {
        if (!HasTable(connection, "gpkg_contents") || !HasTable(connection, "gpkg_geometry_columns"))
        {
            throw FileBytes.Refusal(source, "this is an SQLite database but no GeoPackage (it has no gpkg_contents); export the boundary as GeoPackage");
        }

        using var command = connection.CreateCommand();
        command.CommandText = "SELECT c.table_name, c.identifier, g.column_name, g.geometry_type_name, g.srs_id "
            + "FROM gpkg_contents c JOIN gpkg_geometry_columns g ON lower(g.table_name) = lower(c.table_name) WHERE c.data_type = 'features' ORDER BY c.table_name";
        using var reader = command.ExecuteReader();
        var layers = new List<GeoPackageLayer>();
        while (reader.Read())
        {
            layers.Add(new GeoPackageLayer(reader.GetString(0), reader.IsDBNull(1) ? null : reader.GetString(1), reader.GetString(2), reader.GetString(3), reader.GetInt64(4)));
        }

        return layers;
    }

    private static bool HasTable(SqliteConnection connection, string name)
    {
        using var command = connection.CreateCommand();
        command.CommandText = "SELECT count(*) FROM sqlite_master WHERE type IN ('table', 'view') AND lower(name) = $name";
        command.Parameters.AddWithValue("$name", name);
        return command.ExecuteScalar() is long and > 0;
    }

    private static bool Same(string a, string b) => string.Equals(a, b, StringComparison.OrdinalIgnoreCase);
}
