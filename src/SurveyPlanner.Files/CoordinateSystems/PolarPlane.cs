using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>A polar plane for boundaries in degrees that go round a pole, where they are polygons; metres.</summary>
internal sealed class PolarPlane(bool north, CoordinateSystem degrees) : CoordinateSystem
{
    private readonly AzimuthalEqualArea _plane = new(new LonLat(0, north ? 90 : -90));

    /// <summary>The file's own system: the plane is only our working place.</summary>
    public override string Name => degrees.Name;

    public override bool IsGeographic => false;

    public override string? DatumShift => degrees.DatumShift;

    public FilePoint FromDegrees(FilePoint point)
    {
        var position = degrees.ToWgs84(point.X, point.Y);
        var projected = _plane.Project(position);
        return new FilePoint(projected.X, projected.Y);
    }

    public override LonLat ToWgs84(double x, double y) => _plane.Unproject(new PlanePoint(x, y));
}
