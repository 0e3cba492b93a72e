using System.Collections.Immutable;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

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
        ["random-parallel"] = Of(LayoutKind.RandomParallel, 1500),
        ["random-parallel one-per-band"] = Of(LayoutKind.RandomParallel, 1500) with { Placement = LinePlacement.OnePerBand },
        ["segments"] = Segments(),
        ["segments plus"] = Segments() with { Edge = EdgeRule.Plus },
        ["segments kept"] = Segments() with { Crossing = CrossingRule.Keep },
        ["segments without short pieces"] = Segments() with { MinLengthMetres = 800 },
        ["segments each their own way"] = Segments() with { Bearing = new Bearing.Random() },
        ["segments each their own way kept"] = Segments() with { Bearing = new Bearing.Random(), Crossing = CrossingRule.Keep },
        ["loops"] = Of(LayoutKind.Loops, 2000) with { SideMetres = 900 },
        ["loops kept"] = Of(LayoutKind.Loops, 2000) with { SideMetres = 900, Crossing = CrossingRule.Keep },
        ["point-grid square"] = Of(LayoutKind.PointGrid, 1500),
        ["point-grid triangular"] = Of(LayoutKind.PointGrid, 1500) with { Grid = GridShape.Triangular },
        ["points-on-lines"] = Of(LayoutKind.PointsOnLines, 2500) with { StepMetres = 600 },
        ["random-points"] = Of(LayoutKind.RandomPoints, 2000) with { Reserve = 10 },
        ["random-points plus"] = Of(LayoutKind.RandomPoints, 2000) with { Edge = EdgeRule.Plus },
        ["balanced-points"] = Of(LayoutKind.BalancedPoints, 2000) with { Reserve = 10 },
    }.ToImmutableSortedDictionary();

    /// <summary>Two parts, concave, the larger with a hole; about 130 km².</summary>
    public static readonly Stratum Islands = PlaneStrata.Of(
        [
            [(0, 0), (12_000, 1000), (11_000, 8000), (7000, 4500), (3000, 10_000), (-1000, 6000)],
            [(3000, 3000), (5500, 2500), (5000, 4500)],
        ],
        [[(12_500, 7000), (17_000, 6000), (18_000, 11_000), (13_000, 9500)]]) with
    { LongAxisBearing = 60 };

    public static TheoryData<string> Names => [.. Designs.Keys];

    /// <summary>Whether transects may run on beyond the stratum.</summary>
    public static bool LeavesStratum(LayoutDesign design) => design.Crossing == CrossingRule.Keep;

    public static LayoutDesign Of(LayoutKind kind, double spacing)
        => new(kind, new Sizing.Spacing(spacing), new Bearing.Degrees(90), HalfWidth);

    private static LayoutDesign Segments() => Of(LayoutKind.Segments, 2000) with { SegmentMetres = 1200 };

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
