using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>A place on a drawing, pixels right of and below its upper left corner.</summary>
public readonly record struct Pixel(double X, double Y)
{
    public double DistanceTo(Pixel other) => Math.Sqrt(((X - other.X) * (X - other.X)) + ((Y - other.Y) * (Y - other.Y)));
}

/// <summary>
/// Lays the plane onto the drawing: grid north up, one scale for both axes.
/// </summary>
/// <param name="Width">Width of the drawing, pixels.</param>
/// <param name="Height">Height of it, pixels.</param>
/// <param name="Centre">The place of the plane at the middle of the drawing.</param>
/// <param name="MetresPerPixel">Scale.</param>
public sealed record MapFrame(double Width, double Height, PlanePoint Centre, double MetresPerPixel)
{
    private const double FullWidth = 960;
    private const double LeastHeight = 380;
    private const double MostHeight = 980;

    // Room for ids outside the region and for the labels of the graticule.
    private const double Margin = 46;

    public Pixel ToPixel(PlanePoint p) => new(
        (Width / 2) + ((p.X - Centre.X) / MetresPerPixel),
        (Height / 2) - ((p.Y - Centre.Y) / MetresPerPixel));

    public PlanePoint ToPlane(Pixel p) => new(
        Centre.X + ((p.X - (Width / 2)) * MetresPerPixel),
        Centre.Y - ((p.Y - (Height / 2)) * MetresPerPixel));

    public bool Contains(Pixel p) => p.X >= 0 && p.X <= Width && p.Y >= 0 && p.Y <= Height;

    /// <summary>A drawing of full width whose height suits what lies between the bounds (metres).</summary>
    public static MapFrame Around(double minX, double maxX, double minY, double maxY)
    {
        var (wide, high) = (Math.Max(maxX - minX, 1), Math.Max(maxY - minY, 1));
        var height = Math.Clamp((high / wide * (FullWidth - (2 * Margin))) + (2 * Margin), LeastHeight, MostHeight);
        var scale = Math.Max(wide / (FullWidth - (2 * Margin)), high / (height - (2 * Margin)));
        return new MapFrame(FullWidth, height, new PlanePoint((minX + maxX) / 2, (minY + maxY) / 2), scale);
    }

    /// <summary>A drawing that holds all the shapes and places.</summary>
    public static MapFrame Around(IEnumerable<PlaneShape> shapes, IEnumerable<PlanePoint> places)
    {
        var (minX, maxX, minY, maxY) = (double.MaxValue, double.MinValue, double.MaxValue, double.MinValue);
        foreach (var shape in shapes.Where(shape => !shape.IsEmpty))
        {
            (minX, maxX) = (Math.Min(minX, shape.MinX), Math.Max(maxX, shape.MaxX));
            (minY, maxY) = (Math.Min(minY, shape.MinY), Math.Max(maxY, shape.MaxY));
        }

        foreach (var place in places)
        {
            (minX, maxX) = (Math.Min(minX, place.X), Math.Max(maxX, place.X));
            (minY, maxY) = (Math.Min(minY, place.Y), Math.Max(maxY, place.Y));
        }

        return minX > maxX ? Around(0, 1, 0, 1) : Around(minX, maxX, minY, maxY);
    }
}
