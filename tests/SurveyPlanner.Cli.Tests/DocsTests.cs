using SurveyPlanner.Layouts;
using SurveyPlanner.Pages;

namespace SurveyPlanner.Cli.Tests;

/// <summary>README and docs are run: every command in a <c>sh</c> block, in the order of its page, in a copy of the repository's samples.</summary>
public class DocsTests
{
    private const string DotnetRun = "dotnet run --project src/SurveyPlanner.Cli -- ";

    public static TheoryData<string> Pages =>
    [
        .. Directory.EnumerateFiles(ReferenceData.Root, "*.md")
            .Concat(Directory.EnumerateFiles(Path.Combine(ReferenceData.Root, "docs"), "*.md", SearchOption.AllDirectories))
            .Concat(Directory.EnumerateFiles(Path.Combine(ReferenceData.Root, "sample-regions"), "*.md", SearchOption.AllDirectories))
            .Where(page => Commands(page).Any())
            .Select(page => Path.GetRelativePath(ReferenceData.Root, page))
            .Order(StringComparer.Ordinal),
    ];

    [Theory]
    [MemberData(nameof(Pages))]
    public void Every_command_of_the_page_works(string page)
    {
        using var work = new Workspace();
        work.CopySamples();
        var here = Directory.GetCurrentDirectory();
        Directory.SetCurrentDirectory(work.Folder);
        try
        {
            foreach (var command in Commands(Path.Combine(ReferenceData.Root, page)))
            {
                var run = ProgramRun.Of([.. Words(command).Skip(1)]);
                Assert.True(run.ExitCode == 0, $"{command}\n{run.Error}");
            }
        }
        finally
        {
            Directory.SetCurrentDirectory(here);
        }
    }

    [Fact]
    public void Every_layout_kind_and_the_words_of_its_keys_stand_in_the_glossary()
    {
        var terms = File.ReadLines(Path.Combine(ReferenceData.Root, "docs", "glossary.md"))
            .Where(line => line.StartsWith("| ", StringComparison.Ordinal)).Select(line => line.Split('|')[1].Trim()).ToArray();
        var kinds = Enum.GetValues<LayoutKind>().Select(kind => ChoiceWord.Of(kind).Replace('-', ' '));
        Assert.All(
            kinds.Concat(["placement", "crossing", "reserve", "crossed", "spacing", "radius", "allocation", "assurance"]),
            word => Assert.Contains(terms, term => term.StartsWith(word, StringComparison.Ordinal)));
    }

    [Fact]
    public void The_readme_shows_the_two_commands_and_the_picture_first()
    {
        var readme = File.ReadAllText(Path.Combine(ReferenceData.Root, "README.md"));
        var job = readme.IndexOf(DotnetRun + "plan sample-regions/", StringComparison.Ordinal);
        var tests = readme.IndexOf("\ndotnet test\n", StringComparison.Ordinal);
        var picture = readme.IndexOf("![", StringComparison.Ordinal);
        Assert.True(job > 0 && job < tests && tests < picture);
    }

    /// <summary>
    /// The picture in the README is what the program draws. To renew it, run this test with SURVEY_PLANNER_RENEW=1 and look at it.
    /// </summary>
    [Fact]
    public void The_picture_in_the_readme_is_what_the_program_draws()
    {
        var file = Path.Combine(ReferenceData.Root, "docs", "images", "sea-ducks-map.svg");
        var loaded = LoadedPlan.Read(Path.Combine(ReferenceData.Root, "sample-regions", "sea-ducks-sound", "plan.toml"), []);
        var plan = PlanSurvey.DrawOnly(loaded.Design, loaded.Inputs);
        var drawn = MapRenderer.RenderSvg(plan, new ReportContext("plan.toml", "draw 1 of 1", DrawnPlan.Version));
        if (Environment.GetEnvironmentVariable("SURVEY_PLANNER_RENEW") == "1")
        {
            File.WriteAllText(file, drawn);
        }

        Assert.Equal(File.ReadAllText(file), drawn);
    }

    [Fact]
    public void The_readme_names_every_command()
    {
        var readme = File.ReadAllText(Path.Combine(ReferenceData.Root, "README.md"));
        var commands = Application.Root(new Terminal(TextWriter.Null, TextWriter.Null, false)).Subcommands;
        Assert.All(commands, command => Assert.Contains($"| `{command.Name} ", readme, StringComparison.Ordinal));
    }

    /// <summary>Lines of sh blocks that call the program, either by name or by dotnet run.</summary>
    private static IEnumerable<string> Commands(string page)
    {
        var inside = false;
        foreach (var line in File.ReadLines(page).Select(line => line.Trim()))
        {
            inside = line.StartsWith("```", StringComparison.Ordinal) ? line == "```sh" : inside;
            var command = line.StartsWith(DotnetRun, StringComparison.Ordinal) ? "survey-planner " + line[DotnetRun.Length..] : line;
            if (inside && command.StartsWith("survey-planner ", StringComparison.Ordinal))
            {
                yield return command;
            }
        }
    }

    /// <summary>As a shell splits them: blanks outside double quotes.</summary>
    private static IEnumerable<string> Words(string command)
    {
        var (word, quoted) = ("", false);
        foreach (var c in command.Append(' '))
        {
            if (c == '"')
            {
                quoted = !quoted;
            }
            else if (c == ' ' && !quoted)
            {
                if (word.Length > 0)
                {
                    yield return word;
                }

                word = "";
            }
            else
            {
                word += c;
            }
        }
    }
}
