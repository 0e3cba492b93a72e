using System.Text;
using System.Text.Json;

namespace SurveyPlanner.Files.Outputs;

/// <summary>A JSON document as text, for standard output.</summary>
public static class JsonDocumentText
{
    public static string Of(Action<Utf8JsonWriter> content) => Encoding.UTF8.GetString(JsonText.Write(content, indented: true).Span).TrimEnd();
}
