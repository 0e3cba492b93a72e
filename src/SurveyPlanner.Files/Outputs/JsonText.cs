using System.Buffers;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Unicode;

namespace SurveyPlanner.Files.Outputs;

/// <summary>How this program writes JSON: UTF-8 without a mark, letters of every language as they are, &lt; &gt; &amp; and quotes escaped.</summary>
internal static class JsonText
{
    private static readonly JavaScriptEncoder Encoder = JavaScriptEncoder.Create(UnicodeRanges.All);

    public static ReadOnlyMemory<byte> Write(Action<Utf8JsonWriter> content, bool indented)
    {
        var buffer = new ArrayBufferWriter<byte>();
        var options = new JsonWriterOptions { Encoder = Encoder, Indented = indented, NewLine = "\n" };
        using (var json = new Utf8JsonWriter(buffer, options))
        {
            content(json);
        }

        if (indented)
        {
            buffer.Write("\n"u8);
        }

        return buffer.WrittenMemory;
    }

    /// <summary>A number as <see cref="Figures"/> printed it.</summary>
    public static void Figure(this Utf8JsonWriter json, string key, string figure)
    {
        json.WritePropertyName(key);
        json.WriteRawValue(figure, skipInputValidation: true);
    }

    /// <summary>Text of the user's; what does not apply is left out.</summary>
    public static void Text(this Utf8JsonWriter json, string key, string? text)
    {
        if (text is not null)
        {
            json.WriteString(key, PlainText.WellFormed(text));
        }
    }

    public static void Object(this Utf8JsonWriter json, string key, Action members)
    {
        json.WriteStartObject(key);
        members();
        json.WriteEndObject();
    }

    public static void Array<T>(this Utf8JsonWriter json, string key, IEnumerable<T> items, Action<T> write)
    {
        json.WriteStartArray(key);
        foreach (var item in items)
        {
            write(item);
        }

        json.WriteEndArray();
    }
}
