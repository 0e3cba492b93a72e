using SurveyPlanner.Layouts;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>Everything on the map of a region or a layout, in pixels.</summary>
/// <param name="Sheet">Frame, graticule and strip.</param>
/// <param name="Strata">The strata and what was cut out of them.</param>
/// <param name="Transects">The transects; null for a map of the region alone.</param>
/// <param name="Title">Title of the picture.</param>
/// <param name="Description">What it says, for those who do not see it.</param>
public sealed record LayoutMapDrawing(
    MapSheet Sheet, StrataDrawing Strata, TransectsDrawing? Transects, string Title, string Description)
{
    /// <summary>The region alone, as <c>check</c> shows it.</summary>
    public static LayoutMapDrawing Of(Region region, string title, bool nauticalMiles)
    {
        var frame = MapFrame.Around([.. region.Strata.Select(stratum => stratum.Shape), region.Exclusions], []);
        var placer = new LabelPlacer(frame.Width, frame.Height);
        var strata = StrataDrawing.Of(region, frame, placer);
        return new LayoutMapDrawing(
            MapSheet.For(region, frame, placer, nauticalMiles), strata, null, title, Sentences.OfRegion(region));
    }

    /// <summary>The region with the layouts drawn.</summary>
    public static LayoutMapDrawing Of(SurveyPlan plan, string drawLine, bool nauticalMiles)
    {
        var region = plan.Region;
        Layout[] layouts = [.. plan.Strata.Select(stratum => stratum.Layout)];
        var frame = MapFrame.Around(
            region.Strata.Select(stratum => stratum.Shape),
            layouts.SelectMany(layout => layout.Transects).SelectMany(transect => transect.Pieces).SelectMany(piece => piece.Plane));
        var placer = new LabelPlacer(frame.Width, frame.Height);
        var strata = StrataDrawing.Of(region, frame, placer);
        var sheet = MapSheet.For(region, frame, placer, nauticalMiles, drawLine, Sentences.Seed(plan));
        var transects = TransectsDrawing.Of(layouts, frame, placer);
        return new LayoutMapDrawing(
            sheet, strata, transects, "Transects of " + plan.Design.Name, Sentences.OfMap(plan));
    }
}
