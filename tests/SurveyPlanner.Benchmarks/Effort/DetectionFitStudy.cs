using System.Collections.Immutable;
using System.Diagnostics;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Benchmarks.Effort;

/// <summary>
/// Fits to simulated distances with known truth: bias of the effective half-width (points: squared effective radius), its real spread
/// against the stated one, how fits end, and time. 1,000 data sets each of 20, 60 and 200 distances, seed 20270601.
/// </summary>
internal static class DetectionFitStudy
{
    private const ulong Seed = 20270601;
    private const int DataSets = 1000;

    public static void Run(TextWriter output)
    {
        const double w = 100;
        DetectionFunction[] truths =
        [
            new HalfNormalDetection(40), new HazardRateDetection(40, 3), new UniformCosineDetection(w, [0.8]), new UniformCosineDetection(w, [0.9, 0.15]),
        ];
        output.WriteLine("layout\ttruth\tn\tmean/true\ts.e.\tsd/stated\ton bound\tno cv\tfailed\tmicroseconds");
        uint scenario = 0;
        foreach (var isPoints in new[] { false, true })
        {
            foreach (var truth in truths)
            {
                foreach (var n in new[] { 20, 60, 200 })
                {
                    output.WriteLine(Row(truth, w, isPoints, n, scenario++));
                }
            }
        }
    }

    private static string Row(DetectionFunction truth, double w, bool isPoints, int n, uint scenario)
    {
        var samples = Enumerable.Range(0, DataSets).Select(i => Distances(truth, w, isPoints, n, scenario, (uint)i)).ToList();
        DetectionFitting.FitOne(truth.Model, new DistanceSample(samples[0], w, isPoints));
        var watch = Stopwatch.StartNew();
        var fits = samples.Select(sample => DetectionFitting.FitOne(truth.Model, new DistanceSample(sample, w, isPoints))).ToList();
        var microseconds = watch.Elapsed.TotalMicroseconds / DataSets;
        var good = fits.Where(fit => fit.Status != FitStatus.NotConverged).ToList();
        var ratios = good.Select(fit => fit.Function!.Effective(w, isPoints) / truth.Effective(w, isPoints)).ToList();
        var mean = ratios.Average();
        var sd = Math.Sqrt(ratios.Sum(ratio => (ratio - mean) * (ratio - mean)) / (ratios.Count - 1));
        var stated = good.Where(fit => fit.EffectiveCv is not null).Average(fit => fit.EffectiveCv!.Value);
        return FormattableString.Invariant(
            $"{(isPoints ? "points" : "lines")}\t{truth.Model}({string.Join(", ", truth.Parameters.Select(p => p.Value))})\t{n}\t{mean:0.0000}\t{sd / Math.Sqrt(good.Count):0.0000}\t{sd / stated:0.00}\t{good.Count(fit => fit.Status == FitStatus.OnBound)}\t{good.Count(fit => fit.EffectiveCv is null)}\t{DataSets - good.Count}\t{microseconds:0}");
    }

    private static ImmutableArray<double> Distances(DetectionFunction truth, double w, bool isPoints, int n, uint scenario, uint replicate)
    {
        var random = new PhiloxStream(Seed, 1001, scenario, replicate);
        var distances = ImmutableArray.CreateBuilder<double>(n);
        for (var i = 0; i < n; i++)
        {
            distances.Add(random.NextDistance(truth.ProbabilityAt, w, isPoints));
        }

        return distances.ToImmutable();
    }
}
