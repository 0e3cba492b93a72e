using System.Collections.Immutable;

namespace SurveyPlanner.Effort;

/// <summary>
/// How the interval of the required effort and the assured effort did in simulated pilots, where the truth was known.
/// </summary>
/// <param name="Transects">Lines in each simulated pilot.</param>
/// <param name="DetectionsPerTransect">Detections expected on a line.</param>
/// <param name="Dispersion">Variance-to-mean ratio of the counts.</param>
/// <param name="Coverage">Share of pilots whose 95 % interval held the effort that the truth asks for.</param>
/// <param name="Assured">Share of pilots whose effort assured at 0.8 was enough.</param>
public sealed record MeasuredReliability(int Transects, double DetectionsPerTransect, double Dispersion, double Coverage, double Assured)
{
    /// <summary>Simulated pilots behind each figure; its standard error is 0.005 (coverage) to 0.009 (assured).</summary>
    public const int Pilots = 2000;

    /// <summary>
    /// The first 36 rows of the benchmark <c>pilot-intervals</c> (seed 20270602), copied here; docs/methods/effort.md has the whole table.
    /// </summary>
    internal static readonly ImmutableArray<MeasuredReliability> Table =
    [
        new(5, 1, 1, 0.970, 0.879),
        new(5, 1, 2, 0.985, 0.861),
        new(5, 1, 4, 0.988, 0.809),
        new(5, 3, 1, 0.962, 0.836),
        new(5, 3, 2, 0.973, 0.826),
        new(5, 3, 4, 0.983, 0.849),
        new(5, 10, 1, 0.959, 0.815),
        new(5, 10, 2, 0.967, 0.796),
        new(5, 10, 4, 0.975, 0.811),
        new(10, 1, 1, 0.953, 0.837),
        new(10, 1, 2, 0.976, 0.836),
        new(10, 1, 4, 0.979, 0.809),
        new(10, 3, 1, 0.962, 0.814),
        new(10, 3, 2, 0.978, 0.818),
        new(10, 3, 4, 0.979, 0.810),
        new(10, 10, 1, 0.953, 0.806),
        new(10, 10, 2, 0.964, 0.813),
        new(10, 10, 4, 0.970, 0.806),
        new(20, 1, 1, 0.950, 0.831),
        new(20, 1, 2, 0.976, 0.821),
        new(20, 1, 4, 0.979, 0.787),
        new(20, 3, 1, 0.961, 0.822),
        new(20, 3, 2, 0.969, 0.818),
        new(20, 3, 4, 0.979, 0.798),
        new(20, 10, 1, 0.954, 0.803),
        new(20, 10, 2, 0.963, 0.810),
        new(20, 10, 4, 0.969, 0.808),
        new(40, 1, 1, 0.949, 0.809),
        new(40, 1, 2, 0.974, 0.802),
        new(40, 1, 4, 0.969, 0.771),
        new(40, 3, 1, 0.947, 0.802),
        new(40, 3, 2, 0.966, 0.809),
        new(40, 3, 4, 0.973, 0.794),
        new(40, 10, 1, 0.957, 0.803),
        new(40, 10, 2, 0.955, 0.802),
        new(40, 10, 4, 0.955, 0.803),
    ];

    /// <summary>The row nearest to a pilot in the logarithms of transects, detections on each, and dispersion.</summary>
    internal static MeasuredReliability Nearest(int transects, double detectionsPerTransect, double dispersion)
        => Table.MinBy(row =>
            Math.Pow(Math.Log(row.Transects / (double)transects), 2)
            + Math.Pow(Math.Log(row.DetectionsPerTransect / detectionsPerTransect), 2)
            + Math.Pow(Math.Log(row.Dispersion / Math.Max(1, dispersion)), 2))!;
}
