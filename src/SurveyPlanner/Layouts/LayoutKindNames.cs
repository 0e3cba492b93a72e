using System.Text.Json;

namespace SurveyPlanner.Layouts;

/// <summary>The plan file's words for layout kinds: <c>PointGrid</c> is <c>point-grid</c>.</summary>
public static class LayoutKindNames
{
    public static string Of(LayoutKind kind) => JsonNamingPolicy.KebabCaseLower.ConvertName(kind.ToString());
}
