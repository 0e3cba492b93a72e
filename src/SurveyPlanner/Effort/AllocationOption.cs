using System.Collections.Immutable;

namespace SurveyPlanner.Effort;

/// <summary>Effort of one stratum under an allocation.</summary>
/// <param name="Name">The stratum.</param>
/// <param name="Effort">Kilometres of line, or points: whole transects, and at least the least number, where the length of a transect is known.</param>
/// <param name="Transects">Number of lines or points; null when the length of a line is unknown.</param>
/// <param name="Cost">Cost of that effort; null without costs.</param>
public sealed record StratumShare(string Name, double Effort, int? Transects, double? Cost);

/// <summary>One way to share effort among strata: what it costs and what it buys.</summary>
/// <param name="Allocation">Which.</param>
/// <param name="RequiredEffort">Total effort that the target asks for under it (with the stated assurance, where one is), before whole transects.</param>
/// <param name="Strata">The strata, rounded up to whole transects.</param>
/// <param name="Effort">Their total effort.</param>
/// <param name="Cost">Their total cost; null without costs.</param>
/// <param name="Precision">What that delivers, by the estimate.</param>
public sealed record AllocationOption(
    Allocation Allocation, double RequiredEffort, ImmutableArray<StratumShare> Strata, double Effort, double? Cost, EffortPrecision Precision)
{
    /// <summary>More transects than this are not counted one by one.</summary>
    private const int MostTransects = 1_000_000_000;

    internal static AllocationOption Of(EffortModel model, Allocation allocation, double required, EffortDesign design)
    {
        var strata = model.Strata.Select(stratum => Rounded(stratum, required * stratum.Share, design)).ToImmutableArray();
        var total = strata.Sum(stratum => stratum.Effort);
        return new AllocationOption(
            allocation,
            required,
            strata,
            total,
            design.CostPerUnit.IsEmpty ? null : strata.Sum(stratum => stratum.Cost),
            model.WithShares([.. strata.Select(stratum => stratum.Effort / total)]).PrecisionAt(total)!);
    }

    private static StratumShare Rounded(StratumModel stratum, double effort, EffortDesign design)
    {
        var whole = stratum.TransectEffort is { } one ? Math.Max(Whole(effort / one), design.MinLines) : double.PositiveInfinity;
        int? transects = whole <= MostTransects ? (int)whole : null;
        var rounded = transects * stratum.TransectEffort ?? effort;
        return new StratumShare(
            stratum.Name, rounded, transects, design.CostPerUnit.TryGetValue(stratum.Name, out var cost) ? cost * rounded : null);
    }

    /// <summary>Rounded up; the small allowance keeps an exact whole number from being pushed up by rounding error.</summary>
    internal static double Whole(double number) => Math.Ceiling(number - (1e-9 * number));
}
