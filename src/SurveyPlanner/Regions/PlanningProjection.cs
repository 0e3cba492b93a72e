using System.Globalization;

namespace SurveyPlanner.Regions;

/// <summary>
/// Chooses the plane a survey is planned in: equal-area, centred on the region, azimuthal or conic, whichever distorts lengths less there.
/// </summary>
internal static class PlanningProjection
{
    // Enough positions to find the worst corner of any outline, few enough to cost nothing.
    private const int MaxSamples = 2000;

    // The conic must be clearly better before the simpler azimuthal is given up.
    private const double ConicAdvantage = 0.9;

    /// <summary>The projection for these positions; <paramref name="wanted"/> is <c>azimuthal</c>, <c>conic</c> or null.</summary>
    public static EqualAreaProjection Choose(IReadOnlyList<LonLat> positions, string? wanted)
    {
        if (wanted is not (null or "azimuthal" or "conic"))
        {
            throw new InputException(new Problem(
                $"'{wanted}' is not an equal-area projection known here; write \"azimuthal\" or \"conic\", or leave the key out", Key: "region.projection"));
        }

        var sample = Sample(positions);
        var centre = Centre(sample);
        EqualAreaProjection azimuthal = new AzimuthalEqualArea(centre);
        var conic = Conic(centre, sample);
        if (wanted == "azimuthal" || conic is null)
        {
            return wanted != "conic"
                ? azimuthal
                : throw new InputException(new Problem(
                    "a conic projection does not fit a region round the equator, a pole or the whole globe; write \"azimuthal\" or leave the key out",
                    Key: "region.projection"));
        }

        var conicIsBetter = MaxScaleError(conic, sample) < ConicAdvantage * MaxScaleError(azimuthal, sample);
        return wanted == "conic" || conicIsBetter ? conic : azimuthal;
    }

    /// <summary>Largest error of length, along any direction, over the positions: 0.01 is one percent.</summary>
    public static double MaxScaleError(EqualAreaProjection projection, IReadOnlyList<LonLat> positions)
        => Sample(positions).Max(position => LocalScale(projection, position).LargestScale - 1);

    /// <summary>Largest angle between grid north and true north over the positions, degrees.</summary>
    public static double MaxConvergence(EqualAreaProjection projection, IReadOnlyList<LonLat> positions)
        => Sample(positions).Max(position => Math.Abs(Convergence(projection, position)));

    /// <summary>Bearing of grid north, degrees clockwise from true north, in (-180, 180].</summary>
    public static double Convergence(EqualAreaProjection projection, LonLat position)
    {
        var (east, north) = LocalScale(projection, position).TrueNorth;
        return -Math.Atan2(east, north) * 180 / Math.PI;
    }

    private static (double LargestScale, (double East, double North) TrueNorth) LocalScale(EqualAreaProjection projection, LonLat position)
    {
        // A step of some 60 m: truncation error 1e-10, rounding error 1e-11, both far below what is shown.
        const double step = 5e-4;
        var lat = Math.Clamp(position.Lat, -90 + (2 * step), 90 - (2 * step));
        var radians = lat * Math.PI / 180;
        var cosLat = Math.Cos(radians);
        var (south, north) = (projection.Project(new LonLat(position.Lon, lat - step)), projection.Project(new LonLat(position.Lon, lat + step)));
        var lonStep = step / cosLat;
        var (west, east) = (projection.Project(new LonLat(position.Lon - lonStep, lat)), projection.Project(new LonLat(position.Lon + lonStep, lat)));
        var ellipsoid = Ellipsoid.Wgs84;
        var w = 1 - (ellipsoid.EccentricitySquared * Math.Sin(radians) * Math.Sin(radians));
        var meridian = ellipsoid.SemiMajorMetres * (1 - ellipsoid.EccentricitySquared) / (w * Math.Sqrt(w)) * 2 * step * Math.PI / 180;
        var parallel = ellipsoid.SemiMajorMetres * cosLat / Math.Sqrt(w) * 2 * lonStep * Math.PI / 180;
        var (nx, ny) = ((north.X - south.X) / meridian, (north.Y - south.Y) / meridian);
        var (ex, ey) = ((east.X - west.X) / parallel, (east.Y - west.Y) / parallel);

        // Largest singular value of the local linear map, from the sum of squares and the determinant.
        var squares = (nx * nx) + (ny * ny) + (ex * ex) + (ey * ey);
        var determinant = (ex * ny) - (ey * nx);
        var largest = (Math.Sqrt(Math.Max(0, squares + (2 * determinant))) + Math.Sqrt(Math.Max(0, squares - (2 * determinant)))) / 2;
        return (largest, (nx, ny));
    }

