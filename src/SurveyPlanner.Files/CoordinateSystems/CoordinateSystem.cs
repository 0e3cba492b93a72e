using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>Coordinates that a boundary file can be in, and the way from there to degrees on WGS 84.</summary>
public abstract class CoordinateSystem
{
    /// <summary>Its name with its code if it has one, such as <c>NAD83 / Alaska Albers (EPSG:3338)</c>.</summary>
    public abstract string Name { get; }

    /// <summary>True when coordinates are longitude and latitude in degrees; false when they are lengths in a plane.</summary>
    public abstract bool IsGeographic { get; }

    /// <summary>Metres in one unit of a plane system; 1 for a geographic one.</summary>
    public virtual double MetresPerUnit => 1;

    /// <summary>Degrees in one unit of a geographic system, which is nearly always 1.</summary>
    public virtual double DegreesPerUnit => 1;

    /// <summary>How the datum is brought to WGS 84 and how well, for the user to read; null when it is WGS 84.</summary>
    public virtual string? DatumShift => null;

    /// <summary>True when coordinates are WGS 84 degrees already.</summary>
    public virtual bool IsWgs84Degrees => false;

    /// <summary>To WGS 84 degrees, from the file's units, or from degrees if the system is geographic. NaN when the point lies outside what the system can hold.</summary>
    public abstract LonLat ToWgs84(double x, double y);
}
