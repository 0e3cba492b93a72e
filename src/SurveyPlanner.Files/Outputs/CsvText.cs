using System.Buffers;
using System.Text;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// A table as text: UTF-8, comma between cells, dot in numbers, one header line, lines end in LF; cells quoted as RFC 4180 where they must be.
/// </summary>
internal sealed class CsvText
{
    private readonly ArrayBufferWriter<byte> _text = new();

    public CsvText(string header) => Row(header);

    /// <summary>Adds a row of cells made by <see cref="Cell"/> or <see cref="Figures"/>.</summary>
    public void Row(params ReadOnlySpan<string> cells)
    {
        for (var i = 0; i < cells.Length; i++)
        {
            _text.Write(i == 0 ? ""u8 : ","u8);
            Encoding.UTF8.GetBytes(cells[i], _text);
        }

        _text.Write("\n"u8);
    }

    public OutputFile ToFile(string name) => new(name, _text.WrittenMemory);

    /// <summary>
    /// A cell of text. What a spreadsheet would take for a formula gets an apostrophe in front; control characters and line ends become spaces.
    /// </summary>
    public static string Cell(string text)
    {
        var clean = PlainText.Clean(text);

        // The full-width forms too: some spreadsheets read them as the plain ones.
        var isFormula = text.Length > 0 && ("=+-@\t\r\n＝＋－＠".Contains(text[0], StringComparison.Ordinal)
            || "=+-@＝＋－＠".Contains(clean.TrimStart().FirstOrDefault(' '), StringComparison.Ordinal));
        var guarded = isFormula ? "'" + clean : clean;
        return guarded.AsSpan().ContainsAny(",\"") ? $"\"{guarded.Replace("\"", "\"\"", StringComparison.Ordinal)}\"" : guarded;
    }
}
