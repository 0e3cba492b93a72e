namespace SurveyPlanner.Layouts;

/// <summary>
/// Points at even steps along systematic parallel lines one spacing apart; a random start across the lines, and one along them that all lines
/// share: a rectangular grid, walked line by line.
/// </summary>
internal sealed class PointsOnLines : PointRows
{
    private readonly double _nearest;

    public PointsOnLines(StratumFrame stratum, LayoutDesign design)
        : this(stratum, design, SpacingFor(stratum, design, design.StepMetres!.Value), design.StepMetres.Value)
    {
    }

    private PointsOnLines(StratumFrame stratum, LayoutDesign design, double spacingMetres, double stepMetres)
        : base(stratum, design, spacingMetres, stepMetres, spacingMetres)
        => _nearest = Math.Min(spacingMetres, stepMetres);

    public override bool StripsMayOverlap => 2 * Stratum.HalfWidthMetres > _nearest;

    private static double SpacingFor(StratumFrame stratum, LayoutDesign design, double stepMetres) => design.Sizing switch
    {
        Sizing.Spacing spacing => spacing.Metres,
        Sizing.Number number => stratum.Clip.AreaSquareMetres / (number.Count * stepMetres),
        _ => throw SizingRules.NotForPoints(stratum, design),
    };
}
