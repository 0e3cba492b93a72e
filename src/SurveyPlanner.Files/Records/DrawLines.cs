using System.Buffers;
using System.Text.Json;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Records;

/// <summary>The text of a draws file.</summary>
/// <param name="Draws">The draws so far.</param>
/// <param name="End">Byte at which the next line goes: before a last line that was torn off, else the length of the file.</param>
/// <param name="IsTerminated">Whether the last line before <paramref name="End"/> has its line end.</param>
internal sealed record DrawLines(IReadOnlyList<Draw> Draws, int End, bool IsTerminated)
{
    /// <exception cref="InputException">A whole line is none of ours.</exception>
    public static DrawLines Read(ReadOnlyMemory<byte> text, string file)
    {
        var draws = new List<Draw>();
        var (start, number) = (0, 1);
        while (start < text.Length)
        {
            var length = text.Span[start..].IndexOf((byte)'\n');
            var isTerminated = length >= 0;
            var line = isTerminated ? text.Slice(start, length) : text[start..];
            if (Parse(line) is { } draw)
            {
                draws.Add(draw);
            }
            else if (!isTerminated)
            {
                // Torn off by a run that died while writing it: no draw that anyone has seen.
                return new DrawLines(draws, start, IsTerminated: true);
            }
            else if (!line.Span.Trim(" \t\r"u8).IsEmpty)
            {
                throw new InputException(new Problem("This line is no draw; bring the file back as this program wrote it.", file, number));
            }

            if (!isTerminated)
            {
                return new DrawLines(draws, text.Length, IsTerminated: false);
            }

            (start, number) = (start + length + 1, number + 1);
        }

        return new DrawLines(draws, text.Length, IsTerminated: true);
    }

    /// <summary>What is to be written at <see cref="End"/> to add a draw.</summary>
    public ReadOnlyMemory<byte> Line(Draw draw)
    {
        var text = new ArrayBufferWriter<byte>();
        text.Write(IsTerminated ? ""u8 : "\n"u8);
        text.Write(JsonText.Write(json => WriteDraw(json, draw), indented: false).Span);
        text.Write("\n"u8);
        return text.WrittenMemory;
    }

    private static void WriteDraw(Utf8JsonWriter json, Draw draw)
    {
        json.WriteStartObject();
        json.Text("plan_sha256", draw.PlanSha256);
        json.WriteNumber("seed", draw.Seed);
        json.Text("layout_sha256", draw.LayoutSha256);
        json.Text("reason", draw.Reason);
        json.WriteEndObject();
    }

    private static Draw? Parse(ReadOnlyMemory<byte> line)
    {
        try
        {
            using var document = JsonDocument.Parse(line);
            var root = document.RootElement;
            var reason = root.TryGetProperty("reason", out var said) ? said.GetString() : null;
            return root.GetProperty("plan_sha256").GetString() is { } plan && root.GetProperty("layout_sha256").GetString() is { } layout
                ? new Draw(plan, root.GetProperty("seed").GetUInt64(), layout, reason)
                : null;
        }
        catch (Exception exception) when (exception is JsonException or KeyNotFoundException or InvalidOperationException or FormatException)
        {
            return null;
        }
    }
}
