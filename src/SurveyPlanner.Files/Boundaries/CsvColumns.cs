namespace SurveyPlanner.Files.Boundaries;

/// <summary>Which columns of a vertex list hold what; -1 where there is none.</summary>
internal sealed record CsvColumns(int X, int Y, bool AreDegrees, int Part, int Ring)
{
    private static readonly string[] Latitudes = ["lat", "latitude", "lat_dd", "latitude_dd", "lat_wgs84", "latitude_wgs84", "lat_deg", "lat_ddm"];
    private static readonly string[] Longitudes = ["lon", "long", "lng", "longitude", "lon_dd", "longitude_dd", "lon_wgs84", "longitude_wgs84", "lon_deg", "lon_ddm"];
    private static readonly string[] Eastings = ["x", "easting", "east", "e", "utm_x", "utm_e", "utm_easting", "x_m", "easting_m", "point_x"];
    private static readonly string[] Northings = ["y", "northing", "north", "n", "utm_y", "utm_n", "utm_northing", "y_m", "northing_m", "point_y"];

    public static CsvColumns Find(CsvTable table, string source)
    {
        var header = table.Header.Select(name => name.Trim('\uFEFF').ToLowerInvariant().Replace(' ', '_').Replace("(", "", StringComparison.Ordinal).Replace(")", "", StringComparison.Ordinal)).ToList();
        if (One(header, Latitudes, "latitude", source) is var lat and >= 0 && One(header, Longitudes, "longitude", source) is var lon and >= 0)
        {
            return new CsvColumns(lon, lat, AreDegrees: true, header.IndexOf("part"), header.IndexOf("ring"));
        }

        if (One(header, Eastings, "x", source) is var x and >= 0 && One(header, Northings, "y", source) is var y and >= 0)
        {
            return new CsvColumns(x, y, AreDegrees: false, header.IndexOf("part"), header.IndexOf("ring"));
        }

        throw new InputException(new Problem(
            $"the first line must name the columns, among them lat and lon (or x and y), but it has {LayerChoice.Listed(table.Header)}; if this is no list of vertices, save the boundary as GeoJSON, GeoPackage, shapefile or KML",
            source,
            1));
    }

    private static int One(List<string> header, string[] names, string what, string source)
    {
        var found = Enumerable.Range(0, header.Count).Where(i => names.Contains(header[i])).ToList();
        return found.Count switch
        {
            0 => -1,
            1 => found[0],
            _ => throw new InputException(new Problem($"two columns could be the {what}: {LayerChoice.Listed(found.Select(i => header[i]))}; remove one of them", source, 1)),
        };
    }
}
