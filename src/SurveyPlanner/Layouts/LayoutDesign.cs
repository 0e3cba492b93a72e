using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>The kinds of layout a stratum can have. The plan file's word is the same in lower case with hyphens.</summary>
public enum LayoutKind
{
    /// <summary>Parallel lines one spacing apart, random start.</summary>
    Parallel,

    /// <summary>Parallel lines at random distances.</summary>
    RandomParallel,

    /// <summary>A continuous zigzag across the convex hull of the stratum, random start.</summary>
    Zigzag,

    /// <summary>Short lines of a fixed length on a square grid, random start along both axes.</summary>
    Segments,

    /// <summary>Closed square circuits on a square grid, random start along both axes.</summary>
    Loops,

    /// <summary>Points on a grid, random start along both axes.</summary>
    PointGrid,

    /// <summary>Points at even steps along systematic parallel lines, random start along both axes.</summary>
    PointsOnLines,

    /// <summary>Points at random, each by itself.</summary>
    RandomPoints,

    /// <summary>Random points spread out evenly (balanced acceptance sampling).</summary>
    BalancedPoints,
}

/// <summary>What happens at the stratum's boundary.</summary>
public enum EdgeRule
{
    /// <summary>Transects stop at the boundary.</summary>
    Minus,

    /// <summary>Transects run on past the boundary by the half-width (points: radius), so that coverage stays even up to the edge.</summary>
    Plus,
}

/// <summary>Shape of a point grid.</summary>
public enum GridShape
{
    Square,
    Triangular,
}

/// <summary>How lines at random distances are placed.</summary>
public enum LinePlacement
{
    /// <summary>Each line anywhere, independently of the others.</summary>
    Independent,

    /// <summary>The stratum is cut into equal bands along the lines, and each gets one line, anywhere in it.</summary>
    OnePerBand,
}

/// <summary>What happens to a segment or loop that crosses the boundary.</summary>
public enum CrossingRule
{
    /// <summary>It is cut there: whatever lies inside is kept, wherever it starts.</summary>
    Clip,

    /// <summary>It is kept whole if it starts inside, and left out if not.</summary>
    Keep,
}

/// <summary>How a zigzag turns.</summary>
public enum ZigzagTurning
{
    /// <summary>Turning points equally spaced along the axis.</summary>
    EqualSpaced,

    /// <summary>Every leg at the same angle to the axis.</summary>
    EqualAngle,

    /// <summary>The angle follows the width of the stratum so that coverage is even along the axis.</summary>
    AdjustedAngle,
}

/// <summary>
/// The direction transects run. A zigzag swings about this direction and advances at right angles to it.
/// </summary>
public abstract record Bearing
{
    private Bearing()
    {
    }

    /// <summary>Degrees clockwise from true north at the stratum's centre, in [0, 360).</summary>
    public sealed record Degrees(double Value) : Bearing;

    /// <summary>Along the long side of the narrowest rectangle round the stratum.</summary>
    public sealed record LongAxis : Bearing;

    /// <summary>Along its short side.</summary>
    public sealed record ShortAxis : Bearing;

    /// <summary>Segments: each its own, at random. Their grid then lies along the long axis.</summary>
    public sealed record Random : Bearing;

    /// <summary>
    /// At right angles to lines drawn on the map, along a coast or a depth contour say: to their mean direction, weighted by length.
    /// </summary>
    public sealed record Across(ImmutableArray<ImmutableArray<LonLat>> Lines) : Bearing;

    /// <summary>The same with the lines still in their file: whoever reads the plan's files puts <see cref="Across"/> in its place.</summary>
    public sealed record AcrossFile(string Path) : Bearing;

    /// <summary>Degrees in an attribute of the boundary, each stratum its own.</summary>
    public sealed record FromField(string Name) : Bearing;
}

/// <summary>An attribute of the boundary that holds lengths as plain numbers.</summary>
/// <param name="Name">Its name.</param>
/// <param name="MetresPerUnit">What a 1 in it means, metres.</param>
public sealed record LengthField(string Name, double MetresPerUnit);

