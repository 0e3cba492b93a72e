using System.Globalization;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// Coordinate systems from well-known text of the first kind (OGC 01-009, 2001, and the dialect of .prj files). Names of projections, parameters
/// and datums are matched by meaning; anything that is not understood is refused, never passed over.
/// Own code: ProjNET reads 24 of 33 such texts, shifts datums without asking and takes web Mercator for another projection.
/// </summary>
internal static class WktSystem
{
    /// <summary>Understands a text; throws <see cref="FormatException"/> with the reason when it cannot.</summary>
    public static CoordinateSystem Parse(string text)
    {
        var root = WktNode.Parse(text);
        return root.Keyword switch
        {
            "PROJCS" => Projected(root),
            "GEOGCS" => Geographic(root),
            "COMPD_CS" when root.Find("PROJCS", "GEOGCS") is { } horizontal => horizontal.Keyword == "PROJCS" ? Projected(horizontal) : Geographic(horizontal),
            "PROJCRS" or "PROJECTEDCRS" or "GEOGCRS" or "GEOGRAPHICCRS" or "GEODCRS" or "GEODETICCRS" => SecondKind(root),
            "LOCAL_CS" or "ENGCRS" => throw new FormatException("it is a local system that nothing ties to the globe"),
            _ => throw new FormatException($"{root.Keyword} is not a horizontal coordinate system"),
        };
    }

    /// <summary>Texts of the second kind (ISO 19162) are known by the code at their end only.</summary>
    private static CoordinateSystem SecondKind(WktNode root)
    {
        var id = root.Find("ID", "AUTHORITY");
        var code = id is null ? null : id.Numbers.Count > 0 ? id.Numbers[0].ToString("0", CultureInfo.InvariantCulture) : id.Texts.ElementAtOrDefault(1);
        return id is not null && code is not null && SystemNames.Find($"{id.Name}:{code}") is { } system
            ? system
            : throw new FormatException("it is well-known text of the second kind (ISO 19162) without a code that is known here");
    }

    private static CoordinateSystem Geographic(WktNode node)
    {
        var (datum, degreesPerUnit) = DatumOf(node);
        if (datum.IsWgs84 && datum.PrimeMeridian == 0 && degreesPerUnit == 1)
        {
            return Wgs84Degrees.Instance;
        }

        return new DegreeSystem($"{Spoken(node.Name)}, longitude and latitude", datum, degreesPerUnit);
    }

    private static PlaneSystem Projected(WktNode node)
    {
        var geographic = node.Find("GEOGCS") ?? throw new FormatException("the projected system has no GEOGCS");
        var (datum, degreesPerUnit) = DatumOf(geographic);
        var unit = node.Find("UNIT")?.Number ?? throw new FormatException("the projected system has no UNIT");
        if (!(unit is > 1e-4 and < 1e5))
        {
            throw new FormatException("the UNIT of length is impossible");
        }

        var parameters = WktProjection.Of(node, degreesPerUnit, unit);
        var method = parameters.Create(datum.Ellipsoid, out var fault) ?? throw new FormatException(fault);
        return new PlaneSystem(Spoken(node.Name), datum, method, parameters, unit);
    }

    private static (Datum Datum, double DegreesPerUnit) DatumOf(WktNode geographic)
    {
        var node = geographic.Find("DATUM") ?? throw new FormatException("the geographic system has no DATUM");
        var spheroid = node.Find("SPHEROID", "ELLIPSOID");
        if (spheroid is null || spheroid.Numbers.Count < 2)
        {
            throw new FormatException("the DATUM has no SPHEROID");
        }

        var (a, inverseFlattening) = (spheroid.Numbers[0], spheroid.Numbers[1]);
        if (inverseFlattening == 0)
        {
            throw new FormatException("it is on a sphere, not on an ellipsoid, so that its datum is not known");
        }

        if (!(a is > 6.3e6 and < 6.4e6 && inverseFlattening is > 250 and < 350))
        {
            throw new FormatException("its SPHEROID is not that of the Earth");
        }

        var unit = geographic.Find("UNIT")?.Number ?? Math.PI / 180;
        var degreesPerUnit = Tidy(unit * 180 / Math.PI);
        if (!(degreesPerUnit is > 0 and <= 60))
        {
            throw new FormatException("its UNIT of angle is impossible");
        }

        return (WktDatum.Of(node, new Ellipsoid(spheroid.Name, a, inverseFlattening), PrimeMeridian(geographic, degreesPerUnit)), degreesPerUnit);
    }

    /// <summary>Degrees east of Greenwich. The standard counts them in the system's unit, most programs in degrees: clear only where both are the same, and for Paris.</summary>
    private static double PrimeMeridian(WktNode geographic, double degreesPerUnit)
    {
        const double paris = 2.33722917;
        var value = geographic.Find("PRIMEM")?.Number ?? 0;
        if (Math.Abs(value - paris) < 1e-5 || Math.Abs((value * 0.9) - paris) < 1e-5)
        {
            return paris;
        }

        return value == 0 || degreesPerUnit == 1 ? value : throw new FormatException("its prime meridian is not Greenwich and its angles are not degrees");
    }

    /// <summary>Units written with fifteen digits made whole again: one degree is 0.0174532925199433.</summary>
    private static double Tidy(double degrees) => Math.Abs(degrees - 1) < 1e-7 ? 1 : Math.Abs(degrees - 0.9) < 1e-7 ? 0.9 : degrees;

    private static string Spoken(string name) => name.Length == 0 ? "a system without a name" : Wording.Quote(name.Replace('_', ' ')).Trim('\'');
}
