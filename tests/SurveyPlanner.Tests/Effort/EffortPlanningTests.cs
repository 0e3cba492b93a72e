using System.Collections.Immutable;
using System.Text.Json;
using CsCheck;
using SurveyPlanner.Effort;
using SurveyPlanner.Pilots;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Effort;

public class EffortPlanningTests
{
    private const ulong Seed = 1;

    private static readonly EffortStratum Whole = new("all", 400, false, 100, true);
    private static readonly EffortDesign Target = EffortDesign.None with { TargetCv = 0.2 };

    [Fact]
    public void Without_pilot_rate_or_target_there_is_no_plan()
        => Assert.Null(EffortPlanning.For(EffortDesign.None, null, [Whole], Seed));

    [Fact]
    public void The_effort_for_a_target_delivers_the_target()
    {
        var plan = EffortPlanning.For(Target, Pilot([3, 5, 2, 8, 4, 6]), [Whole], Seed)!;
        Assert.Equal(0.2, plan.CvAt(plan.Required!.Effort)!.Cv, 1e-12);
        Assert.Equal(BOrigin.Pilot, plan.B.Origin);
        Assert.Equal(EncounterRateEstimator.OverlappingPairs, plan.Estimator);
    }

    /// <summary>With one stratum the general model is the published formula: b = n cv².</summary>
    [Fact]
    public void B_is_detections_times_squared_cv()
    {
        var design = Target with { ClusterSize = new GivenClusterSize(4, 3) };
        var plan = EffortPlanning.For(design, Pilot([3, 5, 2, 8, 4, 6]), [Whole], Seed)!;
        Assert.Equal(EffortFormula.B(28, plan.PilotCv!.Cv), plan.B.Value, 1e-12);
        Assert.Equal(0.5625, plan.B.ClusterSizePart!.Value, 1e-12);
    }

    [Fact]
    public void Splitting_a_region_into_like_strata_changes_nothing_under_proportional_allocation()
    {
        var pilot = Pilot([3, 5, 2, 8, 4, 6]);
        var one = EffortPlanning.For(Target, pilot, [Whole], Seed)!;
        var two = EffortPlanning.For(Target, pilot, [Whole with { Name = "a", AreaKm2 = 100 }, Whole with { Name = "b", AreaKm2 = 300 }], Seed)!;
        Assert.Equal(one.Required!.Effort, two.Required!.Effort, 1e-9);
        Assert.Equal([0.25, 0.75], two.Strata.Select(stratum => stratum.Share));
    }

    /// <summary>
    /// The variance of Σ w_h r_h is Σ w_h² c_h r_h / L_h whatever effort each stratum gets, and the detection part falls with the detections of all;
    /// by hand from the figures of the strata.
    /// </summary>
    [Fact]
    public void Effort_shared_otherwise_than_planned_delivers_by_what_fell_on_each_stratum()
    {
        var pilot = new PilotTable(
            false,
            [
                .. new[] { 3, 5, 2, 8, 4, 6 }.Select((count, i) => new PilotTransect("a", $"A{i}", 2, count)),
                .. new[] { 1, 0, 2, 1, 3, 0 }.Select((count, i) => new PilotTransect("b", $"B{i}", 2, count)),
            ],
            []);
        EffortStratum[] strata = [Whole with { Name = "a", AreaKm2 = 100 }, Whole with { Name = "b", AreaKm2 = 300 }];
        var plan = EffortPlanning.For(Target with { ClusterSize = new GivenClusterSize(4, 3) }, pilot, strata, Seed)!;
        var (a, b) = (plan.Model.Strata[0], plan.Model.Strata[1]);
        var delivered = plan.PrecisionOf([12, 700])!;

        var rate = (0.25 * a.Rate) + (0.75 * b.Rate);
        var variance = (0.0625 * a.Dispersion * a.Rate / 12) + (0.5625 * b.Dispersion * b.Rate / 700);
        var detections = (12 * a.Rate) + (700 * b.Rate);
        Assert.Equal((712, detections), (delivered.Effort, delivered.ExpectedDetections));
        Assert.Equal(Math.Sqrt((variance / (rate * rate)) + (0.5625 / detections)), delivered.Cv, 1e-12);
        Assert.Equal(delivered.Cv, plan.CvAt(plan.EffortAsPlanned(delivered))!.Cv, 1e-12);
        Assert.True(plan.EffortAsPlanned(delivered) < 0.5 * 712);
        Assert.Null(plan.PrecisionOf([0, 700]));
        Assert.Null(plan.PrecisionOf([0, 0]));
    }

