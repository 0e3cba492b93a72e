using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// A geodetic datum: its ellipsoid, its prime meridian, and how it is brought to WGS 84.
/// </summary>
/// <param name="Name">Short name, such as <c>OSGB36</c>.</param>
/// <param name="Ellipsoid">The ellipsoid that its latitudes refer to.</param>
/// <param name="PrimeMeridian">Degrees east of Greenwich.</param>
/// <param name="Shifts">Shifts to WGS 84, each for its area, tried in order; none when the datum is taken as WGS 84.</param>
/// <param name="IsWgs84">True for WGS 84 itself: then there is nothing to tell.</param>
internal sealed record Datum(string Name, Ellipsoid Ellipsoid, double PrimeMeridian, IReadOnlyList<HelmertShift> Shifts, bool IsWgs84)
{
    /// <summary>Degrees on WGS 84 from degrees on this datum, longitude counted from its prime meridian. NaN outside the areas of its shifts.</summary>
    public LonLat ToWgs84(double lon, double lat)
    {
        var greenwich = lon + PrimeMeridian;
        if (Shifts.Count == 0)
        {
            return new LonLat(greenwich, lat);
        }

        foreach (var shift in Shifts)
        {
            if (shift.Covers(greenwich, lat))
            {
                return shift.Apply(greenwich, lat, Ellipsoid);
            }
        }

        return new LonLat(double.NaN, double.NaN);
    }

    /// <summary>What the user should know about the datum; null for WGS 84.</summary>
    public string? Statement
    {
        get
        {
            if (IsWgs84)
            {
                return null;
            }

            if (Shifts.Count == 0)
            {
                return $"{Name} was taken as WGS 84, from which it differs by two metres at most";
            }

            var accuracy = Shifts.Max(shift => shift.AccuracyMetres);
            return string.Create(CultureInfo.InvariantCulture, $"{Name} was shifted to WGS 84 ({string.Join(", ", Shifts.Select(shift => shift.Origin))}), which is right to about {accuracy:0.#} m");
        }
    }
}
