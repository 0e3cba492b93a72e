using System.Globalization;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>
/// A stratum turned so that transects run along x: where transects may lie, and where they count.
/// </summary>
internal sealed class StratumFrame
{
    private readonly Lazy<FrameShape> _lines;
    private readonly Lazy<FrameShape> _linesAcross;

    public StratumFrame(Stratum stratum, LayoutDesign design)
    {
        Stratum = stratum;
        HalfWidthMetres = design.HalfWidthMetres;
        BearingDegrees = TrueBearing(stratum, design.Bearing);
        Frame = new TurnedFrame((90 - (BearingDegrees - stratum.ConvergenceDegrees)) * Math.PI / 180);
        Region = new FrameShape(stratum.Shape, Frame);
        ClipShape = design.Edge == EdgeRule.Plus ? WithMargin(stratum, HalfWidthMetres) : stratum.Shape;
        Clip = design.Edge == EdgeRule.Plus ? new FrameShape(ClipShape, Frame) : Region;
        _lines = new Lazy<FrameShape>(() => LinesFor(design.MinLengthMetres, transposed: false));
        _linesAcross = new Lazy<FrameShape>(() => LinesFor(design.MinLengthMetres, transposed: true));
    }

    public Stratum Stratum { get; }

    public double HalfWidthMetres { get; }

    /// <summary>True bearing of the lines at the stratum's centre, degrees in [0, 180).</summary>
    public double BearingDegrees { get; }

    public TurnedFrame Frame { get; }

    /// <summary>The stratum itself.</summary>
    public FrameShape Region { get; }

    /// <summary>Where transects may lie: the stratum, or with plus sampling the stratum and a margin round it.</summary>
    public FrameShape Clip { get; }

    /// <summary>The same in the plane.</summary>
    public PlaneShape ClipShape { get; }

    /// <summary>Where whole lines along x may lie: <see cref="Clip"/> without stretches shorter than the least length.</summary>
    /// <exception cref="InputException">No stretch is that long.</exception>
    public FrameShape Lines => _lines.Value;

    /// <summary><see cref="Lines"/> with x and y swapped, for looking across the lines.</summary>
    public FrameShape LinesAcross => _linesAcross.Value;

    /// <summary>Length of the stratum across its lines, metres: what the lines are spread over.</summary>
    public double ExtentAcross => Clip.MaxY - Clip.MinY;

    /// <summary>Length of the stratum along its lines, metres.</summary>
    public double ExtentAlong => Clip.MaxX - Clip.MinX;

    private FrameShape LinesFor(double minLengthMetres, bool transposed)
    {
        if (minLengthMetres <= 0)
        {
            return transposed ? new FrameShape(ClipShape, Frame, transposed) : Clip;
        }

        var longEnough = Trapezoids.Of(Clip).Select(part => part.WhereWiderThan(minLengthMetres)).OfType<Trapezoid>().ToList();
        var shape = Trapezoids.ToShape(longEnough) ?? throw new InputException(new Problem(
            string.Create(
                CultureInfo.InvariantCulture,
                $"no line along {BearingDegrees:0.#}° runs {minLengthMetres / 1000:0.###} km or more in stratum '{Stratum.Name}'; choose a smaller min_length or another bearing"),
            Key: "layout.min_length"));
        return new FrameShape(shape, new TurnedFrame(0), transposed);
    }

    /// <summary>The stratum and a margin round it, but never into a closed area.</summary>
    private static PlaneShape WithMargin(Stratum stratum, double halfWidthMetres)
    {
        var grown = PlaneGeometry.Grow(stratum.Shape, halfWidthMetres);
        return stratum.Closed.IsEmpty ? grown : PlaneGeometry.Subtract(grown, stratum.Closed);
    }

    private static double TrueBearing(Stratum stratum, Bearing bearing)
    {
        var degrees = bearing switch
        {
            Bearing.Degrees given => given.Value,
            Bearing.LongAxis or Bearing.Random => stratum.LongAxisBearing,
            Bearing.ShortAxis => stratum.LongAxisBearing + 90,
            Bearing.Across across => LineDirection.Of(across.Lines, stratum.CentreLonLat) + 90,
            _ => throw new InvalidOperationException($"unknown bearing {bearing}"),
        };
        return ((degrees % 180) + 180) % 180;
    }
}
