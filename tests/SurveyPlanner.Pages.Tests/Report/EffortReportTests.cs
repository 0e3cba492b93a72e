using System.Text.RegularExpressions;
using SurveyPlanner.Effort;
using SurveyPlanner.Pages.Report;
using SurveyPlanner.Pages.Tests.Fixtures;
using SurveyPlanner.Pages.Tests.Words;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Tests.Report;

public partial class EffortReportTests
{
    private static readonly SurveyPlan Plan = SamplePlan.WithDistances;

    private static EffortPlan Effort => Plan.Effort!;

    [Fact]
    public void The_section_opens_with_the_assured_effort_and_how_far_the_pilot_leaves_it_open()
    {
        var (required, answer) = (Effort.Required!, EffortWords.Answer(Effort));
        Assert.StartsWith($"{Shown(required.AssuredEffort!.Value)}\u00a0km reach a coefficient of variation of 20\u00a0% with an assurance of 80\u00a0%", answer, StringComparison.Ordinal);
        Assert.Contains($"from {Shown(required.Interval!.Lower)} to {Shown(required.Interval.Upper)} km open", answer, StringComparison.Ordinal);
        var page = ReportRenderer.Render(Plan, SamplePlan.Context);
        Assert.Equal(answer, System.Net.WebUtility.HtmlDecode(Opening().Match(page).Groups[1].Value));
    }

    [Fact]
    public void Without_a_pilot_the_answer_says_that_nothing_tells_how_sure_it_is()
    {
        var given = SamplePlan.Of(
            SampleBoundary.Boxes(("all", 20, 60, 21, 61)), SamplePlan.Parallel(8000), effort: EffortDesign.None with { TargetCv = 0.2, GivenEncounterRate = 0.5 });
        Assert.Contains("there is no pilot to say how sure that is", EffortWords.Answer(given.Effort!), StringComparison.Ordinal);
        Assert.Null(EffortWords.OfReliability(given.Effort!));
        Assert.Null(EffortBand.At(given.Effort!, 100));
        Assert.Empty(EffortChart.OfEffort(given, given.Effort!)!.Lines[0].Band);
        Assert.DoesNotContain("NaN", ReportRenderer.Render(given, SamplePlan.Context), StringComparison.Ordinal);
    }

    [Fact]
    public void Measured_reliability_stands_beside_the_interval()
    {
        var measured = Effort with { Uncertainty = Effort.Uncertainty! with { Measured = new MeasuredReliability(5, 3, 4, 0.983, 0.849) } };
        var sentence = EffortWords.OfReliability(measured)!;
        Assert.Contains("2\u202f000 simulated pilots of 5 transects with 3 detections on each and counts 4 times as variable as chance", sentence, StringComparison.Ordinal);
        Assert.Contains("98.3\u00a0% gave a 95\u00a0% interval that held the truth", sentence, StringComparison.Ordinal);
        Assert.Contains("84.9\u00a0% an effort assured at 80\u00a0% that was enough", sentence, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0.9, "less than the plain estimate asks for")]
    [InlineData(1.1, "more than the plain estimate, but not enough for the assurance asked for")]
    [InlineData(1.6, "enough for the assurance asked for")]
    [InlineData(3.5, "more than all that the interval leaves open")]
    public void The_drawn_layout_is_judged_by_what_is_needed(double times, string verdict)
    {
        // Estimate: what is drawn over so many times; assured: half as much again; interval: up to three times.
        var estimate = Plan.Delivered!.Effort / times;
        var required = Effort.Required! with { Effort = estimate, AssuredEffort = 1.5 * estimate, Interval = new EffortInterval(0.5 * estimate, 3 * estimate) };
        Assert.EndsWith($"That is {verdict}.", EffortWords.OfDrawn(Plan, Effort with { Required = required }), StringComparison.Ordinal);
    }

    /// <summary>The band of the pages, the curve moved along the axis, against the core's own band, which scales the variance.</summary>
    [Fact]
    public void The_band_is_that_of_the_core_s_curve()
        => Assert.All(Effort.Curves.CvAgainstEffort, point =>
        {
            var (lower, upper) = EffortBand.At(Effort, point.Effort)!.Value;
            Assert.Equal(point.LowerCv!.Value, lower, 1e-12);
            Assert.Equal(point.UpperCv!.Value, upper, 1e-12);
        });

    [Fact]
    public void The_charts_pass_through_the_target_and_mark_the_drawn_layout()
    {
        var (byEffort, byTarget) = (EffortChart.OfEffort(Plan, Effort)!, EffortChart.OfTarget(Plan, Effort)!);
        var required = Effort.Required!;
        Assert.Equal(20, Interpolated(byEffort.Lines[0].Points, required.Effort), 0.05);
        Assert.Equal(required.Effort, Interpolated(byTarget.Lines[0].Points, 20), 0.005 * required.Effort);
        Assert.Equal((Plan.Delivered!.Effort, 100 * Plan.Delivered.Cv), (byEffort.Dots[0].X, byEffort.Dots[0].Y));
        Assert.Equal((100 * Plan.Delivered.Cv, Plan.Delivered.Effort), (byTarget.Dots[0].X, byTarget.Dots[0].Y));
        Assert.Equal((20.0, false), (Assert.Single(byEffort.Levels).At, byEffort.Levels[0].IsUpright));
        Assert.Equal((20.0, true), (Assert.Single(byTarget.Levels).At, byTarget.Levels[0].IsUpright));
        Assert.All(byEffort.Lines[0].Band, band => Assert.True(band.Low < band.High));
    }

