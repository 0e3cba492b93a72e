using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Points in rows with a random start along both axes: the same distance from each to the next in a row, and from row to row.
/// Visited row by row, to and fro. Expected number: area / area of a grid cell, exactly, for any shape.
/// </summary>
internal abstract class PointRows : LayoutGenerator
{
    private readonly double[] _ranges;
    private readonly double _step;
    private readonly double _rowHeight;
    private readonly bool _oddRowsShifted;

    /// <param name="stratum">The stratum.</param>
    /// <param name="design">The design.</param>
    /// <param name="spacingMetres">The spacing to tell the user.</param>
    /// <param name="stepMetres">Distance between points of a row.</param>
    /// <param name="rowHeightMetres">Distance between rows.</param>
    /// <param name="oddRowsShifted">Whether every other row is shifted by half a step; the pattern then repeats after two rows.</param>
    protected PointRows(
        StratumFrame stratum, LayoutDesign design, double spacingMetres, double stepMetres, double rowHeightMetres, bool oddRowsShifted = false)
        : base(stratum, design, spacingMetres)
    {
        (_step, _rowHeight, _oddRowsShifted) = (stepMetres, rowHeightMetres, oddRowsShifted);
        _ranges = [_step, oddRowsShifted ? 2 * _rowHeight : _rowHeight];
        SizingRules.RefuseTooCoarse(stratum, design, _rowHeight, stratum.ExtentAcross);
        SizingRules.RefuseTooCoarse(stratum, design, _step, stratum.ExtentAlong);
        SizingRules.RefuseTooMany(stratum, design, stratum.Clip.AreaSquareMetres / GridCellArea);
    }

    /// <summary>Area that belongs to one point, square metres.</summary>
    public double GridCellArea => _step * _rowHeight;

    public override ReadOnlySpan<double> OffsetRanges => _ranges;

    public override double NominalCoverage => StripsMayOverlap
        ? DisksInRows.ShareCovered(Stratum.HalfWidthMetres, _step, _rowHeight, _oddRowsShifted)
        : Math.PI * Stratum.HalfWidthMetres * Stratum.HalfWidthMetres / GridCellArea;

    public override double? ExpectedLength => null;

    public override double? ExpectedCount => Stratum.Clip.AreaSquareMetres / GridCellArea;

    public override void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
    {
        var clip = Stratum.Clip;
        var (transect, rowsWithPoints) = (0, 0);
        for (var row = 0; ; row++)
        {
            var y = clip.MinY + (offsets[1] * _ranges[1]) + ((row - (_oddRowsShifted ? 2 : 0)) * _rowHeight);
            if (y > clip.MaxY)
            {
                return;
            }

            var shift = offsets[0] + (_oddRowsShifted && row % 2 == 1 ? 0.5 : 0);
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
            var first = (int)Math.Ceiling(((output.Crossings[2 * pair] - clip.MinX) / _step) - shift);
            var last = (int)Math.Ceiling(((output.Crossings[(2 * pair) + 1] - clip.MinX) / _step) - shift) - 1;
            for (var k = 0; k <= last - first; k++)
            {
                var x = clip.MinX + ((shift + (leftwards ? last - k : first + k)) * _step);
                output.Add(transect++, x, y, x, y);
            }
        }
    }
}
