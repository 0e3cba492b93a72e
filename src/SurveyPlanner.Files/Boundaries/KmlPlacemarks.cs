using System.Collections.Immutable;
using System.Xml;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Walks a KML document once from start to end. A placemark is a feature: its <c>name</c>, the fields of its <c>ExtendedData</c>, and as
/// <c>folder</c> the folder it lies in are its attributes.
/// </summary>
/// <param name="source">The file, for messages.</param>
/// <param name="log">Takes what is to be told.</param>
/// <param name="layer">Only placemarks in a folder or document of this name are read; all when null.</param>
internal sealed class KmlPlacemarks(string source, RepairLog log, string? layer)
{
    // Folders in folders in folders: more than this is an attack.
    private const int MostLevels = 60;

    private readonly VertexBudget _budget = new(source);
    private readonly List<RawFeature> _features = [];
    private readonly SortedSet<string> _folders = new(StringComparer.Ordinal);
    private int _number;
    private int _lines;
    private int _points;

    public IReadOnlyList<RawFeature> Features => _features;

    public void ReadAll(XmlReader reader)
    {
        ReadContainer(reader, [], wanted: layer is null);

        // What follows the last bracket must be read too: a second root is a fault.
        while (reader.Read())
        {
        }
    }

    /// <summary>True when there were links to other files.</summary>
    public bool HasLinks { get; private set; }

    /// <summary>Refuses when no polygon was found.</summary>
    public void DemandSome()
    {
        if (_features.Count == 0)
        {
            throw layer is null
                ? FileBytes.Refusal(source, NoPolygons.Sentence(_number, _lines, 0, _points))
                : FileBytes.Refusal(source, $"no folder {Wording.Quote(layer)} with a polygon is in it; its folders are: {LayerChoice.Listed(_folders)}", "region.layer");
        }
    }

    /// <summary>Reads a kml, Document or Folder element, or a Placemark at the root, up to its end.</summary>
    private void ReadContainer(XmlReader reader, ImmutableList<string> folders, bool wanted)
    {
        if (reader.LocalName == "Placemark")
        {
            ReadPlacemark(reader, folders, wanted);
            return;
        }

        DemandShallow(reader);
        var isFolder = reader.LocalName is "Folder" or "Document";
        XmlWalk.ForEachChild(reader, child =>
        {
            if (isFolder && child.LocalName == "name")
            {
                var name = XmlWalk.ElementText(child).Trim();
                _folders.Add(name);
                folders = folders.Add(name);
                wanted |= string.Equals(name, layer, StringComparison.OrdinalIgnoreCase);
            }
            else if (child.LocalName is "Document" or "Folder" or "Placemark")
            {
                ReadContainer(child, folders, wanted);
            }
            else
            {
                HasLinks |= child.LocalName == "NetworkLink";
                XmlWalk.SkipElement(child);
            }
        });
    }

    private void ReadPlacemark(XmlReader reader, ImmutableList<string> folders, bool wanted)
    {
        _number++;
        var attributes = GeoJsonObjects.None.ToBuilder();
        if (!folders.IsEmpty)
        {
            attributes["folder"] = folders[^1];
        }

        var polygons = new List<List<List<FilePoint>>>();
        XmlWalk.ForEachChild(reader, child =>
        {
            switch (child.LocalName)
            {
                case "name":
                    Put(attributes, "name", XmlWalk.ElementText(child));
                    break;
                case "ExtendedData":
                    ReadData(child, attributes);
                    break;
                default:
                    ReadGeometry(child, polygons);
                    break;
            }
        });
        if (wanted && polygons.Count > 0)
        {
            _features.Add(new RawFeature(_number, attributes.ToImmutable(), RawPolygon.From(polygons, _number)));
        }
        else if (wanted)
        {
            log.Warn("left out, because it holds points or lines, which bound no area, or nothing", Place.Feature(_number));
        }
    }

    private static void ReadData(XmlReader reader, ImmutableSortedDictionary<string, string>.Builder attributes)
        => XmlWalk.ForEachChild(reader, child =>
        {
            if (child.LocalName == "SchemaData")
            {
                ReadData(child, attributes);
            }
            else if (child.LocalName == "SimpleData" && child.GetAttribute("name") is { } simple)
            {
                Put(attributes, simple, XmlWalk.ElementText(child));
            }
            else if (child.LocalName == "Data" && child.GetAttribute("name") is { } name)
            {
                XmlWalk.ForEachChild(child, value =>
                {
                    if (value.LocalName == "value")
                    {
                        Put(attributes, name, XmlWalk.ElementText(value));
                    }
                    else
                    {
                        XmlWalk.SkipElement(value);
                    }
                });
            }
            else
            {
                XmlWalk.SkipElement(child);
            }
        });

    private static void Put(ImmutableSortedDictionary<string, string>.Builder attributes, string name, string text)
    {
        if (text.Trim() is { Length: > 0 } value)
        {
            attributes[name] = value;
        }
    }

    private void ReadGeometry(XmlReader reader, List<List<List<FilePoint>>> polygons)
    {
        DemandShallow(reader);
        switch (reader.LocalName)
        {
            case "MultiGeometry":
                XmlWalk.ForEachChild(reader, child => ReadGeometry(child, polygons));
                break;
            case "Polygon":
                polygons.Add(ReadPolygon(reader, polygons.Count + 1));
                break;
            case "LineString" or "LinearRing" or "Track" or "MultiTrack":
                _lines++;
                XmlWalk.SkipElement(reader);
                break;
            case "Point":
                _points++;
                XmlWalk.SkipElement(reader);
                break;
            default:
                XmlWalk.SkipElement(reader);
                break;
        }
    }

    private List<List<FilePoint>> ReadPolygon(XmlReader reader, int part)
    {
        List<FilePoint>? shell = null;
        var holes = new List<List<FilePoint>>();
        var place = $"{Place.Feature(_number)}, part {part}";
        XmlWalk.ForEachChild(reader, child =>
        {
            if (child.LocalName == "outerBoundaryIs")
            {
                ForEachRing(child, place, ring => shell = shell is null ? ring : throw FileBytes.Refusal(source, "the polygon has two outer boundaries; make them two polygons", place));
            }
            else if (child.LocalName == "innerBoundaryIs")
            {
                ForEachRing(child, place, holes.Add);
            }
            else
            {
                XmlWalk.SkipElement(child);
            }
        });
        return shell is null ? throw FileBytes.Refusal(source, "the polygon has no outer boundary; export the KML again", place) : [shell, .. holes];
    }

    private void ForEachRing(XmlReader reader, string place, Action<List<FilePoint>> add)
        => XmlWalk.ForEachChild(reader, ring => XmlWalk.ForEachChild(ring, child =>
        {
            if (child.LocalName == "coordinates")
            {
                add(KmlCoordinates.Read(XmlWalk.ElementText(child), source, place, _budget));
            }
            else
            {
                XmlWalk.SkipElement(child);
            }
        }));

    private void DemandShallow(XmlReader reader)
    {
        if (reader.Depth > MostLevels)
        {
            throw FileBytes.Refusal(source, $"the file is nested more than {MostLevels} levels deep, which no boundary needs");
        }
    }
}
