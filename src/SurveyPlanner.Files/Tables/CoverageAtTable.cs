using System.Collections.Immutable;
using System.Globalization;
using SurveyPlanner.Coverage;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Files.Units;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tables;

/// <summary>
/// A table of positions, of detections say, whose coverage is asked for. Comma-separated, UTF-8, one header row; columns <c>lon</c> and
/// <c>lat</c> in degrees (WGS 84), any others are kept as they are.
/// </summary>
public sealed class CoverageAtTable
{
    private const int Digits = 9;

    private static readonly Column Lon = new("lon");
    private static readonly Column Lat = new("lat");

    private readonly ImmutableArray<string> _header;
    private readonly ImmutableArray<CsvRow> _rows;

    private CoverageAtTable(ImmutableArray<string> header, ImmutableArray<CsvRow> rows, ImmutableArray<LonLat> positions)
    {
        _header = header;
        _rows = rows;
        Positions = positions;
    }

    /// <summary>The positions, a row each.</summary>
    public ImmutableArray<LonLat> Positions { get; }

    /// <param name="path">The table.</param>
    /// <exception cref="InputException">Every row that cannot be read.</exception>
    /// <exception cref="IOException">The file is there and cannot be read.</exception>
    public static CoverageAtTable Read(string path)
    {
        var problems = new List<Problem>();
        var table = TextTable.Read(path, "table of positions", [Lon, Lat], new InputFiles(), problems);
        var positions = ImmutableArray.CreateBuilder<LonLat>(table.Rows.Length);
        if (problems.Count == 0 && !(table.Has(Lon) && table.Has(Lat)))
        {
            problems.Add(new Problem("positions need the columns lon and lat, in degrees", path, 1));
        }
        else if (table.Has(Lon) && table.Has(Lat))
        {
            foreach (var row in table.Rows)
            {
                // East longitudes up to 360 are common where a survey crosses the date line.
                var (lon, lat) = (Degrees(table, row, Lon, -180, 360), Degrees(table, row, Lat, -90, 90));
                if (lon is { } east && lat is { } north)
                {
                    positions.Add(new LonLat(Longitude.Normalise(east), north));
                }
            }
        }

        if (table.Rows.Length == 0 && problems.Count == 0)
        {
            problems.Add(new Problem("has no rows below the header", path, 1));
        }

        table.Close();
        return problems.Count > 0
            ? throw new InputException(problems)
            : new CoverageAtTable(table.Header, table.Rows, positions.ToImmutable());
    }

    /// <summary>
    /// The table with what was found out added at the end of each row: <c>stratum</c>, <c>coverage</c> (probability of being covered at least
    /// once), <c>standard_error</c> (where simulated), <c>times_covered</c> (expected, simulated) and <c>method</c>: <c>exact</c>,
    /// <c>simulated</c>, or <c>outside</c>, where the rest is empty. A name that the table has already gets <c>_2</c> behind it.
    /// </summary>
    /// <param name="name">Name of the file to be written.</param>
    /// <param name="coverages">What was found out, in the order of <see cref="Positions"/>.</param>
    public OutputFile Write(string name, IReadOnlyList<PositionCoverage> coverages)
    {
        string[] added = ["stratum", "coverage", "standard_error", "times_covered", "method"];
        var text = new CsvText(string.Join(',', _header.Select(CsvText.Cell).Concat(added.Select(NotTaken))));
        foreach (var (row, coverage) in _rows.Zip(coverages))
        {
            text.Row([.. row.Cells.Select(Kept), .. Added(coverage)]);
        }

        return text.ToFile(name);
    }

    private static double? Degrees(TextTable table, CsvRow row, Column column, double low, double high)
    {
        var degrees = table.Number(row, column);
        if (degrees is { } value && !(value >= low && value <= high))
        {
            table.Complain(row, column, $"{Quoted.Short(DecimalText.Write(value))} is not within {low} to {high} degrees");
            return null;
        }

        return degrees;
    }

    /// <summary>Numbers as they are, minus sign and all; other text made harmless.</summary>
    private static string Kept(string cell) => cell.Length > 0 && DecimalText.Read(cell).Complaint is null ? cell.Trim() : CsvText.Cell(cell);

    private string NotTaken(string name)
    {
        bool IsTaken(string tried) => _header.Contains(tried, StringComparer.OrdinalIgnoreCase);
        var free = name;
        for (var i = 2; IsTaken(free); i++)
        {
            free = string.Create(CultureInfo.InvariantCulture, $"{name}_{i}");
        }

        return free;
    }

    private static string[] Added(PositionCoverage coverage)
    {
        if (coverage.IsOutside)
        {
            return ["", "", "", "", Method(coverage)];
        }

        static string Figure(double? value) => value is { } known ? Figures.Significant(known, Digits) : "";
        var isExact = coverage.Exact is not null;
        return
        [
            CsvText.Cell(coverage.Stratum!),
            Figure(coverage.Best),
            isExact ? "" : Figure(coverage.StandardError),
            Figure(coverage.ExpectedTimes),
            Method(coverage),
        ];
    }

    /// <summary>How the coverage at a position is known.</summary>
    internal static string Method(PositionCoverage coverage) => coverage.IsOutside ? "outside" : coverage.Exact is not null ? "exact" : "simulated";
}
