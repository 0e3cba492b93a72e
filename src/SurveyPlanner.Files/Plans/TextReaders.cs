using System.Collections.Immutable;
using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>Any text that says something.</summary>
internal sealed class TextReader : ValueReader<string>
{
    public override string Takes => "text in quotes";

    public override bool IsText => true;

    public override Parsed<string> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Text text when string.IsNullOrWhiteSpace(text.Value) => Parsed.Bad<string>($"is empty: write {sample}, or take the key out"),
        SettingValue.Text text => Parsed.Ok(text.Value),
        _ => WrongType(value, sample),
    };

    public override string Write(string value) => Quoted.Text(value);
}

/// <summary>The path of a file, as written: it is resolved against the plan's folder later.</summary>
internal sealed class PathReader : ValueReader<string>
{
    private readonly TextReader text = new();

    public override string Takes => "a path in quotes";

    public override bool IsText => true;

    public override Parsed<string> Read(SettingValue value, Sample sample)
    {
        if (value is not SettingValue.Text)
        {
            return WrongType(value, sample);
        }

        return text.Read(value, sample).Then(path => path.Any(char.IsControl)
            ? Parsed.Bad<string>($"{Quoted.Short(path)} holds a control character: no file is called so (a path with \\ stands in single quotes)")
            : Parsed.Ok(path));
    }

    public override string Write(string value) => text.Write(value);
}

/// <summary>One value, or a list of them in square brackets.</summary>
internal sealed class ListReader<T>(ValueReader<T> element) : ValueReader<ImmutableArray<T>>
{
    public override string Takes => $"{element.Takes}, or a list of such";

    public override bool IsText => element.IsText;

    public override Parsed<ImmutableArray<T>> Read(SettingValue value, Sample sample)
    {
        if (value is not SettingValue.List list)
        {
            return element.Read(value, sample).Then(single => Parsed.Ok(ImmutableArray.Create(single)));
        }

        if (list.Items.Length == 0)
        {
            return Parsed.Bad<ImmutableArray<T>>($"is an empty list: write {sample}, or take the key out");
        }

        var items = ImmutableArray.CreateBuilder<T>(list.Items.Length);
        for (var i = 0; i < list.Items.Length; i++)
        {
            var item = element.Read(list.Items[i], sample);
            if (item.Complaint is { } complaint)
            {
                return Parsed.Bad<ImmutableArray<T>>($"entry {i + 1}: {complaint}");
            }

            if (items.Contains(item.Good))
            {
                return Parsed.Bad<ImmutableArray<T>>($"entry {i + 1}: {list.Items[i].Shown} stands twice in the list");
            }

            items.Add(item.Good);
        }

        return Parsed.Ok(items.MoveToImmutable());
    }

    public override string Write(ImmutableArray<T> value) => "[" + string.Join(", ", value.Select(element.Write)) + "]";
}

/// <summary>One of the members of an enumeration, in the plan file's words.</summary>
internal sealed class ChoiceReader<T> : ValueReader<T>
    where T : struct, Enum
{
    private static readonly ImmutableArray<T> Members = [.. Enum.GetValues<T>()];

    public override string Takes => WordList.Or(Members.Select(member => Quoted.Text(ChoiceWord.Of(member))));

    public override bool IsText => true;

    public override Parsed<T> Read(SettingValue value, Sample sample)
    {
        if (value is not SettingValue.Text text)
        {
            return WrongType(value, sample);
        }

        foreach (var member in Members)
        {
            if (ChoiceWord.Of(member) == text.Value)
            {
                return Parsed.Ok(member);
            }
        }

        var words = Members.Select(member => ChoiceWord.Of(member)).ToArray();
        return Parsed.Bad<T>($"{Quoted.Short(text.Value)} is none of {WordList.And(words)}{Spelling.Hint(text.Value, words)}");
    }

    public override string Write(T value) => Quoted.Text(ChoiceWord.Of(value));
}
