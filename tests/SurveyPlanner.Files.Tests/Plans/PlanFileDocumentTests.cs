using SurveyPlanner.Files.Plans;

namespace SurveyPlanner.Files.Tests.Plans;

/// <summary>docs/plan-file.md says what the program does.</summary>
public class PlanFileDocumentTests
{
    private static readonly string[] Document = File.ReadAllLines(Path.Combine(ReferenceData.Root, "docs", "plan-file.md"));

    /// <summary>The row of a key in the document's tables.</summary>
    private static string RowOf(PlanKey key)
    {
        var kinds = key.Kinds is { } filter && filter != KindFilter.Any ? $"({filter.Words}) " : "";
        var absent = key.DefaultText is { } text ? $"`{text}`" : "";
        return $"| `{key.Name}` | {key.Takes} | `{key.Example}` | {absent} | {kinds}{key.Doc} |";
    }

    [Fact]
    public void Every_key_has_its_row_under_its_table_and_there_are_no_other_rows()
    {
        var rows = new List<string>();
        var table = "";
        foreach (var line in Document)
        {
            if (line.StartsWith("## `[", StringComparison.Ordinal))
            {
                table = line[5..line.IndexOfAny(['.', ']'])];
            }
            else if (line.StartsWith("| `", StringComparison.Ordinal) && PlanKeys.Tables.Append("stratum").Contains(table))
            {
                rows.Add($"{table} {line}");
            }
        }

        var expected = PlanKeys.All.Select(key => $"{key.Table} {RowOf(key)}").ToArray();
        Assert.True(expected.SequenceEqual(rows), "docs/plan-file.md should have these rows, in this order:\n" + string.Join('\n', expected.Except(rows)));
    }

    [Fact]
    public void Its_example_reads_without_a_problem()
    {
        var start = Array.IndexOf(Document, "```toml");
        var text = string.Join('\n', Document.Skip(start + 1).TakeWhile(line => line != "```"));
        Assert.Equal("Example sound, sea ducks by boat", PlanFileReader.Parse(text, "example.toml", []).Design.Name);
    }

    [Fact]
    public void Every_example_of_a_key_reads_as_that_key()
    {
        foreach (var key in PlanKeys.All)
        {
            var value = TomlReader.Literal(key.Example);
            Assert.NotNull(value);
            Assert.Null(key.Read(value, key.SampleIn(new KeyPath([key.Table]))).Complaint);
        }
    }
}
