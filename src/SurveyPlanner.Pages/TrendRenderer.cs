using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Trends;

namespace SurveyPlanner.Pages;

/// <summary>Writes what a monitoring programme will find: as a self-contained page, or as a picture of its own.</summary>
public static class TrendRenderer
{
    /// <summary>The page, without network or script. Equal input gives equal text; text of unknown origin is escaped.</summary>
    /// <param name="sheet">The figures.</param>
    /// <param name="version">Version of the program.</param>
    public static string RenderHtml(TrendSheet sheet, string version)
    {
        ArgumentNullException.ThrowIfNull(sheet);
        return "<!DOCTYPE html>\n" + RazorText.Render<TrendPage>(new()
        {
            [nameof(TrendPage.Sheet)] = sheet,
            [nameof(TrendPage.Version)] = version,
        });
    }

    /// <summary>Power against years as an SVG file.</summary>
    public static string RenderSvg(TrendSheet sheet)
    {
        ArgumentNullException.ThrowIfNull(sheet);
        return RazorText.Render<ChartView>(new()
        {
            [nameof(ChartView.Chart)] = TrendCharts.OfYears(sheet),
            [nameof(ChartView.Key)] = "years",
            [nameof(ChartView.Standalone)] = true,
        }) + "\n";
    }
}
