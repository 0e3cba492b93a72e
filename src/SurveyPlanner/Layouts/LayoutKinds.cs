using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>The one list of layout kinds.</summary>
internal static class LayoutKinds
{
    /// <summary>
    /// About how long one line of a design is, metres: what turns kilometres into lines. Area over the length covered across the lines, or the
    /// fixed length of segments and circuits; null for points.
    /// </summary>
    public static double? MeanLineLength(Stratum stratum, LayoutDesign design)
    {
        if (design.IsPoints)
        {
            return null;
        }

        if (design.Kind is LayoutKind.Segments or LayoutKind.Loops)
        {
            return design.Kind == LayoutKind.Segments ? design.SegmentMetres : 4 * design.SideMetres;
        }

        var clip = new StratumFrame(stratum, design).Clip;
        return clip.AreaSquareMetres / new CoveredRanges(clip).Length;
    }

    /// <summary>The kind that a design asks for, made ready for a stratum.</summary>
    /// <exception cref="InputException">The design cannot work in this stratum.</exception>
    public static LayoutGenerator Prepare(Stratum stratum, LayoutDesign design)
    {
        LayoutOptions.RefuseMisplaced(stratum, design);
        var frame = new StratumFrame(stratum, design);
        return design.Kind switch
        {
            LayoutKind.Parallel => new ParallelLines(frame, design),
            LayoutKind.RandomParallel => new RandomParallelLines(frame, design),
            LayoutKind.Zigzag => new Zigzag(frame, design),
            LayoutKind.Segments => new Segments(frame, design),
            LayoutKind.Loops => new Loops(frame, design),
            LayoutKind.PointGrid => new PointGrid(frame, design),
            LayoutKind.PointsOnLines => new PointsOnLines(frame, design),
            LayoutKind.RandomPoints => new RandomPoints(frame, design),
            LayoutKind.BalancedPoints => new BalancedPoints(frame, design),
            _ => throw new InvalidOperationException($"layout kind {design.Kind} is not in the list"),
        };
    }
}
