using SurveyPlanner.Pages.Maps;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages;

/// <summary>Writes maps as SVG files of their own: no network, no script, no font but the system's.</summary>
public static class MapRenderer
{
    /// <summary>The region with its strata and closed areas, as <c>check --map</c> shows it.</summary>
    /// <param name="region">The region.</param>
    /// <param name="title">Title of the picture; any characters.</param>
    /// <param name="nauticalMiles">Whether the scale bar counts in nautical miles.</param>
    public static string RenderSvg(Region region, string title, bool nauticalMiles = false)
    {
        ArgumentNullException.ThrowIfNull(region);
        return Standalone(LayoutMapDrawing.Of(region, title, nauticalMiles));
    }

    /// <summary>The region with the transects drawn in it.</summary>
    public static string RenderSvg(SurveyPlan plan, ReportContext context)
    {
        ArgumentNullException.ThrowIfNull(plan);
        ArgumentNullException.ThrowIfNull(context);
        return Standalone(LayoutMapDrawing.Of(plan, context.DrawLine, context.UsesNauticalMiles));
    }

    private static string Standalone(LayoutMapDrawing map) => RazorText.Render<LayoutMap>(new()
    {
        [nameof(LayoutMap.Map)] = map,
        [nameof(LayoutMap.Standalone)] = true,
    }) + "\n";
}
