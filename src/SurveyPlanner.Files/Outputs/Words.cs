using System.Text.Json;

namespace SurveyPlanner.Files.Outputs;

/// <summary>Values of enumerations as the plan file and the documents spell them.</summary>
internal static class Words
{
    /// <summary>In lower case with hyphens: <c>point-grid</c>, <c>random-lines</c>.</summary>
    public static string Kebab<T>(T value)
        where T : struct, Enum => JsonNamingPolicy.KebabCaseLower.ConvertName(value.ToString());
}
