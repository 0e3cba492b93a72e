using System.Collections.Immutable;
using System.Text;

namespace SurveyPlanner.Files.Records;

/// <summary>The files a plan was made from.</summary>
/// <param name="File">The plan file as the user named it.</param>
/// <param name="Content">Its bytes as read.</param>
/// <param name="CanonicalText">The plan as understood, with what the command line changed in it: what a replay reads.</param>
/// <param name="Inputs">Every other file that was read.</param>
public sealed record PlanSource(string File, ReadOnlyMemory<byte> Content, string CanonicalText, ImmutableArray<InputFile> Inputs)
{
    /// <summary>The plan file's text.</summary>
    public string Text => Encoding.UTF8.GetString(Content.Span);
}

/// <summary>An input file as it was when it was read.</summary>
/// <param name="Key">The key of the plan file that names it, such as <c>region.boundary</c>.</param>
/// <param name="Path">Its path as the plan file has it: relative to the plan file, or absolute where the plan says so.</param>
/// <param name="Bytes">Its length.</param>
/// <param name="Sha256">SHA-256 of its bytes.</param>
public sealed record InputFile(string Key, string Path, long Bytes, string Sha256)
{
    /// <summary>From the very bytes that were parsed, so that no change in between goes unseen.</summary>
    public static InputFile Of(string key, string path, ReadOnlySpan<byte> content) =>
        new(key, path, content.Length, Hashes.Sha256(content));
}
