using SurveyPlanner.Files.Folders;

namespace SurveyPlanner.Files.Records;

/// <summary>
/// <c>NAME.draws.jsonl</c> beside the plan file <c>NAME.toml</c>: a line a draw. Open from the moment a draw is added until its outputs
/// are written, and locked so long, so that two runs never get the same number.
/// </summary>
public sealed class DrawsFile : IDisposable
{
    private const long MaxBytes = 64 * 1024 * 1024;
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(10);
    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(20);

    private readonly FileStream _stream;
    private readonly int? _takeBackTo;
    private bool _isKept;

    private DrawsFile(FileStream stream, DrawNumber number, int? takeBackTo) =>
        (_stream, Number, _takeBackTo) = (stream, number, takeBackTo);

    /// <summary>Which draw the added one is.</summary>
    public DrawNumber Number { get; }

    /// <summary>The draws file of a plan file.</summary>
    public static string PathFor(string planFile) => Path.ChangeExtension(planFile, ".draws.jsonl");

    /// <summary>
    /// Adds a draw. The same plan, seed and layout again is the same draw and adds no line.
    /// Unless <see cref="Keep"/> is called before it is disposed of, the draw is taken back.
    /// </summary>
    /// <exception cref="InputException">A line of the file is none of ours.</exception>
    /// <exception cref="IOException">The file cannot be written, or another run holds it.</exception>
    public static DrawsFile Add(string planFile, Draw draw)
    {
        var path = PathFor(planFile);
        try
        {
            var stream = Open(path);
            try
            {
                return Add(stream, path, draw);
            }
            catch
            {
                stream.Dispose();
                throw;
            }
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            throw DiskTrouble.Unwritten($"Cannot keep the count of draws in {path}", exception);
        }
    }

    /// <summary>The outputs are written: the draw counts.</summary>
    public void Keep() => _isKept = true;

    public void Dispose()
    {
        if (!_isKept && _takeBackTo is { } length && _stream.CanWrite)
        {
            TakeBack(_stream, length);
        }

        _stream.Dispose();
    }

    private static DrawsFile Add(FileStream stream, string path, Draw draw)
    {
        if (stream.Length > MaxBytes)
        {
            throw new InputException(new Problem("This file is too large to be a list of draws.", path));
        }

        var text = new byte[stream.Length];
        stream.ReadExactly(text);
        var lines = DrawLines.Read(text, path);
        var before = lines.Draws.TakeWhile(other => (other with { Reason = null }) != (draw with { Reason = null })).Count();
        var isNew = before == lines.Draws.Count;
        if (isNew)
        {
            Append(stream, lines, draw);
        }

        IReadOnlyList<Draw> draws = isNew ? [.. lines.Draws, draw] : lines.Draws;
        bool IsSamePlan(Draw other) => other.PlanSha256 == draw.PlanSha256;
        var number = new DrawNumber(
            draws.Take(before + 1).Count(IsSamePlan), draws.Count(IsSamePlan), draws.Count, draws[before].Reason);
        return new DrawsFile(stream, number, isNew ? lines.End : null);
    }

    private static void Append(FileStream stream, DrawLines lines, Draw draw)
    {
        try
        {
            stream.SetLength(lines.End);
            stream.Position = lines.End;
            Disk.WriteThrough(stream, lines.Line(draw).Span);
        }
        catch
        {
            TakeBack(stream, lines.End);
            throw;
        }
    }

    private static FileStream Open(string path)
    {
        if (new FileInfo(path).LinkTarget is not null)
        {
            throw new IOException("it is a link to somewhere else; put the file itself there");
        }

        var started = DateTime.UtcNow;
        while (true)
        {
            try
            {
                var stream = new FileStream(path, FileMode.OpenOrCreate, FileAccess.ReadWrite, FileShare.None, bufferSize: 0);

                // A run that took back the first draw of all deletes the file: what was opened before that is no longer it.
                if (File.Exists(path))
                {
                    return stream;
                }

                stream.Dispose();
            }
            catch (IOException) when (File.Exists(path) && DateTime.UtcNow - started < Patience)
            {
                Thread.Sleep(Pause);
            }
        }
    }

    private static void TakeBack(FileStream stream, int length)
    {
        try
        {
            stream.SetLength(length);
            if (length == 0)
            {
                File.Delete(stream.Name);
            }
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            // The draw stays on the list: counted once too often rather than once too seldom.
        }
    }
}
