using System.Globalization;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>One vertex of a list.</summary>
internal sealed record CsvRow(int Line, FilePoint Point, string Part, int Ring, IReadOnlyList<string> Cells);

/// <summary>Reads the vertices of a list; all faulty lines are named, up to a number.</summary>
internal sealed class CsvRows(CsvTable table, CsvColumns columns, string source, RepairLog log)
{
    private const int MostProblems = 20;

    private readonly List<Problem> _problems = [];
    private readonly VertexBudget _budget = new(source);
    private bool _decimalCommas;

    public List<CsvRow> Read(IReadOnlyList<CsvLine> lines)
    {
        _budget.Spend(lines.Count);
        var rows = new List<CsvRow>(lines.Count);
        foreach (var line in lines)
        {
            if (Row(line) is { } row)
            {
                rows.Add(row);
            }

            if (_problems.Count >= MostProblems)
            {
                break;
            }
        }

        if (_problems.Count > 0)
        {
            throw new InputException(_problems);
        }

        if (_decimalCommas)
        {
            log.Warn("commas in the coordinates were read as decimal marks");
        }

        return rows;
    }

    private CsvRow? Row(CsvLine line)
    {
        if (line.Cells.Count != table.Header.Count)
        {
            var hint = table.Separator == ',' && line.Cells.Count > table.Header.Count ? "; if commas are decimal marks, part the columns by semicolons" : "; the line may be cut short";
            return Fault(line, $"the line has {line.Cells.Count} cells where the heading has {table.Header.Count}{hint}");
        }

        var x = Coordinate(line, columns.X, isLatitude: false);
        var y = Coordinate(line, columns.Y, isLatitude: true);
        var ring = 1;
        if (columns.Ring >= 0 && !int.TryParse(line.Cells[columns.Ring], NumberStyles.AllowLeadingWhite | NumberStyles.AllowTrailingWhite, CultureInfo.InvariantCulture, out ring))
        {
            return Fault(line, $"the ring {Wording.Quote(line.Cells[columns.Ring])} is no whole number");
        }

        var part = columns.Part < 0 ? "" : line.Cells[columns.Part].Trim();
        return x is { } east && y is { } north ? new CsvRow(line.Number, new FilePoint(east, north), part, ring, line.Cells) : null;
    }

    private double? Coordinate(CsvLine line, int column, bool isLatitude)
    {
        var text = line.Cells[column].Trim();

        // Where cells are parted by something else, one comma in a number can only be its decimal mark.
        if (table.Separator != ',' && text.Count(c => c == ',') == 1 && !text.Contains('.', StringComparison.Ordinal))
        {
            text = text.Replace(',', '.');
            _decimalCommas = true;
        }

        string fault;
        double? value;
        if (columns.AreDegrees)
        {
            value = AngleText.Parse(text, isLatitude, out fault);
        }
        else
        {
            value = double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out var number) && double.IsFinite(number) ? number : null;
            fault = $"{Wording.Quote(text)} is no number";
        }

        if (value is null)
        {
            Fault(line, fault);
        }

        return value;
    }

    private CsvRow? Fault(CsvLine line, string message)
    {
        _problems.Add(new Problem(message, source, line.Number));
        return null;
    }
}
