namespace SurveyPlanner.Cli.Tests;

public class TextTableTests
{
    [Theory]
    [InlineData(0, "0")]
    [InlineData(0.000281, "0.000281")]
    [InlineData(0.00364, "0.00364")]
    [InlineData(0.0240, "0.0240")]
    [InlineData(0.133, "0.133")]
    [InlineData(-2.5, "-2.50")]
    [InlineData(12345.6, "12,346")]
    [InlineData(1e-15, "0.000000000")]
    public void Figures_have_three_digits_that_count(double value, string expected) => Assert.Equal(expected, TextTable.Figure(value));

    [Fact]
    public void Long_names_keep_their_end_and_no_character_is_cut_in_two()
    {
        using var output = new StringWriter();
        var table = new TextTable("stratum", "km");
        table.Add("Northern waters of the great firth, west", "1");
        table.Add("Northern waters of the great firth, east", "+12");
        table.Add(string.Concat(Enumerable.Repeat("😀", 30)), "3");
        table.Write(output);

        var lines = output.ToString().ReplaceLineEndings("\n").Split('\n');
        Assert.StartsWith("Northern waters…th, west", lines[1], StringComparison.Ordinal);
        Assert.StartsWith("Northern waters…th, east", lines[2], StringComparison.Ordinal);
        Assert.StartsWith(string.Concat(Enumerable.Repeat("😀", 15)) + "…" + string.Concat(Enumerable.Repeat("😀", 8)), lines[3], StringComparison.Ordinal);
        Assert.EndsWith("  1", lines[1], StringComparison.Ordinal);
        Assert.EndsWith("+12", lines[2], StringComparison.Ordinal);
    }
}
