using System.Collections.Immutable;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Effort;

/// <summary>
/// The delta method beside the draws: variance of the logarithm of the required effort from the variances of the logarithms of rates,
/// dispersions, detection and cluster parts, with numerical derivatives; a normal interval on the logarithmic scale.
/// </summary>
internal static class EffortDelta
{
    /// <summary>Step of the derivatives in logarithms: error about 1e-6, far below what matters here.</summary>
    private const double Step = 1e-3;

    /// <summary>Least and greatest factor on the required effort at 95 %.</summary>
    /// <param name="basis">The basis.</param>
    /// <param name="model">The basis' model with effort shared as it will be.</param>
    public static EffortInterval Factors(EffortBasis basis, EffortModel model)
    {
        var variance = 0.0;
        for (var i = 0; i < basis.Sources.Length; i++)
        {
            var source = basis.Sources[i];
            if (source.Count is not > 0)
            {
                continue;
            }

            var ofSource = i;
            variance += Squared(factor => Changed(ofSource, stratum => stratum with { Rate = stratum.Rate * factor })) * source.Dispersion / source.Count.Value;
            if (source.EffectiveDegreesOfFreedom is { } df)
            {
                variance += Squared(factor => Changed(ofSource, stratum => stratum with { Dispersion = stratum.Dispersion * factor })) * 2 / df;
            }
        }

        variance += Squared(factor => model with { ClusterPart = model.ClusterPart * factor }) * (basis.ClusterSize?.LogVariance ?? 0);
        variance += Squared(factor => model with { DetectionPart = model.DetectionPart * factor }) * LogVariance(basis.Detection.Pooled?.Draws ?? []);
        for (var h = 0; h < basis.Detection.Own.Length; h++)
        {
            var ofStratum = h;
            variance += Squared(factor => OwnChanged(ofStratum, factor)) * LogVariance(basis.Detection.Own[h].Draws);
        }

        var most = Math.Exp(StudentQuantile.At(0.975, null) * Math.Sqrt(variance));
        return new EffortInterval(1 / most, most);

        double Squared(Func<double, EffortModel> changed)
            => Math.Pow((Math.Log(changed(Math.Exp(Step)).UnitCv2) - Math.Log(changed(Math.Exp(-Step)).UnitCv2)) / (2 * Step), 2);

        EffortModel OwnChanged(int stratum, double factor)
            => model with { Strata = model.Strata.SetItem(stratum, model.Strata[stratum] with { OwnDetectionPart = model.Strata[stratum].OwnDetectionPart * factor }) };

        EffortModel Changed(int source, Func<StratumModel, StratumModel> change)
            => model with { Strata = [.. model.Strata.Select((stratum, h) => basis.SourceOf[h] == source ? change(stratum) : stratum)] };
    }

    private static double LogVariance(ImmutableArray<double> parts)
    {
        if (parts.Length < 2)
        {
            return 0;
        }

        var mean = parts.Average(Math.Log);
        return parts.Sum(part => Math.Pow(Math.Log(part) - mean, 2)) / (parts.Length - 1);
    }
}