    [Fact]
    public void Components_of_pilot_required_and_drawn_stand_side_by_side_and_add_up()
    {
        var table = ComponentTables.Of(Plan, Effort);
        Assert.Equal(["encounter rate", "detection", "cluster size", "together", "95\u00a0% interval, times and divided by"], table.Rows.Select(row => row[0]));
        Assert.Equal(Shown(100 * Effort.PilotCv!.Cv), table.Rows[3][1]);
        Assert.Equal(Shown(100 * Effort.Required!.Precision.Cv), table.Rows[3][4]);
        Assert.Equal(Shown(100 * Plan.Delivered!.Cv), table.Rows[3][7]);
        var squares = table.Rows.Take(3).Sum(row => Math.Pow(double.Parse(row[7], System.Globalization.CultureInfo.InvariantCulture), 2));
        Assert.Equal(100 * Plan.Delivered.Cv, Math.Sqrt(squares), 0.02);
    }

    [Fact]
    public void Ways_of_sharing_stand_side_by_side_with_what_they_cost()
    {
        var effort = Shared(lineKm: 5);
        var table = AllocationTables.OfOptions(effort, Allocation.Proportional);
        Assert.Equal(["proportional", "equal", "optimal"], table.Rows.Select(row => row[0]));
        Assert.Equal(["planned", "", ""], table.Rows.Select(row => row[^1]));
        Assert.Equal(effort.Allocations.Select(option => Figures.Count((long)Math.Round(option.Cost!.Value))), table.Rows.Select(row => row[5]));
        var saved = 1 - (effort.Allocations[2].Cost!.Value / effort.Allocations[0].Cost!.Value);
        Assert.InRange(saved, 0.01, 0.5);
        Assert.EndsWith(
            $"optimal allocation would reach the target with {Figures.Percent(saved)} less cost.", EffortWords.OfAllocations(effort, Allocation.Proportional), StringComparison.Ordinal);
        Assert.EndsWith("with the least cost.", EffortWords.OfAllocations(effort, Allocation.Optimal), StringComparison.Ordinal);
    }

    [Fact]
    public void Where_the_least_number_of_lines_decides_the_ways_of_sharing_are_said_to_be_the_same()
        => Assert.Contains("come to the same", EffortWords.OfAllocations(Shared(lineKm: 500), Allocation.Proportional), StringComparison.Ordinal);

    [Fact]
    public void Points_are_whole_in_sentences_and_tables()
    {
        var (plan, effort) = (SamplePlan.AtPoints, SamplePlan.AtPoints.Effort!);
        Assert.DoesNotMatch(@"\d\.\d* ?(to|points|\u00a0points)", EffortWords.Answer(effort));
        Assert.All(EffortTables.OfRequired(plan, effort, effort.Required!).Rows, row => Assert.DoesNotContain(".", row[1], StringComparison.Ordinal));
        Assert.All(EffortTables.OfTargets(effort).Rows, row => Assert.DoesNotContain(".", row[1] + row[2], StringComparison.Ordinal));
    }

    /// <summary>Sources are for the reader: no page of the repository, no remark to ourselves; what the figures say already is not said again.</summary>
    [Fact]
    public void Advice_names_its_source_only_and_repeats_no_figure()
    {
        foreach (var plan in new[] { Plan, SamplePlan.AtPoints, SamplePlan.WithPilot })
        {
            var page = ReportRenderer.Render(plan, SamplePlan.Context);
            Assert.DoesNotContain("docs/methods", page, StringComparison.Ordinal);
            Assert.DoesNotContain("from memory", page, StringComparison.Ordinal);
            Assert.DoesNotContain("the truth may ask for anything", page, StringComparison.Ordinal);
        }
    }

    private static EffortPlan Shared(double lineKm)
    {
        EffortStratum[] strata = [.. new[] { "outer", "inner" }.Select(name => new EffortStratum(name, 6000, IsPoints: false, 600, IsSystematic: true, lineKm))];
        return EffortPlanning.For(Plan.Design.Effort, SamplePlan.InventedPilotWithDistances(isPoints: false, "outer", "inner"), strata, seed: 1)!;
    }

    private static double Interpolated(IReadOnlyList<(double X, double Y)> points, double x)
    {
        var after = points.Select((point, i) => (point, i)).First(pair => pair.point.X >= x).i;
        var (a, b) = (points[after - 1], points[after]);
        return a.Y + ((b.Y - a.Y) * (x - a.X) / (b.X - a.X));
    }

    private static string Shown(double value) => FiguresTests.Shown(value) is var text && value >= 1000 ? Figures.Three(value) : text;

    [GeneratedRegex(@"<h2>Effort and precision</h2>\s*<p>(.*?)</p>")]
    private static partial Regex Opening();
}
