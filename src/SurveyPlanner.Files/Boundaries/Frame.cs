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
    public double SignedArea(List<FilePoint> ring)
    {
        if (ring.Count == 0)
        {
            return 0;
        }

        var total = 0.0;
        var from = ring[^1];
        var below = Below(from.Y, ring[0].Y);
        foreach (var to in ring)
        {
            var belowTo = Below(to.Y, ring[0].Y);

            // In the plane the mean over an edge is that of its ends, on the ellipsoid Simpson's rule is good enough.
            var mean = system.IsGeographic
                ? (below + (4 * Below((from.Y + to.Y) / 2, ring[0].Y)) + belowTo) / 6
                : (below + belowTo) / 2;
            total += (from.X - to.X) * mean;
            (from, below) = (to, belowTo);
        }

        var unit = system.IsGeographic ? Ellipsoid.Wgs84.SemiMajorMetres : system.MetresPerUnit;
        return total * unit * unit * (system.IsGeographic ? RadiansPerDegree : 1);
    }

    public double Area(Outline outline) => Math.Abs(SignedArea(outline.Points));

    public double Area(Part part) => Area(part.Shell) - part.Holes.Sum(Area);

    /// <summary>A point as longitude and latitude, for messages.</summary>
    public string Position(double x, double y)
    {
        var position = system.ToWgs84(x, y);
        return Wording.Position(Math.IEEERemainder(position.Lon, 360), position.Lat);
    }

    /// <summary>Area below a point down to the equator per radian of longitude and squared semi-axis; in the plane, down to a base near by.</summary>
    private double Below(double y, double baseY) => system.IsGeographic ? Ellipsoid.Wgs84.Q(Math.Sin(y * RadiansPerDegree)) / 2 : y - baseY;
}
