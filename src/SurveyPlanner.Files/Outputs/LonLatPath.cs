using System.Collections.Immutable;
using SurveyPlanner.Layouts;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// A stretch of transect, straight in the plane from vertex to vertex, with as many vertices more as it needs to be drawn with edges
/// that are straight in longitude and latitude, as RFC 7946 and most map programs draw them: at 63°N a line of 100 km from west to east
/// that had only its ends would be drawn 390 m off.
/// </summary>
internal static class LonLatPath
{
    /// <summary>How far an edge may stray from the transect, in half-widths: nothing that changes what is counted.</summary>
    private const double StraySharePerHalfWidth = 0.02;

    /// <summary>The least stray that is looked for, metres: what 7 decimals of a degree can show.</summary>
    private const double LeastStrayMetres = 0.01;

    /// <summary>An edge is halved at most so often; at the pole itself no number would do.</summary>
    private const int MaxHalvings = 12;

    private const double MetresPerDegree = 111_195;

    public static ImmutableArray<LonLat> Of(TransectPiece piece, EqualAreaProjection projection, double halfWidthMetres)
    {
        var tolerance = Math.Max(LeastStrayMetres, StraySharePerHalfWidth * halfWidthMetres);
        var path = ImmutableArray.CreateBuilder<LonLat>(piece.Positions.Length);
        path.Add(piece.Positions[0]);
        for (var i = 1; i < piece.Positions.Length; i++)
        {
            AddBetween(path, new Edge(piece.Plane[i - 1], piece.Plane[i], piece.Positions[i - 1], piece.Positions[i]), projection, tolerance, MaxHalvings);
            path.Add(piece.Positions[i]);
        }

        return path.ToImmutable();
    }

    private static void AddBetween(
        ImmutableArray<LonLat>.Builder path, Edge edge, EqualAreaProjection projection, double tolerance, int halvings)
    {
        // The quarters too: an edge that bends both ways lies right in its middle.
        var middle = projection.Unproject(edge.PlaneAt(0.5));
        var strays = Stray(edge, 0.5, middle) > tolerance
            || Stray(edge, 0.25, projection.Unproject(edge.PlaneAt(0.25))) > tolerance
            || Stray(edge, 0.75, projection.Unproject(edge.PlaneAt(0.75))) > tolerance;
        if (strays && halvings > 0)
        {
            AddBetween(path, edge with { To = edge.PlaneAt(0.5), End = middle }, projection, tolerance, halvings - 1);
            path.Add(middle);
            AddBetween(path, edge with { From = edge.PlaneAt(0.5), Start = middle }, projection, tolerance, halvings - 1);
        }
    }

    /// <summary>Metres, on a sphere: near enough for a tolerance.</summary>
    private static double Stray(Edge edge, double share, LonLat place)
    {
        var drawn = edge.DrawnAt(share);
        var north = (place.Lat - drawn.Lat) * MetresPerDegree;
        var east = Longitude.Difference(drawn.Lon, place.Lon) * MetresPerDegree * Math.Cos(place.Lat * Math.PI / 180);
        return Math.Sqrt((north * north) + (east * east));
    }

    private readonly record struct Edge(PlanePoint From, PlanePoint To, LonLat Start, LonLat End)
    {
        public PlanePoint PlaneAt(double share) => new(From.X + (share * (To.X - From.X)), From.Y + (share * (To.Y - From.Y)));

        public LonLat DrawnAt(double share) =>
            new(Start.Lon + (share * Longitude.Difference(Start.Lon, End.Lon)), Start.Lat + (share * (End.Lat - Start.Lat)));
    }
}
