using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Points on a square or triangular grid with a random start along both axes. Visited row by row, to and fro.
/// Expected number: area / area of a grid cell, exactly, for any shape.
/// </summary>
internal sealed class PointGrid : LayoutGenerator
{
    private readonly double[] _ranges;
    private readonly bool _triangular;
    private readonly double _rowHeight;

    public PointGrid(StratumFrame stratum, LayoutDesign design)
        : base(stratum, design, SpacingFor(stratum, design))
    {
        _triangular = design.Grid == GridShape.Triangular;
        _rowHeight = SpacingMetres * RowHeight(design.Grid);

        // A triangular grid repeats after two rows.
        _ranges = [SpacingMetres, _triangular ? 2 * _rowHeight : _rowHeight];
        SizingRules.RefuseTooCoarse(stratum, design, _rowHeight, stratum.ExtentAcross);
        SizingRules.RefuseTooCoarse(stratum, design, SpacingMetres, stratum.Clip.MaxX - stratum.Clip.MinX);
        SizingRules.RefuseTooMany(stratum, design, stratum.Clip.AreaSquareMetres / GridCellArea);
    }

    /// <summary>Area that belongs to one point, square metres.</summary>
    public double GridCellArea => SpacingMetres * _rowHeight;

    public override ReadOnlySpan<double> OffsetRanges => _ranges;

    public override double NominalCoverage
        => Math.Min(1, Math.PI * Stratum.HalfWidthMetres * Stratum.HalfWidthMetres / GridCellArea);

    public override bool StripsMayOverlap => 2 * Stratum.HalfWidthMetres > SpacingMetres;

    public override double? ExpectedLength => null;

    public override double? ExpectedCount => Stratum.Clip.AreaSquareMetres / GridCellArea;

    public override void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
    {
        var clip = Stratum.Clip;
        var (transect, rowsWithPoints) = (0, 0);
        for (var row = 0; ; row++)
        {
            var y = clip.MinY + (offsets[1] * _ranges[1]) + ((row - (_triangular ? 2 : 0)) * _rowHeight);
            if (y > clip.MaxY)
            {
                return;
            }

            var shift = offsets[0] + (_triangular && row % 2 == 1 ? 0.5 : 0);
            var before = transect;
            AddRow(y, shift, leftwards: rowsWithPoints % 2 == 1, ref transect, output);
            rowsWithPoints += transect > before ? 1 : 0;
        }
    }

    private void AddRow(double y, double shift, bool leftwards, ref int transect, PieceBuffer output)
    {
        var clip = Stratum.Clip;
        var pairs = clip.CrossingsAt(y, ref output.Crossings) / 2;
        for (var i = 0; i < pairs; i++)
        {
            var pair = leftwards ? pairs - 1 - i : i;
            var first = (int)Math.Ceiling(((output.Crossings[2 * pair] - clip.MinX) / SpacingMetres) - shift);
            var last = (int)Math.Ceiling(((output.Crossings[(2 * pair) + 1] - clip.MinX) / SpacingMetres) - shift) - 1;
            for (var k = 0; k <= last - first; k++)
            {
                var x = clip.MinX + ((shift + (leftwards ? last - k : first + k)) * SpacingMetres);
                output.Add(transect++, x, y, x, y);
            }
        }
    }

    private static double RowHeight(GridShape grid) => grid == GridShape.Triangular ? Math.Sqrt(3) / 2 : 1;

    private static double SpacingFor(StratumFrame stratum, LayoutDesign design) => design.Sizing switch
    {
        Sizing.Spacing spacing => spacing.Metres,
        Sizing.Number number => Math.Sqrt(stratum.Clip.AreaSquareMetres / (number.Count * RowHeight(design.Grid))),
        Sizing.TotalLength => throw SizingRules.LengthForPoints(stratum),
        _ => throw new InvalidOperationException("size_from = \"precision\" is turned into a number before a layout is made"),
    };
}
