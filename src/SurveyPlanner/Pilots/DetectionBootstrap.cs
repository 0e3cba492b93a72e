using System.Collections.Immutable;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Pilots;

/// <summary>
/// Parametric bootstrap of detection: distances are drawn from the chosen function, all models are fitted again and one is chosen again. It sees
/// what no single fit's cv contains, the choice of a model (Buckland, Burnham and Augustin 1997, Biometrics 53:603-618, from memory), and it
/// holds where the chosen fit stopped at a bound.
/// </summary>
/// <param name="Part">What detection adds to b: n times the variance of ln μ̂ (points: ln ρ̂²) over the replicates; null when there are too few.</param>
/// <param name="FitParts">n cv² by the fit that each replicate chooses, where that has one: how uncertain such a figure is.</param>
internal sealed record DetectionBootstrap(double? Part, ImmutableArray<double> FitParts)
{
    /// <summary>A variance from so many replicates is known to 6 %.</summary>
    public const int Replicates = 500;

    /// <summary>Enough for the quantiles of <see cref="FitParts"/>, where the fit has a variance of its own.</summary>
    public const int FewReplicates = 200;

    /// <summary>Most distances drawn for a replicate, as many as a survey brings; the part hardly depends on their number.</summary>
    private const int MostDistances = 200;

    /// <summary>The pilot alone decides the draws, so that b does not change with the seed of the layout.</summary>
    private const ulong Seed = 0;

    /// <summary>From the chosen fit, as many replicates as asked for.</summary>
    public static DetectionBootstrap Of(DetectionFits fits, int replicates = Replicates)
    {
        if (fits.Chosen is not { Function: { } function } chosen)
        {
            return new DetectionBootstrap(null, []);
        }

        var models = fits.Fits.Select(fit => fit.Model).ToList();
        var count = Math.Min(chosen.Detections, MostDistances);
        var again = Enumerable.Range(0, replicates)
            .AsParallel()
            .AsOrdered()
            .Select(replicate => DetectionFitting.Fit(Drawn(function, fits, count, (uint)replicate), fits.TruncationMetres, fits.IsPoints, models).Chosen)
            .Where(fit => fit is not null)
            .Select(fit => fit!)
            .ToList();
        return again.Count < replicates / 2
            ? new DetectionBootstrap(null, [])
            : new DetectionBootstrap(
                count * Variance([.. again.Select(fit => Math.Log(fit.Function!.Effective(fits.TruncationMetres, fits.IsPoints)))]),
                [.. again.Select(fit => fit.RelativeVariance).OfType<double>().Where(part => part > 0)]);
    }

    private static ImmutableArray<double> Drawn(DetectionFunction function, DetectionFits fits, int count, uint replicate)
    {
        var random = new PhiloxStream(Seed, RandomPurpose.Bootstrap, 0, replicate);
        var distances = new double[count];
        for (var i = 0; i < count; i++)
        {
            distances[i] = random.NextDistance(function.ProbabilityAt, fits.TruncationMetres, fits.IsPoints);
        }

        return [.. distances];
    }

    private static double Variance(double[] values)
    {
        var mean = values.Average();
        return values.Sum(value => (value - mean) * (value - mean)) / (values.Length - 1);
    }
}
