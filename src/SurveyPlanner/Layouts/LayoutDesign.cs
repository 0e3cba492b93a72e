namespace SurveyPlanner.Layouts;

/// <summary>The kinds of layout a stratum can have. The plan file's word is the same in lower case with hyphens.</summary>
public enum LayoutKind
{
    /// <summary>Parallel lines one spacing apart, random start.</summary>
    Parallel,

    /// <summary>A continuous zigzag across the convex hull of the stratum, random start.</summary>
    Zigzag,

    /// <summary>Points on a grid, random start along both axes.</summary>
    PointGrid,
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
}

/// <summary>What fixes the amount of effort.</summary>
public abstract record Sizing
{
    private Sizing()
    {
    }

    /// <summary>Distance between neighbouring lines or points, metres. A zigzag: between successive turning points, along its axis.</summary>
    public sealed record Spacing(double Metres) : Sizing;

    /// <summary>Expected number of lines, legs or points in the stratum.</summary>
    public sealed record Number(int Count) : Sizing;

    /// <summary>Expected total length of line in the stratum, metres.</summary>
    public sealed record TotalLength(double Metres) : Sizing;

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
    /// <summary>Zigzags: a second, mirrored pass on the way back.</summary>
    public bool Crossed { get; init; }

    /// <summary>Lines: stretches shorter than this are left out, metres; 0 leaves none out.</summary>
    public double MinLengthMetres { get; init; }

    /// <summary>Whether animals are counted around points rather than along lines.</summary>
    public bool IsPoints => Kind is LayoutKind.PointGrid;

    /// <summary>Whether transects lie at fixed distances from each other, so that neighbours can be compared.</summary>
    public bool IsSystematic => Kind is LayoutKind.Parallel or LayoutKind.Zigzag or LayoutKind.PointGrid;
}