    [Fact]
    public void A_pilot_that_names_no_strata_says_that_it_stands_for_all()
    {
        EffortStratum[] strata = [Whole with { Name = "a" }, Whole with { Name = "b" }];
        bool Says(EffortPlan plan) => plan.Advice.Any(advice => advice.Message.StartsWith("The pilot names no strata", StringComparison.Ordinal));
        Assert.True(Says(EffortPlanning.For(Target, Pilot([3, 5, 2, 8, 4, 6]), strata, Seed)!));
        Assert.False(Says(EffortPlanning.For(Target, Pilot([3, 5, 2, 8, 4, 6]), [Whole], Seed)!));
    }

    [Fact]
    public void One_transect_falls_back_on_the_rule_of_thumb_and_says_so()
    {
        var plan = EffortPlanning.For(Target, Pilot([7]), [Whole], Seed)!;
        Assert.Equal(BOrigin.RuleOfThumb, plan.B.Origin);
        Assert.Equal(3 / 0.04 / 3.5, plan.Required!.Effort, 1e-9);
        Assert.Null(plan.PilotCv);
        Assert.Null(plan.Pilot!.Pooled.Variance);
        Assert.Contains(plan.Advice, advice => advice.Message.Contains("one transect has no variance", StringComparison.Ordinal));
    }

