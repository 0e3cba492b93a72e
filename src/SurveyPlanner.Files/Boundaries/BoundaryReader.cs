using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// The front door to boundary files: finds out the format from the content, reads it, and hands on degrees on WGS 84.
/// </summary>
public static class BoundaryReader
{
    /// <summary>
    /// Reads a boundary file.
    /// </summary>
    /// <param name="path">The file, or the folder of a shapefile.</param>
    /// <param name="options">What the user says that the file does not.</param>
    /// <returns>
    /// Polygons in degrees on WGS 84 with edges straight in longitude and latitude, rings closed, longitudes running on within a ring (beyond
    /// ±180 where it crosses 180°) and all rings within one turn. A ring round a pole ends a whole turn of longitude from where it began, at
    /// the same place. Winding is as the file has it. Repairs and warnings are in the notices.
    /// </returns>
    /// <exception cref="InputException">The file cannot be understood without a guess, or is missing: one plain sentence each.</exception>
    /// <exception cref="IOException">The file is there but cannot be read.</exception>
    /// <remarks>
    /// Accuracy: edges that are straight in the file's own projection stray by less than 1 m and change the area by less than 1e-6.
    /// Cost is bounded: at most 300 MB and 2 million vertices.
    /// </remarks>
    public static Boundary Read(string path, BoundaryOptions? options = null)
    {
        options ??= BoundaryOptions.Default;
        var source = options.Name ?? Path.GetFileName(path);
        if (!File.Exists(path) && !Directory.Exists(path))
        {
            throw FileBytes.Refusal(source, "there is no such boundary file; correct its name or path");
        }

        var log = new RepairLog();
        var raw = GeoJsonBoundary.Read(FileBytes.Read(path, source), source, log);
        return BoundaryAssembly.Assemble(raw, source, options, log);
    }
}
