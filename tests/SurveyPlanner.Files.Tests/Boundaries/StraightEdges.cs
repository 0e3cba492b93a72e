using SurveyPlanner.Files.CoordinateSystems;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>
/// Edges are straight in the file's own system: what comes out may stray from them by less than a metre and change the area by less than a
/// millionth. Second method: points set close together on the straight edges, each brought to degrees by itself.
/// </summary>
public class StraightEdges
{
    [Theory]
    [InlineData("EPSG:32633", 300_000, 6_000_000, 400_000)]
    [InlineData("EPSG:32633", 200_000, 9_000_000, 300_000)]
    [InlineData("EPSG:3035", 4_000_000, 2_500_000, 1_000_000)]
    [InlineData("EPSG:3338", -500_000, 1_000_000, 900_000)]
    [InlineData("EPSG:3413", 200_000, -1_500_000, 700_000)]
    [InlineData("EPSG:2154", 300_000, 6_200_000, 500_000)]
    [InlineData("EPSG:3857", 1_000_000, 6_000_000, 1_000_000)]
    [InlineData("EPSG:6933", 1_000_000, 5_000_000, 800_000)]
    [InlineData("EPSG:27700", 200_000, 200_000, 300_000)]
    [InlineData("EPSG:26931", 600_000, 500_000, 200_000)]
    [InlineData("EPSG:28992", 100_000, 400_000, 100_000)]
    [InlineData("EPSG:5880", 4_000_000, 8_000_000, 1_000_000)]
    [InlineData("EPSG:2230", 6_000_000, 1_900_000, 500_000)]
    public void A_large_triangle_in_a_plane_keeps_its_edges(string crs, double x, double y, double size)
    {
        var system = SystemNames.Find(crs)!;
        (double X, double Y)[] corners = [(x, y), (x + size, y + (0.1 * size)), (x + (0.3 * size), y + size)];
        var text = string.Join(", ", corners.Select(corner => FormattableString.Invariant($"{corner.X:R} {corner.Y:R}")));
        var boundary = InMemory.Read(InMemory.Polygon(text), options: new() { Crs = crs });
        var shell = boundary.Features[0].Polygons[0].Shell;

        // Many more points than there are edges in what came out.
        var dense = new List<LonLat>();
        for (var edge = 0; edge < 3; edge++)
        {
            var (from, to) = (corners[edge], corners[(edge + 1) % 3]);
            const int pieces = 20_000;
            for (var i = 0; i < pieces; i++)
            {
                dense.Add(system.ToWgs84(from.X + ((to.X - from.X) * i / pieces), from.Y + ((to.Y - from.Y) * i / pieces)));
            }
        }

        var area = AreaOf.SquareKilometres(boundary);
        var denseArea = AreaOf.SquareKilometres(new GeographicPolygon([.. dense, dense[0]], []));
        Assert.InRange(Math.Abs((area / denseArea) - 1), 0, 2e-7);
        Assert.InRange(LargestDistance(dense, shell), 0, 0.3);
    }

    /// <summary>Metres from the points to the outline, walking along both.</summary>
    private static double LargestDistance(List<LonLat> points, IReadOnlyList<LonLat> outline)
    {
        var (largest, edge) = (0.0, 0);
        foreach (var point in points)
        {
            while (edge + 2 < outline.Count && Distance(point, outline[edge + 1], outline[edge + 2]) <= Distance(point, outline[edge], outline[edge + 1]))
            {
                edge++;
            }

            largest = Math.Max(largest, Distance(point, outline[edge], outline[edge + 1]));
        }

        return largest;
    }

    private static double Distance(LonLat point, LonLat from, LonLat to)
    {
        var cos = Math.Cos(point.Lat * Math.PI / 180);
        var (ux, uy) = ((to.Lon - from.Lon) * cos, to.Lat - from.Lat);
        var (px, py) = ((point.Lon - from.Lon) * cos, point.Lat - from.Lat);
        var share = Math.Clamp(((px * ux) + (py * uy)) / ((ux * ux) + (uy * uy)), 0, 1);
        var (dx, dy) = (px - (share * ux), py - (share * uy));
        return Math.Sqrt((dx * dx) + (dy * dy)) * 111_195;
    }
}
