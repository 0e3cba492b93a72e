using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Short tracks, all of one length, that start from the nodes of a square grid with a random start along both axes. Visited row by row, to and fro.
/// A track that crosses the boundary is cut there, or kept whole if it starts inside. Expected total length, exactly, for any shape and either
/// rule: area × length of a track / area of a grid cell, as long as no pieces are dropped.
/// </summary>
internal abstract class TrackGrid : LayoutGenerator
{
    private readonly double[] _ranges;
    private readonly Lazy<double> _meanLength;

    protected TrackGrid(StratumFrame stratum, LayoutDesign design, double spacingMetres)
        : base(stratum, design, spacingMetres)
    {
        _ranges = [spacingMetres, spacingMetres];
        _meanLength = new Lazy<double>(() => ExpectedLength ?? EffortIntegral.Over(this).Mean);
        SizingRules.RefuseTooCoarse(stratum, design, spacingMetres, stratum.ExtentAcross);
        SizingRules.RefuseTooCoarse(stratum, design, spacingMetres, stratum.ExtentAlong);
        SizingRules.RefuseTooMany(stratum, design, stratum.Clip.AreaSquareMetres / (spacingMetres * spacingMetres));
    }

    public bool IsKeptWhole => Design.Crossing == CrossingRule.Keep;

    public override ReadOnlySpan<double> OffsetRanges => _ranges;

    /// <summary>Mean swept area over area, as if strips never overlapped.</summary>
    public override double NominalCoverage
        => Math.Min(1, 2 * Stratum.HalfWidthMetres * _meanLength.Value / Stratum.Clip.AreaSquareMetres);

    public override double? ExpectedLength
        => Design.MinLengthMetres > 0 ? null : Stratum.Clip.AreaSquareMetres * TrackMetres / (SpacingMetres * SpacingMetres);

    public override double? ExpectedCount
        => IsKeptWhole ? Stratum.Clip.AreaSquareMetres / (SpacingMetres * SpacingMetres) : null;

    /// <summary>Length of a whole track, metres.</summary>
    protected abstract double TrackMetres { get; }

    /// <summary>How far from its node a track may reach, to the left, right, below and above, metres.</summary>
    protected abstract (double Left, double Right, double Below, double Above) Reach { get; }

    public override void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
    {
        var clip = Stratum.Clip;
        var reach = IsKeptWhole ? default : Reach;
        var (transect, rowsWithTracks) = (0, 0);
        var (firstRow, lastRow) = Nodes(offsets[1], -reach.Above, clip.MaxY - clip.MinY + reach.Below);
        for (var row = firstRow; row <= lastRow; row++)
        {
            var y = clip.MinY + ((row + offsets[1]) * SpacingMetres);
            var (low, high) = Clipper.ExtentBetween(clip, y - reach.Below, y + reach.Above);
            if (low > high)
            {
                continue;
            }

            var (first, last) = Nodes(offsets[0], low - clip.MinX - reach.Right, high - clip.MinX + reach.Left);
            var (before, leftwards) = (transect, rowsWithTracks % 2 == 1);
            output.Slanted.Clear();
            for (var i = first; i <= last; i++)
            {
                var column = leftwards ? first + last - i : i;
                var x = clip.MinX + ((column + offsets[0]) * SpacingMetres);
                if (!IsKeptWhole || clip.Contains(x, y))
                {
                    AddTrack(x, y, leg: i, ref random, output.Slanted);
                }
            }

            transect = CutRow(clip, transect, output);
            rowsWithTracks += transect > before ? 1 : 0;
        }
    }

    /// <summary>Adds the sides of the track that starts at a node.</summary>
    /// <param name="x">The node.</param>
    /// <param name="y">The node.</param>
    /// <param name="leg">Number of the track in its row.</param>
    /// <param name="random">For whatever is random about it.</param>
    /// <param name="output">Takes the sides, in the order they are walked.</param>
    protected abstract void AddTrack(double x, double y, int leg, ref PhiloxStream random, SlantedLines output);

    /// <summary>Adds what is left of the tracks of a row. Returns the number of the next transect.</summary>
    private int CutRow(FrameShape clip, int transect, PieceBuffer output)
    {
        var lines = output.Slanted;
        if (!IsKeptWhole)
        {
            clip.Tree.FindCrossings(lines);
        }

        for (var line = 0; line < lines.Count;)
        {
            var before = output.Count;
            line = IsKeptWhole ? lines.KeepLeg(line, transect, output) : Clipper.ClipLeg(clip, lines, line, transect, output);
            transect += output.KeepStretches(before, Design.MinLengthMetres) ? 1 : 0;
        }

        return transect;
    }

    protected static double SpacingFor(StratumFrame stratum, LayoutDesign design, double trackMetres, Func<double, LayoutGenerator> at)
    {
        var area = stratum.Clip.AreaSquareMetres;
        return design.Sizing switch
        {
            Sizing.Spacing spacing => spacing.Metres,
            Sizing.Number number when design.Crossing == CrossingRule.Keep => Math.Sqrt(area / number.Count),
            Sizing.Number number => SpacingSearch.ForNumber(stratum, at, number.Count, Math.Sqrt(area / number.Count)),
            Sizing.TotalLength length when design.MinLengthMetres == 0 => Math.Sqrt(area * trackMetres / length.Metres),
            Sizing.TotalLength length => SpacingSearch.ForLength(stratum, at, length.Metres, Math.Sqrt(area * trackMetres / length.Metres)),
            _ => throw new InvalidOperationException("size_from = \"precision\" is turned into a length before a layout is made"),
        };
    }

    /// <summary>First and last node between two distances from the corner of the bounding box.</summary>
    private (int First, int Last) Nodes(double offset, double from, double to)
        => ((int)Math.Ceiling((from / SpacingMetres) - offset), (int)Math.Floor((to / SpacingMetres) - offset));
}
