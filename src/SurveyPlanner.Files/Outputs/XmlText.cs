using System.Text;
using System.Xml;

namespace SurveyPlanner.Files.Outputs;

/// <summary>How this program writes XML: UTF-8 without a mark, indented, lines end in LF.</summary>
internal static class XmlText
{
    public static ReadOnlyMemory<byte> Write(Action<XmlWriter> content)
    {
        var settings = new XmlWriterSettings { Encoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false), Indent = true, NewLineChars = "\n" };
        using var stream = new MemoryStream();
        using (var xml = XmlWriter.Create(stream, settings))
        {
            content(xml);
        }

        stream.WriteByte((byte)'\n');
        return stream.ToArray();
    }
}
