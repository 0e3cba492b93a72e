using System.Collections.Immutable;
using SurveyPlanner.Files.Plans;
using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Tables;

/// <summary>A column that a table may have.</summary>
/// <param name="Name">Its name; a length column's is followed by its unit: <c>length_km</c>.</param>
/// <param name="IsLength">Whether the unit follows.</param>
internal sealed record Column(string Name, bool IsLength = false)
{
    /// <summary>The names that a header may give it, and how many metres one unit of it is (1 for no unit).</summary>
    public IEnumerable<(string Header, double Metres)> Headers
        => IsLength ? UnitTable.Length.Units.Select(unit => ($"{Name}_{unit.Symbol}", unit.InBaseUnits)) : [(Name, 1.0)];
}

/// <summary>
/// A text table with a header row, its known columns found; what is wrong with a cell is reported with file, line and column name.
/// </summary>
internal sealed class TextTable
{
    /// <summary>A table with more broken rows is broken as a whole; further rows are counted, not listed.</summary>
    private const int MostRowsListed = 50;

    /// <summary>A million rows.</summary>
    private const int MostKilobytes = 64 * 1024;

    private readonly List<Problem> problems;
    private readonly Dictionary<Column, (int Index, string Header, double Metres)> found = [];
    private readonly HashSet<int> brokenLines = [];

    private TextTable(string file, List<Problem> problems)
    {
        File = file;
        this.problems = problems;
    }

    public string File { get; }

    /// <summary>The names of all columns, as they stand there.</summary>
    public ImmutableArray<string> Header { get; private set; } = [];

    public ImmutableArray<CsvRow> Rows { get; private set; } = [];

    /// <summary>Columns of the table that nobody asked for.</summary>
    public List<Notice> Notices { get; } = [];

    /// <summary>Reads a table and finds its columns.</summary>
    /// <param name="path">The file.</param>
    /// <param name="noun">What it is, for messages.</param>
    /// <param name="columns">The columns that it may have.</param>
    /// <param name="files">The files of the run.</param>
    /// <param name="problems">Receives what is wrong.</param>
    public static TextTable Read(string path, string noun, IReadOnlyList<Column> columns, InputFiles files, List<Problem> problems)
    {
        var table = new TextTable(path, problems);
        try
        {
            var rows = CsvReader.Read(TextFile.Read(path, noun, MostKilobytes, files), path);
            if (rows.Length == 0)
            {
                problems.Add(new Problem($"is empty: the first line of a {noun} names its columns", path, 1, 1));
                return table;
            }

            if (rows[0].Cells is [var only] && only.AsSpan().ContainsAny(';', '\t'))
            {
                problems.Add(new Problem("the columns are parted by semicolons or tabs: save the table with commas, and with a point as decimal mark", path, rows[0].Line, 1));
                return table;
            }

            table.Header = rows[0].Cells;
            table.FindColumns(rows[0], columns);
            table.Rows = rows.RemoveAt(0);
            table.CheckWidths(rows[0].Cells.Length);
        }
        catch (InputException exception)
        {
            problems.AddRange(exception.Problems);
        }

        return table;
    }

    public bool Has(Column column) => found.ContainsKey(column);

    /// <summary>How many base units one unit of the column is.</summary>
    public double MetresIn(Column column) => found[column].Metres;

    public string? Text(CsvRow row, Column column, bool mayBeEmpty = false)
    {
        var text = row.Cells[found[column].Index];
        if (text.Length == 0 && !mayBeEmpty)
        {
            Complain(row, column, "is empty");
            return null;
        }

        return text;
    }

    /// <summary>The number in a cell, in the column's unit; null when it is none (that has been said).</summary>
    public double? Number(CsvRow row, Column column)
    {
        if (Text(row, column) is not { } text)
        {
            return null;
        }

        var number = DecimalText.Read(text);
        if (number.Complaint is { } complaint)
        {
            Complain(row, column, complaint);
            return null;
        }

        return number.Good;
    }

    /// <summary>The whole number in a cell, at least <paramref name="min"/>; null when it is none (that has been said).</summary>
    public int? Whole(CsvRow row, Column column, int min)
    {
        if (Number(row, column) is not { } number)
        {
            return null;
        }

        if (number != Math.Floor(number) || number < min || number > int.MaxValue)
        {
            Complain(row, column, $"{Quoted.Short(row.Cells[found[column].Index])} is not a whole number from {min} on");
            return null;
        }

        return (int)number;
    }

    public void Complain(CsvRow row, Column column, string message) => Report(row.Line, message, found[column].Header);

    /// <summary>Says how many rows were not listed; call once, after the last row.</summary>
    public void Close()
    {
        if (brokenLines.Count > MostRowsListed)
        {
            problems.Add(new Problem($"and {brokenLines.Count - MostRowsListed} more rows have problems", File));
        }
    }

    private void Report(int line, string message, string? header = null)
    {
        if (brokenLines.Add(line) ? brokenLines.Count <= MostRowsListed : problems.Exists(problem => problem.File == File && problem.Line == line))
        {
            problems.Add(new Problem(message, File, line, null, header));
        }
    }

    private void FindColumns(CsvRow header, IReadOnlyList<Column> columns)
    {
        var known = columns.SelectMany(column => column.Headers.Select(name => (column, name.Header, name.Metres))).ToArray();
        var unknown = new List<(string Header, int Index)>();
        for (var i = 0; i < header.Cells.Length; i++)
        {
            var name = header.Cells[i].Trim();
            var match = known.FirstOrDefault(pair => pair.Header.Equals(name, StringComparison.OrdinalIgnoreCase));
            if (match.column is null)
            {
                unknown.Add((name, i));
            }
            else if (!found.TryAdd(match.column, (i, match.Header, match.Metres)))
            {
                Report(header.Line, $"the column {match.Header} answers the same question as {found[match.column].Header}: keep one of them");
            }
        }

        foreach (var (name, index) in unknown)
        {
            ReportUnknown(header.Line, name, index, [.. known.Where(pair => !found.ContainsKey(pair.column)).Select(pair => pair.Header)]);
        }
    }

    private void ReportUnknown(int line, string name, int index, string[] absent)
    {
        if (name.Length == 0)
        {
            Report(line, $"column {index + 1} has no name");
        }
        else if (absent.Where(header => header.StartsWith(name + "_", StringComparison.OrdinalIgnoreCase)).ToArray() is { Length: > 0 } withUnit)
        {
            Report(line, $"the column {Quoted.Short(name)} needs its unit in its name: {WordList.Or(withUnit)}");
        }
        else if (Spelling.Nearest(name, absent) is { } nearest)
        {
            Report(line, $"there is no column {Quoted.Short(name)}: did you mean {nearest}?");
        }
        else
        {
            Notices.Add(new Notice(NoticeKind.Warning, $"{File}: the column {Quoted.Short(name)} is not used"));
        }
    }

    private void CheckWidths(int width)
    {
        var good = ImmutableArray.CreateBuilder<CsvRow>(Rows.Length);
        foreach (var row in Rows)
        {
            if (row.Cells.Length == width)
            {
                good.Add(row);
            }
            else
            {
                Report(row.Line, $"has {row.Cells.Length} cells and the header {width}{(row.Cells.Length > width ? ": the decimal mark is a point, and text with a comma stands in quotes" : "")}");
            }
        }

        Rows = good.ToImmutable();
    }
}
