using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// A layout kind made ready for one stratum: its spacing is fixed, only the random offset is open.
/// Immutable and safe to share between threads. To add a kind: derive from this beside its siblings, add it to <see cref="LayoutKinds"/>.
/// </summary>
internal abstract class LayoutGenerator(StratumFrame stratum, LayoutDesign design, double spacingMetres)
{
    public StratumFrame Stratum { get; } = stratum;

    public LayoutDesign Design { get; } = design;

    /// <summary>Distance between neighbouring lines or points, metres.</summary>
    public double SpacingMetres { get; } = spacingMetres;

    /// <summary>The range of each random offset, metres: an offset is uniform over [0, range).</summary>
    public abstract ReadOnlySpan<double> OffsetRanges { get; }

    /// <summary>Coverage of an interior place that no edge is near.</summary>
    public abstract double NominalCoverage { get; }

    /// <summary>Whether the strips (or disks) of one realisation can overlap.</summary>
    public abstract bool StripsMayOverlap { get; }

    /// <summary>Expected total length of line in closed form, metres in the plane; null for points and where none is known.</summary>
    public abstract double? ExpectedLength { get; }

    /// <summary>Expected number of lines or points in closed form; null where none is known.</summary>
    public abstract double? ExpectedCount { get; }

    /// <summary>How far drawn lines may stray from the design because curves are drawn as chords, metres.</summary>
    public virtual double CurveStrayMetres => 0;

    /// <summary>Something the user should know about this design in this stratum, one sentence; null when there is nothing.</summary>
    public virtual string? Warning => null;

    /// <summary>
    /// Writes the realisation at given offsets. <paramref name="offsets"/> holds one number in [0, 1) for each of <see cref="OffsetRanges"/>;
    /// <paramref name="random"/> supplies whatever else a kind draws.
    /// </summary>
    public abstract void Realise(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output);

    /// <summary>Number of spare points beside the layout.</summary>
    public virtual int ReserveCount => 0;

    /// <summary>
    /// Writes the spare points that belong to a realisation, in the order to be used: same offsets, and the stream as it was before that was drawn.
    /// </summary>
    public virtual void RealiseReserve(ReadOnlySpan<double> offsets, ref PhiloxStream random, PieceBuffer output)
    {
    }
}
