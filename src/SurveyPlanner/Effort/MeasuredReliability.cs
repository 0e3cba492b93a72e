using System.Collections.Immutable;

namespace SurveyPlanner.Effort;

/// <summary>
/// How the interval of the required effort and the assured effort did in simulated pilots, where the truth and the detection model were known.
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
        new(5, 1, 1, 0.981, 0.879),
        new(5, 1, 2, 0.985, 0.858),
        new(5, 1, 4, 0.989, 0.797),
        new(5, 3, 1, 0.969, 0.835),
        new(5, 3, 2, 0.976, 0.828),
        new(5, 3, 4, 0.984, 0.851),
        new(5, 10, 1, 0.959, 0.816),
        new(5, 10, 2, 0.967, 0.798),
        new(5, 10, 4, 0.977, 0.812),
        new(10, 1, 1, 0.962, 0.838),
        new(10, 1, 2, 0.984, 0.837),
        new(10, 1, 4, 0.979, 0.807),
        new(10, 3, 1, 0.965, 0.818),
        new(10, 3, 2, 0.978, 0.819),
        new(10, 3, 4, 0.980, 0.812),
        new(10, 10, 1, 0.952, 0.807),
        new(10, 10, 2, 0.963, 0.813),
        new(10, 10, 4, 0.970, 0.806),
        new(20, 1, 1, 0.955, 0.835),
        new(20, 1, 2, 0.977, 0.824),
        new(20, 1, 4, 0.979, 0.791),
        new(20, 3, 1, 0.961, 0.822),
        new(20, 3, 2, 0.969, 0.817),
        new(20, 3, 4, 0.979, 0.799),
        new(20, 10, 1, 0.954, 0.803),
        new(20, 10, 2, 0.963, 0.810),
        new(20, 10, 4, 0.968, 0.809),
        new(40, 1, 1, 0.952, 0.813),
        new(40, 1, 2, 0.974, 0.802),
        new(40, 1, 4, 0.969, 0.772),
        new(40, 3, 1, 0.948, 0.802),
        new(40, 3, 2, 0.966, 0.808),
        new(40, 3, 4, 0.973, 0.794),
        new(40, 10, 1, 0.957, 0.802),
        new(40, 10, 2, 0.955, 0.802),
        new(40, 10, 4, 0.954, 0.803),
    ];

    /// <summary>The row nearest to a pilot in the logarithms of transects, detections on each, and dispersion.</summary>
    internal static MeasuredReliability Nearest(int transects, double detectionsPerTransect, double dispersion)
        => Table.MinBy(row =>
            Math.Pow(Math.Log(row.Transects / (double)transects), 2)
            + Math.Pow(Math.Log(row.DetectionsPerTransect / detectionsPerTransect), 2)
            + Math.Pow(Math.Log(row.Dispersion / Math.Max(1, dispersion)), 2))!;
}
