using SurveyPlanner.Pages.Words;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// What every map has besides its message: the frame, the graticule, and under it a strip with scale bar, north, globe and a line that says how it was made.
/// </summary>
/// <param name="Frame">The drawing above the strip.</param>
/// <param name="Graticule">Meridians and parallels.</param>
/// <param name="ScaleBar">Its scale.</param>
/// <param name="Globe">Where on Earth.</param>
/// <param name="NorthDegrees">At the middle of the map: direction of true north, degrees clockwise from the top; null where the middle is a pole.</param>
/// <param name="Note">Datum, projection, and what else the map's reader must know.</param>
public sealed record MapSheet(MapFrame Frame, Graticule Graticule, ScaleBar ScaleBar, Globe Globe, double? NorthDegrees, string Note)
{
    /// <summary>Height of the strip under the map, pixels.</summary>
    public const double StripHeight = 100;

    /// <summary>Radius of the globe, pixels.</summary>
    public const double GlobeRadius = 40;

    // From here on one arrow does not speak for the whole map, and the note says so.
    private const double NotableConvergenceDegrees = 5;

    public double Width => Frame.Width;

    public double FullHeight => Frame.Height + StripHeight;

    /// <param name="region">The region shown.</param>
    /// <param name="frame">How it lies on the drawing.</param>
    /// <param name="placer">Labels placed so far; those of the graticule are added.</param>
    /// <param name="nauticalMiles">Whether the scale bar counts in nautical miles.</param>
    /// <param name="remarks">Ends of the note, such as draw and seed.</param>
    internal static MapSheet For(Region region, MapFrame frame, LabelPlacer placer, bool nauticalMiles, params IEnumerable<string> remarks)
    {
        var projection = region.Projection;
        var middle = projection.Unproject(frame.Centre);
        return new MapSheet(
            frame,
            Graticule.For(projection, frame, placer),
            ScaleBar.For(frame.MetresPerPixel, nauticalMiles),
            Globe.Showing(middle, GlobeRadius),
            North(projection, middle),
            string.Join(" · ", [$"WGS 84 · {projection.Method} centred {Positions.Rough(projection.Centre)}", .. remarks, .. NorthRemark(region)]));
    }

    private static IEnumerable<string> NorthRemark(Region region)
        => region.MaxConvergenceDegrees > NotableConvergenceDegrees ? ["north arrow: middle of the map"] : [];

    // By a step of a hundred metres to the north: no formula of the projection is needed.
    private static double? North(EqualAreaProjection projection, LonLat middle)
    {
        const double Step = 0.001;
        if (Math.Abs(middle.Lat) > 90 - (2 * Step))
        {
            return null;
        }

        var (from, to) = (projection.Project(middle), projection.Project(middle with { Lat = middle.Lat + Step }));
        return Math.Atan2(to.X - from.X, to.Y - from.Y) * 180 / Math.PI;
    }
}
