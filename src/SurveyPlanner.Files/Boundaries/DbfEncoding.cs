using System.Text;
using System.Text.Unicode;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>Which encoding the text of a .dbf is in.</summary>
internal static class DbfEncoding
{
    public static Encoding Of(byte[] dbf, byte[]? cpg, int headerBytes, RepairLog log)
    {
        var named = cpg is null ? null : Named(Encoding.ASCII.GetString(cpg).Trim('\0', ' ', '\t', '\r', '\n'));
        if (named is not null)
        {
            return named;
        }

        if (ByLanguage(dbf[29]) is { } byLanguage)
        {
            return byLanguage;
        }

        var text = dbf.AsSpan(headerBytes);
        if (!text.ContainsAnyExceptInRange((byte)0, (byte)0x7F))
        {
            return Encoding.UTF8;
        }

        var isUtf8 = Utf8.IsValid(text);
        log.Warn($"the shapefile does not say the encoding of its attributes (no .cpg file); {(isUtf8 ? "UTF-8" : "Windows-1252")} was assumed");
        return isUtf8 ? Encoding.UTF8 : CodePage(1252)!;
    }

    /// <summary>The encoding that a .cpg names, by name or by number; null when it is not known.</summary>
    private static Encoding? Named(string name)
    {
        var digits = new string([.. name.Where(char.IsAsciiDigit)]);
        return name.ToUpperInvariant() switch
        {
            "UTF-8" or "UTF8" or "65001" => Encoding.UTF8,
            "ISO-8859-1" or "ISO8859-1" or "ISO 8859-1" or "ISO88591" or "LATIN1" or "LATIN-1" or "28591" or "88591" or "8859_1" or "8859-1" => Encoding.Latin1,
            var upper when upper.Contains("8859", StringComparison.Ordinal) && int.TryParse(digits[(digits.IndexOf("8859", StringComparison.Ordinal) + 4)..], out var part) && part is > 1 and < 16
                => CodePage(28590 + part),
            "SYSTEM" or "OEM" or "ANSI" or "" => null,
            _ => int.TryParse(digits, out var page) && page > 0 ? CodePage(page) : null,
        };
    }

    /// <summary>The language byte of dBASE, as far as shapefiles in use have it.</summary>
    private static Encoding? ByLanguage(byte language) => language switch
    {
        0x01 or 0x09 or 0x0B or 0x0D or 0x0F or 0x11 or 0x15 or 0x18 or 0x19 or 0x1B => CodePage(437),
        0x02 or 0x0A or 0x0E or 0x10 or 0x12 or 0x14 or 0x16 or 0x1A or 0x1D or 0x25 or 0x37 => CodePage(850),
        0x03 or 0x57 or 0x58 or 0x59 => CodePage(1252),
        0x08 or 0x17 or 0x66 => CodePage(865),
        0x13 or 0x7B => CodePage(932),
        0x1F or 0x22 or 0x23 or 0x40 or 0x64 or 0x87 => CodePage(852),
        0x26 or 0x65 => CodePage(866),
        0x4D or 0x7A => CodePage(936),
        0x4E or 0x79 => CodePage(949),
        0x4F or 0x78 => CodePage(950),
        0x50 or 0x7C => CodePage(874),
        0xC8 => CodePage(1250),
        0xC9 => CodePage(1251),
        0xCA => CodePage(1254),
        0xCB => CodePage(1253),
        0xCC => CodePage(1257),
        _ => null,
    };

    private static Encoding? CodePage(int page) => CodePagesEncodingProvider.Instance.GetEncoding(page);
}
