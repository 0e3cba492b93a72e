namespace SurveyPlanner.Regions;

/// <summary>Bounding box in degrees; across 180° <see cref="West"/> is larger than <see cref="East"/>.</summary>
public readonly record struct GeographicExtent(double West, double South, double East, double North)
{
    /// <summary>Of a shape in the plane of a projection. A region round a pole reaches all longitudes.</summary>
    internal static GeographicExtent Of(IEnumerable<PlaneShape> shapes, EqualAreaProjection projection)
    {
        // The nearer pole: no plane reaches from one to the other.
        var pole = new LonLat(0, Math.CopySign(90, projection.Centre.Lat));
        var polePoint = projection.Project(pole);
        double west = 180, east = -180, south = 90, north = -90;
        foreach (var shape in shapes)
        {
            if (Holds(shape, polePoint))
            {
                (west, east) = (-180, 180);
                (south, north) = (Math.Min(south, pole.Lat), Math.Max(north, pole.Lat));
            }

            for (var i = 0; i < shape.VertexCount; i++)
            {
                var position = projection.Unproject(new PlanePoint(shape.X[i], shape.Y[i]));
                var fromCentre = Longitude.From(projection.Centre.Lon, position.Lon);
                (west, east) = (Math.Min(west, fromCentre), Math.Max(east, fromCentre));
                (south, north) = (Math.Min(south, position.Lat), Math.Max(north, position.Lat));
            }
        }

        if (east - west == 360)
        {
            return new GeographicExtent(-180, south, 180, north);
        }

        return new GeographicExtent(
            Longitude.Normalise(projection.Centre.Lon + west), south, Longitude.Normalise(projection.Centre.Lon + east), north);
    }

    /// <summary>Whether a ray from the point crosses the edges an odd number of times.</summary>
    private static bool Holds(PlaneShape shape, PlanePoint point)
    {
        var isInside = false;
        for (var ring = 0; ring < shape.RingCount; ring++)
        {
            var (start, end) = (shape.RingStarts[ring], shape.RingStarts[ring + 1]);
            for (var (i, before) = (start, end - 1); i < end; before = i++)
            {
                var crosses = shape.Y[i] > point.Y != shape.Y[before] > point.Y
                    && point.X < shape.X[i] + ((shape.X[before] - shape.X[i]) * (point.Y - shape.Y[i]) / (shape.Y[before] - shape.Y[i]));
                isInside ^= crosses;
            }
        }

        return isInside;
    }
}
