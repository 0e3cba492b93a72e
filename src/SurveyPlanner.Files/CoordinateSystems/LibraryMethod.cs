using System.Globalization;
using ProjNet.CoordinateSystems;
using ProjNet.CoordinateSystems.Transformations;
using Ellipsoid = SurveyPlanner.Regions.Ellipsoid;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// Projections that ProjNET computes as PROJ does: Lambert conformal conic, Mercator, oblique stereographic, polyconic.
/// Accuracy: 1 mm against PROJ. The library never sees a file's text: it gets a text made here from checked parameters, with one datum on
/// both sides so that it shifts nothing, no false origin and scale 1; and every answer is projected back and must meet its question.
/// </summary>
internal sealed class LibraryMethod : PlaneMethod
{
    private readonly MathTransform _inverse;
    private readonly MathTransform _forward;
    private readonly double _scale;
    private readonly double _lon0;

    private LibraryMethod(string projection, Ellipsoid ellipsoid, double lon0, double scale, params (string Name, double Value)[] parameters)
    {
        // The central meridian is 0 for the library, so that 180° is far away; ours is added afterwards.
        var list = string.Concat(parameters.Select(p => $",PARAMETER[\"{p.Name}\",{Number(p.Value)}]"));
        var spheroid = $"{Number(ellipsoid.SemiMajorMetres)},{Number(ellipsoid.InverseFlattening)}";
        var wkt = $"PROJCS[\"file\",GEOGCS[\"file\",DATUM[\"file\",SPHEROID[\"file\",{spheroid}]],PRIMEM[\"Greenwich\",0],UNIT[\"degree\",0.0174532925199433]],"
            + $"PROJECTION[\"{projection}\"],PARAMETER[\"central_meridian\",0],PARAMETER[\"false_easting\",0],PARAMETER[\"false_northing\",0]{list},UNIT[\"metre\",1]]";
        var system = (ProjectedCoordinateSystem)new CoordinateSystemFactory().CreateFromWkt(wkt);
        var factory = new CoordinateTransformationFactory();
        _inverse = factory.CreateFromCoordinateSystems(system, system.GeographicCoordinateSystem).MathTransform;
        _forward = factory.CreateFromCoordinateSystems(system.GeographicCoordinateSystem, system).MathTransform;
        (_scale, _lon0) = (scale, lon0);
    }

    /// <summary>Two standard parallels, or one given twice together with a scale.</summary>
    public static LibraryMethod ConformalConic(Ellipsoid ellipsoid, double lat0, double lon0, double lat1, double lat2, double scale)
        => new("Lambert_Conformal_Conic_2SP", ellipsoid, lon0, scale, ("latitude_of_origin", lat0), ("standard_parallel_1", lat1), ("standard_parallel_2", lat2));

    public static LibraryMethod Mercator(Ellipsoid ellipsoid, double lon0, double scale)
        => new("Mercator_1SP", ellipsoid, lon0, scale, ("latitude_of_origin", 0), ("scale_factor", 1));

    public static LibraryMethod ObliqueStereographic(Ellipsoid ellipsoid, double lat0, double lon0, double scale)
        => new("Oblique_Stereographic", ellipsoid, lon0, scale, ("latitude_of_origin", lat0), ("scale_factor", 1));

    public static LibraryMethod Polyconic(Ellipsoid ellipsoid, double lat0, double lon0)
        => new("Polyconic", ellipsoid, lon0, 1, ("latitude_of_origin", lat0));

    public override (double Lon, double Lat) Inverse(double x, double y)
    {
        var (plainX, plainY) = (x / _scale, y / _scale);
        if (!(Math.Abs(plainX) < 4e7 && Math.Abs(plainY) < 4e7))
        {
            return Nowhere;
        }

        var (lon, lat) = _inverse.Transform(plainX, plainY);
        var (backX, backY) = _forward.Transform(lon, lat);
        return Math.Abs(backX - plainX) < 0.01 && Math.Abs(backY - plainY) < 0.01 ? (lon + _lon0, lat) : Nowhere;
    }

    private static string Number(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
