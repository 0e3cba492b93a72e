using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>
/// Area of a boundary on WGS 84 with edges straight in longitude and latitude, computed here anew so that it is a second method: the integral
/// of the closed form for the area below a parallel (Snyder 1987, USGS Professional Paper 1395, eq. 3-12), Simpson's rule in pieces of 0.05°.
/// </summary>
internal static class AreaOf
{
    private const double A = 6378137.0;
    private const double F = 1 / 298.257223563;

    public static double SquareKilometres(Boundary boundary) => boundary.Features.SelectMany(feature => feature.Polygons).Sum(SquareKilometres);

    public static double SquareKilometres(GeographicPolygon polygon) => Ring(polygon.Shell) - polygon.Holes.Sum(Ring);

    private static double Ring(ImmutableArray<LonLat> ring)
    {
        Assert.Equal(ring[0].Lat, ring[^1].Lat);
        Assert.Equal(0, (ring[^1].Lon - ring[0].Lon) % 360, 1e-9);
        var total = 0.0;
        for (var i = 1; i < ring.Length; i++)
        {
            total += Beyond(ring[i - 1], ring[i], north: ring[0].Lat >= 0);
        }

        return Math.Abs(total) / 1e6;
    }

    private static double Beyond(LonLat from, LonLat to, bool north)
    {
        var east = (to.Lon - from.Lon) * Math.PI / 180;
        var pieces = (int)Math.Ceiling(Math.Abs(to.Lat - from.Lat) / 0.05) + 1;
        var sum = 0.0;
        for (var piece = 0; piece < pieces; piece++)
        {
            var (start, end) = (from.Lat + ((to.Lat - from.Lat) * piece / pieces), from.Lat + ((to.Lat - from.Lat) * (piece + 1) / pieces));
            sum += (FromPole(start) + (4 * FromPole((start + end) / 2)) + FromPole(end)) / 6 / pieces;
        }

        return east * sum;

        // Counted from the pole, not from the equator: then a ring round the pole needs no edge through it.
        double FromPole(double latitude) => Zone(latitude) - Zone(north ? 90 : -90);
    }

    /// <summary>Area between the equator and a parallel for a radian of longitude.</summary>
    private static double Zone(double latitude)
    {
        var e = Math.Sqrt(F * (2 - F));
        var sin = Math.Sin(latitude * Math.PI / 180);
        var es = e * sin;
        return A * A * (1 - (e * e)) / 2 * ((sin / (1 - (es * es))) + (Math.Atanh(es) / e));
    }
}
