namespace SurveyPlanner.Files.Units;

/// <summary>A value read from text, or the sentence that says why it could not be read and how to mend it.</summary>
internal readonly record struct Parsed<T>(T? Value, string? Complaint)
{
    public bool IsGood => Complaint is null;

    /// <summary>The value of a good reading.</summary>
    public T Good => IsGood ? Value! : throw new InvalidOperationException(Complaint);

    public Parsed<TOut> Then<TOut>(Func<T, Parsed<TOut>> next) => IsGood ? next(Value!) : new Parsed<TOut>(default, Complaint);
}

internal static class Parsed
{
    public static Parsed<T> Ok<T>(T value) => new(value, null);

    public static Parsed<T> Bad<T>(string complaint) => new(default, complaint);
}
