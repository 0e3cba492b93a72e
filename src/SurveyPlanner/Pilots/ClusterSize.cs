using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>
/// Cluster size as estimated or given. Assumption: size does not change the chance of being seen; where it does, the mean is too large.
/// </summary>
/// <param name="Mean">Mean number of animals in a cluster.</param>
/// <param name="StandardDeviation">Standard deviation of size among clusters.</param>
/// <param name="Detections">Number of clusters it was estimated from; null where the figures were given.</param>
public sealed record ClusterSize(double Mean, double StandardDeviation, int? Detections)
{
    /// <summary>(sd / mean)²: what cluster size adds to b.</summary>
    public double RelativeVariance => Math.Pow(StandardDeviation / Mean, 2);

    /// <summary>Variance of the logarithm of <see cref="RelativeVariance"/> as estimated (delta method, from the sample itself); 0 where given.</summary>
    internal double LogVariance { get; init; }

    /// <summary>From detections; null with fewer than two, or when all sizes are 1 and there are no clusters to speak of.</summary>
    public static ClusterSize? Of(ImmutableArray<PilotDetection> detections)
    {
        if (detections.Length < 2 || detections.All(detection => detection.Size == 1))
        {
            return null;
        }

        var mean = detections.Average(detection => (double)detection.Size);
        var squares = detections.Sum(detection => Math.Pow(detection.Size - mean, 2));
        var variance = squares / (detections.Length - 1);

        if (variance == 0)
        {
            return new ClusterSize(mean, 0, detections.Length);
        }

        // What each detection moves ln(variance / mean²) by, its influence.
        var influences = detections.Sum(detection => Math.Pow(
            (Math.Pow(detection.Size - mean, 2) / variance) - 1 - (2 * (detection.Size - mean) / mean), 2));
        return new ClusterSize(mean, Math.Sqrt(variance), detections.Length) { LogVariance = influences / Math.Pow(detections.Length, 2) };
    }
}
