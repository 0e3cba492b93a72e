using System.Collections.Immutable;
using System.Text.Json;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>The objects of GeoJSON round the geometries: what the root is, its features, their attributes.</summary>
internal sealed class GeoJsonObjects(string source)
{
    public static readonly ImmutableSortedDictionary<string, string> None = ImmutableSortedDictionary.Create<string, string>(StringComparer.Ordinal);

    private static readonly string[] Geometries =
        ["Point", "MultiPoint", "LineString", "MultiLineString", "Polygon", "MultiPolygon", "GeometryCollection"];

    /// <summary>The type of the root, or a refusal that names the format that the file really is.</summary>
    public string RootType(JsonElement root)
    {
        if (root.ValueKind != JsonValueKind.Object)
        {
            throw FileBytes.Refusal(source, $"the JSON is {Kind(root)} where GeoJSON has an object; export the boundary as GeoJSON");
        }

        if (Text(root, "type") is not { } type)
        {
            throw FileBytes.Refusal(source, IsEsriJson(root)
                ? "this is Esri JSON, which is not read; export the layer as GeoJSON, GeoPackage or shapefile"
                : "the JSON object has no \"type\", so it is not GeoJSON; export the boundary as GeoJSON");
        }

        if (type == "Topology")
        {
            throw FileBytes.Refusal(source, "this is TopoJSON, which is not read; convert it to GeoJSON");
        }

        if (type is not ("FeatureCollection" or "Feature") && !Geometries.Contains(type))
        {
            throw FileBytes.Refusal(source, $"the type is {Wording.Quote(type)}, where GeoJSON has FeatureCollection, Feature, Polygon or MultiPolygon (spelt exactly so)");
        }

        return type;
    }

    /// <summary>The features of the root, or the root itself.</summary>
    public IEnumerable<(JsonElement Element, bool IsFeature)> Features(JsonElement root, string type)
    {
        if (type != "FeatureCollection")
        {
            yield return (root, type == "Feature");
            yield break;
        }

        if (!root.TryGetProperty("features", out var features) || features.ValueKind != JsonValueKind.Array)
        {
            throw FileBytes.Refusal(source, "the FeatureCollection has no list \"features\"; export the boundary again");
        }

        var number = 0;
        foreach (var feature in features.EnumerateArray())
        {
            number++;
            if (feature.ValueKind != JsonValueKind.Object || Text(feature, "type") != "Feature")
            {
                throw FileBytes.Refusal(source, "an entry of \"features\" is not an object of type Feature; export the boundary again", Place.Feature(number));
            }

            yield return (feature, true);
        }
    }

    /// <summary>The geometry of a feature; of kind Null when there is none.</summary>
    public JsonElement Geometry(JsonElement feature, int number)
    {
        if (!feature.TryGetProperty("geometry", out var geometry))
        {
            throw FileBytes.Refusal(source, "the feature has no member \"geometry\" (null would be allowed); export the boundary again", Place.Feature(number));
        }

        return geometry;
    }

    /// <summary>Properties as text: strings as they are, everything else as the file writes it; null is left out. The feature's id joins as <c>id</c>.</summary>
    public ImmutableSortedDictionary<string, string> Attributes(JsonElement feature, int number)
    {
        var attributes = None.ToBuilder();
        if (feature.TryGetProperty("id", out var id) && id.ValueKind is JsonValueKind.String or JsonValueKind.Number)
        {
            attributes["id"] = AsText(id, number);
        }

        if (!feature.TryGetProperty("properties", out var properties) || properties.ValueKind == JsonValueKind.Null)
        {
            return attributes.ToImmutable();
        }

        if (properties.ValueKind != JsonValueKind.Object)
        {
            throw FileBytes.Refusal(source, $"\"properties\" is {Kind(properties)} where an object or null belongs", Place.Feature(number));
        }

        foreach (var property in properties.EnumerateObject().Where(property => property.Value.ValueKind != JsonValueKind.Null))
        {
            attributes[NameOf(property, number)] = AsText(property.Value, number);
        }

        return attributes.ToImmutable();
    }

    /// <summary>A member that is a string; null when it is missing or something else.</summary>
    public static string? Text(JsonElement element, string member)
    {
        try
        {
            return element.TryGetProperty(member, out var value) && value.ValueKind == JsonValueKind.String ? value.GetString() : null;
        }
        catch (InvalidOperationException)
        {
            // Half a surrogate pair in an escape: no name that we look for has one.
            return null;
        }
    }

    public static string Kind(JsonElement element) => element.ValueKind switch
    {
        JsonValueKind.Object => "an object",
        JsonValueKind.Array => "a list",
        JsonValueKind.String => "a text",
        JsonValueKind.Number => "a number",
        JsonValueKind.Null => "null",
        _ => "true or false",
    };

    private static bool IsEsriJson(JsonElement root)
        => root.TryGetProperty("geometryType", out _) || root.TryGetProperty("spatialReference", out _) || root.TryGetProperty("rings", out _);

    private string AsText(JsonElement value, int number)
    {
        try
        {
            return value.ValueKind == JsonValueKind.String ? value.GetString()! : value.GetRawText();
        }
        catch (InvalidOperationException)
        {
            throw HalfCharacter(number);
        }
    }

    private string NameOf(JsonProperty property, int number)
    {
        try
        {
            return property.Name;
        }
        catch (InvalidOperationException)
        {
            throw HalfCharacter(number);
        }
    }

    private InputException HalfCharacter(int number)
        => FileBytes.Refusal(source, "an attribute holds half a character (a lone surrogate such as \\ud800); remove it", Place.Feature(number));
}
