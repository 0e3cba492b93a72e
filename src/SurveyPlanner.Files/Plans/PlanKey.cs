using SurveyPlanner.Files.Units;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Plans;

/// <summary>Keys of one group answer the same question: exactly one of them is needed, and a stratum's answer replaces the common one.</summary>
internal enum KeyGroup
{
    None,

    /// <summary>How much effort: spacing, a number, a total length, the target precision.</summary>
    Sizing,

    /// <summary>How far out animals count: the half-width of lines, the radius of points.</summary>
    Reach,
}

/// <summary>One key of the plan file: everything the reader, the messages and the documentation know of it.</summary>
internal abstract class PlanKey(string table, string name, string example, string doc)
{
    public string Table { get; } = table;

    public string Name { get; } = name;

    /// <summary>A right value as TOML.</summary>
    public string Example { get; } = example;

    /// <summary>What it means, one line.</summary>
    public string Doc { get; } = doc;

    /// <summary>The kinds of layout it belongs to; null when it has nothing to do with kinds.</summary>
    public KindFilter? Kinds { get; init; }

    public KeyGroup Group { get; init; }

    /// <summary>Whether a layout of its kinds must have it, in <c>[layout]</c> or in the stratum.</summary>
    public bool IsRequired { get; init; }

    public abstract string Takes { get; }

    public abstract bool IsText { get; }

    /// <summary>What holds when the key is absent, boxed; null when nothing does.</summary>
    public object? Default { get; init; }

    /// <summary>The same as TOML.</summary>
    public string? DefaultText => Default is { } value ? Write(value) : null;

    public bool BelongsTo(LayoutKind kind) => Kinds is null || Kinds.Holds(kind);

    /// <summary>How the key is rightly written in a table.</summary>
    public Sample SampleIn(KeyPath table) => new(table.Add([Name]).ToString(), Example);

    public abstract Parsed<object> Read(SettingValue value, Sample sample);

    public abstract string Write(object value);

    /// <summary>A layout design with the value of this key in its place; keys of other tables leave it as it is.</summary>
    public abstract LayoutDesign Apply(object value, LayoutDesign design);
}

/// <summary>A key whose value is a <typeparamref name="T"/>.</summary>
internal sealed class PlanKey<T>(string table, string name, ValueReader<T> reader, string example, string doc)
    : PlanKey(table, name, example, doc)
    where T : notnull
{
    /// <summary>Where the value belongs in a layout design.</summary>
    public Func<LayoutDesign, T, LayoutDesign>? Into { get; init; }

    public override string Takes => reader.Takes;

    public override bool IsText => reader.IsText;

    public override Parsed<object> Read(SettingValue value, Sample sample)
        => reader.Read(value, sample).Then(good => Parsed.Ok<object>(good));

    public override string Write(object value) => reader.Write((T)value);

    public override LayoutDesign Apply(object value, LayoutDesign design) => Into?.Invoke(design, (T)value) ?? design;
}

/// <summary>What follows from a kind alone, as the core's design knows it.</summary>
internal static class KindFacts
{
    private static readonly LayoutDesign AnyDesign = new(default, new Sizing.Precision(), new Bearing.LongAxis(), HalfWidthMetres: 1);

    public static bool IsPoints(this LayoutKind kind) => (AnyDesign with { Kind = kind }).IsPoints;
}

/// <summary>A set of layout kinds with a name for messages.</summary>
internal sealed record KindFilter(string Words, Func<LayoutKind, bool> Holds)
{
    public static readonly KindFilter Any = new("every kind", _ => true);

    public static readonly KindFilter Lines = new("kinds made of lines", kind => !kind.IsPoints());

    public static readonly KindFilter Points = new("kinds made of points", kind => kind.IsPoints());

    /// <summary>The kinds named.</summary>
    public static KindFilter Only(params LayoutKind[] kinds)
        => new(WordList.And(kinds.Select(kind => ChoiceWord.Of(kind))), kinds.Contains);
}
