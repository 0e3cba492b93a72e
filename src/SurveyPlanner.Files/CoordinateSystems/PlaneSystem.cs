using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>Coordinates in the plane of a map projection.</summary>
internal sealed class PlaneSystem(string name, Datum datum, PlaneMethod method, ProjectionParameters parameters, double metresPerUnit) : CoordinateSystem
{
    public override string Name => name;

    public override bool IsGeographic => false;

    public override double MetresPerUnit => metresPerUnit;

    public override string? DatumShift => datum.Statement;

    public override LonLat ToWgs84(double x, double y)
    {
        var (lon, lat) = ToOwnDatum(x, y);
        return datum.ToWgs84(lon, lat);
    }

    /// <summary>Degrees on the system's own datum, longitude counted from its prime meridian.</summary>
    public (double Lon, double Lat) ToOwnDatum(double x, double y)
        => method.Inverse((x * metresPerUnit) - parameters.FalseEastingMetres, (y * metresPerUnit) - parameters.FalseNorthingMetres);
}
