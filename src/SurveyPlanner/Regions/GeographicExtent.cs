namespace SurveyPlanner.Regions;

/// <summary>Bounding box in degrees; across 180° <see cref="West"/> is larger than <see cref="East"/>.</summary>
public readonly record struct GeographicExtent(double West, double South, double East, double North)
{
    /// <summary>Of a shape in the plane of a projection. A region round a pole reaches all longitudes.</summary>
    internal static GeographicExtent Of(IEnumerable<PlaneShape> shapes, EqualAreaProjection projection)
    {
        double west = 180, east = -180, south = 90, north = -90;
        foreach (var shape in shapes)
        {
            for (var i = 0; i < shape.VertexCount; i++)
            {
                var position = projection.Unproject(new PlanePoint(shape.X[i], shape.Y[i]));
                var fromCentre = Longitude.From(projection.Centre.Lon, position.Lon);
                (west, east) = (Math.Min(west, fromCentre), Math.Max(east, fromCentre));
                (south, north) = (Math.Min(south, position.Lat), Math.Max(north, position.Lat));
            }
        }

        return new GeographicExtent(
            Longitude.Normalise(projection.Centre.Lon + west), south, Longitude.Normalise(projection.Centre.Lon + east), north);
    }
}
