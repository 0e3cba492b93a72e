using CsCheck;
using SurveyPlanner.Files.Plans;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Files.Tests.Plans;

/// <summary>Whatever the text, it is read or refused with places; nothing else.</summary>
public class PlanFuzzTests
{
    private static readonly string[] NastyValues =
    [
        "", "5", "-1", "0", "1e308", "nan", "-inf", "[]", "[[1]]", "{}", "{ a = 1 }", "true", "1979-05-27", "07:32:00", "\"\"", "\" \"", "\"💥\"", "\"5\"", "\"-5 km\"", "\"1e999 km\"",
        "\"1,5 km\"", "\"5 parsec\"", "\"\\u0000\"", "'''a\nb'''", "0x10", "1_0", "[\"a\", 1]", "[\"a\", \"a\"]", "\"/\"", "9999999999999999999999", "5 km", "“x”", "20 %", "45°", "\"", "\"\\uD800\"",
    ];

    private static void ReadOrRefuse(string text, params string[] sets)
    {
        try
        {
            var plan = PlanFileReader.Parse(text, "a.toml", sets);
            Assert.Equal(plan.CanonicalText, PlanFileReader.Parse(plan.CanonicalText, "a.toml", []).CanonicalText);
        }
        catch (InputException exception)
        {
            // Two more than line feeds: the last line, and carriage returns alone count as line ends.
            var lines = text.Count(c => c is '\n' or '\r') + 1;
            Assert.NotEmpty(exception.Problems);
            foreach (var problem in exception.Problems)
            {
                Assert.True(problem is { File: "a.toml" } ? problem.Line is { } line && line >= 1 && line <= lines && problem.Column >= 1 : problem.File == "--set", problem.ToString());
                Assert.DoesNotContain(problem.ToString(), char.IsControl);
                Assert.InRange(problem.Message.Length, 5, 600);
                Assert.InRange(problem.ToString().Length, 5, 700);
            }
        }
    }

    [Fact]
    public void A_damaged_plan_is_read_or_refused_with_places() => Mutations.Of(SamplePlans.Full).Hold(800, seed: 1, text => ReadOrRefuse(text));

    [Fact]
    public void Any_text_at_all_is_read_or_refused_with_places() => Gen.String.Hold(1000, seed: 1, text => ReadOrRefuse(text));

    [Fact]
    public void A_plan_cut_short_at_any_place_is_read_or_refused_with_places()
    {
        for (var length = 0; length <= SamplePlans.Full.Length; length++)
        {
            ReadOrRefuse(SamplePlans.Full[..length]);
        }
    }

    [Fact]
    public void Any_value_of_any_key_is_read_or_refused_with_places()
    {
        foreach (var key in PlanKeys.All)
        {
            foreach (var value in NastyValues)
            {
                var table = key.Table == "stratum" ? "stratum.x" : key.Table;
                ReadOrRefuse($"{SamplePlans.Least}\n{table}.{key.Name} = {value}\n");
                ReadOrRefuse($"[{table}]\n{key.Name} = {value}\n");
                ReadOrRefuse(SamplePlans.Least, $"{table}.{key.Name}={value}");
            }
        }
    }

    [Fact]
    public void Any_override_is_read_or_refused()
        => Mutations.Of("stratum.\"inner bay\".spacing = \"4 km\"").Hold(600, seed: 1, set => ReadOrRefuse(SamplePlans.Full, set));

    [Theory]
    [InlineData('[')]
    [InlineData('{')]
    [InlineData('"')]
    [InlineData('.')]
    [InlineData('a')]
    public void A_hundred_thousand_of_the_same_character_are_refused(char character)
    {
        ReadOrRefuse("a = " + new string(character, 100_000));
        ReadOrRefuse(new string(character, 100_000) + " = 1");
    }

    [Theory]
    [InlineData("a = 1\n")]
    [InlineData("[stratum.a]\nspacng = 1\n")]
    [InlineData("layout.x = [\n")]
    [InlineData("\n")]
    public void Ten_thousand_of_the_same_line_are_refused_with_no_more_problems_than_anyone_reads(string line)
    {
        var text = string.Concat(Enumerable.Repeat(line, 10_000));
        ReadOrRefuse(text);
        Assert.InRange(Assert.Throws<InputException>(() => PlanFileReader.Parse(text, "a.toml", [])).Problems.Count, 1, 201);
    }
}
