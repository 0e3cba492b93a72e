using System.Collections.Immutable;
using SurveyPlanner.Effort;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Simulated;

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
