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

/// <summary>A line, labelled at its end; several lines have their labels in the margin, each with a sample of its line.</summary>
/// <param name="Label">Its name; empty where it has none.</param>
/// <param name="Points">Its points from left to right.</param>
public sealed record Line(string Label, IReadOnlyList<(double X, double Y)> Points)
{
    /// <summary>Uncertainty round it, from left to right; empty where there is none.</summary>
    public IReadOnlyList<(double X, double Low, double High)> Band { get; init; } = [];

    /// <summary>How it is told from the other lines.</summary>
    public LineLook Look { get; init; }
}

/// <summary>Looks that lines are told apart by, also in grey: more than four lines are more than a reader can follow.</summary>
public enum LineLook
{
    First,
    Second,
    Third,
    Fourth,

    /// <summary>One of a crowd that is not named.</summary>
    Quiet,
}

/// <summary>A thin line across the chart, such as a target, with its name and value.</summary>
/// <param name="At">Its place on the y axis; on the x axis if upright.</param>
/// <param name="Label">Its name and value.</param>
/// <param name="IsUpright">Whether it runs from the base to the top.</param>
public sealed record Level(double At, string Label, bool IsUpright = false);

/// <summary>One dot, such as the layout as drawn, with its name.</summary>
public sealed record Dot(double X, double Y, string Label);
