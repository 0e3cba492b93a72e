using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Tests.Folders;

public sealed class OutputFolderTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    private string Target => _folder.At("out");

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void A_folder_is_written_with_exactly_its_files()
    {
        Write(Target, Files("one"), force: false);

        Assert.Equal(["out", "out/summary.json", "out/transects.gpx", "out/waypoints.csv"], _folder.Entries);
        Assert.Equal("one", Content());
    }

    [Fact]
    public void A_path_with_a_slash_at_its_end_is_the_same_folder()
    {
        Write(Target + "/", Files("one"), force: false);

        Assert.Equal("one", Content());
    }

    [Fact]
    public void An_existing_folder_is_refused_without_force_and_replaced_with_it()
    {
        Write(Target, Files("one"), force: false);

        Refused("exists already", () => Write(Target, Files("two"), force: false));
        Refused("exists already", () => Check(Target, force: false));
        Assert.Equal("one", Content());

        Check(Target, force: true);
        Write(Target, [new OutputFile("summary.json", "two"u8.ToArray())], force: true);
        Assert.Equal(["out", "out/summary.json"], _folder.Entries);
        Assert.Equal("two", Content());
    }

    [Theory]
    [InlineData("photo.jpg")]
    [InlineData(".hidden")]
    [InlineData("Summary.json")]
    public void A_folder_with_a_foreign_file_is_never_replaced(string foreign)
    {
        Write(Target, Files("one"), force: false);
        File.WriteAllText(Path.Combine(Target, foreign), "mine");

        Refused(foreign, () => Write(Target, Files("two"), force: true));
        Refused("did not write", () => Check(Target, force: true));
        Assert.Equal("one", Content());
        Assert.Equal("mine", File.ReadAllText(Path.Combine(Target, foreign)));
    }

    [Fact]
    public void A_folder_with_a_folder_or_a_link_in_it_is_never_replaced()
    {
        Directory.CreateDirectory(Path.Combine(Target, "summary.json"));
        Refused("summary.json", () => Write(Target, Files("two"), force: true));

        Directory.Delete(Path.Combine(Target, "summary.json"));
        File.WriteAllText(_folder.At("elsewhere"), "mine");
        File.CreateSymbolicLink(Path.Combine(Target, "summary.json"), _folder.At("elsewhere"));
        Refused("summary.json", () => Write(Target, Files("two"), force: true));
        Assert.Equal("mine", File.ReadAllText(_folder.At("elsewhere")));
    }

    [Fact]
    public void A_file_a_link_a_root_and_a_missing_parent_are_refused()
    {
        File.WriteAllText(_folder.At("file"), "mine");
        Directory.CreateDirectory(_folder.At("real"));
        Directory.CreateSymbolicLink(_folder.At("link"), _folder.At("real"));
        Directory.CreateSymbolicLink(_folder.At("dangling"), _folder.At("nowhere"));
        var before = _folder.Entries;

        Refused("is a file", () => Write(_folder.At("file"), Files("x"), force: true));
        Refused("is a link", () => Write(_folder.At("link"), Files("x"), force: true));
        Refused("is a link", () => Write(_folder.At("link") + "/", Files("x"), force: true));
        Refused("is a link", () => Write(_folder.At("dangling"), Files("x"), force: false));
        Refused("is a file, not a folder", () => Write(_folder.At("file", "no", "out"), Files("x"), force: false));
        Refused("root of a disk", () => Write("/", Files("x"), force: true));
        Refused("no name", () => Write("", Files("x"), force: true));
        Refused("no name", () => Write("a\0b", Files("x"), force: true));
        Assert.Equal(before, _folder.Entries);
        Assert.Equal("mine", File.ReadAllText(_folder.At("file")));
    }

    [Theory]
    [InlineData("../summary.json")]
    [InlineData("a/b")]
    [InlineData("a\\b")]
    [InlineData("..")]
    [InlineData("")]
    [InlineData("SUMMARY.JSON")]
    public void A_file_name_that_leads_elsewhere_or_comes_twice_is_our_fault(string name)
    {
        Assert.Throws<ArgumentException>(() => Write(Target, [.. Files("x"), new OutputFile(name, default)], force: false));
        Assert.Empty(_folder.Entries);
    }

    [Theory]
    [InlineData(false, false)]
    [InlineData(true, false)]
    [InlineData(false, true)]
    [InlineData(true, true)]
    public void Whatever_step_fails_the_folder_is_whole_old_or_new_and_the_next_run_works(bool replaces, bool forGood)
    {
        // SQLite's way (its testing page): fail the first step, then the second, until a run meets no failure.
        for (var failAt = 1; ; failAt++)
        {
            using var folder = new TemporaryFolder();
            var target = folder.At("out");
            if (replaces)
            {
                Write(target, Files("old"), force: false);
            }

            var disk = new FailingDisk(failAt, forGood);
            var failed = Record.Exception(() => Write(target, Files("new"), replaces, disk: disk));

            AssertWholeAfter(failed, target, folder, replaces, forGood);
            Write(target, Files("next"), force: replaces || failed is null);
            Assert.Equal(["out", "out/summary.json", "out/transects.gpx", "out/waypoints.csv"], folder.Entries);
            Assert.Equal("next", File.ReadAllText(Path.Combine(target, "summary.json")));
            if (disk.Steps < failAt)
            {
                // Make two folders, write three files, rename once or three times, delete.
                Assert.Equal(replaces ? 9 : 7, disk.Steps);
                return;
            }
        }
    }

    private static void AssertWholeAfter(Exception? failed, string target, TemporaryFolder folder, bool replaces, bool forGood)
    {
        if (failed is not null)
        {
            Assert.IsType<IOException>(failed);
            Assert.Contains("the disk broke", failed.Message, StringComparison.Ordinal);
            Assert.DoesNotContain("\n", failed.Message, StringComparison.Ordinal);
        }

        var isThere = Directory.Exists(target);
        if (failed is null || isThere)
        {
            var content = Directory.GetFiles(target).Select(File.ReadAllText).Distinct().ToList();
            Assert.Equal([failed is null ? "new" : "old"], content);
            Assert.Equal(3, Directory.GetFiles(target).Length);
            return;
        }

        // A disk that broke for good between the two renames: the old files wait beside, and the next run brings them back.
        Assert.True(!replaces || forGood);
        Assert.True(!replaces || folder.Entries.Any(entry => entry.EndsWith("/old/summary.json", StringComparison.Ordinal)));
    }

    [Fact]
    public void What_a_dead_run_moved_aside_is_put_back()
    {
        var old = _folder.At(".out.work-999-0123abcd", "old");
        Directory.CreateDirectory(old);
        File.WriteAllText(Path.Combine(old, "summary.json"), "old");
        File.WriteAllText(_folder.At(".out.work-999-0123abcd", "lock"), "");

        Refused("exists already", () => Check(Target, force: false));
        Assert.Equal(["out", "out/summary.json"], _folder.Entries);
    }

    [Fact]
    public void Folders_that_only_look_like_ours_are_left_alone()
    {
        string[] lookalikes = [".out.work-", ".out.work-1-XYZ", ".out.work-1-0123abcdef", ".other.work-1-0123abcd", "out.work-1-0123abcd"];
        Array.ForEach(lookalikes, name => Directory.CreateDirectory(_folder.At(name)));

        Write(Target, Files("one"), force: false);

        Assert.All(lookalikes, name => Assert.True(Directory.Exists(_folder.At(name)), name));
    }

    [Fact]
    public void A_run_that_meets_another_at_work_is_told_its_process()
    {
        using (WorkFolder.Begin(new Disk(), Target))
        {
            Refused($"process {Environment.ProcessId}", () => Write(Target, Files("x"), force: false));
        }

        Assert.Empty(_folder.Entries);
    }

    [Fact]
    public void A_second_run_is_told_before_its_work_and_the_first_goes_on()
    {
        using (var first = OutputFolder.Reserve(Target, force: false, TestContext.Current.CancellationToken))
        {
            Refused($"another run (process {Environment.ProcessId}) is at work on it now", () => Check(Target, force: false));
            Refused("at work on it now", () => Check(Target, force: true));
            first.Write(Files("one"));
        }

        Refused("exists already", () => Check(Target, force: false));
        Check(Target, force: true);
        Assert.Equal(["out", "out/summary.json", "out/transects.gpx", "out/waypoints.csv"], _folder.Entries);
    }

    [Fact]
    public void Folders_above_are_made_and_taken_away_again_unless_something_is_written()
    {
        Directory.CreateDirectory(_folder.At("a"));
        var target = _folder.At("a", "b", "c", "out");
        Check(target, force: false);
        Assert.Equal(["a"], _folder.Entries);

        Write(target, Files("one"), force: false);
        Assert.Equal(3, Directory.GetFiles(target).Length);
    }

    [Fact]
    public void A_folder_that_came_to_be_in_the_meantime_is_not_written_over()
    {
        using (var folder = OutputFolder.Reserve(Target, force: false, TestContext.Current.CancellationToken))
        {
            Directory.CreateDirectory(Target);
            Refused("exists already", () => folder.Write(Files("x")));
        }

        Assert.Equal(["out"], _folder.Entries);
    }

    [Fact]
    public void Stopping_lets_go_at_once_whatever_the_run_is_at()
    {
        using var stop = new CancellationTokenSource();
        using var folder = OutputFolder.Reserve(_folder.At("new", "out"), force: false, stop.Token);
        Assert.NotEmpty(_folder.Entries);
        stop.Cancel();

        Assert.Empty(_folder.Entries);
        Assert.Throws<OperationCanceledException>(() => folder.Write(Files("x")));
        Assert.Empty(_folder.Entries);
    }

    /// <summary>The kernel's own tree takes no folder, not even from root (proc(5)).</summary>
    [Fact]
    public void A_place_that_takes_no_folder_is_one_sentence()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "needs /proc");
        Refused("Cannot write /proc/x: the system lets nothing be made there", () => Check("/proc/x", force: false));
        Refused("Cannot write /proc/x/y: the system lets nothing be made there", () => Check("/proc/x/y", force: false));
        Refused("Cannot write /proc/x.svg: the system lets nothing be made there", () => OneFile.Write("/proc/x.svg", "x"));
        Refused("the name is too long", () => Check(_folder.At(new string('x', 300)), force: false));
    }

    [Fact]
    public void Cancelling_leaves_nothing()
    {
        using var cancellation = new CancellationTokenSource();
        cancellation.Cancel();

        Assert.Throws<OperationCanceledException>(() => Write(Target, Files("x"), force: false, cancellation.Token));
        Assert.Empty(_folder.Entries);
    }

    [Fact]
    public async Task Of_many_runs_at_once_one_wins_whole_and_the_others_are_refused()
    {
        for (var round = 0; round < 10; round++)
        {
            var target = _folder.At("out" + round);
            var runs = Enumerable.Range(0, 8).Select(run => Task.Run(() => Record.Exception(
                () => Write(target, Files($"run {run}"), force: false)))).ToArray();
            var outcomes = await Task.WhenAll(runs);

            Assert.True(outcomes.Count(outcome => outcome is null) <= 1);
            Assert.All(outcomes.OfType<Exception>(), outcome => Assert.IsType<IOException>(outcome));
            Assert.Equal(outcomes.Any(outcome => outcome is null), Directory.Exists(target));
            if (Directory.Exists(target))
            {
                Assert.Single(Directory.GetFiles(target).Select(File.ReadAllText).Distinct());
            }
        }

        Assert.DoesNotContain(_folder.Entries, entry => entry.StartsWith('.'));
    }

    [Fact]
    public async Task Of_many_runs_with_force_the_folder_is_always_one_of_theirs()
    {
        Write(Target, Files("first"), force: false);
        for (var round = 0; round < 10; round++)
        {
            var runs = Enumerable.Range(0, 8).Select(run => Task.Run(() => Record.Exception(
                () => Write(Target, Files($"run {run}"), force: true)))).ToArray();
            var outcomes = await Task.WhenAll(runs);

            Assert.All(outcomes.OfType<Exception>(), outcome => Assert.IsType<IOException>(outcome));
            Assert.Single(Directory.GetFiles(Target).Select(File.ReadAllText).Distinct());
            Assert.Equal(3, Directory.GetFiles(Target).Length);
        }

        Assert.DoesNotContain(_folder.Entries, entry => entry.StartsWith('.'));
    }

    [Theory]
    [InlineData(28, "the disk is full")]
    [InlineData(30, "read-only")]
    [InlineData(27, "a file of that size")]
    [InlineData(122, "share of the disk")]
    public void What_the_system_says_becomes_a_plain_sentence(int errorNumber, string expected)
    {
        // Numbers of errno on Linux: ENOSPC 28, EROFS 30, EFBIG 27, EDQUOT 122 (errno.h).
        var sentence = DiskTrouble.Unwritten("Cannot write out", new IOException("No space left on device : '/x'", errorNumber)).Message;

        Assert.StartsWith("Cannot write out: ", sentence, StringComparison.Ordinal);
        Assert.Contains(expected, sentence, StringComparison.Ordinal);
    }

    private static void Check(string path, bool force) => OutputFolder.Reserve(path, force, TestContext.Current.CancellationToken).Dispose();

    private static void Write(string path, IReadOnlyCollection<OutputFile> files, bool force, CancellationToken? stop = null, IDisk? disk = null)
    {
        using var folder = OutputFolder.Reserve(path, force, disk ?? new Disk(), stop ?? TestContext.Current.CancellationToken);
        folder.Write(files);
    }

    private static OutputFile[] Files(string content) => EndlessWriter.Files(content);

    private string Content() => File.ReadAllText(Path.Combine(Target, "summary.json"));

    private static void Refused(string expected, Action action)
    {
        var refusal = Assert.Throws<IOException>(action);
        Assert.Contains(expected, refusal.Message, StringComparison.Ordinal);
        Assert.DoesNotContain("\n", refusal.Message, StringComparison.Ordinal);
    }
}
