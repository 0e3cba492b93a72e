using SurveyPlanner.Files.CoordinateSystems;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Lengths and areas in a file's own coordinates, good enough for tolerances and for telling by how much a repair changed something:
/// lengths to about 1 %, areas to 1e-6 in degrees and to the scale of the file's projection in a plane.
/// </summary>
internal sealed class Frame(CoordinateSystem system)
{
    private const double RadiansPerDegree = Math.PI / 180;
    private const double MetresPerDegree = 111_195;

    public bool IsGeographic => system.IsGeographic;

    /// <summary>From one point to another, metres east and north.</summary>
    public (double East, double North) Step(FilePoint from, FilePoint to)
    {
        var (east, north) = (to.X - from.X, to.Y - from.Y);
        return system.IsGeographic
            ? (east * MetresPerDegree * Math.Cos(from.Y * RadiansPerDegree), north * MetresPerDegree)
            : (east * system.MetresPerUnit, north * system.MetresPerUnit);
    }

    public double Distance(FilePoint from, FilePoint to)
    {
        var (east, north) = Step(from, to);
        return Math.Sqrt((east * east) + (north * north));
    }

    public double Perimeter(IReadOnlyList<FilePoint> ring)
    {
        var total = 0.0;
        for (var i = 0; i < ring.Count; i++)
        {
            total += Distance(ring[i], ring[(i + 1) % ring.Count]);
        }

        return total;
    }

    /// <summary>Square metres, positive when the ring runs anticlockwise. The ring is not closed.</summary>
    public double SignedArea(IReadOnlyList<FilePoint> ring)
    {
        var total = 0.0;
        for (var i = 0; i < ring.Count; i++)
        {
            var (from, to) = (ring[i], ring[(i + 1) % ring.Count]);
            total += system.IsGeographic
                ? (from.X - to.X) * RadiansPerDegree * MeanQ(from.Y, to.Y)
                : (from.X - to.X) * ((from.Y + to.Y) / 2 - ring[0].Y);
        }

        var unit = system.IsGeographic ? Ellipsoid.Wgs84.SemiMajorMetres : system.MetresPerUnit;
        return total * unit * unit;
    }

    public double Area(Outline outline) => Math.Abs(SignedArea(outline.Points));

    public double Area(Part part) => Area(part.Shell) - part.Holes.Sum(Area);

    /// <summary>A point as longitude and latitude, for messages.</summary>
    public string Position(double x, double y)
    {
        var position = system.ToWgs84(x, y);
        return Wording.Position(Math.IEEERemainder(position.Lon, 360), position.Lat);
    }

    /// <summary>Mean over an edge of the area below it down to the equator, per radian and squared semi-axis (Simpson's rule).</summary>
    private static double MeanQ(double fromLatitude, double toLatitude)
        => (HalfQ(fromLatitude) + (4 * HalfQ((fromLatitude + toLatitude) / 2)) + HalfQ(toLatitude)) / 6;

    private static double HalfQ(double latitude) => Ellipsoid.Wgs84.Q(Math.Sin(latitude * RadiansPerDegree)) / 2;
}
