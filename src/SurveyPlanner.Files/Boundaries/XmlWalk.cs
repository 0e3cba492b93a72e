using System.Text;
using System.Xml;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>Ways through an XML document that leave the reader at the end of the element they were called on.</summary>
internal static class XmlWalk
{
    /// <summary>Calls back on each child element; the callback reads it up to its end.</summary>
    public static void ForEachChild(XmlReader reader, Action<XmlReader> read)
    {
        if (reader.IsEmptyElement)
        {
            return;
        }

        var depth = reader.Depth;
        while (reader.Read() && reader.Depth > depth)
        {
            if (reader.NodeType == XmlNodeType.Element)
            {
                read(reader);
            }
        }
    }

    /// <summary>All text in an element, and the reader at its end.</summary>
    public static string ElementText(XmlReader reader)
    {
        if (reader.IsEmptyElement)
        {
            return "";
        }

        var text = new StringBuilder();
        var depth = reader.Depth;
        while (reader.Read() && reader.Depth > depth)
        {
            if (reader.NodeType is XmlNodeType.Text or XmlNodeType.CDATA or XmlNodeType.Whitespace or XmlNodeType.SignificantWhitespace)
            {
                text.Append(reader.Value);
            }
        }

        return text.ToString();
    }

    public static void SkipElement(XmlReader reader) => ForEachChild(reader, static _ => { });
}
