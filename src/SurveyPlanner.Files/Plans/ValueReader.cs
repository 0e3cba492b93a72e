using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>How a key is rightly written, for messages: <c>layout.spacing = "5 km"</c>.</summary>
internal readonly record struct Sample(string Key, string Value)
{
    public override string ToString() => $"{Key} = {Value}";

    /// <summary>The same key with another value.</summary>
    public Sample With(string value) => this with { Value = value };
}

/// <summary>Reads one type of value: says what it takes, reads it, and writes it in one fixed form.</summary>
internal abstract class ValueReader<T>
{
    /// <summary>What it takes, for the documentation: <c>a length</c>.</summary>
    public abstract string Takes { get; }

    /// <summary>Whether it takes text, so that <c>--set key=45</c> needs no quotes inside quotes.</summary>
    public virtual bool IsText => false;

    public abstract Parsed<T> Read(SettingValue value, Sample sample);

    /// <summary>The value as TOML, the same for the same meaning: <c>5 km</c> and <c>5000 m</c> come out alike.</summary>
    public abstract string Write(T value);

    /// <summary>The sentence for a value of the wrong type.</summary>
    protected Parsed<T> WrongType(SettingValue value, Sample sample)
        => Parsed.Bad<T>($"{value.Shown} is not {Takes}: write {sample}");
}
