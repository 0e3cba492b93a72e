using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// An equal-spaced zigzag: legs from one side of the stratum's convex hull to the other, turning points one spacing apart along the axis
/// (which is at right angles to the bearing), on alternate sides. The start is uniform over two spacings, the period of the pattern.
/// Each leg is a transect, cut at the stratum's boundary.
/// </summary>
internal sealed class Zigzag : LayoutGenerator
{
    private readonly double[] _ranges;
    private readonly HullSides _hull;
    private readonly Lazy<double> _expectedLength;

    public Zigzag(StratumFrame stratum, LayoutDesign design)
        : this(stratum, design, SpacingFor(stratum, design))
    {
        SizingRules.RefuseTooCoarse(stratum, SpacingMetres);
        SizingRules.RefuseTooMany(stratum, stratum.ExtentAcross / SpacingMetres);
        if (design.Turning != ZigzagTurning.EqualSpaced)
        {
            throw new InputException(new Problem("only zigzags with equal-spaced turning points are drawn so far; write turning = \"equal-spaced\"", Key: "layout.turning"));
        }
    }

    private Zigzag(StratumFrame stratum, LayoutDesign design, double spacingMetres)
        : base(stratum, design, spacingMetres)
    {
        _ranges = [2 * SpacingMetres];
        _hull = new HullSides(stratum);
        _expectedLength = new Lazy<double>(() => EffortIntegral.Over(this).Mean);
    }

    public override ReadOnlySpan<double> OffsetRanges => _ranges;

    /// <summary>Mean swept area over area: what coverage would be if it were even.</summary>
    public override double NominalCoverage
        => Math.Min(1, 2 * Stratum.HalfWidthMetres * _expectedLength.Value / Stratum.Clip.AreaSquareMetres);

    public override bool StripsMayOverlap => true;

    public override double? ExpectedLength => null;

    public override double? ExpectedCount => null;

    public override void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
    {
        var clip = Stratum.Clip;
        var transect = 0;
        var y = clip.MinY + ((offsets[0] - 1) * _ranges[0]);
        var x = _hull.Left(y);
        for (var turn = 1; y <= clip.MaxY; turn++)
        {
            var nextY = clip.MinY + ((offsets[0] - 1) * _ranges[0]) + (turn * SpacingMetres);
            var nextX = turn % 2 == 1 ? _hull.Right(nextY) : _hull.Left(nextY);
            var before = output.Count;
            Clipper.ClipSegment(clip, x, y, nextX, nextY, transect, output);
            transect += output.Count > before ? 1 : 0;
            (x, y) = (nextX, nextY);
        }
    }

    private static double SpacingFor(StratumFrame stratum, LayoutDesign design) => design.Sizing switch
    {
        Sizing.Spacing spacing => spacing.Metres,
        Sizing.Number number => stratum.ExtentAcross / number.Count,
        Sizing.TotalLength length => SpacingForLength(stratum, design, length.Metres),
        _ => throw new InvalidOperationException("size_from = \"precision\" is turned into a length before a layout is made"),
    };

    /// <summary>Wider spacing, shorter path: halves the interval on a logarithmic scale until the expected length is met to 1e-6.</summary>
    private static double SpacingForLength(StratumFrame stratum, LayoutDesign design, double lengthMetres)
    {
        var (low, high) = (stratum.ExtentAcross / 100_000, stratum.ExtentAcross);
        if (EffortIntegral.Over(new Zigzag(stratum, design, high)).Mean > lengthMetres)
        {
            return high * 1.0001;
        }

        // Lines as close as their strips are wide are the densest that make sense; start there rather than at the limit.
        low = Math.Max(low, Math.Min(high / 2, stratum.Clip.AreaSquareMetres / lengthMetres / 4));
        for (var round = 0; round < 40 && high / low > 1 + 1e-7; round++)
        {
            var middle = Math.Sqrt(low * high);
            if (EffortIntegral.Over(new Zigzag(stratum, design, middle)).Mean > lengthMetres)
            {
                low = middle;
            }
            else
            {
                high = middle;
            }
        }

        return Math.Sqrt(low * high);
    }
}
