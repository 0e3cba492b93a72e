namespace SurveyPlanner;

/// <summary>
/// One thing that is wrong with the input: a plain sentence that says what, where, and how to mend it.
/// </summary>
/// <param name="Message">What is wrong and how to mend it, one sentence, without the place.</param>
/// <param name="File">The file it stands in, as the user named it, if it stands in a file.</param>
/// <param name="Line">Line in that file, counted from 1.</param>
/// <param name="Column">Column in that line, counted from 1.</param>
/// <param name="Key">The key of the plan file, such as <c>layout.spacing</c>, or a place such as <c>feature 3, ring 2, vertex 17</c>.</param>
public sealed record Problem(string Message, string? File = null, int? Line = null, int? Column = null, string? Key = null)
{
    /// <summary>The sentence as shown: <c>file:line:column: key: message</c>, leaving out what is not known.</summary>
    public override string ToString()
    {
        var place = File ?? "";
        if (Line is { } line)
        {
            place += Column is { } column ? $":{line}:{column}" : $":{line}";
        }

        var parts = new[] { place, Key ?? "", Message }.Where(part => part.Length > 0);
        return string.Join(": ", parts);
    }
}

/// <summary>Severity of a <see cref="Notice"/>.</summary>
public enum NoticeKind
{
    /// <summary>Something in the input was mended; says what, where and by how much the area changed.</summary>
    Repair,

    /// <summary>Nothing was changed, and the user should look.</summary>
    Warning,
}

/// <summary>Something the user must be told although the work can go on.</summary>
public sealed record Notice(NoticeKind Kind, string Message);

/// <summary>The input, or the design it asks for, cannot work. Carries every problem found, never only the first.</summary>
public sealed class InputException : Exception
{
    public InputException(IEnumerable<Problem> problems)
        : this([.. problems])
    {
    }

    public InputException(params Problem[] problems)
        : base(string.Join('\n', problems.Select(problem => problem.ToString())))
        => Problems = problems;

    public InputException(string message)
        : this(new Problem(message))
    {
    }

    public IReadOnlyList<Problem> Problems { get; }
}
