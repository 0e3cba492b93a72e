using System.Collections.Immutable;
using SurveyPlanner.Numerics;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>
/// The models that the pilot leaves possible, as draws from the confidence distribution of its figures: encounter rates and dispersions by
/// <see cref="RateSource.Draw"/>, detection by parametric bootstrap, cluster size by a chi-square. The required effort under each
/// draw gives the interval and the assured effort (a generalised confidence interval, Weerahandi 1993, from memory). Coverage as measured:
/// docs/methods/effort.md; percentile, basic and studentised bootstraps were tried there and cover worse.
/// </summary>
internal sealed class EffortDraws
{
    public const int Count = 2000;

    private readonly ImmutableArray<EffortModel> _models;

    private EffortDraws(ImmutableArray<EffortModel> models) => _models = models;

    /// <summary>Draws for a basis; null when nothing of it is uncertain.</summary>
    public static EffortDraws? Of(EffortBasis basis, ulong seed)
    {
        if (basis.Sources.All(source => source.Count is null))
        {
            return null;
        }

        return new EffortDraws([.. Enumerable.Range(0, Count).Select(draw => Draw(basis, seed, draw))]);
    }

    /// <summary>
    /// Factors on the required effort, in rising order: what the truth may ask for over what the estimate asks for, effort shared as in the model.
    /// </summary>
    public double[] EffortFactors(EffortModel estimate)
    {
        var shares = estimate.Strata.Select(stratum => stratum.Share).ToList();
        var unit = estimate.UnitCv2;
        return [.. _models.Select(model => model.WithShares(shares).UnitCv2 / unit).Order()];
    }

    private static EffortModel Draw(EffortBasis basis, ulong seed, int draw)
    {
        var rates = basis.Sources
            .Select((source, i) =>
            {
                var random = new PhiloxStream(seed, RandomPurpose.PilotDraw, (uint)i, (uint)draw);
                return source.Draw(ref random);
            })
            .ToArray();
        var size = new PhiloxStream(seed, RandomPurpose.PilotDraw, uint.MaxValue, (uint)draw);
        return basis.Model with
        {
            DetectionPart = Part(basis.Detection.Pooled) ?? basis.Model.DetectionPart,
            ClusterPart = basis.Model.ClusterPart * SizeFactor(basis.ClusterSize, ref size),
            Strata =
            [
                .. basis.Model.Strata.Select((stratum, i) => stratum with
                {
                    Rate = rates[basis.SourceOf[i]].Rate,
                    Dispersion = rates[basis.SourceOf[i]].Dispersion,
                    OwnDetectionPart = (basis.Detection.Own.IsEmpty ? null : Part(basis.Detection.Own[i])) ?? stratum.OwnDetectionPart,
                }),
            ],
        };

        double? Part(DetectionSource? source) => source is { Draws: { IsEmpty: false } draws } ? draws[draw % draws.Length] : null;
    }

    /// <summary>df / χ²(df), the degrees of freedom from the variance of the logarithm.</summary>
    private static double SizeFactor(ClusterSize? size, ref PhiloxStream random)
    {
        if (size is not { LogVariance: > 0 })
        {
            return 1;
        }

        var df = 2 / size.LogVariance;
        return df / random.NextChiSquare(df);
    }
}
