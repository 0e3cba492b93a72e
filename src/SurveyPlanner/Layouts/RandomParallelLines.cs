using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Parallel lines at random distances: each anywhere, or one in each of as many equal bands as there are lines. Heights at which the stratum has no
/// part are left out, so every line meets it. Travelled in order across the stratum, to and fro.
/// Expected total length: number of lines × area / extent across the lines, exactly, for any shape and both placements.
/// </summary>
internal sealed class RandomParallelLines : LayoutGenerator
{
    public RandomParallelLines(StratumFrame stratum, LayoutDesign design)
        : this(stratum, design, new CoveredRanges(stratum.Lines))
    {
    }

    private RandomParallelLines(StratumFrame stratum, LayoutDesign design, CoveredRanges ranges)
        : this(stratum, design, ranges, CountFor(stratum, design, ranges.Length))
    {
    }

    private RandomParallelLines(StratumFrame stratum, LayoutDesign design, CoveredRanges ranges, int lines)
        : base(stratum, design, ranges.Length / lines)
        => (Ranges, Count) = (ranges, lines);

    /// <summary>The heights that lines are spread over.</summary>
    public CoveredRanges Ranges { get; }

    /// <summary>Number of lines, the same in every draw.</summary>
    public int Count { get; }

    public override ReadOnlySpan<double> OffsetRanges => [];

    public override double NominalCoverage
    {
        get
        {
            var width = Math.Min(1, 2 * Stratum.HalfWidthMetres / Ranges.Length);
            return Design.Placement == LinePlacement.Independent ? 1 - Math.Pow(1 - width, Count) : Math.Min(1, width * Count);
        }
    }

    public override bool StripsMayOverlap => true;

    public override double? ExpectedLength => Count * Stratum.Lines.AreaSquareMetres / Ranges.Length;

    public override double? ExpectedCount => Count;

    public override void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
    {
        var positions = output.Positions;
        positions.Clear();
        for (var line = 0; line < Count; line++)
        {
            var share = random.NextDouble();
            positions.Add(Design.Placement == LinePlacement.Independent ? share * Ranges.Length : (line + share) * SpacingMetres);
        }

        positions.Sort();
        var transect = 0;
        foreach (var position in positions)
        {
            var before = output.Count;
            Clipper.ClipHorizontal(Stratum.Lines, Ranges.HeightAt(position), transect, leftwards: transect % 2 == 1, output);
            transect += output.Count > before ? 1 : 0;
        }
    }

    private static int CountFor(StratumFrame stratum, LayoutDesign design, double extent)
    {
        var wanted = design.Sizing switch
        {
            Sizing.Spacing spacing => extent / spacing.Metres,
            Sizing.Number number => number.Count,
            Sizing.TotalLength length => length.Metres * extent / stratum.Lines.AreaSquareMetres,
            _ => throw new InvalidOperationException("size_from = \"precision\" is turned into a length before a layout is made"),
        };
        if (design.Sizing is Sizing.Spacing given)
        {
            SizingRules.RefuseTooCoarse(stratum, design, given.Metres, extent);
        }

        SizingRules.RefuseTooMany(stratum, design, wanted);
        return SizingRules.WholeNumber(wanted);
    }
}
