using System.Globalization;
using System.Text.Json;
using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// The <c>crs</c> member that GeoJSON had in 2008 and RFC 7946 took out: named systems are honoured and told, links are never followed.
/// </summary>
internal static class GeoJsonCrs
{
    public const string Default = "the rule for GeoJSON files that name no other, RFC 7946";

    /// <summary>The system that an object declares; WGS 84 when it has no such member, null when it says that none is known.</summary>
    public static (CoordinateSystem? System, string Origin) Read(JsonElement element, string source, RepairLog log)
    {
        if (!element.TryGetProperty("crs", out var crs))
        {
            return (Wgs84Degrees.Instance, Default);
        }

        if (crs.ValueKind == JsonValueKind.Null)
        {
            return (null, "its crs member is null, which says that the coordinate system is not known");
        }

        var name = Name(crs, source);
        var system = SystemNames.Find(name) ?? throw FileBytes.Refusal(
            source,
            $"its crs member names {Wording.Quote(name)}, a coordinate system that is not known here; save the boundary in WGS 84 longitude and latitude (EPSG:4326)");
        log.Warn($"the file has a crs member as GeoJSON had in 2008 ({Wording.Quote(name)}); it was honoured: {system.Name}");
        return (system, "the crs member");
    }

    private static string Name(JsonElement crs, string source)
    {
        var type = crs.ValueKind == JsonValueKind.Object ? GeoJsonObjects.Text(crs, "type") : null;
        var hasProperties = crs.ValueKind == JsonValueKind.Object && crs.TryGetProperty("properties", out var found) && found.ValueKind == JsonValueKind.Object;
        var properties = hasProperties ? crs.GetProperty("properties") : default;
        if (type is "link" or "url")
        {
            throw FileBytes.Refusal(
                source,
                "its crs member is a link, and links are never followed; give the coordinate system by name, or save the boundary in WGS 84 longitude and latitude (EPSG:4326)");
        }

        if (type == "name" && hasProperties && GeoJsonObjects.Text(properties, "name") is { } name)
        {
            return name;
        }

        // An even older form: {"type":"EPSG","properties":{"code":3338}}.
        if (type == "EPSG" && hasProperties && properties.TryGetProperty("code", out var code) && code.ValueKind == JsonValueKind.Number && code.TryGetInt32(out var number))
        {
            return string.Create(CultureInfo.InvariantCulture, $"EPSG:{number}");
        }

        throw FileBytes.Refusal(source, "its crs member is of a form that is not known; remove it and save the boundary in WGS 84 longitude and latitude (EPSG:4326)");
    }
}
