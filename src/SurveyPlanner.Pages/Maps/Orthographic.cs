using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// The half of a sphere seen from far away, orthographic (Snyder 1987, USGS Professional Paper 1395, eq. 20-3 and 20-4, p. 149).
/// </summary>
/// <param name="Lon">Longitude of the middle, degrees.</param>
/// <param name="Lat">Latitude of it.</param>
/// <param name="Radius">Radius, pixels; the middle is the origin.</param>
internal sealed record Orthographic(double Lon, double Lat, double Radius)
{
    private readonly double _sin = Math.Sin(Lat * Math.PI / 180);
    private readonly double _cos = Math.Cos(Lat * Math.PI / 180);

    /// <summary>Place on the drawing and how far on this side of the globe it is; negative beyond the limb.</summary>
    public (Pixel Place, double Towards) At(LonLat p)
    {
        var (phi, lambda) = (p.Lat * Math.PI / 180, (p.Lon - Lon) * Math.PI / 180);
        var towards = (_sin * Math.Sin(phi)) + (_cos * Math.Cos(phi) * Math.Cos(lambda));
        var x = Math.Cos(phi) * Math.Sin(lambda);
        var y = (_cos * Math.Sin(phi)) - (_sin * Math.Cos(phi) * Math.Cos(lambda));
        return (new Pixel(Radius * x, -Radius * y), towards);
    }

    public void Trace(PathData path, IEnumerable<LonLat> line)
    {
        var open = new List<Pixel>();
        foreach (var (place, towards) in line.Select(At).Append((default, -1)))
        {
            if (towards >= 0)
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

    /// <summary>Land in sight: rings cut at the limb, and joined along it.</summary>
    public string Land()
    {
        var path = new PathData();
        foreach (var ring in LandOutline.Rings)
        {
            var seen = InSight([.. ring.Select(At)]);
            if (seen.Count > 2)
            {
                path.Ring(seen.ToArray());
            }
        }

        return path.ToString();
    }

    private List<Pixel> InSight((Pixel Place, double Towards)[] ring)
    {
        var seen = new List<Pixel>();

        // Begun at a place in sight, a ring leaves before it enters.
        var first = Array.FindIndex(ring, place => place.Towards >= 0);
        Pixel left = default;
        for (var i = 0; first >= 0 && i < ring.Length; i++)
        {
            var (a, b) = (ring[(first + i) % ring.Length], ring[(first + i + 1) % ring.Length]);
            if (a.Towards >= 0)
            {
                seen.Add(a.Place);
            }

            if (a.Towards >= 0 && b.Towards < 0)
            {
                left = Limb(a, b);
            }
            else if (a.Towards < 0 && b.Towards >= 0)
            {
                seen.AddRange(Arc(left, Limb(a, b)));
            }
        }

        return seen;
    }

    // Where the straight line through the globe from one place to the other crosses the plane of the limb.
    private Pixel Limb((Pixel Place, double Towards) a, (Pixel Place, double Towards) b)
    {
        var share = a.Towards / (a.Towards - b.Towards);
        var (x, y) = (a.Place.X + (share * (b.Place.X - a.Place.X)), a.Place.Y + (share * (b.Place.Y - a.Place.Y)));
        var distance = Math.Max(Math.Sqrt((x * x) + (y * y)), 1e-9);
        return new Pixel(x / distance * Radius, y / distance * Radius);
    }

    // The shorter way along the limb.
    private IEnumerable<Pixel> Arc(Pixel from, Pixel to)
    {
        const int Steps = 12;
        var start = Math.Atan2(from.Y, from.X);
        var turn = Math.IEEERemainder(Math.Atan2(to.Y, to.X) - start, 2 * Math.PI);
        return Enumerable.Range(0, Steps + 1).Select(i => start + (turn * i / Steps))
            .Select(angle => new Pixel(Radius * Math.Cos(angle), Radius * Math.Sin(angle)));
    }
}