    private static ConicEqualArea? Conic(LonLat centre, IReadOnlyList<LonLat> sample)
    {
        var (south, north) = (sample.Min(p => p.Lat), sample.Max(p => p.Lat));
        var reach = sample.Max(p => Math.Abs(Longitude.From(centre.Lon, p.Lon)));

        // One sixth of the height in from either edge: the usual rule for standard parallels (Snyder 1987, p. 99).
        var (lat1, lat2) = (Round(south + ((north - south) / 6)), Round(north - ((north - south) / 6)));
        var fits = Math.Abs(lat1 + lat2) > 2 && Math.Max(Math.Abs(south), Math.Abs(north)) < 85 && reach < 150;
        return fits ? new ConicEqualArea(centre, lat1, lat2) : null;
    }

    /// <summary>Middle of the region, to a hundredth of a degree so that it can be read out and typed in elsewhere.</summary>
    private static LonLat Centre(IReadOnlyList<LonLat> sample)
    {
        var centre = new LonLat(MiddleLongitude(sample), (sample.Min(p => p.Lat) + sample.Max(p => p.Lat)) / 2);
        for (var round = 0; round < 3; round++)
        {
            var plane = new AzimuthalEqualArea(centre);
            var points = sample.Select(plane.Project).ToList();
            centre = plane.Unproject(new PlanePoint(
                (points.Min(p => p.X) + points.Max(p => p.X)) / 2,
                (points.Min(p => p.Y) + points.Max(p => p.Y)) / 2));
        }

        var rounded = new LonLat(Round(centre.Lon), Round(centre.Lat));
        return Math.Abs(rounded.Lat) > 89.5 ? new LonLat(rounded.Lon, Math.CopySign(90, rounded.Lat)) : rounded;
    }

    /// <summary>The longitude opposite the widest empty stretch of the circle: right on both sides of 180°.</summary>
    private static double MiddleLongitude(IReadOnlyList<LonLat> sample)
    {
        var sorted = sample.Select(p => Longitude.Normalise(p.Lon)).Order().ToList();
        var (widest, middle) = (sorted[0] + 360 - sorted[^1], (sorted[0] + sorted[^1]) / 2);
        for (var i = 1; i < sorted.Count; i++)
        {
            var gap = sorted[i] - sorted[i - 1];
            if (gap > widest)
            {
                (widest, middle) = (gap, ((sorted[i] + sorted[i - 1]) / 2) + 180);
            }
        }

        return Longitude.Normalise(middle);
    }

    private static IReadOnlyList<LonLat> Sample(IReadOnlyList<LonLat> positions)
    {
        if (positions.Count <= MaxSamples)
        {
            return positions;
        }

        // Every n-th vertex, and whatever reaches furthest in each of the four directions.
        var step = (positions.Count + MaxSamples - 1) / MaxSamples;
        return
        [
            .. positions.Where((_, i) => i % step == 0),
            positions.MinBy(p => p.Lat), positions.MaxBy(p => p.Lat),
            positions.MinBy(p => p.Lon), positions.MaxBy(p => p.Lon),
        ];
    }

    private static double Round(double degrees) => double.Parse(degrees.ToString("F2", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
}
