using SurveyPlanner.Files.Records;

namespace SurveyPlanner.Files.Outputs;

/// <summary>One file to be written: a plain name without any folder, and its bytes.</summary>
public sealed record OutputFile(string Name, ReadOnlyMemory<byte> Content)
{
    /// <summary>SHA-256 of the bytes, lower-case hexadecimal.</summary>
    public string Sha256 => Hashes.Sha256(Content.Span);
}
