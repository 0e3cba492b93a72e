using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// The small globe that shows where on Earth the region lies.
/// </summary>
/// <param name="Radius">Radius, pixels; the middle of the globe is the origin of its paths.</param>
/// <param name="Land">Land as one path, empty where none is in sight.</param>
/// <param name="Lines">Meridians and parallels every 30 degrees.</param>
/// <param name="Equator">The equator.</param>
/// <param name="Mark">Where the region lies.</param>
public sealed record Globe(double Radius, string Land, string Lines, string Equator, Pixel Mark)
{
    /// <param name="place">The middle of the region.</param>
    /// <param name="radius">Radius of the globe, pixels.</param>
    public static Globe Showing(LonLat place, double radius)
    {
        // Turned to the region's meridian, but only half way to its latitude: the equator stays in sight and tells the hemisphere.
        var view = new Orthographic(place.Lon, place.Lat / 2, radius);
        var lines = new PathData();
        for (var lon = -180; lon < 180; lon += 30)
        {
            view.Trace(lines, from lat in Range(-90, 90, 5) select new LonLat(lon, lat));
        }

        foreach (var lat in (ReadOnlySpan<int>)[-60, -30, 30, 60])
        {
            var parallel = lat;
            view.Trace(lines, from lon in Range(-180, 180, 5) select new LonLat(lon, parallel));
        }

        var equator = new PathData();
        view.Trace(equator, from lon in Range(-180, 180, 5) select new LonLat(lon, 0));
        return new Globe(radius, view.Land(), lines.ToString(), equator.ToString(), view.At(place).Place);
    }

    private static IEnumerable<int> Range(int from, int to, int step)
    {
        for (var i = from; i <= to; i += step)
        {
            yield return i;
        }
    }
}
