using System.Text;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>A line of a CSV file with its number in the file, from 1.</summary>
internal sealed record CsvLine(int Number, IReadOnlyList<string> Cells);

/// <summary>
/// Lines and cells of a table as text (RFC 4180, and the semicolon or tab that spreadsheets write where the comma is the decimal mark).
/// </summary>
internal sealed record CsvTable(char Separator, IReadOnlyList<string> Header, IReadOnlyList<CsvLine> Lines, bool EndsWithLineEnd)
{
    // A cell longer than this is a quotation mark that nobody closed.
    private const int LongestCell = 10_000;

    public static CsvTable Read(string text, string source)
    {
        var firstLine = text.AsSpan()[..Math.Max(0, text.AsSpan().IndexOfAny('\r', '\n') is var end and >= 0 ? end : text.Length)];
        var separator = SeparatorOf(firstLine);
        var lines = new List<CsvLine>();
        var at = 0;
        var number = 1;
        while (at < text.Length)
        {
            var start = number;
            lines.Add(new CsvLine(start, Line(text, ref at, ref number, separator, source)));
        }

        if (lines.Count == 0)
        {
            throw FileBytes.Refusal(source, "the file is empty; export the boundary again");
        }

        return new CsvTable(separator, [.. lines[0].Cells.Select(cell => cell.Trim())], lines[1..], text[^1] is '\n' or '\r');
    }

    private static char SeparatorOf(ReadOnlySpan<char> firstLine)
        => firstLine.Contains(';') ? ';' : firstLine.Contains('\t') ? '\t' : ',';

    private static List<string> Line(string text, ref int at, ref int number, char separator, string source)
    {
        var cells = new List<string>();
        while (true)
        {
            cells.Add(at < text.Length && text[at] == '"' ? Quoted(text, ref at, ref number, source) : "");
            var start = at;
            while (at < text.Length && text[at] != separator && text[at] is not ('\r' or '\n'))
            {
                at++;
            }

            // What follows a closing quotation mark up to the separator still belongs to the cell.
            cells[^1] += text[start..at];
            if (at < text.Length && text[at] == separator)
            {
                at++;
                continue;
            }

            if (at < text.Length)
            {
                at += text[at] == '\r' && at + 1 < text.Length && text[at + 1] == '\n' ? 2 : 1;
                number++;
            }

            return cells;
        }
    }

    /// <summary>A cell between quotation marks, where two of them stand for one.</summary>
    private static string Quoted(string text, ref int at, ref int number, string source)
    {
        var (cell, start) = (new StringBuilder(), number);
        for (at++; at < text.Length && cell.Length <= LongestCell; at++)
        {
            number += text[at] == '\n' ? 1 : 0;
            if (text[at] != '"')
            {
                cell.Append(text[at]);
            }
            else if (at + 1 < text.Length && text[at + 1] == '"')
            {
                cell.Append(text[at++]);
            }
            else
            {
                at++;
                return cell.ToString();
            }
        }

        throw new InputException(new Problem("a quotation mark is opened here and not closed; correct it", source, start));
    }
}
