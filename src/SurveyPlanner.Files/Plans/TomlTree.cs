using System.Collections.Immutable;
using SurveyPlanner.Files.Units;
using Tomlyn.Syntax;

namespace SurveyPlanner.Files.Plans;

/// <summary>Walks a parsed TOML document: dotted keys and inline tables become plain paths.</summary>
internal sealed class TomlTree(string file, List<Problem> problems)
{
    public List<Setting> Settings { get; } = [];

    public List<TableHeader> Tables { get; } = [];

    public void Add(DocumentSyntax document)
    {
        var root = new KeyPath([]);
        foreach (var pair in document.KeyValues)
        {
            Add(root, pair);
        }

        foreach (var table in document.Tables)
        {
            var header = new TableHeader(new KeyPath(Segments(table.Name)), At(table.Span));
            if (table is TableArraySyntax)
            {
                problems.Add(header.Place.Problem($"write [{Quoted.Plain(header.Path.ToString())}] in single brackets: there is only one such table", header.Path.ToString()));
            }

            Tables.Add(header);
            foreach (var pair in table.Items)
            {
                Add(header.Path, pair);
            }
        }
    }

    /// <summary>Keys on lines that had to be left out count as present, so that nobody calls them missing.</summary>
    public void AddLeftOut(IEnumerable<(int Line, string Key)> leftOut)
    {
        foreach (var (line, key) in leftOut)
        {
            var table = Tables.LastOrDefault(header => header.Place.Line < line)?.Path ?? new KeyPath([]);
            var place = new Place(file, line, 1);
            Settings.Add(new Setting(table.Add([key]), new SettingValue.Unreadable(), place, place));
        }
    }

    public static SettingValue Convert(ValueSyntax value)
    {
        var raw = RawText(value);
        return value switch
        {
            StringValueSyntax text => new SettingValue.Text(text.Value ?? "", raw),
            IntegerValueSyntax whole => new SettingValue.Whole(whole.Value, raw),
            FloatValueSyntax number => new SettingValue.Number(number.Value, raw),
            BooleanValueSyntax truth => new SettingValue.YesNo(truth.Value, raw),
            ArraySyntax list => new SettingValue.List(
                [.. list.Items.Select(item => item.Value is { } element ? Convert(element) : new SettingValue.Other(raw))], raw),
            _ => new SettingValue.Other(raw),
        };
    }

    private void Add(KeyPath table, KeyValueSyntax pair)
    {
        var path = table.Add(Segments(pair.Key));
        if (pair.Value is InlineTableSyntax inline)
        {
            Tables.Add(new TableHeader(path, At(pair.Span)));
            foreach (var item in inline.Items)
            {
                if (item.KeyValue is { } inner)
                {
                    Add(path, inner);
                }
            }
        }
        else if (pair.Value is { } value)
        {
            Settings.Add(new Setting(path, Convert(value), At(pair.Span), At(value.Span)));
        }
    }

    private Place At(SourceSpan span) => new(file, span.Start.Line + 1, span.Start.Column + 1);

    private static ImmutableArray<string> Segments(KeySyntax? key)
        => key is null ? [] : [Segment(key.Key), .. key.DotKeys.Select(dotted => Segment(dotted.Key))];

    private static string Segment(BareKeyOrStringValueSyntax? segment) => segment switch
    {
        BareKeySyntax bare => bare.Key?.Text ?? "",
        StringValueSyntax text => text.Value ?? "",
        _ => "",
    };

    /// <summary>The value as written, without the comment that may follow it.</summary>
    private static string RawText(ValueSyntax value) => value switch
    {
        StringValueSyntax text => text.Token?.Text ?? "",
        IntegerValueSyntax whole => whole.Token?.Text ?? "",
        FloatValueSyntax number => number.Token?.Text ?? "",
        BooleanValueSyntax truth => truth.Token?.Text ?? "",
        DateTimeValueSyntax date => date.Token?.Text ?? "",
        _ => value.ToString()?.Trim() ?? "",
    };
}
