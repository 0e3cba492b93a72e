using System.Globalization;

namespace SurveyPlanner.Cli;

/// <summary>An aligned table without boxes: the first column to the left, figures to the right.</summary>
internal sealed class TextTable(params string[] header)
{
    private const int MaxCell = 24;
    private const int MaxTail = 8;
    private const int MostDecimals = 9;

    private readonly List<string[]> _rows = [];

    public void Add(params string[] cells) => _rows.Add([.. cells.Select(Plain)]);

    public void Write(TextWriter output)
    {
        var widths = header.Select((title, column) => _rows.Select(row => row[column].Length).Append(title.Length).Max()).ToArray();
        foreach (var row in _rows.Prepend(header))
        {
            var cells = row.Select((cell, column) => IsText(column) ? cell.PadRight(widths[column]) : cell.PadLeft(widths[column]));
            output.WriteLine(string.Join("  ", cells).TrimEnd());
        }
    }

    public static string Number(int value) => value.ToString("#,0", CultureInfo.InvariantCulture);

    public static string Degrees(double value) => value.ToString("0.00000", CultureInfo.InvariantCulture);

    /// <summary>Degrees to a tenth; what rounds to the full turn is 0.</summary>
    public static string Bearing(double degrees, double turn)
        => (Math.Round(degrees, 1) % turn).ToString("0.0", CultureInfo.InvariantCulture);

    /// <summary>Three significant figures, never in powers of ten for what a person would write out.</summary>
    public static string Figure(double value)
    {
        var size = Math.Abs(value);
        if (size >= 1000)
        {
            return Math.Round(value).ToString("#,0", CultureInfo.InvariantCulture);
        }

        var decimals = size switch
        {
            0 => 0,
            >= 100 => 0,
            >= 10 => 1,
            >= 1 => 2,
            >= 0.1 => 3,
            >= 0.01 => 4,
            _ => Math.Min(MostDecimals, 2 - (int)Math.Floor(Math.Log10(size))),
        };
        return value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
    }

    private bool IsText(int column) => column == 0 || _rows.Any(row => row[column].Length > 0 && !IsFigure(row[column][0]));

    private static bool IsFigure(char c) => char.IsAsciiDigit(c) || c is '-' or '+';

    /// <summary>Names may hold anything, and be of any length; those that begin alike mostly differ at their end.</summary>
    private static string Plain(string cell)
    {
        var plain = new StringInfo(string.Concat(cell.Select(c => char.IsControl(c) ? ' ' : c)));
        return plain.LengthInTextElements <= MaxCell
            ? plain.String
            : plain.SubstringByTextElements(0, MaxCell - 1 - MaxTail) + "…" + plain.SubstringByTextElements(plain.LengthInTextElements - MaxTail);
    }
}
