using System.Text.Json;
using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>The polygons of GeoJSON geometries, and a count of what was not polygons.</summary>
internal sealed class GeoJsonGeometries(string source, RepairLog log, CoordinateSystem? rootSystem)
{
    private readonly VertexBudget _budget = new(source);
    private int _lines;
    private int _closedLines;
    private int _points;

    /// <summary>A crs member below the root must say what the root says: nothing else could be meant.</summary>
    public void CheckCrs(JsonElement element, int number, bool isRoot)
    {
        if (!isRoot && element.TryGetProperty("crs", out _))
        {
            var (system, _) = GeoJsonCrs.Read(element, source, new RepairLog());
            if (system?.Name != rootSystem?.Name)
            {
                throw FileBytes.Refusal(source, "the crs member of this feature differs from that of the file; save all features in one coordinate system", Place.Feature(number));
            }
        }
    }

    /// <summary>All polygons of a geometry, those inside collections too. Lines and points are counted and told.</summary>
    public List<RawPolygon> Polygons(JsonElement geometry, int number)
    {
        var found = new List<JsonElement>();
        Gather(geometry, number, found);
        var polygons = new List<RawPolygon>(found.Count);
        for (var part = 1; part <= found.Count; part++)
        {
            polygons.Add(Polygon(found[part - 1], number, part, found.Count));
        }

        return polygons;
    }

    /// <summary>Why nothing was found, and what to do.</summary>
    public string NoPolygonsSentence(int features)
        => NoPolygons.Sentence(features, _lines, _closedLines, _points);

    private void Gather(JsonElement geometry, int number, List<JsonElement> polygons)
    {
        if (geometry.ValueKind == JsonValueKind.Null)
        {
            log.Warn("left out, because the geometry is null or empty", Place.Feature(number));
            return;
        }

        if (geometry.ValueKind != JsonValueKind.Object || GeoJsonObjects.Text(geometry, "type") is not { } type)
        {
            throw FileBytes.Refusal(source, "the geometry is not an object with a \"type\"; export the boundary again", Place.Feature(number));
        }

        switch (type)
        {
            case "GeometryCollection":
                foreach (var member in Member(geometry, "geometries", number).EnumerateArray())
                {
                    Gather(member, number, polygons);
                }

                break;
            case "Polygon" or "MultiPolygon":
                AddPolygons(Member(geometry, "coordinates", number), type, number, polygons);
                break;
            default:
                CountOther(geometry, type, number);
                break;
        }
    }

    private void AddPolygons(JsonElement coordinates, string type, int number, List<JsonElement> polygons)
    {
        if (coordinates.GetArrayLength() == 0)
        {
            log.Warn("left out, because the geometry is null or empty", Place.Feature(number));
        }
        else if (type == "Polygon")
        {
            polygons.Add(coordinates);
        }
        else
        {
            polygons.AddRange(coordinates.EnumerateArray());
        }
    }

    private void CountOther(JsonElement geometry, string type, int number)
    {
        if (type is "Point" or "MultiPoint")
        {
            _points++;
        }
        else if (type is "LineString" or "MultiLineString")
        {
            _lines++;
            _closedLines += type == "LineString" && IsClosed(Member(geometry, "coordinates", number)) ? 1 : 0;
        }
        else
        {
            throw FileBytes.Refusal(source, $"the geometry type {Wording.Quote(type)} is none of GeoJSON; for a boundary it must be Polygon or MultiPolygon", Place.Feature(number));
        }

        log.Warn("left out, because it holds points or lines, which bound no area", Place.Feature(number));
    }

    private static bool IsClosed(JsonElement coordinates)
        => coordinates.GetArrayLength() > 3 && JsonElement.DeepEquals(coordinates[0], coordinates[coordinates.GetArrayLength() - 1]);

    private JsonElement Member(JsonElement geometry, string name, int number)
        => geometry.TryGetProperty(name, out var member) && member.ValueKind == JsonValueKind.Array
            ? member
            : throw FileBytes.Refusal(source, $"the geometry has no list \"{name}\"; export the boundary again", Place.Feature(number));

    private RawPolygon Polygon(JsonElement rings, int number, int part, int parts)
    {
        if (rings.ValueKind != JsonValueKind.Array || rings.GetArrayLength() == 0)
        {
            throw FileBytes.Refusal(source, "a polygon must be a list of rings; export the boundary again", Place.Ring(number, part, parts, 1));
        }

        var read = new List<RawRing>(rings.GetArrayLength());
        foreach (var ring in rings.EnumerateArray())
        {
            read.Add(Ring(ring, Place.Ring(number, part, parts, read.Count + 1)));
        }

        return new RawPolygon(read[0], read[1..]);
    }

    private RawRing Ring(JsonElement ring, string place)
    {
        if (ring.ValueKind != JsonValueKind.Array)
        {
            throw FileBytes.Refusal(source, $"a ring must be a list of positions, but {GeoJsonObjects.Kind(ring)} stands there", place);
        }

        _budget.Spend(ring.GetArrayLength());
        var points = new List<FilePoint>(ring.GetArrayLength());
        foreach (var position in ring.EnumerateArray())
        {
            points.Add(Position(position, place, points.Count + 1));
        }

        return new RawRing(points, place);
    }

    private FilePoint Position(JsonElement position, string ring, int vertex)
    {
        if (position.ValueKind != JsonValueKind.Array || position.GetArrayLength() < 2)
        {
            throw FileBytes.Refusal(source, "a position must be a list of two numbers or more, longitude first", Place.Vertex(ring, vertex));
        }

        // Heights and measures behind the first two are of no use to a boundary.
        return new FilePoint(Number(position[0], ring, vertex), Number(position[1], ring, vertex));
    }

    private double Number(JsonElement value, string ring, int vertex)
    {
        if (value.ValueKind != JsonValueKind.Number)
        {
            throw FileBytes.Refusal(source, $"a coordinate must be a number, but {GeoJsonObjects.Kind(value)} stands there", Place.Vertex(ring, vertex));
        }

        var number = value.GetDouble();
        return double.IsFinite(number)
            ? number
            : throw FileBytes.Refusal(source, $"the coordinate {Wording.Quote(value.GetRawText())} is too large for a number (it overflows to infinity); correct it", Place.Vertex(ring, vertex));
    }
}
