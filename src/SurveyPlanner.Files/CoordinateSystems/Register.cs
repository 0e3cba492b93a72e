using System.Collections.Frozen;
using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.CoordinateSystems;

/// <summary>
/// Our own table of coordinate systems and datums: parameters of the EPSG Geodetic Parameter Dataset (IOGP), v10.076, as two embedded
/// tables made by tests/reference-data/coordinate-systems/make-tables.py.
/// </summary>
internal static class Register
{
    private static readonly Lazy<FrozenDictionary<string, string[]>> DatumRows = new(() => Rows("datums.tsv").ToFrozenDictionary(cells => cells[0]));

    private static readonly Lazy<FrozenDictionary<string, string[]>> PlaneRows = new(() => Rows("projected.tsv").ToFrozenDictionary(cells => cells[0]));

    private static readonly Lazy<FrozenDictionary<string, string[]>> DatumRowsByName = new(() => Rows("datums.tsv")
        .SelectMany(cells => cells[2].Split('|').Append(cells[1]).Select(name => (Name: Plain(name), Cells: cells)))
        .DistinctBy(pair => pair.Name)
        .ToFrozenDictionary(pair => pair.Name, pair => pair.Cells));

    /// <summary>The system with a code such as <c>3338</c> or <c>ESRI:102003</c>; null when it is not in the table.</summary>
    public static CoordinateSystem? Find(string code)
    {
        if (code is "4326" or "4979")
        {
            return Wgs84Degrees.Instance;
        }

        var geographic = DatumRows.Value.Values.FirstOrDefault(cells => cells[6].Split(',').Contains(code));
        if (geographic is not null)
        {
            // Codes of the Paris datum count in grads; all others in degrees.
            return new DegreeSystem($"{geographic[1]}, longitude and latitude in degrees (EPSG:{code})", ToDatum(geographic), code == "4807" ? 0.9 : 1);
        }

        return PlaneRows.Value.TryGetValue(code, out var cells) ? ToSystem(cells) : null;
    }

    /// <summary>The datum with a name as files write it; null when it is not in the table.</summary>
    public static Datum? FindDatum(string name) => DatumRowsByName.Value.TryGetValue(Plain(name), out var cells) ? ToDatum(cells) : null;

    /// <summary>The datum with an EPSG code; null when it is not in the table.</summary>
    public static Datum? FindDatumByCode(string code) => DatumRows.Value.TryGetValue(code, out var cells) ? ToDatum(cells) : null;

    /// <summary>All codes of plane systems in the table.</summary>
    public static IEnumerable<string> PlaneCodes => PlaneRows.Value.Keys;

    private static PlaneSystem ToSystem(string[] cells)
    {
        var parameters = new ProjectionParameters(cells[3])
        {
            Lat0 = Optional(cells, 5),
            Lon0 = Optional(cells, 6),
            Lat1 = Optional(cells, 7),
            Lat2 = Optional(cells, 8),
            Scale = Optional(cells, 9),
            FalseEastingMetres = Optional(cells, 10) ?? 0,
            FalseNorthingMetres = Optional(cells, 11) ?? 0,
            Azimuth = Optional(cells, 12),
            Gamma = Optional(cells, 13),
        };
        var datum = ToDatum(DatumRows.Value[cells[2]]);
        var method = parameters.Create(datum.Ellipsoid, out var fault) ?? throw new InvalidOperationException($"the table's system {cells[0]} is wrong: {fault}");
        var code = cells[0].Contains(':', StringComparison.Ordinal) ? cells[0] : "EPSG:" + cells[0];
        return new PlaneSystem($"{cells[1].Replace('_', ' ')} ({code})", datum, method, parameters, Number(cells[4]));
    }

    private static Datum ToDatum(string[] cells)
    {
        var shifts = cells.Length > 7 ? cells[7].Split(';').Select(ToShift).ToList() : [];
        return new Datum(cells[1], new Ellipsoid(cells[1], Number(cells[3]), Number(cells[4])), Number(cells[5]), shifts, cells[0] == "6326");
    }

    private static HelmertShift ToShift(string text)
    {
        var cells = text.Split(',');
        var v = cells.Skip(1).Select(Number).ToArray();
        return new HelmertShift($"EPSG operation {cells[0]}", v[0], v[1], v[2], v[3], v[4], v[5], v[6], v[7]) { Area = (v[8], v[9], v[10], v[11]) };
    }

    /// <summary>A name without case, marks and the <c>D_</c> that one maker of programs puts before it.</summary>
    private static string Plain(string name)
    {
        var bare = name.StartsWith("D_", StringComparison.OrdinalIgnoreCase) ? name[2..] : name;
        return string.Concat(bare.Where(c => char.IsLetterOrDigit(c) || c == '+')).ToUpperInvariant();
    }

    private static double? Optional(string[] cells, int column) => cells.Length > column && cells[column].Length > 0 ? Number(cells[column]) : null;

    private static double Number(string cell) => double.Parse(cell, NumberStyles.Float, CultureInfo.InvariantCulture);

    private static IEnumerable<string[]> Rows(string table)
    {
        using var stream = typeof(Register).Assembly.GetManifestResourceStream(table) ?? throw new InvalidOperationException($"{table} is not embedded");
        using var reader = new StreamReader(stream);
        reader.ReadLine();
        while (reader.ReadLine() is { } line)
        {
            yield return line.Split('\t');
        }
    }
}
