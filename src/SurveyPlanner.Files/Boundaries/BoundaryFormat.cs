using System.Text;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>The formats that can be read.</summary>
internal enum BoundaryFormat
{
    GeoJson,
    Zip,
    GeoPackage,
    Shapefile,
    Kml,
    Csv,
}

/// <summary>Finds out what a file is from its first bytes; its name only helps where bytes leave it open.</summary>
internal static class FormatOf
{
    private const string Remedy = "save the boundary as GeoJSON, GeoPackage, shapefile, KML or CSV";

    /// <summary>Formats that are recognised by their first bytes and not read.</summary>
    private static readonly (byte[] Start, string Name)[] Named =
    [
        ([0x66, 0x67, 0x62], "FlatGeobuf"),
        ("PAR1"u8.ToArray(), "a Parquet file"),
        ("%PDF"u8.ToArray(), "a PDF document"),
        ([0xD0, 0xCF, 0x11, 0xE0], "an old Office document"),
        ([0x1F, 0x8B], "a gzip archive"),
        ("7z"u8.ToArray(), "a 7z archive"),
        ("Rar!"u8.ToArray(), "a RAR archive"),
        ([0x00, 0x01, 0x00, 0x00, (byte)'S', (byte)'t', (byte)'a', (byte)'n'], "an Access database (personal geodatabase)"),
        ([(byte)'I', (byte)'I', 42, 0], "a TIFF image"),
        ([(byte)'M', (byte)'M', 0, 42], "a TIFF image"),
        ([0x89, (byte)'P', (byte)'N', (byte)'G'], "a picture"),
        ([0xFF, 0xD8, 0xFF], "a picture"),
        ("!table"u8.ToArray(), "a MapInfo table"),
        ("POLYGON"u8.ToArray(), "well-known text"),
        ("MULTIPOLYGON"u8.ToArray(), "well-known text"),
        ("SRID="u8.ToArray(), "well-known text"),
    ];

    /// <summary>Sidecars of a shapefile that people pick by mistake.</summary>
    private static readonly string[] Sidecars = [".dbf", ".shx", ".prj", ".cpg", ".sbn", ".sbx", ".qpj"];

    public static BoundaryFormat Find(byte[] bytes, string path, string source)
    {
        var start = bytes.AsSpan(0, Math.Min(bytes.Length, 4096));
        if (start.StartsWith("SQLite format 3\0"u8))
        {
            return BoundaryFormat.GeoPackage;
        }

        if (start.StartsWith("PK"u8) && start.Length > 3 && start[2] is 1 or 3 or 5)
        {
            return BoundaryFormat.Zip;
        }

        if (start is [0, 0, 0x27, 0x0A, ..])
        {
            return BoundaryFormat.Shapefile;
        }

        foreach (var (magic, name) in Named)
        {
            if (start.StartsWith(magic))
            {
                throw FileBytes.Refusal(source, $"this is {name}, which is not read; {Remedy}");
            }
        }

        return OfText(start, path, source);
    }

    private static BoundaryFormat OfText(ReadOnlySpan<byte> start, string path, string source)
    {
        var extension = Path.GetExtension(path).ToLowerInvariant();
        if (Sidecars.Contains(extension))
        {
            throw FileBytes.Refusal(source, "this is only one file of a shapefile; name the .shp file, its folder or its zip archive");
        }

        var text = DecodeStart(start).TrimStart('\uFEFF', ' ', '\t', '\r', '\n');
        if (text.StartsWith('{') || text.StartsWith('[') || extension is ".geojson" or ".json")
        {
            return BoundaryFormat.GeoJson;
        }

        if (extension is ".dxf" or ".dwg" or ".gpx" or ".wkt" or ".mif" && !text.StartsWith('<'))
        {
            throw FileBytes.Refusal(source, $"files of the kind {extension} are not read; {Remedy}");
        }

        if (text.StartsWith('<'))
        {
            return BoundaryFormat.Kml;
        }

        // A zero byte or another control character in the first lines: no text.
        var fault = text switch
        {
            "" => "the file is empty; export the boundary again",
            _ when extension is ".shp" => "the file is called .shp but does not begin like a shapefile, so it is damaged; copy or export it again",
            _ when text.Any(c => char.IsControl(c) && c is not ('\r' or '\n' or '\t')) => $"the format of this file is not known; {Remedy}",
            _ => null,
        };
        return fault is null ? BoundaryFormat.Csv : throw FileBytes.Refusal(source, fault);
    }

    private static string DecodeStart(ReadOnlySpan<byte> start) => start switch
    {
        [0xFF, 0xFE, ..] => Encoding.Unicode.GetString(start),
        [0xFE, 0xFF, ..] => Encoding.BigEndianUnicode.GetString(start),
        _ => Encoding.UTF8.GetString(start),
    };
}
