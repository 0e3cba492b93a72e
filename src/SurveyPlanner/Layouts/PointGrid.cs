namespace SurveyPlanner.Layouts;

/// <summary>Points on a square or triangular grid with a random start along both axes; one spacing to the nearest neighbours.</summary>
internal sealed class PointGrid(StratumFrame stratum, LayoutDesign design, double spacingMetres)
    : PointRows(
        stratum,
        design,
        spacingMetres,
        spacingMetres,
        spacingMetres * RowHeight(design.Grid),
        oddRowsShifted: design.Grid == GridShape.Triangular)
{
    public PointGrid(StratumFrame stratum, LayoutDesign design)
        : this(stratum, design, SpacingFor(stratum, design))
    {
    }

    public override bool StripsMayOverlap => 2 * Stratum.HalfWidthMetres > SpacingMetres;

    private static double RowHeight(GridShape grid) => grid == GridShape.Triangular ? Math.Sqrt(3) / 2 : 1;

    private static double SpacingFor(StratumFrame stratum, LayoutDesign design) => design.Sizing switch
    {
        Sizing.Spacing spacing => spacing.Metres,
        Sizing.Number number => Math.Sqrt(stratum.Clip.AreaSquareMetres / (number.Count * RowHeight(design.Grid))),
        _ => throw SizingRules.NotForPoints(stratum, design),
    };
}
