using System.Text.Json;

namespace SurveyPlanner;

/// <summary>
/// The word for one of a set of choices, as the plan file takes it and summaries and reports give it: <c>PointGrid</c> is <c>point-grid</c>.
/// </summary>
public static class ChoiceWord
{
    public static string Of<T>(T choice)
        where T : struct, Enum => JsonNamingPolicy.KebabCaseLower.ConvertName(choice.ToString());
}
