using System.Collections.Immutable;
using System.Globalization;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Benchmarks.Effort;

/// <summary>
/// Error of ln μ̂ (points: ln ρ̂²) where half-normal, hazard-rate and uniform-cosine are fitted and one is chosen: mean and root mean square over
/// 1,000 data sets each of 20, 60 and 150 distances, seed 20270607.
/// </summary>
internal static class ChosenWidthStudy
{
    private const ulong Seed = 20270607;
    private const double Truncation = 100;
    private const int DataSets = 1000;

    public static void Run(TextWriter output)
    {
        DetectionFunction[] truths =
        [
            new HalfNormalDetection(40), new HalfNormalDetection(80), new HazardRateDetection(40, 3), new HazardRateDetection(60, 5), new HazardRateDetection(30, 1.5),
            new UniformCosineDetection(Truncation, [0.9, 0.15]), new StripDetection(),
        ];
        output.WriteLine("layout\ttruth\tn\tmean\trms\ton bound");
        uint scenario = 0;
        foreach (var isPoints in new[] { false, true })
        {
            foreach (var truth in truths)
            {
                foreach (var n in new[] { 20, 60, 150 })
                {
                    output.WriteLine(Row(truth, isPoints, n, scenario++));
                }
            }
        }
    }

    private static string Row(DetectionFunction truth, bool isPoints, int n, uint scenario)
    {
        DetectionModel[] models = [DetectionModel.HalfNormal, DetectionModel.HazardRate, DetectionModel.UniformCosine];
        var chosen = Enumerable.Range(0, DataSets).AsParallel().AsOrdered()
            .Select(i => DetectionFitting.Fit(Distances(truth, isPoints, n, scenario, (uint)i), Truncation, isPoints, models).Chosen!)
            .ToList();
        var errors = chosen.Select(fit => Math.Log(fit.Function!.Effective(Truncation, isPoints) / truth.Effective(Truncation, isPoints))).ToList();
        var parameters = string.Join(", ", truth.Parameters.Select(p => p.Value.ToString(CultureInfo.InvariantCulture)));
        return FormattableString.Invariant(
            $"{(isPoints ? "points" : "lines")}\t{truth.Model}({parameters})\t{n}\t{errors.Average():0.00}\t{Math.Sqrt(errors.Average(error => error * error)):0.00}\t{chosen.Count(fit => fit.Status == FitStatus.OnBound)}");
    }

    private static ImmutableArray<double> Distances(DetectionFunction truth, bool isPoints, int n, uint scenario, uint replicate)
    {
        var random = new PhiloxStream(Seed, 1010, scenario, replicate);
        var distances = new double[n];
        for (var i = 0; i < n; i++)
        {
            distances[i] = random.NextDistance(truth.ProbabilityAt, Truncation, isPoints);
        }

        return [.. distances];
    }
}
