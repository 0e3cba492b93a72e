using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Tests.Fixtures;

namespace SurveyPlanner.Pages.Tests;

/// <summary>Writes pages to a folder to be looked at; does nothing unless SURVEY_PLANNER_PICTURES names one.</summary>
public class PictureBook
{
    [Fact]
    public void Pages_of_real_regions_to_look_at()
    {
        if (Environment.GetEnvironmentVariable("SURVEY_PLANNER_PICTURES") is not { Length: > 0 } folder)
        {
            Assert.Skip("SURVEY_PLANNER_PICTURES names no folder");
            return;
        }

        Directory.CreateDirectory(folder);
        File.WriteAllText(Path.Combine(folder, "pilot.html"), ReportRenderer.Render(SamplePlan.WithPilot, SamplePlan.Context));
        File.WriteAllText(Path.Combine(folder, "distances.html"), ReportRenderer.Render(SamplePlan.WithDistances, SamplePlan.Context));
        File.WriteAllText(Path.Combine(folder, "at-points.html"), ReportRenderer.Render(SamplePlan.AtPoints, SamplePlan.Context));
        var sea = SamplePlan.Of(
            SampleBoundary.Read("marine_archipelago_sea"), SamplePlan.Parallel(10_000), effort: SamplePlan.InventedEffort,
            pilot: SamplePlan.InventedPilotWithDistances(isPoints: false, ""));
        File.WriteAllText(Path.Combine(folder, "sea-with-pilot.html"), ReportRenderer.Render(sea, SamplePlan.Context));
        var counties = SamplePlan.Of(
            SampleBoundary.Read("strata_maine_counties"), SamplePlan.Zigzag(15_000), "name", effort: SamplePlan.InventedEffort,
            pilot: SamplePlan.InventedPilotWithDistances(isPoints: false, ""));
        File.WriteAllText(Path.Combine(folder, "counties-with-pilot.html"), ReportRenderer.Render(counties, SamplePlan.Context));
        var programme = new TrendDesign(0.2);
        File.WriteAllText(Path.Combine(folder, "trend.html"), TrendRenderer.RenderHtml(TrendSheet.Of("Archipelago, sea ducks by boat", programme, "the plan's target", 10, 0.8), "0.1.0"));
        File.WriteAllText(Path.Combine(folder, "trend.svg"), TrendRenderer.RenderSvg(TrendSheet.Of("Archipelago", programme, "the plan's target", 10, 0.8)));
        var simulated = programme with { Shape = TrendShape.Linear, CvModel = TrendCvModel.InverseRootOfAbundance, YearsBetweenSurveys = 2 };
        File.WriteAllText(Path.Combine(folder, "trend-simulated.html"), TrendRenderer.RenderHtml(TrendSheet.Of("Archipelago", simulated, "as given", 8, 0.8), "0.1.0"));
        var points = SamplePlan.Of(SampleBoundary.Read("inland_county_polygon"), SamplePlan.Grid(4000));
        File.WriteAllText(Path.Combine(folder, "points.html"), ReportRenderer.Render(points, SamplePlan.Context));
        var zigzag = SamplePlan.Of(SampleBoundary.Read("lake_caspian_with_islands"), SamplePlan.Zigzag(60_000));
        File.WriteAllText(Path.Combine(folder, "zigzag.html"), ReportRenderer.Render(zigzag, SamplePlan.Context));
        var pole = SamplePlan.Of(SampleBoundary.Boxes(("west", -60, 80, 60, 89.5), ("east", 60, 80, 150, 89.5)), SamplePlan.Parallel(60_000), stratumField: "name");
        File.WriteAllText(Path.Combine(folder, "pole.svg"), MapRenderer.RenderSvg(pole, SamplePlan.Context with { UsesNauticalMiles = true }));
        foreach (var (file, field, spacing) in ((string, string?, double)[])
                 [
                     ("marine_archipelago_sea", null, 10_000), ("strata_maine_counties", "name", 15_000), ("antimeridian_fiji", null, 20_000),
                     ("polar_svalbard", null, 25_000), ("lake_caspian_with_islands", null, 40_000), ("island_iceland", null, 20_000),
                 ])
        {
            var plan = SamplePlan.Of(SampleBoundary.Read(file), SamplePlan.Parallel(spacing), field);
            File.WriteAllText(Path.Combine(folder, file + ".html"), ReportRenderer.Render(plan, SamplePlan.Context));
            File.WriteAllText(Path.Combine(folder, file + ".svg"), MapRenderer.RenderSvg(plan, SamplePlan.Context));
            File.WriteAllText(Path.Combine(folder, file + "-region.svg"), MapRenderer.RenderSvg(plan.Region, file));
        }
    }
}
