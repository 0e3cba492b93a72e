using System.Collections.Immutable;
using SurveyPlanner.Effort;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Benchmarks.Effort;

/// <summary>A pilot whose truth is known.</summary>
/// <param name="Transects">Lines, 2 km each.</param>
/// <param name="DetectionsPerTransect">Detections expected on each.</param>
/// <param name="Dispersion">Variance-to-mean ratio of counts: Poisson at 1, negative binomial above.</param>
/// <param name="Clusters">Whether animals come in clusters of 1 + Poisson(2).</param>
/// <param name="Estimator">Variance estimator used.</param>
internal sealed record PilotTruth(
    int Transects,
    double DetectionsPerTransect,
    double Dispersion,
    bool Clusters = false,
    EncounterRateEstimator Estimator = EncounterRateEstimator.RandomLines)
{
    private const double LineKm = 2;
    private const double SigmaMetres = 40;
    private const double TruncationMetres = 100;
    private const double TargetCv = 0.2;

    /// <summary>The effort that the truth asks for: (c + detection part + cluster part) / rate / cv².</summary>
    public double RequiredKm
    {
        get
        {
            var (mean, variance) = HalfNormalFit.Moments(SigmaMetres, TruncationMetres, false);
            var clusters = Clusters ? 2.0 / 9 : 0;
            return (Dispersion + (mean * mean / variance) + clusters) / (DetectionsPerTransect / LineKm) / (TargetCv * TargetCv);
        }
    }

    /// <summary>A pilot drawn from the truth; null when it has fewer than two detections, with which nobody plans.</summary>
    public PilotTable? Draw(ulong seed, uint scenario, uint replicate)
    {
        var random = new PhiloxStream(seed, 1002, scenario, replicate);
        var function = new HalfNormalDetection(SigmaMetres);
        var transects = ImmutableArray.CreateBuilder<PilotTransect>();
        var detections = ImmutableArray.CreateBuilder<PilotDetection>();
        for (var k = 0; k < Transects; k++)
        {
            var id = $"T{k}";
            var count = random.NextCount(DetectionsPerTransect, Dispersion);
            transects.Add(new PilotTransect("", id, LineKm, count));
            for (var i = 0; i < count; i++)
            {
                var distance = random.NextDistance(function.ProbabilityAt, TruncationMetres, false);
                detections.Add(new PilotDetection(id, distance, Clusters ? 1 + random.NextPoisson(2) : 1));
            }
        }

        return detections.Count < 2 ? null : new PilotTable(false, transects.ToImmutable(), detections.ToImmutable());
    }

    public EffortPlan Plan(PilotTable pilot, double assurance, ulong seed, params ImmutableArray<DetectionModel> models)
        => EffortPlanning.For(
            EffortDesign.None with
            {
                TargetCv = TargetCv,
                Assurance = assurance,
                Estimator = Estimator,
                Detection = DetectionDesign.None with { Models = models },
            },
            pilot,
            [new EffortStratum("all", 400, false, TruncationMetres, true)],
            seed)!;
}

/// <summary>
/// How often the interval of the required effort holds the truth, and the effort assured at 0.8 is enough, over 2,000 simulated pilots
/// a row, seed 20270602. Its rows with a single estimator and no clusters are the table in <see cref="MeasuredReliability"/>.
/// </summary>
internal static class PilotIntervalStudy
{
    private const ulong Seed = 20270602;

    public static void Run(TextWriter output, int pilots)
    {
        output.WriteLine("lines\tper line\tdispersion\tclusters\testimator\tpilots\tcoverage\tabove\tbelow\tassured\tdelta coverage\twidth");
        var truths = new List<PilotTruth>();
        foreach (var lines in new[] { 5, 10, 20, 40 })
        {
            foreach (var perLine in new[] { 1.0, 3, 10 })
            {
                truths.AddRange(new[] { 1.0, 2, 4 }.Select(dispersion => new PilotTruth(lines, perLine, dispersion)));
            }
        }

        truths.AddRange(truths.Where(truth => truth.DetectionsPerTransect == 3).ToList().SelectMany(truth => new[]
        {
            truth with { Clusters = true }, truth with { Estimator = EncounterRateEstimator.OverlappingPairs },
        }));
        for (var i = 0; i < truths.Count; i++)
        {
            output.WriteLine(Row(truths[i], pilots, (uint)i));
            output.Flush();
        }
    }

    private static string Row(PilotTruth truth, int pilots, uint scenario)
    {
        var results = Enumerable.Range(0, pilots)
            .AsParallel()
            .AsOrdered()
            .Select(i => truth.Draw(Seed, scenario, (uint)i) is { } pilot
                ? truth.Plan(pilot, 0.8, Seed + (ulong)i, DetectionModel.HalfNormal).Required
                : null)
            .Where(required => required is not null)
            .Select(required => required!)
            .ToList();
        var true_ = truth.RequiredKm;
        double Share(Func<RequiredEffort, bool> holds) => 100.0 * results.Count(holds) / results.Count;
        return FormattableString.Invariant(
            $"{truth.Transects}\t{truth.DetectionsPerTransect}\t{truth.Dispersion}\t{truth.Clusters}\t{truth.Estimator}\t{results.Count}\t{Share(r => r.Interval!.Lower <= true_ && true_ <= r.Interval.Upper):0.0}\t{Share(r => r.Interval!.Lower > true_):0.0}\t{Share(r => r.Interval!.Upper < true_):0.0}\t{Share(r => r.AssuredEffort >= true_):0.0}\t{Share(r => r.DeltaInterval!.Lower <= true_ && true_ <= r.DeltaInterval.Upper):0.0}\t{results.Average(r => Math.Log(r.Interval!.Upper / r.Interval.Lower)):0.00}");
    }
}
