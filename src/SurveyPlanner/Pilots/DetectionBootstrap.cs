using System.Collections.Immutable;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Pilots;

/// <summary>Parametric bootstrap of a detection fit: distances are drawn from the fitted function and the same model is fitted again.</summary>
internal static class DetectionBootstrap
{
    /// <summary>Most distances drawn for a replicate; with more the spread is smaller than shown, which matters to nobody.</summary>
    private const int MostDistances = 1000;

    /// <summary>
    /// n cv² of detection as the pilot leaves it open: the estimate times estimate over replicate, so that a replicate below the estimate
    /// stands for a truth above it. Replicates whose fit has no cv are left out; empty when all are.
    /// </summary>
    public static ImmutableArray<double> RelativeVariances(
        DetectionFit fit, double truncation, bool isPoints, int replicates, ulong seed, uint stratum)
    {
        if (fit.RelativeVariance is not { } estimate || fit.Parameters.IsEmpty)
        {
            return [];
        }

        var values = ImmutableArray.CreateBuilder<double>(replicates);
        for (uint replicate = 0; replicate < replicates; replicate++)
        {
            var random = new PhiloxStream(seed, RandomPurpose.Bootstrap, stratum, replicate);
            var distances = ImmutableArray.CreateBuilder<double>();
            for (var i = 0; i < Math.Min(fit.Detections, MostDistances); i++)
            {
                distances.Add(random.NextDistance(fit.Function!.ProbabilityAt, truncation, isPoints));
            }

            var again = DetectionFitting.FitOne(fit.Model, new DistanceSample(distances.ToImmutable(), truncation, isPoints));
            if (again.RelativeVariance is { } value && value > 0 && double.IsFinite(value))
            {
                values.Add(estimate * estimate / value);
            }
        }

        return values.ToImmutable();
    }
}
