using Tomlyn;
using Tomlyn.Parsing;
using Tomlyn.Syntax;

namespace SurveyPlanner.Files.Plans;

/// <summary>
/// TOML text to settings. A line that is no TOML is reported, then mended or left out, and reading goes on, so that one
/// slip does not hide the other problems of a file.
/// </summary>
internal sealed class TomlReader(string file, List<Problem> problems)
{
    /// <summary>After so many broken lines the file is something else than a plan; the rest is not looked at.</summary>
    private const int MostBrokenLines = 30;

    /// <summary>Lines that had to be left out, and the key each seemed to hold.</summary>
    private readonly List<(int Line, string Key)> leftOut = [];

    /// <summary>The file as TOML, or null when it is broken beyond mending (the problems say where).</summary>
    public PlanSyntax? Read(string text)
    {
        var lines = text.Replace("\r\n", "\n", StringComparison.Ordinal).Replace('\r', '\n').Split('\n');
        var lastLine = LastLine(lines);
        if (ParseMending(lines) is not { } document)
        {
            return null;
        }

        var tree = new TomlTree(file, problems);
        tree.Add(document);
        tree.AddLeftOut(leftOut);
        var syntax = new PlanSyntax([.. tree.Settings], [.. tree.Tables], lastLine);
        var unique = DuplicateKeys.Remove(syntax, problems);
        ReportOtherRedefinitions(string.Join('\n', lines));
        return unique;
    }

    /// <summary>The value of a TOML literal, or null when the text is none; for <c>--set</c>.</summary>
    public static SettingValue? Literal(string text)
    {
        if (text.AsSpan().ContainsAny('\n', '\r') || TryParse("x = " + text) is not { HasErrors: false } document)
        {
            return null;
        }

        return document.KeyValues.ToArray() is [{ Value: { } value }] ? TomlTree.Convert(value) : null;
    }

    private DocumentSyntax? ParseMending(string[] lines)
    {
        var broken = new HashSet<int>();
        while (true)
        {
            var document = TryParse(string.Join('\n', lines));
            if (document is { HasErrors: false })
            {
                return document;
            }

            var (index, column) = BlamedLine(document, lines);
            if (broken.Add(index))
            {
                var (complaint, mended) = BrokenLine.Explain(lines[index]);
                problems.Add(new Problem(complaint, file, index + 1, column));
                lines[index] = mended;
            }
            else if (!LeaveOut(lines, index))
            {
                return null;
            }

            if (broken.Count > MostBrokenLines)
            {
                return null;
            }
        }
    }

    /// <summary>A line whose mending did not help goes; false when that cannot help either.</summary>
    private bool LeaveOut(string[] lines, int index)
    {
        // What follows a broken table header would count to the table before it: nothing after it can be judged.
        if (lines[index].Length == 0 || lines[index].TrimStart().StartsWith('['))
        {
            return false;
        }

        if (BrokenLine.KeyOf(lines[index]) is { } key)
        {
            leftOut.Add((index + 1, key));
        }

        lines[index] = "";
        return true;
    }

    /// <summary>Index and column (from 1) of the line that is most likely at fault.</summary>
    private static (int Index, int Column) BlamedLine(DocumentSyntax? document, string[] lines)
    {
        if (document is null)
        {
            // The library does not say where: the first line that defeats it by itself, else the one nested deepest.
            var defeating = Array.FindIndex(lines, line => TryParse(line) is null);
            return (defeating >= 0 ? defeating : Array.IndexOf(lines, lines.MaxBy(line => line.Count(c => c is '[' or '{'))), 1);
        }

        var start = document.Diagnostics
            .Where(diagnostic => diagnostic.Kind == DiagnosticMessageKind.Error)
            .Select(diagnostic => diagnostic.Span.Start)
            .MinBy(position => position.Offset);
        var index = Math.Clamp(start.Line, 0, lines.Length - 1);

        // A line that is good by itself suffers from one above it: a bracket or quote left open there.
        var culprit = index;
        while (culprit >= 0 && TryParse(lines[culprit]) is { HasErrors: false })
        {
            culprit--;
        }

        return culprit < 0 || culprit == index ? (index, Math.Max(0, start.Column) + 1) : (culprit, 1);
    }

    /// <summary>What TOML forbids beyond plain duplicates, such as <c>layout.kind</c> above a <c>[layout]</c>.</summary>
    private void ReportOtherRedefinitions(string text)
    {
        var known = problems.Select(problem => problem.Line).ToHashSet();
        foreach (var diagnostic in SyntaxParser.Parse(text, file, validate: true).Diagnostics)
        {
            var line = diagnostic.Span.Start.Line + 1;
            if (diagnostic.Kind == DiagnosticMessageKind.Error && known.Add(line))
            {
                problems.Add(new Problem(
                    "this table or key was already defined in another way further up: keep one of them", file, line, diagnostic.Span.Start.Column + 1));
            }
        }
    }

    private static int LastLine(string[] lines) => Math.Max(1, lines[^1].Length == 0 ? lines.Length - 1 : lines.Length);

    /// <summary>Null where the library gives up: on nesting too deep, and (a fault of it) on the escape of half a surrogate pair.</summary>
    private static DocumentSyntax? TryParse(string text)
    {
        try
        {
            return SyntaxParser.Parse(text, validate: false);
        }
        catch (Exception exception) when (exception is TomlException or ArgumentOutOfRangeException)
        {
            return null;
        }
    }
}
