using SurveyPlanner.Effort;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;
using SurveyPlanner.Simulated;

namespace SurveyPlanner.Tests.Effort;

/// <summary>
/// A fast part of the study of simulated pilots; the whole of it, 2,000 pilots a row, is run by the benchmarks
/// (<c>pilot-intervals</c>) and its figures stand in docs/methods/effort.md.
/// </summary>
public class EffortUncertaintyTests
{
    /// <summary>150 pilots, 4 standard errors about the nominal shares, seed 41; the interval may hold the truth more often than it says.</summary>
    [Theory]
    [InlineData(10, 3, 2)]
    [InlineData(20, 3, 1)]
    public void Intervals_hold_the_truth_and_assured_efforts_are_enough_as_often_as_they_say(int lines, double perLine, double dispersion)
    {
        var truth = new PilotTruth(lines, perLine, dispersion);
        var results = Enumerable.Range(0, 150)
            .Select(i => truth.Draw(41, 0, (uint)i))
            .Where(pilot => pilot is not null)
            .Select(pilot => truth.Plan(pilot!, 0.8, 41, DetectionModel.HalfNormal).Required!)
            .ToList();
        double Share(Func<RequiredEffort, bool> holds) => (double)results.Count(holds) / results.Count;

        var covered = Share(required => required.Interval!.Lower <= truth.RequiredKm && truth.RequiredKm <= required.Interval.Upper);
        Assert.InRange(covered, 0.95 - (4 * Math.Sqrt(0.95 * 0.05 / results.Count)), 1);
        Assert.Equal(0.8, Share(required => required.AssuredEffort >= truth.RequiredKm), 4 * Math.Sqrt(0.8 * 0.2 / results.Count));
    }

    /// <summary>
    /// The formula end to end: 400 surveys of the length that the truth asks for really have the target cv, within 4 standard errors of a
    /// cv (1 / sqrt(2 n)) and 5 % for its small-sample excess. Seed 45.
    /// </summary>
    [Theory]
    [InlineData(1)]
    [InlineData(2.5)]
    public void Surveys_of_the_required_length_have_the_target_cv(double dispersion)
    {
        const int surveys = 400;
        var truth = new PilotTruth(0, 3, dispersion);
        var whole = truth with { Transects = (int)Math.Round(truth.RequiredKm / 2) };
        var densities = Enumerable.Range(0, surveys).Select(i =>
        {
            var table = whole.Draw(45, 1, (uint)i)!;
            var fit = DetectionFitting.Fit([.. table.Detections.Select(detection => detection.DistanceMetres)], 100, false, [DetectionModel.HalfNormal]);
            return table.Detections.Length / fit.Chosen!.EffectiveMetres!.Value;
        }).ToList();
        var mean = densities.Average();
        var cv = Math.Sqrt(densities.Sum(density => (density - mean) * (density - mean)) / (surveys - 1)) / mean;
        Assert.Equal(1, cv / 0.2, (4 / Math.Sqrt(2 * surveys)) + 0.05);
    }

    /// <summary>
    /// Pilots of 30 points with about 30 distances, seed 46, all usual models: in some of them a fit stops at a bound. Before fits at bounds lost
    /// their say, an assured effort could be a thousand times the plain one.
    /// </summary>
    [Fact]
    public void An_assured_effort_keeps_to_the_size_of_the_plain_one_wherever_fits_stop()
    {
        var bounds = 0;
        foreach (var truth in new DetectionFunction[] { new HalfNormalDetection(40), new HazardRateDetection(30, 1.5), new UniformCosineDetection(100, [0.9, 0.15]) })
        {
            for (uint i = 0; i < 6; i++)
            {
                var plan = EffortPlanning.For(
                    EffortDesign.None with { TargetCv = 0.2, Assurance = 0.8 }, Points(truth, i), [new EffortStratum("all", 400, true, 100, false)], 1)!;
                bounds += plan.Pilot!.Detection!.Fits.Count(fit => fit.Status == FitStatus.OnBound);
                Assert.InRange(plan.Uncertainty!.AssuredFactor!.Value, 0.9, 3);
                Assert.InRange(plan.B.DetectionPart!.Value, 0.2, 12);
            }
        }

        Assert.True(bounds >= 5);
    }

    private static PilotTable Points(DetectionFunction truth, uint replicate)
    {
        var random = new PhiloxStream(46, 1007, 0, replicate);
        var transects = new List<PilotTransect>();
        var detections = new List<PilotDetection>();
        for (var k = 0; k < 30; k++)
        {
            transects.Add(new PilotTransect("", $"P{k}", 1, random.NextPoisson(1)));
            for (var i = 0; i < transects[^1].Count; i++)
            {
                detections.Add(new PilotDetection($"P{k}", random.NextDistance(truth.ProbabilityAt, 100, true), 1));
            }
        }

        return new PilotTable(true, [.. transects], [.. detections]);
    }

