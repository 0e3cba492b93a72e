using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>Longitude and latitude on WGS 84: nothing to convert.</summary>
internal sealed class Wgs84Degrees : CoordinateSystem
{
    public static readonly Wgs84Degrees Instance = new();

    public override string Name => "WGS 84, longitude and latitude in degrees (EPSG:4326)";

    public override bool IsGeographic => true;

    public override bool IsWgs84Degrees => true;

    public override LonLat ToWgs84(double x, double y) => new(x, y);
}
