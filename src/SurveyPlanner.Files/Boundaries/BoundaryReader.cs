using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// The front door to boundary files: finds out the format from the content, reads it, and hands on degrees on WGS 84.
/// </summary>
public static class BoundaryReader
{
    /// <summary>
    /// Reads a boundary file: GeoJSON, shapefile (.shp, folder or zip), GeoPackage, KML, KMZ, or a CSV list of vertices.
    /// </summary>
    /// <param name="path">The file, or the folder of a shapefile.</param>
    /// <param name="options">What the user says that the file does not.</param>
    /// <param name="files">The files of the run; unless given, of this reading alone.</param>
    /// <returns>
    /// Polygons in degrees on WGS 84 with edges straight in longitude and latitude, rings closed, longitudes running on within a ring (beyond
    /// ±180 where it crosses 180°) and all rings within one turn. A ring round a pole ends a whole turn of longitude from where it began, at
    /// the same place. Winding is as the file has it. Repairs and warnings are in the notices.
    /// </returns>
    /// <exception cref="InputException">The file cannot be understood without a guess, or is missing: one plain sentence each.</exception>
    /// <exception cref="IOException">The file is there but cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The file is there but may not be read.</exception>
    /// <remarks>
    /// Accuracy: edges that are straight in the file's own projection stray by less than 1 m and change the area by less than 1e-6.
    /// Cost is bounded: at most 300 MB and 2 million vertices.
    /// </remarks>
    public static Boundary Read(string path, BoundaryOptions? options = null, InputFiles? files = null)
    {
        files ??= new InputFiles();
        options ??= BoundaryOptions.Default;
        var source = options.Name ?? Path.GetFileName(Path.TrimEndingDirectorySeparator(path));
        if (Directory.Exists(path))
        {
            return ReadShapefile(ShapefileFolder.Find(path, source, options), source, options, new RepairLog(), files);
        }

        if (!File.Exists(path))
        {
            throw FileBytes.Refusal(source, "there is no such boundary file; correct its name or path");
        }

        return Read(FileBytes.Read(path, source, files), path, source, options, files);
    }

    /// <summary>The same for a file whose bytes are at hand; what lies beside it is still looked for under its path.</summary>
    internal static Boundary Read(byte[] bytes, string path, string source, BoundaryOptions options, InputFiles files)
    {
        var log = new RepairLog();
        var format = FormatOf.Find(bytes, path, source);
        if (format == BoundaryFormat.Shapefile)
        {
            return ReadShapefile(path, source, options, log, files);
        }

        if (options.Layer is not null && format is BoundaryFormat.GeoJson or BoundaryFormat.Csv)
        {
            throw FileBytes.Refusal(source, "the file has no layers; leave layer out", "region.layer");
        }

        var raw = format switch
        {
            BoundaryFormat.GeoJson => GeoJsonBoundary.Read(bytes, source, log),
            BoundaryFormat.Zip => ZipBoundary.Read(bytes, source, options, log),
            BoundaryFormat.GeoPackage => GeoPackageBoundary.Read(path, bytes, source, options, log),
            BoundaryFormat.Kml => KmlBoundary.Read([bytes], source, log, options.Layer),
            _ => CsvBoundary.Read(bytes, source, log),
        };
        return BoundaryAssembly.Assemble(raw, source, options, log);
    }

    private static Boundary ReadShapefile(string shp, string source, BoundaryOptions options, RepairLog log, InputFiles files)
        => BoundaryAssembly.Assemble(ShapefileBoundary.Read(ShapefileFolder.Parts(shp, source, files), source, log), source, options, log);
}
