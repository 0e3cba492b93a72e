namespace SurveyPlanner.Pages.Report;

/// <summary>A table as text: the first column names the rows.</summary>
/// <param name="Caption">What it holds.</param>
/// <param name="Columns">Headings, units in them.</param>
/// <param name="Rows">A text for each column; a line break in it begins a new line of the cell.</param>
public sealed record Table(string Caption, IReadOnlyList<Column> Columns, IReadOnlyList<IReadOnlyList<string>> Rows);

/// <summary>A column: its heading, and whether it holds figures, which are set to the right.</summary>
public sealed record Column(string Heading, bool IsFigures = true)
{
    public string? Class => IsFigures ? "num" : null;
}
