using System.Globalization;

namespace SurveyPlanner.Layouts;

/// <summary>What every kind checks about its size.</summary>
internal static class SizingRules
{
    private const int MaxTransects = 100_000;

    /// <summary>Length across the lines that is covered by any part of the shape: gaps between islands do not count. Metres.</summary>
    public static double CoveredExtent(FrameShape shape)
    {
        var (total, reached) = (0.0, double.NegativeInfinity);
        foreach (var (low, high) in shape.PartRanges.OrderBy(range => range.Low))
        {
            total += Math.Max(0, high - Math.Max(low, reached));
            reached = Math.Max(reached, high);
        }

        return total;
    }

    public static void RefuseTooCoarse(StratumFrame stratum, double spacingMetres)
    {
        if (spacingMetres > stratum.ExtentAcross)
        {
            throw new InputException(new Problem(
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"a spacing of {spacingMetres / 1000:0.###} km is larger than stratum '{stratum.Stratum.Name}', which is {stratum.ExtentAcross / 1000:0.###} km across the lines, so most draws would place no line in it; choose a smaller spacing or another bearing"),
                Key: "layout.spacing"));
        }
    }

    public static void RefuseTooMany(StratumFrame stratum, double transects)
    {
        if (transects > MaxTransects)
        {
            throw new InputException(new Problem(
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"asks for about {transects:0} transects in stratum '{stratum.Stratum.Name}'; the limit is {MaxTransects}; choose a larger spacing (is the unit right?)"),
                Key: "layout.spacing"));
        }
    }

    public static InputException LengthForPoints(StratumFrame stratum) => new(new Problem(
        $"stratum '{stratum.Stratum.Name}' has points, and points have no length; give spacing or points instead", Key: "layout.total_length"));
}
