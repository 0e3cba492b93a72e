using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Short lines of a fixed length on a square grid: along the rows of the grid, or each in a direction of its own, uniform over the full circle.
/// </summary>
internal sealed class Segments : TrackGrid
{
    private readonly double _length;

    public Segments(StratumFrame stratum, LayoutDesign design)
        : this(stratum, design, SpacingFor(stratum, design, design.SegmentMetres!.Value, spacing => new Segments(stratum, design, spacing)))
    {
    }

    private Segments(StratumFrame stratum, LayoutDesign design, double spacingMetres)
        : base(stratum, design, spacingMetres)
    {
        _length = design.SegmentMetres!.Value;
        SizingRules.RefuseLongTracks(stratum, design, _length, spacingMetres);
    }

    /// <summary>Whether each segment has a direction of its own.</summary>
    public bool HasRandomBearings => Design.Bearing is Bearing.Random;

    public override bool StripsMayOverlap => HasRandomBearings || 2 * Stratum.HalfWidthMetres > SpacingMetres;

    protected override double TrackMetres => _length;

    protected override (double Left, double Right, double Below, double Above) Reach
        => HasRandomBearings ? (_length, _length, _length, _length) : (0, _length, 0, 0);

    protected override void AddTrack(double x, double y, int leg, ref PhiloxStream random, SlantedLines output)
    {
        var (sin, cos) = HasRandomBearings ? Math.SinCos(2 * Math.PI * random.NextDouble()) : (0, 1);
        output.Add(leg, x, y, x + (_length * cos), y + (_length * sin));
    }
}
