using System.Collections.Immutable;
using CsCheck;
using SurveyPlanner.Effort;
using SurveyPlanner.Pilots;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Tests.Effort;

public class AllocationOptionTests
{
    private static readonly EffortStratum[] Strata =
        [new("bay", 100, false, 100, true), new("shelf", 250, false, 100, true), new("deep", 900, false, 100, true)];

    private static readonly PilotTable Pilot = new(
        false,
        [
            .. Lines("bay", [9, 14, 11, 6]), .. Lines("shelf", [4, 1, 7, 3]), .. Lines("deep", [1, 0, 2, 1]),
        ],
        []);

    /// <summary>
    /// Law: no shift of cost between two strata of the optimal shares buys a smaller variance. Strata, dispersions, rates, costs and pooled
    /// detection part at random.
    /// </summary>
    [Fact]
    public void Nothing_bought_at_the_same_cost_beats_the_optimal_shares()
        => Gen.Select(
            Gen.Select(Gen.Double[0.05, 1], Gen.Double[0.1, 20], Gen.Double[0.5, 6], Gen.Double[0.2, 5]).Array[2, 5],
            Gen.Double[0, 3]).Hold(
            200,
            seed: 1,
            drawn =>
            {
                var (rows, detectionPart) = drawn;
                var area = rows.Sum(row => row.Item1);
                var model = new EffortModel(
                    false,
                    [.. rows.Select((row, i) => new StratumModel($"{i}", row.Item1 / area, row.Item2, row.Item3, null, 0, null, null))],
                    detectionPart, null, null, null, false);
                var costs = rows.Select((row, i) => ($"{i}", row.Item4)).ToDictionary(pair => pair.Item1, pair => pair.Item2);
                var best = Efforts(model, costs);
                var least = Variance(model, best);
                Assert.All(Enumerable.Range(0, rows.Length - 1), i => Assert.All(new[] { -0.01, 0.01 }, shift =>
                {
                    var money = shift * Math.Min(best[i] * rows[i].Item4, best[i + 1] * rows[i + 1].Item4);
                    var moved = best.SetItem(i, best[i] + (money / rows[i].Item4)).SetItem(i + 1, best[i + 1] - (money / rows[i + 1].Item4));
                    Assert.True(Variance(model, moved) >= least * (1 - 1e-12));
                }));
            });

    [Fact]
    public void All_ways_stand_side_by_side_and_each_reaches_the_target()
    {
        var costs = ImmutableSortedDictionary<string, double>.Empty.Add("bay", 40).Add("shelf", 60).Add("deep", 110);
        var plan = EffortPlanning.For(
            EffortDesign.None with { TargetCv = 0.15, CostPerUnit = costs, Allocation = Allocation.Equal, MinLines = 3 }, Pilot, Strata, 5)!;
        Assert.Equal(Enum.GetValues<Allocation>(), plan.Allocations.Select(option => option.Allocation));
        Assert.All(plan.Allocations, option => Assert.True(option.Precision.Cv <= 0.15 + 1e-12));
        Assert.All(plan.Allocations, option => Assert.All(option.Strata, stratum => Assert.True(stratum.Transects >= 3)));
        var optimal = plan.Allocations.Single(option => option.Allocation == Allocation.Optimal);
        Assert.All(plan.Allocations, option => Assert.True(optimal.Cost <= option.Cost + (2 * 3 * 110)));

        // The plan's own figures are those of the way asked for.
        var equal = plan.Allocations.Single(option => option.Allocation == Allocation.Equal);
        Assert.Equal(equal.Strata.Select(stratum => (double?)stratum.Effort), plan.Strata.Select(stratum => stratum.Effort));
        Assert.Equal(equal.RequiredEffort, plan.Required!.Effort, 1e-9);
    }

    [Fact]
    public void The_least_number_of_lines_holds_in_every_stratum()
    {
        var plan = EffortPlanning.For(EffortDesign.None with { TargetCv = 0.5, MinLines = 12 }, Pilot, Strata, 5)!;
        Assert.All(plan.Strata, stratum => Assert.True(stratum.Transects >= 12));
        Assert.All(plan.Strata, stratum => Assert.Equal(stratum.Transects * 2.0, stratum.Effort));
    }

    /// <summary>Under proportional allocation the strata's own parts of b add up weighted by their detections.</summary>
    [Fact]
    public void Detection_by_stratum_gives_each_stratum_its_own_fit()
    {
        // Squares of even figures fall off with distance.
        var distances = Pilot.Transects.SelectMany(transect => Enumerable.Range(0, transect.Count)
            .Select(i => new PilotDetection(transect.Id, Math.Pow(((17 * i) + (transect.Effort * 7) + (transect.Id.Length * 11)) % 97, 2) / 97, 1)));
        var pilot = Pilot with { Detections = [.. distances] };
        var design = EffortDesign.None with { TargetCv = 0.15, Detection = DetectionDesign.None with { Models = [DetectionModel.HalfNormal] } };
        var apart = EffortPlanning.For(design with { Detection = design.Detection with { ByStratum = true } }, pilot, Strata, 5)!;
        Assert.All(apart.Pilot!.Strata, stratum => Assert.NotNull(stratum.Detection!.Chosen));
        var weights = apart.Strata.Select(stratum => stratum.Share * stratum.EncounterRate).ToList();
        var parts = apart.Pilot.Strata.Select(stratum => stratum.Detection!.Chosen!.RelativeVariance!.Value);
        Assert.Equal(parts.Zip(weights, (part, weight) => part * weight).Sum() / weights.Sum(), apart.B.DetectionPart!.Value, 1e-12);
        Assert.Null(apart.Model.DetectionPart);
        Assert.Equal(0.15, apart.CvAt(apart.Required!.Effort)!.Cv, 1e-12);
    }

    private static ImmutableArray<double> Efforts(EffortModel model, Dictionary<string, double> costs)
        => [.. EffortShares.Of(model, Allocation.Optimal, costs).Select(share => 100 * share)];

    private static double Variance(EffortModel model, ImmutableArray<double> efforts)
        => model.WithShares([.. efforts.Select(effort => effort / efforts.Sum())]).UnitCv2 / efforts.Sum();

    private static IEnumerable<PilotTransect> Lines(string stratum, int[] counts)
        => counts.Select((count, i) => new PilotTransect(stratum, $"{stratum}{i}", 2, count));
}
