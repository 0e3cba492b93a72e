using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Systematic parallel lines: one spacing apart, the first at a random distance in [0, spacing) from the stratum's edge.
/// Expected total length: area / spacing, exactly, for any shape (area where stretches are long enough to be kept). Travelled to and fro.
/// </summary>
internal sealed class ParallelLines : LayoutGenerator
{
    private readonly double[] _ranges;
    private readonly FrameShape _lines;

    public ParallelLines(StratumFrame stratum, LayoutDesign design)
        : base(stratum, design, SpacingFor(stratum, design.Sizing))
    {
        (_ranges, _lines) = ([SpacingMetres], stratum.Lines);
        SizingRules.RefuseTooCoarse(stratum, design, SpacingMetres, stratum.ExtentAcross);
        SizingRules.RefuseTooMany(stratum, design, stratum.ExtentAcross / SpacingMetres);
    }

    public override ReadOnlySpan<double> OffsetRanges => _ranges;

    public override double NominalCoverage => Math.Min(1, 2 * Stratum.HalfWidthMetres / SpacingMetres);

    public override bool StripsMayOverlap => 2 * Stratum.HalfWidthMetres > SpacingMetres;

    public override double? ExpectedLength => _lines.AreaSquareMetres / SpacingMetres;

    public override double? ExpectedCount => new CoveredRanges(_lines).Length / SpacingMetres;

    public override void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
    {
        var transect = 0;
        for (var line = 0; ; line++)
        {
            var y = Stratum.Clip.MinY + ((offsets[0] + line) * SpacingMetres);
            if (y > _lines.MaxY)
            {
                return;
            }

            var before = output.Count;
            Clipper.ClipHorizontal(_lines, y, transect, leftwards: transect % 2 == 1, output);
            if (output.Count > before)
            {
                transect++;
            }
        }
    }

    private static double SpacingFor(StratumFrame stratum, Sizing sizing) => sizing switch
    {
        Sizing.Spacing spacing => spacing.Metres,
        Sizing.Number number => new CoveredRanges(stratum.Lines).Length / number.Count,
        Sizing.TotalLength length => stratum.Lines.AreaSquareMetres / length.Metres,
        _ => throw new InvalidOperationException("size_from = \"precision\" is turned into a length before a layout is made"),
    };
}
