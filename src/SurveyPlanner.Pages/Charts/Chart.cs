namespace SurveyPlanner.Pages.Charts;

/// <summary>
/// A chart over two axes: bars, bands, lines, levels and dots, drawn in that order. Build it from figures; the drawing follows by itself.
/// </summary>
/// <param name="Title">Title for those who do not see it.</param>
/// <param name="Description">What it shows, for the same.</param>
/// <param name="X">Axis to the right.</param>
/// <param name="Y">Axis upwards.</param>
public sealed record Chart(string Title, string Description, Axis X, Axis Y)
{
    public IReadOnlyList<Bar> Bars { get; init; } = [];

    public IReadOnlyList<Line> Lines { get; init; } = [];

    public IReadOnlyList<Level> Levels { get; init; } = [];

    public IReadOnlyList<Dot> Dots { get; init; } = [];
}

/// <summary>A bar from the base of the chart, such as a class of a histogram.</summary>
/// <param name="From">Its left side on the x axis.</param>
/// <param name="To">Its right side.</param>
/// <param name="Height">Its top on the y axis.</param>
public sealed record Bar(double From, double To, double Height);

/// <summary>A line, labelled at its end.</summary>
/// <param name="Label">Its name.</param>
/// <param name="Points">Its points from left to right.</param>
/// <param name="Band">Uncertainty round it, from left to right; empty where there is none.</param>
/// <param name="IsSecond">Whether it is drawn dashed, to be told from a first one.</param>
public sealed record Line(string Label, IReadOnlyList<(double X, double Y)> Points, IReadOnlyList<(double X, double Low, double High)> Band, bool IsSecond = false);

/// <summary>A thin line across the chart at one height, such as a target, with its name and value.</summary>
public sealed record Level(double Y, string Label);

/// <summary>One dot, such as the layout as drawn, with its name.</summary>
public sealed record Dot(double X, double Y, string Label);
