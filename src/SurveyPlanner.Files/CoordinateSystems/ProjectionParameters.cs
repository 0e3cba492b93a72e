using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// A map projection as any source describes it, in degrees and metres. What a source leaves out is null.
/// </summary>
/// <param name="Method">One of the methods of <see cref="Create"/>.</param>
internal sealed record ProjectionParameters(string Method)
{
    public double? Lat0 { get; init; }

    public double? Lon0 { get; init; }

    public double? Lat1 { get; init; }

    public double? Lat2 { get; init; }

    public double? Scale { get; init; }

    public double FalseEastingMetres { get; init; }

    public double FalseNorthingMetres { get; init; }

    public double? Azimuth { get; init; }

    public double? Gamma { get; init; }

    /// <summary>The projection, or null with the reason when a parameter is missing or impossible.</summary>
    public PlaneMethod? Create(Ellipsoid ellipsoid, out string? fault)
    {
        fault = Fault();
        return fault is null ? CreateSound(ellipsoid) : null;
    }

    private PlaneMethod CreateSound(Ellipsoid ellipsoid) => Method switch
    {
        "transverse-mercator" => new TransverseMercator(ellipsoid, Lat0 ?? 0, Lon0 ?? 0, Scale ?? 1),
        "albers" => EqualAreaMethod.Conic(ellipsoid, Lat0 ?? 0, Lon0 ?? 0, Lat1!.Value, Lat2 ?? Lat1.Value),
        "azimuthal-equal-area" => EqualAreaMethod.Azimuthal(ellipsoid, Lat0!.Value, Lon0 ?? 0),
        "cylindrical-equal-area" => new CylindricalEqualArea(ellipsoid, Lon0 ?? 0, Lat1 ?? 0),
        "lambert-conformal-conic" => LibraryMethod.ConformalConic(
            ellipsoid, Lat0 ?? Lat1!.Value, Lon0 ?? 0, Lat1 ?? Lat0!.Value, Lat2 ?? Lat1 ?? Lat0!.Value, Scale ?? 1),
        "mercator" => LibraryMethod.Mercator(ellipsoid, Lon0 ?? 0, Lat1 is { } parallel ? ellipsoid.ParallelRadius(parallel * Math.PI / 180) : Scale ?? 1),
        "pseudo-mercator" => new PseudoMercator(ellipsoid, Lon0 ?? 0),
        "polar-stereographic" => Lat1 is { } parallel
            ? PolarStereographic.ByParallel(ellipsoid, parallel, Lon0 ?? 0)
            : PolarStereographic.ByScale(ellipsoid, Lat0 > 0, Lon0 ?? 0, Scale ?? 1),
        "oblique-stereographic" => LibraryMethod.ObliqueStereographic(ellipsoid, Lat0!.Value, Lon0 ?? 0, Scale ?? 1),
        "polyconic" => LibraryMethod.Polyconic(ellipsoid, Lat0 ?? 0, Lon0 ?? 0),
        "hotine-oblique-mercator" => new ObliqueMercator(ellipsoid, Lat0!.Value, Lon0 ?? 0, Azimuth!.Value, Gamma ?? Azimuth.Value, Scale ?? 1, originAtCentre: false),
        "oblique-mercator" => new ObliqueMercator(ellipsoid, Lat0!.Value, Lon0 ?? 0, Azimuth!.Value, Gamma ?? Azimuth.Value, Scale ?? 1, originAtCentre: true),
        _ => throw new InvalidOperationException($"no projection method {Method}"),
    };

    private string? Fault()
    {
        double?[] latitudes = [Lat0, Lat1, Lat2];
        if (latitudes.Any(latitude => latitude is { } value && !(Math.Abs(value) <= 90)) || Lon0 is { } lon && !(Math.Abs(lon) <= 540))
        {
            return "a latitude or longitude of the projection is beyond the globe";
        }

        if (Scale is { } scale && !(scale is > 0.1 and < 10))
        {
            return "the scale factor of the projection is impossible";
        }

        return Method switch
        {
            "albers" when Lat1 is null => "the projection has no standard parallel",
            "albers" when Math.Abs(Lat1.Value + (Lat2 ?? Lat1.Value)) < 0.01 => "the standard parallels lie opposite each other across the equator",
            "lambert-conformal-conic" when (Lat1 ?? Lat0) is null => "the projection has no standard parallel",
            "lambert-conformal-conic" when !IsCone(Lat1 ?? Lat0!.Value, Lat2 ?? Lat1 ?? Lat0!.Value) => "the standard parallels make no cone",
            "polar-stereographic" when Lat1 is null && Math.Abs(Lat0 ?? 0) < 89.999 => "the polar projection has no standard parallel and its origin is not a pole",
            "polar-stereographic" when Lat1 == 0 => "the standard parallel of the polar projection is the equator",
            "mercator" or "cylindrical-equal-area" when Math.Abs(Lat1 ?? 0) > 89 => "the standard parallel of the projection is a pole",
            "azimuthal-equal-area" or "oblique-stereographic" when Lat0 is null => "the projection has no latitude of origin",
            "oblique-stereographic" when Math.Abs(Lat0.Value) > 89.9 => "the latitude of origin is a pole",
            "hotine-oblique-mercator" or "oblique-mercator" when Lat0 is null || Azimuth is null => "the oblique projection has no centre or no azimuth",
            "hotine-oblique-mercator" or "oblique-mercator" when Math.Abs(Lat0.Value) > 85 || Math.Abs(Lat0.Value) < 1e-6 => "the centre of the oblique projection is too near the equator or a pole",
            _ => null,
        };
    }

    private static bool IsCone(double lat1, double lat2) => Math.Abs(lat1 + lat2) > 0.01 && Math.Abs(lat1) < 89.9 && Math.Abs(lat2) < 89.9;
}
