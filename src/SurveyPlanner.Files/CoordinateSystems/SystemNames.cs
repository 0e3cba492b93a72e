using System.Text.RegularExpressions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>Finds a coordinate system by the ways its code is written.</summary>
internal static partial class SystemNames
{
    /// <summary>
    /// The system that a name stands for, or null when the name is not understood or the code not known. Understood are
    /// <c>EPSG:3338</c>, <c>urn:ogc:def:crs:EPSG::3338</c>, <c>http://www.opengis.net/def/crs/EPSG/0/3338</c>, the same with <c>OGC</c> and
    /// <c>CRS84</c>, and a bare number. Nothing is ever fetched.
    /// </summary>
    public static CoordinateSystem? Find(string name)
    {
        if (Split(name) is not var (authority, code))
        {
            return null;
        }

        return authority switch
        {
            "OGC" or "" when code is "CRS84" or "84" or "WGS84" => Wgs84Degrees.Instance,
            "OGC" when code == "CRS83" => Register.Find("4269"),
            "EPSG" => Register.Find(code),
            "" => Register.Find(code) ?? Register.Find("ESRI:" + code),
            "ESRI" => Register.Find("ESRI:" + code) ?? Register.Find(code),
            _ => null,
        };
    }

    private static (string Authority, string Code)? Split(string name)
    {
        var match = NamePattern().Match(name.Trim());
        return match.Success ? (match.Groups["authority"].Value.ToUpperInvariant(), match.Groups["code"].Value.ToUpperInvariant()) : null;
    }

    [GeneratedRegex(
        @"^(?:urn:(?:ogc|x-ogc):def:crs:(?<authority>\w+):[\w.]*:|https?://www\.opengis\.net/def/crs/(?<authority>\w+)/[\w.]+/|(?<authority>[A-Za-z]*):{0,2}\s*)(?<code>\w+)$",
        RegexOptions.IgnoreCase | RegexOptions.CultureInvariant,
        matchTimeoutMilliseconds: 1000)]
    private static partial Regex NamePattern();
}
