namespace SurveyPlanner.Files.Boundaries;

/// <summary>What the user says about a boundary file that the file itself does not.</summary>
public sealed record BoundaryOptions
{
    /// <summary>Nothing is said: the file speaks for itself.</summary>
    public static readonly BoundaryOptions Default = new();

    /// <summary>Which layer to read of a file that holds several (GeoPackage table, shapefile of an archive or folder, folder of a KML file).</summary>
    public string? Layer { get; init; }

    /// <summary>Coordinate system, as <c>EPSG:n</c>, for a file that does not say its own. It must not contradict the file.</summary>
    public string? Crs { get; init; }

    /// <summary>What messages call the file; its file name unless given.</summary>
    public string? Name { get; init; }
}
