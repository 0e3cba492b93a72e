using System.Collections.Immutable;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Benchmarks.Effort;

/// <summary>
/// What detection adds to b when a model is chosen among half-normal, hazard-rate and uniform-cosine: the real n var(ln μ̂) of 1,000 surveys with
/// 150 distances, against what pilots say of it: n cv² of the chosen fit alone, and the bootstrap of the whole choice. Seed 20270605.
/// </summary>
internal static class DetectionPartStudy
{
    private const ulong Seed = 20270605;
    private const double Truncation = 100;
    private const int Surveys = 1000;
    private const int SurveyDistances = 150;
    private const int Pilots = 60;

    private static readonly DetectionModel[] Models = [DetectionModel.HalfNormal, DetectionModel.HazardRate, DetectionModel.UniformCosine];

    public static void Run(TextWriter output)
    {
        DetectionFunction[] truths =
        [
            new HalfNormalDetection(40), new HalfNormalDetection(80), new HazardRateDetection(40, 3), new HazardRateDetection(60, 5),
            new UniformCosineDetection(Truncation, [0.9, 0.15]), new StripDetection(),
        ];
        output.WriteLine("layout\ttruth\treal\tn\tfit alone 10 %\tmedian\t90 %\tgreatest\tbootstrap 10 %\tmedian\t90 %\tgreatest\ton bound");
        uint scenario = 0;
        foreach (var isPoints in new[] { false, true })
        {
            foreach (var truth in truths)
            {
                var real = Real(truth, isPoints, scenario++);
                foreach (var n in new[] { 20, 60, 150 })
                {
                    output.WriteLine(Row(truth, isPoints, real, n, scenario++));
                    output.Flush();
                }
            }
        }
    }

    /// <summary>n var(ln μ̂) of surveys that choose among the models.</summary>
    public static double Real(DetectionFunction truth, bool isPoints, uint scenario)
    {
        var logs = Enumerable.Range(0, Surveys).AsParallel().AsOrdered()
            .Select(i => Math.Log(Fits(truth, isPoints, SurveyDistances, scenario, (uint)i).Chosen!.Function!.Effective(Truncation, isPoints)))
            .ToList();
        var mean = logs.Average();
        return SurveyDistances * logs.Sum(log => (log - mean) * (log - mean)) / (Surveys - 1);
    }

    private static string Row(DetectionFunction truth, bool isPoints, double real, int n, uint scenario)
    {
        var pilots = Enumerable.Range(0, Pilots).Select(i => Fits(truth, isPoints, n, scenario, (uint)i)).ToList();
        var alone = pilots.Select(fits => fits.Chosen!.RelativeVariance).OfType<double>().Order().ToList();
        var bootstrap = pilots.Select(fits => DetectionBootstrap.Of(fits).Part).OfType<double>().Order().ToList();
        var name = $"{truth.Model}({string.Join(", ", truth.Parameters.Select(p => p.Value.ToString(System.Globalization.CultureInfo.InvariantCulture)))})";
        return FormattableString.Invariant(
            $"{(isPoints ? "points" : "lines")}\t{name}\t{real:0.00}\t{n}\t{Quantiles(alone)}\t{Quantiles(bootstrap)}\t{pilots.Count(fits => fits.Chosen!.Status == FitStatus.OnBound)}");
    }

    private static string Quantiles(List<double> sorted)
    {
        double At(double share) => sorted[(int)(share * (sorted.Count - 1))];
        return FormattableString.Invariant($"{At(0.1):0.00}\t{At(0.5):0.00}\t{At(0.9):0.00}\t{sorted[^1]:0.0}");
    }

    private static DetectionFits Fits(DetectionFunction truth, bool isPoints, int n, uint scenario, uint replicate)
    {
        var random = new PhiloxStream(Seed, 1003, scenario, replicate);
        var distances = ImmutableArray.CreateBuilder<double>(n);
        for (var i = 0; i < n; i++)
        {
            distances.Add(random.NextDistance(truth.ProbabilityAt, Truncation, isPoints));
        }

        return DetectionFitting.Fit(distances.ToImmutable(), Truncation, isPoints, Models);
    }
}