    [Fact]
    public void The_same_seed_gives_the_same_figures_and_another_seed_nearly_the_same()
    {
        var truth = new PilotTruth(12, 4, 1.5, Clusters: true);
        var pilot = truth.Draw(42, 0, 0)!;
        var (a, b, other) = (Of(1), Of(1), Of(2));
        Assert.Equal(a, b);
        Assert.NotEqual(a, other);

        // The 80 % quantile of 2,000 draws has a standard error of about 2 % where the logarithm spreads by 0.5.
        Assert.Equal(1, other.AssuredFactor!.Value / a.AssuredFactor!.Value, 0.1);

        EffortUncertainty Of(ulong seed) => truth.Plan(pilot, 0.8, seed).Uncertainty!;
    }

    /// <summary>The measured figures shown are those of the nearest simulated pilots.</summary>
    [Theory]
    [InlineData(9, 2.5, 0.7, 10, 3, 1)]
    [InlineData(60, 30, 9, 40, 10, 4)]
    [InlineData(3, 0.5, 1.6, 5, 1, 2)]
    public void The_nearest_measured_figures_stand_beside_the_interval(int lines, double perLine, double dispersion, int asLines, double asPerLine, double asDispersion)
    {
        var row = MeasuredReliability.Nearest(lines, perLine, dispersion);
        Assert.Equal((asLines, asPerLine, asDispersion), (row.Transects, row.DetectionsPerTransect, row.Dispersion));
        Assert.Equal(36, MeasuredReliability.Table.Distinct().Count());
    }

    [Fact]
    public void More_assurance_takes_more_effort()
    {
        var truth = new PilotTruth(10, 5, 2);
        var pilot = truth.Draw(43, 0, 0)!;
        var efforts = new[] { 0.5, 0.7, 0.8, 0.9, 0.95 }.Select(assurance => truth.Plan(pilot, assurance, 1).Required!.AssuredEffort!.Value).ToList();
        Assert.Equal(efforts.Order(), efforts);
        Assert.True(efforts[^1] > 1.2 * efforts[0]);
    }

    [Fact]
    public void Figures_given_for_certain_leave_nothing_open()
    {
        var design = EffortDesign.None with { TargetCv = 0.2, GivenEncounterRate = 0.5, B = 3, Assurance = 0.8 };
        var plan = EffortPlanning.For(design, null, [new EffortStratum("all", 100, false, 100, true)], 1)!;
        Assert.Null(plan.Uncertainty);
        Assert.Null(plan.Required!.AssuredEffort);
        Assert.Contains(plan.Advice, advice => advice.Message.Contains("assurance", StringComparison.Ordinal));
    }

    /// <summary>With b given only the encounter rate is open: about a gamma, cv² = b / n.</summary>
    [Fact]
    public void A_given_b_leaves_the_encounter_rate_open()
    {
        var pilot = new PilotTable(false, [new("", "1", 10, 60), new("", "2", 10, 60)], []);
        var plan = EffortPlanning.For(EffortDesign.None with { TargetCv = 0.2, B = 3 }, pilot, [new EffortStratum("all", 100, false, 100, true)], 1)!;
        var spread = Math.Log(plan.Uncertainty!.Factors.Upper / plan.Uncertainty.Factors.Lower) / (2 * 1.96);
        Assert.Equal(Math.Sqrt(3 / 120.0), spread, 0.015);
        Assert.Null(plan.Uncertainty.Measured);
    }

    [Fact]
    public void Curves_meet_the_required_effort_and_widen_by_the_interval()
    {
        var truth = new PilotTruth(15, 4, 2);
        var plan = truth.Plan(truth.Draw(44, 0, 0)!, 0.8, 1);
        var atTarget = plan.Curves.EffortAgainstTarget.Single(point => Math.Abs(point.TargetCv - 0.2) < 1e-9);
        Assert.Equal(plan.Required!.Effort, atTarget.Effort, 1e-9);
        Assert.Equal(plan.Required.Interval!.Upper, atTarget.Interval!.Upper, 1e-9);
        Assert.All(plan.Curves.CvAgainstEffort, point => Assert.True(point.LowerCv < point.Cv && point.Cv < point.UpperCv));
        Assert.All(plan.Curves.CvAgainstEffort, point => Assert.Equal(plan.CvAt(point.Effort)!.Cv, point.Cv, 1e-12));
    }
}