    [Fact]
    public void Many_strata_with_too_few_lines_are_told_in_one_sentence()
    {
        EffortStratum[] strata = [.. Enumerable.Range(1, 6).Select(i => Whole with { Name = $"s{i}", AreaKm2 = 100 * i, TransectLengthKm = 50 })];
        var plan = EffortPlanning.For(Target, Pilot([3, 5, 2, 8, 4, 6]), strata, Seed)!;
        var advice = Assert.Single(plan.Advice, advice => advice.Message.Contains("at least 10 to 20", StringComparison.Ordinal));
        Assert.StartsWith("In 6 of 6 strata the target alone would ask for fewer than 10 lines each, in 's1' for about ", advice.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Equal_counts_do_not_promise_a_variance_of_nothing()
    {
        var plan = EffortPlanning.For(Target, Pilot([4, 4, 4, 4]), [Whole], Seed)!;
        Assert.Equal(1, plan.B.EncounterRatePart!.Value, 1e-12);
        Assert.Contains(plan.Advice, advice => advice.Message.Contains("Poisson", StringComparison.Ordinal));
    }

    [Fact]
    public void A_detection_cv_taken_as_given_stays_whatever_the_effort()
    {
        var design = Target with { Detection = DetectionDesign.None with { GivenCv = 0.1 } };
        var plan = EffortPlanning.For(design, Pilot([3, 5, 2, 8, 4, 6]), [Whole], Seed)!;
        Assert.Equal(0.2, plan.CvAt(plan.Required!.Effort)!.Cv, 1e-12);
        Assert.InRange(plan.CvAt(1e12)!.Cv, 0.1, 0.1001);

        var hopeless = EffortPlanning.For(design with { TargetCv = 0.1 }, Pilot([3, 5, 2, 8, 4, 6]), [Whole], Seed)!;
        Assert.Null(hopeless.Required);
        Assert.Contains(hopeless.Advice, advice => advice.Message.StartsWith("No effort reaches", StringComparison.Ordinal));
    }

    /// <summary>Each point visited 4 times: b holds for that, so 100 visits are 25 points.</summary>
    [Fact]
    public void Visits_to_points_visited_again_are_not_passed_off_as_points()
    {
        var points = Whole with { IsPoints = true };
        var pilot = new PilotTable(true, [.. new[] { 3, 9, 0, 12, 5, 7 }.Select((count, i) => new PilotTransect("", $"{i}", 4, count))], []);
        var plan = EffortPlanning.For(Target, pilot, [points], Seed)!;
        var advice = Assert.Single(plan.Advice, advice => advice.Message.Contains("4 times on average", StringComparison.Ordinal));
        Assert.Contains(FormattableString.Invariant($"{plan.Required!.Planned} visits are about {Math.Ceiling(plan.Required.Planned / 4)} points"), advice.Message, StringComparison.Ordinal);

        var once = pilot with { Transects = [.. pilot.Transects.Select(transect => transect with { Effort = 1 })] };
        Assert.DoesNotContain(EffortPlanning.For(Target, once, [points], Seed)!.Advice, one => one.Message.Contains("on average", StringComparison.Ordinal));
    }

    /// <summary>One detection leaves nothing to tell a variance from: 0 degrees of freedom, not many.</summary>
    [Fact]
    public void A_single_detection_has_no_degrees_of_freedom()
    {
        var pilot = new PilotTable(
            false, [new("", "1", 2, 1), new("", "2", 2, 0), new("", "3", 2, 0)], [new("1", 30, 1)]);
        var plan = EffortPlanning.For(
            Target with { Detection = DetectionDesign.None with { Models = [DetectionModel.HalfNormal] } }, pilot, [Whole], Seed)!;
        var detection = plan.PilotCv!.Components.Single(component => component.Source == CvSource.Detection);
        Assert.Equal(0, detection.DegreesOfFreedom);
        Assert.Null(plan.PilotCv.IntervalFactor);
    }

    [Fact]
    public void A_fit_passed_over_at_its_bound_is_told_in_one_sentence_with_what_it_means()
    {
        // 30 even distances that end at 69 m of 100, as nobody sees but as a note-taker may stop.
        var pilot = new PilotTable(
            false,
            [.. Enumerable.Range(0, 6).Select(k => new PilotTransect("", $"{k}", 2, 5))],
            [.. Enumerable.Range(0, 30).Select(i => new PilotDetection($"{i % 6}", 2.3 * (i + 1), 1))]);
        var plan = EffortPlanning.For(Target, pilot, [Whole], Seed)!;
        var fits = plan.Pilot!.Detection!;
        Assert.Equal(FitStatus.OnBound, fits.Fits.MinBy(fit => fit.Aic)!.Status);
        Assert.Contains(plan.Advice, advice => advice.Message.Contains("bound", StringComparison.Ordinal) && advice.Message.Contains("cut off at", StringComparison.Ordinal));
    }

    [Fact]
    public void Strata_of_the_other_kind_are_left_out_and_named()
    {
        var plan = EffortPlanning.For(Target, Pilot([3, 5, 2]), [Whole, Whole with { Name = "hut", IsPoints = true }], Seed)!;
        Assert.Equal("all", Assert.Single(plan.Strata).Name);
        Assert.Contains(plan.Advice, advice => advice.Message.Contains("'hut' is left out", StringComparison.Ordinal));
    }

    [Fact]
    public void A_stratum_where_nothing_was_seen_has_no_cv_of_its_own()
    {
        var pilot = new PilotTable(
            false, [new("a", "1", 2, 3), new("a", "2", 2, 5), new("b", "3", 2, 0), new("b", "4", 2, 0)], []);
        var plan = EffortPlanning.For(Target, pilot, [Whole with { Name = "a" }, Whole with { Name = "b" }], Seed)!;
        Assert.Null(plan.Strata[1].Cv);
        Assert.Null(plan.Strata[1].EffortForOwnTarget);
        Assert.Contains(plan.Advice, advice => advice.Message.Contains("saw nothing in stratum 'b'", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData(0, "from 0.001 to 1")]
    [InlineData(-0.1, "from 0.001 to 1")]
    [InlineData(15, "15 % is 0.15")]
    [InlineData(150, "from 0.001 to 1")]
    [InlineData(double.NaN, "from 0.001 to 1")]
    public void Impossible_targets_are_refused(double target, string says)
        => Assert.Contains(says, Refused(Target with { TargetCv = target, GivenEncounterRate = 1 }).Single().Message, StringComparison.Ordinal);

    [Fact]
    public void Every_problem_of_the_design_is_told_at_once()
    {
        var design = Target with
        {
            TargetCv = 0,
            Assurance = 1,
            B = -1,
            MinLines = 0,
            GivenEncounterRate = double.PositiveInfinity,
            ClusterSize = new GivenClusterSize(0.5, 1),
            CostPerUnit = ImmutableSortedDictionary<string, double>.Empty.Add("elsewhere", -3),
        };
        Assert.Equal(8, Refused(design).Count);
    }

    [Fact]
    public void A_target_without_any_encounter_rate_is_refused()
        => Assert.Equal("precision.target_cv", Refused(Target).Single().Key);

    [Fact]
    public void A_pilot_of_lines_does_not_size_points()
    {
        var problems = Assert.Throws<InputException>(
            () => EffortPlanning.For(Target, Pilot([1, 2]), [Whole with { IsPoints = true }], Seed)).Problems;
        Assert.Contains("give a pilot of points", Assert.Single(problems).Message, StringComparison.Ordinal);
    }

    /// <summary>
    /// Law: whatever the pilot, either a problem is told or every figure is finite (the serializer refuses NaN and infinity).
    /// </summary>
    [Fact]
    public void No_figure_is_ever_NaN_or_infinite()
        => Gen.Select(
            Gen.Select(Gen.OneOf(Gen.Const("a"), Gen.Const("b"), Gen.Const("c")), Gen.Int[0, 4], Gen.Int[0, 130], Gen.Int[1, 3]).Array[1, 7],
            Gen.Bool,
            Gen.Bool,
            Gen.Enum<Allocation>(),
            Gen.Int[0, 2].Select(choice => choice == 0 ? null : (double?)(choice == 1 ? 0.05 : 0.4))).Hold(
            40,
            seed: 1,
            drawn =>
            {
                var (rows, withDistances, byStratum, allocation, givenCv) = drawn;
                var transects = rows.Select((row, i) => new PilotTransect(row.Item1, $"{i}", row.Item4, row.Item2)).ToImmutableArray();
                var detections = transects.SelectMany((transect, i) => Enumerable.Range(0, transect.Count)
                    .Select(k => new PilotDetection(transect.Id, (rows[i].Item3 + (7 * k)) % 130, 1 + ((i + k) % 3))));
                var design = new EffortDesign(
                    0.2, 0.8, null, null, null, allocation, DetectionDesign.None with { GivenCv = givenCv, ByStratum = byStratum, Models = byStratum ? [DetectionModel.HalfNormal] : [] }, null,
                    ImmutableSortedDictionary<string, double>.Empty);
                try
                {
                    var strata = new[] { "a", "b", "d" }.Select((name, i) => Whole with { Name = name, AreaKm2 = 10 + (50 * i) });
                    var plan = EffortPlanning.For(
                        design, new PilotTable(false, transects, withDistances ? [.. detections] : []), [.. strata, Whole with { Name = "c", IsPoints = true }], Seed);
                    JsonSerializer.Serialize(plan);
                }
                catch (InputException refused)
                {
                    Assert.NotEmpty(refused.Problems);
                }
            });

    private static IReadOnlyList<Problem> Refused(EffortDesign design)
        => Assert.Throws<InputException>(() => EffortPlanning.For(design, null, [Whole], Seed)).Problems;

    /// <summary>Lines of 2 km without stratum names.</summary>
    private static PilotTable Pilot(int[] counts)
        => new(false, [.. counts.Select((count, i) => new PilotTransect("", $"T{i}", 2, count))], []);
}
