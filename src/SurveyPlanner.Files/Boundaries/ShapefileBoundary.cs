using System.Buffers.Binary;
using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Reads polygons from a shapefile (ESRI Shapefile Technical Description, 1998). Every length that the file states is held against what is
/// there, so that a file cut short is refused and never read in part.
/// Own code: the library's reader loops for ever on a file cut between records and repeats the previous polygon on one cut within.
/// </summary>
internal static class ShapefileBoundary
{
    public static RawBoundary Read(ShapefileParts parts, string source, RepairLog log)
    {
        var records = ShapeRecords.Read(parts.Shp, source);
        CheckIndex(parts.Shx, records, source, log);
        var table = parts.Dbf is { } dbf ? DbfTable.Read(dbf, parts.Cpg, source, log) : null;
        if (table is null)
        {
            log.Warn("the shapefile has no .dbf file, so its features have no attributes");
        }
        else if (table.Rows.Count != records.Count)
        {
            throw FileBytes.Refusal(source, $"the .shp holds {records.Count} shapes but the .dbf {table.Rows.Count} rows; the two do not belong together, or one is cut short");
        }

        var features = Features(records, table, source, log);
        if (features.Count == 0)
        {
            throw FileBytes.Refusal(source, NoPolygons.Sentence(records.Count, 0, 0, 0));
        }

        var (system, origin) = System(parts.Prj);
        return new RawBoundary(features, system, origin, []);
    }

    private static List<RawFeature> Features(IReadOnlyList<Shape?> records, DbfTable? table, string source, RepairLog log)
    {
        var budget = new VertexBudget(source);
        var features = new List<RawFeature>();
        for (var i = 0; i < records.Count; i++)
        {
            var number = i + 1;
            if (table is not null && table.Rows[i].IsDeleted)
            {
                log.Warn("left out, because its row is marked as deleted", Place.Feature(number));
            }
            else if (records[i] is { } shape)
            {
                budget.Spend(shape.Points.Count);
                features.Add(new RawFeature(number, table?.Rows[i].Attributes ?? GeoJsonObjects.None, ShapeRings.ToPolygons(shape, number, log)));
            }
            else
            {
                log.Warn("left out, because the geometry is null or empty", Place.Feature(number));
            }
        }

        return features;
    }

    private static (CoordinateSystem? System, string Origin) System(byte[]? prj)
    {
        if (prj is null)
        {
            return (null, "it has no .prj file");
        }

        try
        {
            return (WktSystem.Parse(global::System.Text.Encoding.UTF8.GetString(prj)), "the .prj file");
        }
        catch (FormatException error)
        {
            return (null, $"its .prj file is not understood: {error.Message}");
        }
    }

    /// <summary>The index must list the records that the main file holds; without one it is simply not needed.</summary>
    private static void CheckIndex(byte[]? shx, IReadOnlyList<Shape?> records, string source, RepairLog log)
    {
        if (shx is null)
        {
            log.Warn("the shapefile has no .shx file; it was read without");
        }
        else if (shx.Length < 100 || BinaryPrimitives.ReadInt32BigEndian(shx) != 9994)
        {
            log.Warn("the .shx file is damaged; the shapefile was read without");
        }
        else if ((shx.Length - 100) / 8 != records.Count)
        {
            throw FileBytes.Refusal(source, $"the .shx lists {(shx.Length - 100) / 8} shapes but the .shp holds {records.Count}; one of them is cut short or does not belong to it; export the shapefile again");
        }
    }
}
