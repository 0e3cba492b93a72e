namespace SurveyPlanner.Pages.Charts;

/// <summary>Bars with names, one below the other, each with its figure at its end.</summary>
/// <param name="Title">Title for those who do not see it.</param>
/// <param name="Description">What it shows, for the same.</param>
/// <param name="Unit">What the bars count, with the unit.</param>
/// <param name="Bars">Name, length (not negative) and the figure as text.</param>
public sealed record NamedBars(string Title, string Description, string Unit, IReadOnlyList<(string Name, double Value, string Text)> Bars);
