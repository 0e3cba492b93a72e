namespace SurveyPlanner.Layouts;

/// <summary>A place where a zigzag turns, in the turned frame.</summary>
/// <param name="X">x, metres.</param>
/// <param name="Y">y, metres: the place along the axis.</param>
/// <param name="IsLeft">Whether it lies on the left side of the band.</param>
internal readonly record struct Turn(double X, double Y, bool IsLeft);

/// <summary>The path of a zigzag for any random start: where it turns, and how it gets from one turn to the next.</summary>
internal abstract class ZigzagPath
{
    /// <summary>Length of axis over which the start is uniform: the pattern repeats after it. Metres.</summary>
    public abstract double Period { get; }

    /// <summary>How far a leg's chords may stray from the true curve, metres; 0 for straight legs.</summary>
    public abstract double CurveStrayMetres { get; }

    /// <summary>
    /// Adds all turns of one pass, from beyond one end of the stratum to beyond the other.
    /// The mirrored pass has left and right exchanged and comes back down the axis.
    /// </summary>
    /// <param name="share">The random start, in [0, 1).</param>
    /// <param name="mirrored">Whether it is the second, mirrored pass.</param>
    /// <param name="turns">Takes the turns, in order of travel.</param>
    public abstract void AddTurns(double share, bool mirrored, List<Turn> turns);

    /// <summary>Adds the lines of the leg between two turns that follow one another.</summary>
    public abstract void AddLeg(Turn from, Turn to, int leg, SlantedLines output);
}
