using System.Collections.Immutable;
using System.Text;

namespace SurveyPlanner.Files.Tables;

/// <summary>A row of a table: the line it begins on (from 1), and its cells as text.</summary>
internal sealed record CsvRow(int Line, ImmutableArray<string> Cells)
{
    public bool IsEmpty => Cells.All(string.IsNullOrWhiteSpace);
}

/// <summary>
/// Comma-separated values as RFC 4180 has them: quotes where a cell holds a comma, a line end or a quote (doubled).
/// Also taken: LF or CR alone as line end, and a last line without one.
/// </summary>
internal static class CsvReader
{
    /// <param name="text">The text, without a byte-order mark.</param>
    /// <param name="file">What to call it in messages.</param>
    /// <returns>All rows that hold anything; the first is the header.</returns>
    /// <exception cref="InputException">A quote that is never closed, or text after a closing quote.</exception>
    public static ImmutableArray<CsvRow> Read(string text, string file)
    {
        var rows = ImmutableArray.CreateBuilder<CsvRow>();
        var scanner = new Scanner(text, file);
        while (scanner.Next() is { } row)
        {
            if (!row.IsEmpty)
            {
                rows.Add(row);
            }
        }

        return rows.ToImmutable();
    }

    private sealed class Scanner(string text, string file)
    {
        private int position;
        private int line = 1;

        public CsvRow? Next()
        {
            if (position >= text.Length)
            {
                return null;
            }

            var start = line;
            var cells = ImmutableArray.CreateBuilder<string>();
            while (true)
            {
                cells.Add(AtQuote() ? Quoted() : Plain());
                if (position < text.Length && text[position] == ',')
                {
                    position++;
                    continue;
                }

                EndLine();
                return new CsvRow(start, cells.ToImmutable());
            }
        }

        private bool AtQuote() => position < text.Length && text[position] == '"';

        private string Plain()
        {
            var start = position;
            while (position < text.Length && text[position] is not (',' or '\n' or '\r'))
            {
                position++;
            }

            return text[start..position].Trim();
        }

        private string Quoted()
        {
            var opened = line;
            var cell = new StringBuilder();
            position++;
            while (true)
            {
                if (position >= text.Length)
                {
                    throw new InputException(new Problem("the quote that opens on this line is never closed", file, opened, 1));
                }

                var character = text[position++];
                if (character == '"' && !AtQuote())
                {
                    break;
                }

                if (character == '"')
                {
                    position++;
                }
                else if (character == '\n' || (character == '\r' && (position >= text.Length || text[position] != '\n')))
                {
                    line++;
                }

                cell.Append(character);
            }

            if (Plain().Length > 0)
            {
                throw new InputException(new Problem("text stands after a closing quote: a quote inside a cell is written twice", file, line, 1));
            }

            return cell.ToString();
        }

        private void EndLine()
        {
            if (position < text.Length && text[position] == '\r')
            {
                position++;
                position += position < text.Length && text[position] == '\n' ? 1 : 0;
            }
            else
            {
                position++;
            }

            line++;
        }
    }
}
