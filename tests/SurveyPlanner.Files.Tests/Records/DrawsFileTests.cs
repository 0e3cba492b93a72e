using SurveyPlanner.Files.Records;
using SurveyPlanner.Files.Tests.Folders;

namespace SurveyPlanner.Files.Tests.Records;

public sealed class DrawsFileTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private string Plan => _folder.At("sound.toml");

    private string Draws => _folder.At("sound.draws.jsonl");

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void Draws_of_a_plan_are_counted_and_the_same_seed_is_the_same_draw()
    {
        Assert.Equal("draw 1 of 1", Add(seed: 1).ToString());
        Assert.Equal("draw 2 of 2", Add(seed: 2, reason: "the boat changed").ToString());
        Assert.Equal(new DrawNumber(1, 2, 2), Add(seed: 1));
        Assert.Equal(new DrawNumber(2, 2, 2, "the boat changed"), Add(seed: 2, reason: "another reason"));
        Assert.Equal(2, File.ReadAllLines(Draws).Length);
    }

    [Fact]
    public void Another_plan_in_the_same_file_counts_for_itself_and_in_the_total()
    {
        Add(seed: 1);
        Assert.Equal(new DrawNumber(1, 1, 2), Add(seed: 1, plan: "b"));
        Assert.Equal(new DrawNumber(2, 2, 3), Add(seed: 2));
    }

    [Fact]
    public void The_same_seed_with_another_layout_is_another_draw_for_the_boundary_was_changed()
    {
        Add(seed: 1, layout: "x");
        Assert.Equal(new DrawNumber(2, 2, 2), Add(seed: 1, layout: "y"));
    }

    [Fact]
    public void A_line_is_as_documented()
    {
        Add(seed: ulong.MaxValue, reason: "wind & \"weather\"\nbad");

        Assert.Equal(
            "{\"plan_sha256\":\"a\",\"seed\":18446744073709551615,\"layout_sha256\":\"x\",\"reason\":\"wind \\u0026 \\u0022weather\\u0022\\nbad\"}\n",
            File.ReadAllText(Draws));
    }

    [Fact]
    public void A_draw_whose_outputs_were_not_written_is_taken_back()
    {
        using (DrawsFile.Add(Plan, new Draw("a", 1, "x")))
        {
            Assert.True(File.Exists(Draws));
        }

        Assert.False(File.Exists(Draws));
        Add(seed: 1);
        var before = File.ReadAllText(Draws);
        DrawsFile.Add(Plan, new Draw("a", 2, "x")).Dispose();
        Assert.Equal(before, File.ReadAllText(Draws));
        DrawsFile.Add(Plan, new Draw("a", 1, "x")).Dispose();
        Assert.Equal(before, File.ReadAllText(Draws));
    }

    [Fact]
    public void A_last_line_torn_off_by_a_dead_run_is_no_draw_and_does_not_spoil_the_next()
    {
        Add(seed: 1);
        var whole = File.ReadAllText(Draws);
        for (var length = 0; length < whole.Length - 1; length++)
        {
            File.WriteAllText(Draws, whole + whole[..length]);
            Assert.Equal(new DrawNumber(2, 2, 2), Add(seed: 2));
            Assert.Equal(2, File.ReadAllLines(Draws).Length);
        }
    }

    [Fact]
    public void A_last_line_that_lacks_only_its_end_counts()
    {
        Add(seed: 1);
        File.WriteAllText(Draws, File.ReadAllText(Draws).TrimEnd('\n'));

        Assert.Equal(new DrawNumber(2, 2, 2), Add(seed: 2));
        Assert.Equal(2, File.ReadAllLines(Draws).Length);
    }

    [Fact]
    public void A_line_that_is_no_draw_is_named_by_its_number()
    {
        Add(seed: 1);
        File.AppendAllText(Draws, "\n{\"seed\":2}\n");
        var before = File.ReadAllText(Draws);

        var trouble = Assert.Throws<InputException>(() => DrawsFile.Add(Plan, new Draw("a", 3, "x")));

        Assert.Equal(3, Assert.Single(trouble.Problems).Line);
        Assert.Equal(before, File.ReadAllText(Draws));
    }

    [Fact]
    public void A_link_a_folder_and_a_missing_place_are_refused()
    {
        File.WriteAllText(_folder.At("elsewhere"), "");
        File.CreateSymbolicLink(Draws, _folder.At("elsewhere"));
        Assert.Contains("is a link", Assert.Throws<IOException>(() => DrawsFile.Add(Plan, new Draw("a", 1, "x"))).Message, StringComparison.Ordinal);

        File.Delete(Draws);
        Directory.CreateDirectory(Draws);
        Assert.Throws<IOException>(() => DrawsFile.Add(Plan, new Draw("a", 1, "x")));
        Assert.Throws<IOException>(() => DrawsFile.Add(_folder.At("no", "plan.toml"), new Draw("a", 1, "x")));
    }

    [Fact]
    public async Task Runs_at_once_get_different_numbers()
    {
        var runs = Enumerable.Range(0, 16).Select(seed => Task.Run(() => Add((ulong)seed).Number)).ToArray();

        var numbers = await Task.WhenAll(runs);

        Assert.Equal(Enumerable.Range(1, 16), numbers.Order());
        Assert.Equal(16, File.ReadAllLines(Draws).Length);
    }

    private DrawNumber Add(ulong seed, string plan = "a", string layout = "x", string? reason = null)
    {
        using var file = DrawsFile.Add(Plan, new Draw(plan, seed, layout, reason));
        file.Keep();
        return file.Number;
    }
}
