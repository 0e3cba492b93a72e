using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>Whether the numbers of a file can be what the file says they are. Says which vertex cannot, and what is likely to be the matter.</summary>
internal static class CoordinateCheck
{
    /// <summary>A turn and a half: longitudes from 0 to 360, and outlines that run on a little beyond.</summary>
    private const double MostLongitude = 540;

    /// <summary>Throws when a vertex is impossible in the system that the file is in.</summary>
    public static void Demand(RawBoundary raw, CoordinateSystem system, string source)
    {
        if (system.IsGeographic)
        {
            DemandDegrees(raw, source);
        }
        else if (raw.Rings.SelectMany(ring => ring.Points).All(IsDegrees))
        {
            throw FileBytes.Refusal(
                source,
                $"the coordinates look like degrees, but {raw.SystemOrigin} says {system.Name}; correct what is wrong of the two (degrees on WGS 84 are EPSG:4326)");
        }
    }

    /// <summary>The refusal of a file that does not say its coordinate system, with the remedy.</summary>
    public static InputException Undeclared(RawBoundary raw, string source)
    {
        var degrees = raw.Rings.SelectMany(ring => ring.Points).All(IsDegrees);
        var remedy = degrees
            ? "the numbers could be degrees: if they are longitude and latitude on WGS 84, set crs = \"EPSG:4326\" in [region]"
            : "the numbers are lengths in some projection: find its code and set it in [region], such as crs = \"EPSG:32633\"";
        return FileBytes.Refusal(source, $"the file does not say its coordinate system ({raw.SystemOrigin}); {remedy}");
    }

    private static bool IsDegrees(FilePoint point) => Math.Abs(point.X) <= 360 && Math.Abs(point.Y) <= 90;

    private static void DemandDegrees(RawBoundary raw, string source)
    {
        foreach (var ring in raw.Rings)
        {
            for (var i = 0; i < ring.Points.Count; i++)
            {
                var point = ring.Points[i];
                if (!(Math.Abs(point.Y) <= 90 && Math.Abs(point.X) <= MostLongitude))
                {
                    throw FileBytes.Refusal(source, Sentence(raw, point), Place.Vertex(ring.Place, i + 1));
                }
            }
        }
    }

    private static string Sentence(RawBoundary raw, FilePoint bad)
    {
        var found = $"the position {Wording.Number(bad.X)}, {Wording.Number(bad.Y)} is not longitude, latitude in degrees";
        if (raw.Rings.SelectMany(ring => ring.Points).All(point => Math.Abs(point.X) <= 90 && Math.Abs(point.Y) <= MostLongitude))
        {
            return $"{found}: latitude and longitude seem to be swapped (lat/lon); write longitude first";
        }

        return Math.Max(Math.Abs(bad.X), Math.Abs(bad.Y)) > 1000
            ? $"{found}: it looks like metres in a projection; say which in [region], such as crs = \"EPSG:32633\", or save the boundary in WGS 84 longitude and latitude"
            : $"{found} (latitude goes from -90 to 90); correct it, or save the boundary in WGS 84 longitude and latitude";
    }
}
