using System.Globalization;

namespace SurveyPlanner.Regions;

/// <summary>
/// Ground that strata enclose between them and that belongs to none: often a border that was drawn twice and not the same.
/// Gaps that are open to the outside are coast like any other and not looked for.
/// </summary>
internal static class StratumGaps
{
    // Borders drawn from the same vertices differ by rounding only; a gap worth telling is wider than this.
    private const double WidthToleranceMetres = 1;

    /// <summary>A warning for each gap.</summary>
    public static IEnumerable<Notice> Find(IReadOnlyList<PlaneShape> strata, EqualAreaProjection projection)
    {
        if (strata.Count < 2)
        {
            yield break;
        }

        var builder = new PlaneShapeBuilder();
        foreach (var stratum in strata)
        {
            builder.Add(stratum);
        }

        var own = strata.SelectMany(Holes).ToList();
        foreach (var (area, perimeter, x, y) in Holes(PlaneGeometry.Unite(builder.Build())))
        {
            // An island in the middle of one stratum is a hole of that stratum, and no gap.
            var isOwn = own.Any(hole => Math.Abs(hole.Area - area) < 1e-6 * area && Math.Abs(hole.X - x) + Math.Abs(hole.Y - y) < perimeter);
            if (!isOwn && area > WidthToleranceMetres * perimeter / 2)
            {
                var place = projection.Unproject(new PlanePoint(x, y));
                yield return new Notice(NoticeKind.Warning, string.Create(
                    CultureInfo.InvariantCulture,
                    $"between the strata lies a gap of {area / 1e6:0.###} km² near longitude {place.Lon:0.###}, latitude {place.Lat:0.###} that belongs to none and will not be surveyed; if it should be, draw the borders together in your GIS"));
            }
        }
    }

    /// <summary>Area, perimeter and first vertex of every hole.</summary>
    private static IEnumerable<(double Area, double Perimeter, double X, double Y)> Holes(PlaneShape shape)
    {
        for (var part = 0; part < shape.PartCount; part++)
        {
            for (var ring = shape.PartStarts[part] + 1; ring < shape.PartStarts[part + 1]; ring++)
            {
                var start = shape.RingStarts[ring];
                yield return (Math.Abs(shape.SignedRingArea(ring)), shape.RingLength(ring), shape.X[start], shape.Y[start]);
            }
        }
    }
}
