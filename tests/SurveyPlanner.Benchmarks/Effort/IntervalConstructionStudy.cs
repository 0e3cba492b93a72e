using MathNet.Numerics.Distributions;
using SurveyPlanner.Effort;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Benchmarks.Effort;

/// <summary>
/// Ways to build the interval of the required effort, compared on simulated pilots of K lines of unit length: share of 95 % intervals that hold
/// the truth and of 80 % upper limits that are enough. Counts only: the detection part of b is known here, 0.616, which leaves the hard part,
/// the dispersion of few counts. 2,000 pilots a row, 400 replicates a pilot, seed 20270604.
/// </summary>
internal static class IntervalConstructionStudy
{
    private const ulong Seed = 20270604;
    private const int Pilots = 2000;
    private const int Replicates = 400;
    private const double DetectionPart = 0.616;

    private static readonly string[] Names = ["percentile", "basic (log)", "studentised (log)", "delta (log)", "draws, rate by drawn dispersion", "draws"];

    private sealed record Estimate(int Transects, int Count, double Dispersion)
    {
        public double LogEffort => Math.Log((Dispersion + DetectionPart) * Transects / Count);

        public RateSource Source => new((double)Count / Transects, Dispersion, Transects - 1, Count, Transects);

        /// <summary>Standard error of the logarithm by the delta method, the same variances as <see cref="EffortDelta"/> takes.</summary>
        public double LogError
            => Math.Sqrt((Math.Pow(Dispersion / (Dispersion + DetectionPart), 2) * 2 / Source.EffectiveDegreesOfFreedom!.Value) + (Dispersion / Count));
    }

    public static void Run(TextWriter output)
    {
        output.WriteLine("lines\tper line\tdispersion\t" + string.Join('\t', Names));
        uint scenario = 0;
        foreach (var lines in new[] { 5, 10, 20, 40 })
        {
            foreach (var perLine in new[] { 1.0, 3, 10 })
            {
                foreach (var dispersion in new[] { 1.0, 2, 4 })
                {
                    output.WriteLine(Row(lines, perLine, dispersion, scenario++));
                    output.Flush();
                }
            }
        }
    }

    private static string Row(int lines, double perLine, double dispersion, uint scenario)
    {
        var truth = Math.Log((dispersion + DetectionPart) / perLine);
        var limits = Enumerable.Range(0, Pilots)
            .AsParallel()
            .AsOrdered()
            .Select(i => Limits(lines, perLine, dispersion, scenario, (uint)i))
            .Where(all => all is not null)
            .ToList();
        var cells = Names.Select((_, m) =>
        {
            double Share(Func<(double Lower, double Upper, double Assured), bool> holds) => 100.0 * limits.Count(all => holds(all![m])) / limits.Count;
            return FormattableString.Invariant(
                $"{Share(limit => limit.Lower <= truth && truth <= limit.Upper):0.0} / {Share(limit => limit.Assured >= truth):0.0}");
        });
        return FormattableString.Invariant($"{lines}\t{perLine}\t{dispersion}\t") + string.Join('\t', cells);
    }

    private static (double Lower, double Upper, double Assured)[]? Limits(int lines, double perLine, double dispersion, uint scenario, uint replicate)
    {
        var random = new PhiloxStream(Seed, 1005, scenario, replicate);
        if (Draw(ref random, lines, perLine, dispersion) is not { } pilot)
        {
            return null;
        }

        var (boot, studentised, byDrawn, draws) = (new double[Replicates], new double[Replicates], new double[Replicates], new double[Replicates]);
        for (var i = 0; i < Replicates; i++)
        {
            var again = Draw(ref random, lines, (double)pilot.Count / lines, pilot.Dispersion);
            boot[i] = again?.LogEffort ?? double.PositiveInfinity;
            studentised[i] = again is null ? double.PositiveInfinity : (again.LogEffort - pilot.LogEffort) / again.LogError;
            var (rate, drawn) = pilot.Source.Draw(ref random);
            draws[i] = Math.Log((drawn + DetectionPart) / rate);
            byDrawn[i] = Math.Log((drawn + DetectionPart) / (pilot.Source with { Dispersion = drawn, DegreesOfFreedom = null }).Draw(ref random).Rate);
        }

        foreach (var values in new[] { boot, studentised, byDrawn, draws })
        {
            Array.Sort(values);
        }

        var (centre, error) = (pilot.LogEffort, pilot.LogError);
        Func<double, double>[] quantiles =
        [
            p => At(boot, p),
            p => (2 * centre) - At(boot, 1 - p),
            p => centre - (error * At(studentised, 1 - p)),
            p => centre + (error * Normal.InvCDF(0, 1, p)),
            p => At(byDrawn, p),
            p => At(draws, p),
        ];
        return [.. quantiles.Select(quantile => (quantile(0.025), quantile(0.975), quantile(0.8)))];

        static double At(double[] sorted, double p) => sorted[Math.Clamp((int)Math.Round((p * Replicates) - 0.5), 0, Replicates - 1)];
    }

    /// <summary>Null with fewer than two detections; equal counts count as Poisson, as in the program.</summary>
    private static Estimate? Draw(ref PhiloxStream random, int lines, double perLine, double dispersion)
    {
        var counts = new int[lines];
        for (var k = 0; k < lines; k++)
        {
            counts[k] = random.NextCount(perLine, dispersion);
        }

        var total = counts.Sum();
        if (total < 2)
        {
            return null;
        }

        var mean = (double)total / lines;
        var variance = counts.Sum(count => (count - mean) * (count - mean)) / (lines - 1);
        return new Estimate(lines, total, variance > 0 ? variance / mean : 1);
    }
}
