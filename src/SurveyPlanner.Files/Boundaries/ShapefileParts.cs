namespace SurveyPlanner.Files.Boundaries;

/// <summary>The files that make up one shapefile, wherever they came from.</summary>
internal sealed record ShapefileParts(string Name, byte[] Shp, byte[]? Shx, byte[]? Dbf, byte[]? Prj, byte[]? Cpg)
{
    /// <summary>Gathers the sidecars of a .shp by their names, case apart.</summary>
    /// <param name="shp">Full name of the .shp.</param>
    /// <param name="names">Full names of all files beside it.</param>
    /// <param name="read">Reads one of them.</param>
    public static ShapefileParts From(string shp, IReadOnlyCollection<string> names, Func<string, byte[]> read)
    {
        var stem = shp[..^".shp".Length];
        return new ShapefileParts(Path.GetFileName(stem), read(shp), Sidecar(".shx"), Sidecar(".dbf"), Sidecar(".prj"), Sidecar(".cpg"));

        byte[]? Sidecar(string extension)
            => names.FirstOrDefault(name => name == stem + extension) is { } exact ? read(exact)
                : names.FirstOrDefault(name => string.Equals(name, stem + extension, StringComparison.OrdinalIgnoreCase)) is { } other ? read(other)
                : null;
    }
}
