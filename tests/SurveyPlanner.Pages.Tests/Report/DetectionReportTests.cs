using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Report;
using SurveyPlanner.Pages.Tests.Fixtures;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Pages.Tests.Report;

public class DetectionReportTests
{
    private static readonly DetectionFits Lines = SamplePlan.WithDistances.Effort!.Pilot!.Detection!;

    private static readonly DetectionFits Points = SamplePlan.AtPoints.Effort!.Pilot!.Detection!;

    [Fact]
    public void Along_lines_the_curve_is_the_chosen_function_and_holds_as_much_as_the_bars()
    {
        var chart = DetectionWords.Chart(Lines)!;
        Assert.All(chart.Lines[0].Points, point => Assert.Equal(Lines.Chosen!.Function!.ProbabilityAt(point.X), point.Y, 1e-12));
        Assert.Equal(Lines.Chosen!.EffectiveMetres!.Value, Area(chart.Lines[0].Points), 0.5);
        Assert.Equal(Lines.Chosen.EffectiveMetres.Value, Area(chart.Bars), 1e-6);
    }

    /// <summary>A density has an integral of 1, by the bars exactly, by the curve as far as the trapezoid rule goes.</summary>
    [Fact]
    public void At_points_curve_and_bars_are_densities_of_distance()
    {
        var chart = DetectionWords.Chart(Points)!;
        Assert.Equal(1, Area(chart.Bars), 1e-9);
        Assert.Equal(1, Area(chart.Lines[0].Points), 1e-3);
        Assert.Equal(0, chart.Lines[0].Points[0].Y);
        Assert.Equal("Density of distances, per metre", chart.Y.Title);
    }

    [Fact]
    public void The_table_has_every_model_with_its_end_and_marks_the_chosen_one()
    {
        var failed = new DetectionFit(DetectionModel.HazardRate, FitStatus.NotConverged, "No maximum <was> found.", 45, null, [], null, null, null);
        var fits = Lines with { Fits = [.. Lines.Fits, failed] };
        var table = DetectionWords.Table(fits);
        Assert.Equal(fits.Fits.Length, table.Rows.Count);
        Assert.Single(table.Rows, row => row[0].EndsWith(", chosen", StringComparison.Ordinal));
        Assert.Equal(["hazard-rate", "–", "–", "–", "–", "", "Did not converge: No maximum <was> found."], table.Rows[^1]);
        Assert.Equal("0.0", table.Rows[fits.Fits.IndexOf(fits.Fits.MinBy(fit => fit.Aic)!)][2]);

        var plan = SamplePlan.WithDistances;
        var page = ReportRenderer.Render(
            plan with { Effort = plan.Effort! with { Pilot = plan.Effort.Pilot! with { Detection = fits } } }, SamplePlan.Context);
        Assert.Contains("Did not converge: No maximum &lt;was&gt; found.", page, StringComparison.Ordinal);
    }

    [Fact]
    public void A_smaller_AIC_at_a_bound_is_not_hidden()
    {
        var chosen = Lines.Chosen!;
        var worse = chosen with { Model = DetectionModel.Strip, LogLikelihood = chosen.LogLikelihood - 3 };
        Assert.Contains("has the smallest AIC of 2 models and", DetectionWords.Finding(Lines with { Fits = [chosen, worse] }), StringComparison.Ordinal);

        var bound = chosen with { Model = DetectionModel.Strip, Status = FitStatus.OnBound, LogLikelihood = chosen.LogLikelihood + 3, EffectiveCv = null };
        var fits = Lines with { Fits = [chosen, bound] };
        Assert.Contains("has the smallest AIC of those of 2 models that did not stop at a bound and", DetectionWords.Finding(fits), StringComparison.Ordinal);
        Assert.Equal(["6.0", "0.0"], DetectionWords.Table(fits).Rows.Select(row => row[2]));
    }

    [Fact]
    public void Without_a_fit_there_is_no_picture_and_the_section_says_so()
    {
        var none = Lines with { Fits = [], Chosen = null, Histogram = [] };
        Assert.Null(DetectionWords.Chart(none));
        Assert.StartsWith("No detection function could be fitted", DetectionWords.Finding(none), StringComparison.Ordinal);
    }

    private static double Area(IReadOnlyList<(double X, double Y)> points) => points.Zip(points.Skip(1)).Sum(pair => (pair.Second.X - pair.First.X) * (pair.First.Y + pair.Second.Y) / 2);

    private static double Area(IEnumerable<Bar> bars) => bars.Sum(bar => (bar.To - bar.From) * bar.Height);
}
