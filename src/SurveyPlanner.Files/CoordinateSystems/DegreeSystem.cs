using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>Longitude and latitude on a datum of its own, in degrees or another angle.</summary>
internal sealed class DegreeSystem(string name, Datum datum, double degreesPerUnit = 1) : CoordinateSystem
{
    public override string Name => name;

    public override bool IsGeographic => true;

    public override double DegreesPerUnit => degreesPerUnit;

    /// <summary>A datum that is taken as WGS 84 needs no conversion at all.</summary>
    public override bool IsWgs84Degrees => datum.Shifts.Count == 0 && datum.PrimeMeridian == 0;

    public override string? DatumShift => datum.Statement;

    public override LonLat ToWgs84(double x, double y) => datum.ToWgs84(x, y);
}
