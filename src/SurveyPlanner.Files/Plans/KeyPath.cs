using System.Collections.Immutable;
using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>The full name of a key or table: <c>layout.spacing</c>, <c>stratum."inner bay".kind</c>. Equal when written the same.</summary>
internal sealed class KeyPath : IEquatable<KeyPath>
{
    private readonly string text;

    public KeyPath(ImmutableArray<string> segments)
    {
        Segments = segments;
        text = string.Join('.', segments.Select(Segment));
    }

    public ImmutableArray<string> Segments { get; }

    public KeyPath Add(IEnumerable<string> segments) => new([.. Segments, .. segments]);

    /// <summary>The path without its last segment.</summary>
    public KeyPath Parent => new(Segments[..^1]);

    public bool Equals(KeyPath? other) => other is not null && other.text == text;

    public override bool Equals(object? obj) => Equals(obj as KeyPath);

    public override int GetHashCode() => text.GetHashCode(StringComparison.Ordinal);

    public override string ToString() => text;

    /// <summary>One segment as TOML has it: bare where TOML allows that, else in quotes.</summary>
    public static string Segment(string segment) => IsBare(segment) ? segment : Quoted.Text(segment);

    public static bool IsBare(string segment)
        => segment.Length > 0 && segment.All(c => char.IsAsciiLetterOrDigit(c) || c is '_' or '-');
}
