using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>Closed square circuits on a square grid, walked from the node along the row, anticlockwise in the turned frame, and back to it.</summary>
internal sealed class Loops : TrackGrid
{
    public Loops(StratumFrame stratum, LayoutDesign design)
        : this(stratum, design, SpacingFor(stratum, design, 4 * design.SideMetres!.Value, spacing => new Loops(stratum, design, spacing)))
    {
    }

    private Loops(StratumFrame stratum, LayoutDesign design, double spacingMetres)
        : base(stratum, design, spacingMetres)
    {
        SideMetres = design.SideMetres!.Value;
        SizingRules.RefuseLongTracks(stratum, design, SideMetres, spacingMetres);
    }

    public double SideMetres { get; }

    /// <summary>Whether strips of neighbouring loops, or of opposite sides of one, can overlap; those of adjacent sides always do at their corner.</summary>
    public override bool StripsMayOverlap
        => SideMetres + (2 * Stratum.HalfWidthMetres) > SpacingMetres || 2 * Stratum.HalfWidthMetres > SideMetres;

    protected override double TrackMetres => 4 * SideMetres;

    protected override (double Left, double Right, double Below, double Above) Reach => (0, SideMetres, 0, SideMetres);

    protected override void AddTrack(double x, double y, int leg, ref PhiloxStream random, SlantedLines output)
    {
        var (right, top) = (x + SideMetres, y + SideMetres);
        output.Add(leg, x, y, right, y);
        output.Add(leg, right, y, right, top);
        output.Add(leg, right, top, x, top);
        output.Add(leg, x, top, x, y);
    }
}
