namespace SurveyPlanner.Files.Boundaries;

/// <summary>A boundary in a zip archive: a shapefile, a KML file (then it is a KMZ) or a GeoJSON file. Nothing is unpacked to disk.</summary>
internal static class ZipBoundary
{
    private static readonly string[] Readable = [".shp", ".kml", ".geojson", ".json"];

    public static RawBoundary Read(byte[] bytes, string source, BoundaryOptions options, RepairLog log)
    {
        using var members = new ZipMembers(bytes, source);
        var names = members.Names;
        var candidates = names.Where(name => Readable.Contains(Extension(name))).Order(StringComparer.Ordinal).ToList();

        if (candidates.Count > 0 && candidates.TrueForAll(name => Extension(name) == ".kml"))
        {
            // A KMZ. Some programs put each layer into a file of its own and link them together; all lie in the archive and are read.
            return KmlBoundary.Read([.. candidates.Select(members.Read)], source, log, options.Layer);
        }

        var name = Choose(candidates, names, source, options);
        return Extension(name) switch
        {
            ".shp" => ShapefileBoundary.Read(ShapefileParts.From(name, names, members.Read), source, log),
            ".kml" => KmlBoundary.Read([members.Read(name)], source, log, layer: null),
            _ => GeoJsonBoundary.Read(members.Read(name), source, log),
        };
    }

    private static string Choose(List<string> candidates, IReadOnlyList<string> names, string source, BoundaryOptions options)
    {
        if (candidates.Count == 0)
        {
            throw FileBytes.Refusal(source, NothingToRead(names));
        }

        if (options.Layer is { } layer)
        {
            return LayerChoice.Of(candidates, layer, Path.GetFileNameWithoutExtension, source, "file");
        }

        return candidates.Count == 1
            ? candidates[0]
            : throw FileBytes.Refusal(source, $"the archive holds several boundaries: {LayerChoice.Listed(candidates.Select(Path.GetFileNameWithoutExtension)!)}; say which with layer in [region]");
    }

    private static string NothingToRead(IReadOnlyList<string> names)
    {
        if (names.Contains("[Content_Types].xml"))
        {
            return "this is an Office document; save the vertex list as CSV";
        }

        if (names.Any(name => Extension(name) is ".gpkg"))
        {
            return "the archive holds a GeoPackage; unpack it and name the .gpkg file";
        }

        return names.Any(name => name.Contains(".gdb/", StringComparison.OrdinalIgnoreCase))
            ? "the archive holds a file geodatabase, which is not read; export the layer as GeoPackage or shapefile"
            : "the archive holds no .shp, .kml or .geojson file; put the boundary into it";
    }

    private static string Extension(string name) => Path.GetExtension(name).ToLowerInvariant();
}
