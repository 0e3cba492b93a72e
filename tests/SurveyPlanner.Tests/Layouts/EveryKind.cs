using System.Collections.Immutable;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>One design or more of every kind, sized for strata of some ten kilometres.</summary>
internal static class EveryKind
{
    private const double HalfWidth = 100;

    public static readonly ImmutableSortedDictionary<string, LayoutDesign> Designs = new Dictionary<string, LayoutDesign>
    {
        ["parallel"] = Of(LayoutKind.Parallel, 1500),
        ["parallel plus"] = Of(LayoutKind.Parallel, 1500) with { Edge = EdgeRule.Plus },
        ["zigzag equal-spaced"] = Of(LayoutKind.Zigzag, 1500),
        ["zigzag equal-spaced crossed"] = Of(LayoutKind.Zigzag, 3000) with { Crossed = true },
        ["zigzag equal-angle"] = Of(LayoutKind.Zigzag, 1500) with { Turning = ZigzagTurning.EqualAngle },
        ["zigzag adjusted-angle"] = Of(LayoutKind.Zigzag, 1500) with { Turning = ZigzagTurning.AdjustedAngle },
        ["zigzag adjusted-angle crossed plus"] = Of(LayoutKind.Zigzag, 1500) with
        {
            Turning = ZigzagTurning.AdjustedAngle,
            Crossed = true,
            Edge = EdgeRule.Plus,
        },
        ["zigzag adjusted-angle without short pieces"] = Of(LayoutKind.Zigzag, 1500) with
        {
            Turning = ZigzagTurning.AdjustedAngle,
            MinLengthMetres = 1000,
        },
        ["point-grid square"] = Of(LayoutKind.PointGrid, 1500),
        ["point-grid triangular"] = Of(LayoutKind.PointGrid, 1500) with { Grid = GridShape.Triangular },
    }.ToImmutableSortedDictionary();

    public static TheoryData<string> Names => [.. Designs.Keys];

    public static LayoutDesign Of(LayoutKind kind, double spacing)
        => new(kind, new Sizing.Spacing(spacing), new Bearing.Degrees(90), HalfWidth);

    /// <summary>The kind made ready; null where it does not exist in the stratum and says so.</summary>
    public static LayoutGenerator? TryPrepare(Stratum stratum, LayoutDesign design)
    {
        try
        {
            return LayoutKinds.Prepare(stratum, design);
        }
        catch (InputException refusal) when (refusal.Problems[0].Message.Contains("does not exist", StringComparison.Ordinal))
        {
            return null;
        }
    }

    /// <summary>One realisation at the given offset(s), whatever else is random drawn from the seed.</summary>
    public static Piece[] Draw(LayoutGenerator generator, double offset, ulong seed = 1)
    {
        var (buffer, random) = (new PieceBuffer(), new PhiloxStream(seed, 99, 0, 0));
        var offsets = new double[generator.OffsetRanges.Length];
        Array.Fill(offsets, offset);
        generator.Realise(offsets, ref random, buffer);
        return [.. buffer.Pieces];
    }
}
