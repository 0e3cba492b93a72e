using SurveyPlanner.Layouts;
using SurveyPlanner.Pages.Charts;

namespace SurveyPlanner.Pages;

/// <summary>Draws what other bearings would bring, as an SVG file of its own.</summary>
public static class BearingsRenderer
{
    private const int MostNamed = 4;

    /// <summary>Off-effort distance against bearing, a line a stratum; bearings at which a layout cannot work are gaps that a line bridges.</summary>
    public static string RenderSvg(IReadOnlyList<StratumBearings> strata)
    {
        ArgumentNullException.ThrowIfNull(strata);
        return RazorText.Render<ChartView>(new()
        {
            [nameof(ChartView.Chart)] = ChartOf(strata),
            [nameof(ChartView.Key)] = "bearings",
            [nameof(ChartView.Standalone)] = true,
        }) + "\n";
    }

    private static Chart ChartOf(IReadOnlyList<StratumBearings> strata)
    {
        var lines = strata.Select((stratum, i) => new Line(
            i < MostNamed ? stratum.Stratum : "",
            [.. stratum.Trials.Where(trial => trial.Figures is not null).Select(trial => (trial.BearingDegrees, trial.Figures!.OffEffortMetres / 1000))])
        {
            Look = i < MostNamed ? (LineLook)i : LineLook.Quiet,
        }).Where(line => line.Points.Count > 1).ToList();
        var most = lines.SelectMany(line => line.Points).Select(point => point.Y).DefaultIfEmpty(1).Max();
        return new Chart(
            "Way between transects against bearing",
            "For each bearing the expected way from the end of each transect to the start of the next, by stratum. The table that the command prints has the figures.",
            new Axis("True bearing of the lines, degrees", 0, 180, 30),
            Axis.Covering("Way between transects, km", 0, most))
        {
            Lines = lines,
        };
    }
}
