using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// A zigzag across the convex hull of the stratum, its axis at right angles to the bearing, with a random start; one pass, or a second, mirrored
/// one on the way back. Each leg is a transect, cut at the stratum's boundary.
/// </summary>
internal sealed class Zigzag : LayoutGenerator
{
    private readonly double[] _ranges;
    private readonly ZigzagPath _path;
    private readonly string? _warning;
    private readonly Lazy<double> _expectedLength;

    public Zigzag(StratumFrame stratum, LayoutDesign design)
        : this(stratum, design, new HullSides(stratum))
    {
    }

    private Zigzag(StratumFrame stratum, LayoutDesign design, HullSides hull)
        : this(stratum, design, hull, SpacingFor(stratum, design, hull))
    {
    }

    private Zigzag(StratumFrame stratum, LayoutDesign design, HullSides hull, double spacingMetres)
        : base(stratum, design, spacingMetres)
    {
        SizingRules.RefuseTooCoarse(stratum, design, SpacingMetres, stratum.ExtentAcross);
        SizingRules.RefuseTooMany(stratum, design, Passes * stratum.ExtentAcross / SpacingMetres);
        (_path, _warning) = PathFor(stratum, design, hull, spacingMetres);
        _ranges = [_path.Period];
        _expectedLength = new Lazy<double>(() => EffortIntegral.Over(this).Mean);
    }

    public override ReadOnlySpan<double> OffsetRanges => _ranges;

    /// <summary>Mean swept area over area: what coverage would be if it were even.</summary>
    public override double NominalCoverage
        => Math.Min(1, 2 * Stratum.HalfWidthMetres * _expectedLength.Value / Stratum.Clip.AreaSquareMetres);

    public override bool StripsMayOverlap => true;

    public override double? ExpectedLength => null;

    public override double? ExpectedCount => null;

    public override double CurveStrayMetres => _path.CurveStrayMetres;

    public override string? Warning => _warning;

    private int Passes => Design.Crossed ? 2 : 1;

    public override void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
    {
        var (turns, lines, transect) = (output.Turns, output.Slanted, 0);
        for (var pass = 0; pass < Passes; pass++)
        {
            turns.Clear();
            lines.Clear();
            _path.AddTurns(offsets[0], mirrored: pass == 1, turns);
            for (var leg = 1; leg < turns.Count; leg++)
            {
                _path.AddLeg(turns[leg - 1], turns[leg], leg, lines);
            }

            Stratum.Clip.Tree.FindCrossings(lines);
            for (var line = 0; line < lines.Count;)
            {
                var before = output.Count;
                line = Clipper.ClipLeg(Stratum.Clip, lines, line, transect, output);
                transect += output.KeepStretches(before, Design.MinLengthMetres) ? 1 : 0;
            }
        }
    }

    /// <summary>
    /// The path for a spacing c between turns along the axis. With equal angle and adjusted angle that is the spacing where the hull has its mean
    /// width H: the tangent of the angle is H/c there, as it is between equally spaced turns in a rectangle.
    /// </summary>
    private static (ZigzagPath Path, string? Warning) PathFor(StratumFrame stratum, LayoutDesign design, HullSides hull, double spacingMetres)
    {
        if (design.Turning == ZigzagTurning.EqualSpaced)
        {
            return (new EqualSpacedPath(hull, spacingMetres), null);
        }

        var meanWidth = hull.MeanWidth;
        var tangent = meanWidth / spacingMetres;
        SwingRule rule = design.Turning == ZigzagTurning.EqualAngle
            ? new EqualAngleSwing(tangent, stratum.HalfWidthMetres)
            : new AdjustedAngleSwing(Math.Sqrt(1 + (tangent * tangent)) / meanWidth);
        var band = ZigzagBand.For(stratum, hull, rule, design.Turning == ZigzagTurning.EqualAngle ? "equal-angle" : "adjusted-angle");
        return (new SwingPath(band.Outline, rule, hull.MinY, hull.MaxY, stratum.HalfWidthMetres), band.Warning);
    }

    private static double SpacingFor(StratumFrame stratum, LayoutDesign design, HullSides hull)
    {
        LayoutGenerator At(double spacing) => new Zigzag(stratum, design, hull, spacing);
        var passes = design.Crossed ? 2 : 1;
        return design.Sizing switch
        {
            Sizing.Spacing spacing => spacing.Metres,
            Sizing.Number number => SpacingSearch.ForNumber(stratum, At, number.Count, passes * stratum.ExtentAcross / number.Count),
            Sizing.TotalLength length => SpacingSearch.ForLength(stratum, At, length.Metres, passes * stratum.Clip.AreaSquareMetres / length.Metres),
            _ => throw new InvalidOperationException("size_from = \"precision\" is turned into a length before a layout is made"),
        };
    }
}
