namespace SurveyPlanner.Files.Boundaries;

/// <summary>A shapefile that lies open in a folder, named by the folder or by its .shp.</summary>
internal static class ShapefileFolder
{
    /// <summary>The one shapefile of a folder, or the one that the layer names.</summary>
    public static string Find(string folder, string source, BoundaryOptions options)
    {
        var files = Directory.GetFiles(folder).Where(file => HasExtension(file, ".shp")).Order(StringComparer.Ordinal).ToList();
        if (files.Count == 0)
        {
            throw FileBytes.Refusal(source, folder.TrimEnd('/', '\\').EndsWith(".gdb", StringComparison.OrdinalIgnoreCase)
                ? "this is a file geodatabase, which is not read; export the layer as GeoPackage or shapefile"
                : "the folder holds no .shp file; name the boundary file itself");
        }

        if (options.Layer is { } layer)
        {
            return LayerChoice.Of(files, layer, Path.GetFileNameWithoutExtension, source, "shapefile");
        }

        return files.Count == 1
            ? files[0]
            : throw FileBytes.Refusal(source, $"the folder holds several shapefiles: {LayerChoice.Listed(files.Select(Path.GetFileNameWithoutExtension)!)}; say which with layer in [region], or name its .shp file");
    }

    public static ShapefileParts Parts(string shp, string source, InputFiles files)
        => ShapefileParts.From(Path.GetFullPath(shp), Directory.GetFiles(Path.GetDirectoryName(Path.GetFullPath(shp))!), file => FileBytes.Read(file, source, files));

    private static bool HasExtension(string file, string extension) => string.Equals(Path.GetExtension(file), extension, StringComparison.OrdinalIgnoreCase);
}
