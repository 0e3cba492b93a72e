using SurveyPlanner.Files.Folders;

namespace SurveyPlanner.Files.Tests.Folders;

public sealed class OneFileTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_file_is_written_over_what_was_there_and_nothing_else_is_left()
    {
        OneFile.Write(_folder.At("plan.toml"), "one");
        OneFile.Write(_folder.At("plan.toml"), "zwei Höfe");

        Assert.Equal(["plan.toml"], _folder.Entries);
        Assert.Equal("zwei Höfe"u8.ToArray(), File.ReadAllBytes(_folder.At("plan.toml")));
    }

    [Fact]
    public void What_cannot_be_written_is_one_sentence_and_leaves_nothing()
    {
        Directory.CreateDirectory(_folder.At("folder"));
        File.CreateSymbolicLink(_folder.At("link"), _folder.At("elsewhere"));
        var before = _folder.Entries;

        foreach (var path in new[] { _folder.At("folder"), _folder.At("link"), _folder.At("no", "plan.toml") })
        {
            var trouble = Assert.Throws<IOException>(() => OneFile.Write(path, "x"));
            Assert.Contains(path, trouble.Message, StringComparison.Ordinal);
            Assert.DoesNotContain("\n", trouble.Message, StringComparison.Ordinal);
        }

        Assert.Contains("is a folder", Assert.Throws<IOException>(() => OneFile.Write(_folder.At("folder"), "x")).Message, StringComparison.Ordinal);
        Assert.Contains("has no name", Assert.Throws<IOException>(() => OneFile.Write("", "x")).Message, StringComparison.Ordinal);
        Assert.Equal(before, _folder.Entries);
    }
}
