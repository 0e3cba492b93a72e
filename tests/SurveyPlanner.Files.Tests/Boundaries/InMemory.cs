using System.Globalization;
using System.IO.Compression;
using System.Text;
using SurveyPlanner.Files.Boundaries;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Boundaries;

/// <summary>Boundary files made up in a test, read by the front door without touching the disk.</summary>
internal static class InMemory
{
    public static Boundary Read(string text, string name = "made-up.geojson", BoundaryOptions? options = null) => Read(Encoding.UTF8.GetBytes(text), name, options);

    public static Boundary Read(byte[] bytes, string name, BoundaryOptions? options = null) => BoundaryReader.Read(bytes, name, name, options ?? BoundaryOptions.Default, new InputFiles());

    /// <summary>The sentence that a file is refused with.</summary>
    public static string Refusal(string text, string name = "made-up.geojson", BoundaryOptions? options = null) => Refusal(Encoding.UTF8.GetBytes(text), name, options);

    public static string Refusal(byte[] bytes, string name, BoundaryOptions? options = null) => Assert.Throws<InputException>(() => Read(bytes, name, options)).Message;

    public static string Told(Boundary boundary) => string.Join("\n", boundary.Notices.Select(notice => $"{notice.Kind}: {notice.Message}"));

    /// <summary>GeoJSON of one polygon; rings as <c>x y, x y</c>, closed here unless told not to.</summary>
    public static string Polygon(params string[] rings) => $$"""{"type":"Polygon","coordinates":{{Rings(rings)}}}""";

    public static string MultiPolygon(params string[][] polygons) => $$"""{"type":"MultiPolygon","coordinates":[{{string.Join(",", polygons.Select(Rings))}}]}""";

    public static string Feature(string geometry, string properties = "null") => $$"""{"type":"Feature","properties":{{properties}},"geometry":{{geometry}}}""";

    public static string Collection(params string[] features) => $$"""{"type":"FeatureCollection","features":[{{string.Join(",", features)}}]}""";

    public static byte[] Zip(params (string Name, byte[] Content)[] members)
    {
        using var stream = new MemoryStream();
        using (var archive = new ZipArchive(stream, ZipArchiveMode.Create, leaveOpen: true))
        {
            foreach (var (name, content) in members)
            {
                using var member = archive.CreateEntry(name).Open();
                member.Write(content);
            }
        }

        return stream.ToArray();
    }

    /// <summary>A regular star whose every edge crosses nearly every other.</summary>
    public static string Star(int points)
        => string.Join(", ", Enumerable.Range(0, points).Select(i => i * (points / 2) * 2 * Math.PI / points)
            .Select(angle => string.Create(CultureInfo.InvariantCulture, $"{10 + Math.Cos(angle)} {50 + Math.Sin(angle)}")));

    private static string Rings(string[] rings) => $"[{string.Join(",", rings.Select(Ring))}]";

    private static string Ring(string points)
    {
        var open = points.EndsWith(" open", StringComparison.Ordinal);
        var list = points.Replace(" open", "", StringComparison.Ordinal).Split(',').Select(point => "[" + string.Join(",", point.Trim().Split(' ')) + "]").ToList();
        return $"[{string.Join(",", open ? list : [.. list, list[0]])}]";
    }
}
