using SurveyPlanner.Files.Plans;
using SurveyPlanner.Files.Tables;

namespace SurveyPlanner.Files.Tests.Plans;

/// <summary>The plan files that users copy from.</summary>
public class SamplePlanFilesTests
{
    public static TheoryData<string> Plans()
        => [.. Directory.EnumerateFiles(Path.Combine(ReferenceData.Root, "sample-regions"), "*.toml", SearchOption.AllDirectories).Order(StringComparer.Ordinal)];

    [Theory]
    [MemberData(nameof(Plans))]
    public void Every_sample_plan_reads_with_its_pilot(string path)
    {
        var plan = PlanFileReader.Read(path, []);
        Assert.True(plan.SeedGiven);
        var pilot = PilotTableReader.Read(plan.PilotTransectsPath!, plan.PilotDetectionsPath);
        Assert.Equal(plan.Design.Layout.IsPoints, pilot.IsPoints);
        Assert.Equal(pilot.Transects.Sum(transect => transect.Count), pilot.Detections.Length);
        Assert.Empty(pilot.Notices);
    }

    [Fact]
    public void A_file_that_is_not_there_is_told_with_its_place_and_the_nearest_name()
    {
        var folder = Directory.CreateTempSubdirectory("plan").FullName;
        try
        {
            var path = Path.Combine(folder, "plan.toml");
            File.WriteAllText(path, SamplePlans.Least);
            File.WriteAllText(Path.Combine(folder, "moors.geojson"), "{}");
            var problem = Assert.Single(Assert.Throws<InputException>(() => PlanFileReader.Read(path, [])).Problems);

            Assert.Equal((path, 2, 12, "region.boundary"), (problem.File, problem.Line, problem.Column, problem.Key));
            Assert.Equal($"there is no file \"moor.geojson\", looked for at \"{Path.Combine(folder, "moor.geojson")}\": did you mean moors.geojson?", problem.Message);
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    [Fact]
    public void A_plan_that_is_not_there_or_is_a_folder_is_told()
    {
        Assert.Equal("none.toml: there is no plan file of this name", Assert.Throws<InputException>(() => PlanFileReader.Read("none.toml", [])).Message);
        var folder = Path.GetTempPath();
        Assert.Equal($"{folder}: this is a folder, not a plan file", Assert.Throws<InputException>(() => PlanFileReader.Read(folder, [])).Message);
    }
}
