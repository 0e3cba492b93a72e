using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// The small globe that shows where on Earth the region lies: orthographic, on a sphere (Snyder 1987, USGS Prof. Paper 1395, eq. 20-3 and 20-4).
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
        var view = new View(place.Lon, place.Lat / 2, radius);
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

    private sealed record View(double Lon, double Lat, double Radius)
    {
        private readonly double _sin = Math.Sin(Lat * Math.PI / 180);
        private readonly double _cos = Math.Cos(Lat * Math.PI / 180);

        /// <summary>Place on the drawing and whether it is on this side of the globe.</summary>
        public (Pixel Place, bool InSight) At(LonLat p)
        {
            var (phi, lambda) = (p.Lat * Math.PI / 180, (p.Lon - Lon) * Math.PI / 180);
            var towards = (_sin * Math.Sin(phi)) + (_cos * Math.Cos(phi) * Math.Cos(lambda));
            var x = Math.Cos(phi) * Math.Sin(lambda);
            var y = (_cos * Math.Sin(phi)) - (_sin * Math.Cos(phi) * Math.Cos(lambda));
            return (new Pixel(Radius * x, -Radius * y), towards >= 0);
        }

        public void Trace(PathData path, IEnumerable<LonLat> line)
        {
            var open = new List<Pixel>();
            foreach (var (place, inSight) in line.Select(At).Append((default, false)))
            {
                if (inSight)
                {
                    open.Add(place);
                    continue;
                }

                if (open.Count > 1)
                {
                    path.Polyline(open.ToArray());
                }

                open.Clear();
            }
        }

        /// <summary>Land in sight. Places beyond the limb are drawn on the limb: on so small a globe the eye sees no difference.</summary>
        public string Land()
        {
            var path = new PathData();
            foreach (var ring in LandOutline.Rings)
            {
                var places = ring.Select(At).ToArray();
                if (places.Any(p => p.InSight))
                {
                    path.Ring([.. places.Select(p => p.InSight ? p.Place : OnLimb(p.Place))]);
                }
            }

            return path.ToString();
        }

        private Pixel OnLimb(Pixel p)
        {
            var distance = Math.Max(p.DistanceTo(default), 1e-9);
            return new Pixel(p.X / distance * Radius, p.Y / distance * Radius);
        }
    }
}