/// <summary>What fixes the amount of effort.</summary>
public abstract record Sizing
{
    private Sizing()
    {
    }

    /// <summary>
    /// Distance between neighbouring lines or points, metres. A zigzag: between successive turning points, along its axis (with equal and
    /// adjusted angle, where the hull has its mean width).
    /// </summary>
    public sealed record Spacing(double Metres) : Sizing;

    /// <summary>Expected number of lines, legs or points in the stratum.</summary>
    public sealed record Number(int Count) : Sizing;

    /// <summary>Expected total length of line in the stratum, metres.</summary>
    public sealed record TotalLength(double Metres) : Sizing;

    /// <summary>A spacing in an attribute of the boundary, each stratum its own.</summary>
    public sealed record FromField(LengthField Field) : Sizing;

    /// <summary>Whatever the target precision asks for, from the pilot.</summary>
    public sealed record Precision : Sizing;
}

/// <summary>
/// The layout asked for in one stratum: the plan file's <c>[layout]</c> with the stratum's own keys laid over it.
/// </summary>
/// <param name="Kind">Which kind of layout.</param>
/// <param name="Sizing">What fixes the amount of effort.</param>
/// <param name="Bearing">The direction transects run.</param>
/// <param name="HalfWidthMetres">Strip half-width of a line, or radius of a point, metres: the distance out to which animals count.</param>
/// <param name="Edge">What happens at the boundary.</param>
/// <param name="Grid">Point grids: their shape.</param>
/// <param name="Turning">Zigzags: how they turn.</param>
public sealed record LayoutDesign(
    LayoutKind Kind,
    Sizing Sizing,
    Bearing Bearing,
    double HalfWidthMetres,
    EdgeRule Edge = EdgeRule.Minus,
    GridShape Grid = GridShape.Square,
    ZigzagTurning Turning = ZigzagTurning.EqualSpaced)
{
    /// <summary>The attribute of the boundary that holds the half-width or radius, each stratum its own; null where the design gives it.</summary>
    public LengthField? HalfWidthField { get; init; }

    /// <summary>Lines at random distances: how they are placed.</summary>
    public LinePlacement Placement { get; init; }

    /// <summary>Zigzags: a second, mirrored pass on the way back.</summary>
    public bool Crossed { get; init; }

    /// <summary>Lines: stretches shorter than this are left out, metres; 0 leaves none out.</summary>
    public double MinLengthMetres { get; init; }

    /// <summary>Segments: length of each, metres.</summary>
    public double? SegmentMetres { get; init; }

    /// <summary>Loops: side of the square, metres.</summary>
    public double? SideMetres { get; init; }

    /// <summary>Segments and loops: what happens to those that cross the boundary.</summary>
    public CrossingRule Crossing { get; init; }

    /// <summary>Points on lines: distance from one to the next along a line, metres.</summary>
    public double? StepMetres { get; init; }

    /// <summary>Random and balanced points: length of the list of spare points, to be used strictly in its order.</summary>
    public int Reserve { get; init; }

    /// <summary>Whether animals are counted around points rather than along lines.</summary>
    public bool IsPoints => Kind is LayoutKind.PointGrid or LayoutKind.PointsOnLines or LayoutKind.RandomPoints or LayoutKind.BalancedPoints;

    /// <summary>Whether it has neither lines to point anywhere nor a distance between neighbours.</summary>
    public bool IsScattered => Kind is LayoutKind.RandomPoints or LayoutKind.BalancedPoints;

    /// <summary>
    /// Whether transects follow one another at a fixed spacing from a random start, so that each can be compared with the next. Grids of segments
    /// and loops are systematic too, but have no single order.
    /// </summary>
    public bool IsSystematic => Kind is LayoutKind.Parallel or LayoutKind.Zigzag or LayoutKind.PointGrid or LayoutKind.PointsOnLines;
}
