using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>Whether two descriptions of a coordinate system mean the same, judged by what they make of the file's own points.</summary>
internal static class SystemAgreement
{
    private const int Samples = 20;
    private const double MetresPerDegree = 111_195;

    /// <summary>Largest distance between the two readings of a sample of vertices; infinite when one of them cannot read a point that the other can.</summary>
    public static double Metres(CoordinateSystem a, CoordinateSystem b, IReadOnlyList<RawFeature> features)
    {
        if (a.IsGeographic != b.IsGeographic)
        {
            return double.PositiveInfinity;
        }

        var points = features.SelectMany(feature => feature.Polygons).SelectMany(polygon => polygon.Shell.Points).ToList();
        var step = Math.Max(1, points.Count / Samples);
        return points.Where((_, i) => i % step == 0).Select(point => Apart(a, b, point)).DefaultIfEmpty(0).Max();
    }

    private static double Apart(CoordinateSystem a, CoordinateSystem b, FilePoint point)
    {
        var (first, second) = (a.ToWgs84(point.X * a.DegreesPerUnit, point.Y * a.DegreesPerUnit), b.ToWgs84(point.X * b.DegreesPerUnit, point.Y * b.DegreesPerUnit));
        if (!double.IsFinite(first.Lon) && !double.IsFinite(second.Lon))
        {
            return 0;
        }

        var east = Math.IEEERemainder(first.Lon - second.Lon, 360) * Math.Cos(first.Lat * Math.PI / 180);
        var metres = Math.Sqrt((east * east) + ((first.Lat - second.Lat) * (first.Lat - second.Lat))) * MetresPerDegree;
        return double.IsFinite(metres) ? metres : double.PositiveInfinity;
    }
}
