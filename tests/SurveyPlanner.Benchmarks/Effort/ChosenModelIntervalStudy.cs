using System.Collections.Immutable;
using System.Globalization;
using SurveyPlanner.Effort;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Benchmarks.Effort;

/// <summary>
/// How often the interval of the required effort holds the truth, and the effort assured at 0.8 is enough, when pilot and survey both choose
/// among half-normal, hazard-rate and uniform-cosine. The truth has the detection part that such surveys really have
/// (<see cref="DetectionPartStudy.Real"/>). 100 pilots a row, 3 detections expected on each transect, target 0.2, seed 20270606.
/// </summary>
internal static class ChosenModelIntervalStudy
{
    private const ulong Seed = 20270606;
    private const double Truncation = 100;
    private const double DetectionsPerTransect = 3;
    private const double Target = 0.2;
    private const int Pilots = 100;

    public static void Run(TextWriter output)
    {
        output.WriteLine("layout\ttruth\ttransects\tdispersion\tpart\tcoverage\tassured\tassured/truth 50 %\t95 %\tgreatest");
        uint scenario = 0;
        foreach (var (function, isPoints) in new (DetectionFunction, bool)[]
        {
            (new HalfNormalDetection(40), false), (new HazardRateDetection(40, 3), false), (new StripDetection(), false), (new HalfNormalDetection(40), true),
        })
        {
            var part = DetectionPartStudy.Real(function, isPoints, 2000 + scenario);
            foreach (var (transects, dispersion) in new[] { (10, 2.0), (40, 1.0) })
            {
                output.WriteLine(Row(function, isPoints, transects, dispersion, part, scenario++));
                output.Flush();
            }
        }
    }

    private static string Row(DetectionFunction function, bool isPoints, int transects, double dispersion, double part, uint scenario)
    {
        var truth = (dispersion + part) / DetectionsPerTransect / (Target * Target);
        var results = Enumerable.Range(0, Pilots)
            .Select(i => Draw(function, isPoints, transects, dispersion, scenario, (uint)i))
            .Select(pilot => Plan(pilot).Required!)
            .ToList();
        var ratios = results.Select(required => required.AssuredEffort!.Value / truth).Order().ToList();
        double Share(Func<RequiredEffort, bool> holds) => 100.0 * results.Count(holds) / results.Count;
        var parameters = string.Join(", ", function.Parameters.Select(p => p.Value.ToString(CultureInfo.InvariantCulture)));
        return FormattableString.Invariant(
            $"{(isPoints ? "points" : "lines")}\t{function.Model}({parameters})\t{transects}\t{dispersion}\t{part:0.00}\t{Share(r => r.Interval!.Lower <= truth && truth <= r.Interval.Upper):0.0}\t{Share(r => r.AssuredEffort >= truth):0.0}\t{ratios[ratios.Count / 2]:0.00}\t{ratios[(int)(0.95 * ratios.Count)]:0.00}\t{ratios[^1]:0.0}");
    }

    private static EffortPlan Plan(PilotTable pilot)
        => EffortPlanning.For(
            EffortDesign.None with { TargetCv = Target, Assurance = 0.8, Estimator = EncounterRateEstimator.RandomLines },
            pilot,
            [new EffortStratum("all", 400, pilot.IsPoints, Truncation, true)],
            Seed)!;

    private static PilotTable Draw(DetectionFunction function, bool isPoints, int transects, double dispersion, uint scenario, uint replicate)
    {
        var random = new PhiloxStream(Seed, 1008, scenario, replicate);
        var table = ImmutableArray.CreateBuilder<PilotTransect>();
        var detections = ImmutableArray.CreateBuilder<PilotDetection>();
        for (var k = 0; k < transects; k++)
        {
            var count = random.NextCount(DetectionsPerTransect, dispersion);
            table.Add(new PilotTransect("", $"T{k}", 1, count));
            for (var i = 0; i < count; i++)
            {
                detections.Add(new PilotDetection($"T{k}", random.NextDistance(function.ProbabilityAt, Truncation, isPoints), 1));
            }
        }

        return new PilotTable(isPoints, table.ToImmutable(), detections.ToImmutable());
    }
}
