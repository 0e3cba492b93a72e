using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Reads an outline from a list of its vertices, one a line, with a heading: <c>lat</c> and <c>lon</c> (or <c>x</c> and <c>y</c> with a named
/// coordinate system); <c>part</c> where there are several outlines; <c>ring</c> where they have holes (1 the outer one). Columns that do
/// not change within an outline become its attributes.
/// </summary>
internal static class CsvBoundary
{
    public static RawBoundary Read(byte[] bytes, string source, RepairLog log)
    {
        var table = CsvTable.Read(Encoding.UTF8.GetString(FileBytes.ToUtf8(bytes, source, log).Span), source);
        var columns = CsvColumns.Find(table, source);
        var lines = LinesOf(table, source);
        var rows = new CsvRows(table, columns, source, log).Read(lines);
        if (rows.Count == 0)
        {
            throw FileBytes.Refusal(source, "the file holds no vertices; export the boundary again");
        }

        var features = Features(rows, table, columns, source);
        log.Warn($"read as a list of vertices: {Wording.Count(rows.Count, "vertex", "vertices")} in {Wording.Count(features.Sum(f => f.Polygons.Sum(p => 1 + p.Holes.Count)), "outline", "outlines")}, from the columns {Wording.Quote(table.Header[columns.X])} and {Wording.Quote(table.Header[columns.Y])}");
        if (!table.EndsWithLineEnd)
        {
            log.Warn("the last line has no end; if the file was cut short there, its last vertex is wrong");
        }

        return columns.AreDegrees
            ? new RawBoundary(features, Wgs84Degrees.Instance, "the file does not say, WGS 84 was assumed", []) { SystemIsDefault = true }
            : new RawBoundary(features, null, "a list of vertices cannot say it", []);
    }

    /// <summary>Lines that are not empty. An empty one amid others may part two outlines, which must be said clearly.</summary>
    private static List<CsvLine> LinesOf(CsvTable table, string source)
    {
        var lines = table.Lines.ToList();
        while (lines.Count > 0 && IsEmpty(lines[^1]))
        {
            lines.RemoveAt(lines.Count - 1);
        }

        return lines.Find(IsEmpty) is { } gap
            ? throw new InputException(new Problem("this line is empty; if it parts two outlines, add a column \"part\" that numbers them, else remove it", source, gap.Number))
            : lines;
    }

    private static bool IsEmpty(CsvLine line) => line.Cells.All(string.IsNullOrWhiteSpace);

    private static List<RawFeature> Features(List<CsvRow> rows, CsvTable table, CsvColumns columns, string source)
    {
        var features = new List<RawFeature>();
        var seen = new HashSet<string>(StringComparer.Ordinal);
        foreach (var part in Runs(rows, row => row.Part))
        {
            if (!seen.Add(part[0].Part))
            {
                throw new InputException(new Problem($"the lines of part {Wording.Quote(part[0].Part)} do not stand together; sort the file by part", source, part[0].Line));
            }

            var number = features.Count + 1;
            var rings = Runs(part, row => row.Ring.ToString(CultureInfo.InvariantCulture)).ToList();
            for (var i = 0; i < rings.Count; i++)
            {
                if (rings[i][0].Ring != i + 1)
                {
                    throw new InputException(new Problem("the rings of a part must be numbered 1, 2, 3 and so on, the outer one first, and their lines stand together", source, rings[i][0].Line));
                }
            }

            var raw = rings.Select((ring, i) => new RawRing([.. ring.Select(row => row.Point)], Place.Ring(number, 1, 1, i + 1))).ToList();
            features.Add(new RawFeature(number, Attributes(part, table, columns), [new RawPolygon(raw[0], raw[1..])]));
        }

        return features;
    }

    private static IEnumerable<List<CsvRow>> Runs(List<CsvRow> rows, Func<CsvRow, string> key)
    {
        for (var start = 0; start < rows.Count;)
        {
            var end = start;
            while (end < rows.Count && key(rows[end]) == key(rows[start]))
            {
                end++;
            }

            yield return rows[start..end];
            start = end;
        }
    }

    private static ImmutableSortedDictionary<string, string> Attributes(List<CsvRow> part, CsvTable table, CsvColumns columns)
    {
        var attributes = GeoJsonObjects.None.ToBuilder();
        for (var column = 0; column < table.Header.Count; column++)
        {
            var value = part[0].Cells[column].Trim();
            if (column != columns.X && column != columns.Y && value.Length > 0 && part.TrueForAll(row => row.Cells[column].Trim() == value))
            {
                attributes[table.Header[column]] = value;
            }
        }

        return attributes.ToImmutable();
    }
}
