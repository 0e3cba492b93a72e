using System.Globalization;

namespace SurveyPlanner.Regions;

/// <summary>Projections as WKT 2 (ISO 19162:2019) with the codes of the EPSG registry for methods and parameters.</summary>
internal static class ProjectionWkt
{
    public static string Angle(string name, int code, double degrees) => string.Create(
        CultureInfo.InvariantCulture,
        $"""PARAMETER["{name}",{degrees:0.#########},ANGLEUNIT["degree",0.0174532925199433],ID["EPSG",{code}]]""");

    public static string Projected(string method, int code, Ellipsoid ellipsoid, params string[] parameters)
    {
        var shape = string.Create(CultureInfo.InvariantCulture, $"{ellipsoid.SemiMajorMetres},{ellipsoid.InverseFlattening}");
        return $"""
            PROJCRS["SurveyPlanner equal-area plane",BASEGEOGCRS["WGS 84",DATUM["World Geodetic System 1984",ELLIPSOID["{ellipsoid.Name}",{shape},LENGTHUNIT["metre",1]]],PRIMEM["Greenwich",0,ANGLEUNIT["degree",0.0174532925199433]]],CONVERSION["{method}, centred on the region",METHOD["{method}",ID["EPSG",{code.ToString(CultureInfo.InvariantCulture)}]],{string.Join(',', parameters)},{Zero("east", method)},{Zero("north", method)}],CS[Cartesian,2],AXIS["easting (X)",east,ORDER[1]],AXIS["northing (Y)",north,ORDER[2]],LENGTHUNIT["metre",1]]
            """;
    }

    private static string Zero(string axis, string method)
    {
        var albers = method.StartsWith("Albers", StringComparison.Ordinal);
        var (name, code) = (axis, albers) switch
        {
            ("east", true) => ("Easting at false origin", 8826),
            ("north", true) => ("Northing at false origin", 8827),
            ("east", false) => ("False easting", 8806),
            _ => ("False northing", 8807),
        };
        return $"""PARAMETER["{name}",0,LENGTHUNIT["metre",1],ID["EPSG",{code.ToString(CultureInfo.InvariantCulture)}]]""";
    }
}
