using System.Text;
using SurveyPlanner.Files.Boundaries;

namespace SurveyPlanner.Files;

/// <summary>Text files: strictly UTF-8, with or without a byte-order mark.</summary>
internal static class TextFile
{
    private static readonly UTF8Encoding Strict = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <param name="path">The file.</param>
    /// <param name="noun">What it should be, for messages: <c>plan file</c>.</param>
    /// <param name="mostKilobytes">What is larger is something else under the wrong name.</param>
    /// <param name="files">The files of the run.</param>
    /// <exception cref="InputException">No such file, too large, or not UTF-8 (with the line).</exception>
    public static string Read(string path, string noun, int mostKilobytes, InputFiles files)
    {
        if (Directory.Exists(path))
        {
            throw new InputException(new Problem($"this is a folder, not a {noun}", path));
        }

        if (!File.Exists(path))
        {
            throw new InputException(new Problem($"there is no {noun} of this name", path));
        }

        if (new FileInfo(path).Length > mostKilobytes * 1024L)
        {
            throw new InputException(new Problem($"is larger than {mostKilobytes} kB: no {noun} is so large", path));
        }

        return Decode(files.Bytes(path), path);
    }

    private static string Decode(byte[] bytes, string path)
    {
        if (bytes.AsSpan().StartsWith([(byte)0xFF, (byte)0xFE]) || bytes.AsSpan().StartsWith([(byte)0xFE, (byte)0xFF]))
        {
            throw new InputException(new Problem("is saved as UTF-16: save it as UTF-8", path, 1, 1));
        }

        try
        {
            var text = Strict.GetString(bytes);
            return text.StartsWith('\uFEFF') ? text[1..] : text;
        }
        catch (DecoderFallbackException exception)
        {
            var (line, column) = FileBytes.LineAndColumn(bytes, exception.Index);
            throw new InputException(new Problem("holds a character that is not UTF-8: save the file as UTF-8", path, line, column));
        }
    }
}
