namespace SurveyPlanner.Files.Tests.Folders;

public sealed class KilledRunTests
{
    [Fact]
    public void A_run_killed_at_any_moment_leaves_a_whole_folder_and_the_next_run_clears_up()
    {
        // Milliseconds after the first writing; a writing takes a few, so these fall anywhere in it.
        foreach (var delay in new[] { 0, 1, 2, 3, 5, 7, 11, 13, 17, 19, 23, 29 })
        {
            using var folder = new TemporaryFolder();
            var target = folder.At("out");
            using (var child = EndlessWriter.Start(target))
            {
                Thread.Sleep(delay);
                child.Kill();
                child.WaitForExit();
            }

            // Killed between its two renames it leaves the old folder, whole, in its work folder.
            var whole = Directory.Exists(target) ? target : Directory.GetDirectories(folder.Path, "*").Select(work => Path.Combine(work, "old")).Single();
            Assert.Equal(EndlessWriter.Names.Order(), Directory.GetFiles(whole).Select(Path.GetFileName).Order());
            Assert.Equal(20_000, Assert.Single(Directory.GetFiles(whole).Select(File.ReadAllText).Distinct()).Length);

            EndlessWriter.Write(target, EndlessWriter.Files("next"));
            Assert.Equal(["out", .. EndlessWriter.Names.Select(name => "out/" + name).Order()], folder.Entries);
        }
    }
}
