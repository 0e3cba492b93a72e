using System.Collections.Immutable;
using System.Diagnostics;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Benchmarks.Effort;

/// <summary>
/// Fits to simulated distances with known truth: bias of the effective half-width (points: squared effective radius), its real spread
/// against the stated one (of fits that have one), how fits end, and time. 1,000 data sets each of 20, 60 and 200 distances, seed 20270601. Then
/// uniform-cosine with one term, with two, and with the better by AIC, on distances with and without a second term.
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

    public static void RunTerms(TextWriter output)
    {
        const double w = 100;
        output.WriteLine("layout\ttruth\tn\tone: mean/true\trms error\ttwo: mean/true\trms error\tAIC: mean/true\trms error\ttwo chosen");
        uint scenario = 1000;
        foreach (var isPoints in new[] { false, true })
        {
            foreach (var truth in new UniformCosineDetection[] { new(w, [0.8]), new(w, [0.9, 0.15]), new(w, [1.1, 0.2]) })
            {
                foreach (var n in new[] { 20, 60, 200, 600 })
                {
                    output.WriteLine(TermsRow(truth, w, isPoints, n, scenario++));
                }
            }
        }
    }

    private static string TermsRow(UniformCosineDetection truth, double w, bool isPoints, int n, uint scenario)
    {
        var samples = Enumerable.Range(0, DataSets).Select(i => new DistanceSample(Distances(truth, w, isPoints, n, scenario, (uint)i), w, isPoints)).ToList();
        var chosen = samples.Select(sample => UniformCosineFit.Fit(sample)).ToList();
        var cells = new[] { samples.Select(sample => UniformCosineFit.Fit(sample, 1)), samples.Select(sample => UniformCosineFit.Fit(sample, 2)), chosen }
            .Select(fits => fits.Select(fit => fit.Function!.Effective(w, isPoints) / truth.Effective(w, isPoints)).ToList())
            .Select(ratios => FormattableString.Invariant($"{ratios.Average():0.000}\t{Math.Sqrt(ratios.Average(ratio => (ratio - 1) * (ratio - 1))):0.000}"));
        var coefficients = string.Join(", ", truth.Coefficients.Select(a => a.ToString(System.Globalization.CultureInfo.InvariantCulture)));
        return $"{(isPoints ? "points" : "lines")}\t{coefficients}\t{n}\t{string.Join('\t', cells)}\t{chosen.Count(fit => fit.Parameters.Length == 2)}";
    }

    private static string Row(DetectionFunction truth, double w, bool isPoints, int n, uint scenario)
    {
        var samples = Enumerable.Range(0, DataSets).Select(i => Distances(truth, w, isPoints, n, scenario, (uint)i)).ToList();
        DetectionFitting.FitOne(truth.Model, new DistanceSample(samples[0], w, isPoints));
        var watch = Stopwatch.StartNew();
        var fits = samples.Select(sample => DetectionFitting.FitOne(truth.Model, new DistanceSample(sample, w, isPoints))).ToList();
        var microseconds = watch.Elapsed.TotalMicroseconds / DataSets;
        var good = fits.Where(fit => fit.Status != FitStatus.NotConverged).ToList();
        var (mean, sd) = Spread(good, truth, w, isPoints);
        var withCv = good.Where(fit => fit.EffectiveCv is not null).ToList();
        var stated = withCv.Average(fit => fit.EffectiveCv!.Value);
        return FormattableString.Invariant(
            $"{(isPoints ? "points" : "lines")}\t{truth.Model}({string.Join(", ", truth.Parameters.Select(p => p.Value))})\t{n}\t{mean:0.0000}\t{sd / Math.Sqrt(good.Count):0.0000}\t{Spread(withCv, truth, w, isPoints).Sd / stated:0.00}\t{good.Count(fit => fit.Status == FitStatus.OnBound)}\t{good.Count - withCv.Count}\t{DataSets - good.Count}\t{microseconds:0}");
    }

    private static (double Mean, double Sd) Spread(List<DetectionFit> fits, DetectionFunction truth, double w, bool isPoints)
    {
        var ratios = fits.Select(fit => fit.Function!.Effective(w, isPoints) / truth.Effective(w, isPoints)).ToList();
        var mean = ratios.Average();
        return (mean, Math.Sqrt(ratios.Sum(ratio => (ratio - mean) * (ratio - mean)) / (ratios.Count - 1)));
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
