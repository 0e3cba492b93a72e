using System.Runtime.Intrinsics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// A segment as boxes see it, in single precision, which is enough to tell what can be skipped. From the middle of the shape, metres.
/// </summary>
internal readonly struct SegmentProbe
{
    // Far above what single precision rounds off, in parts of the lengths it is reckoned from.
    private const double Margin = 4e-6;

    private readonly float _middleX;
    private readonly float _middleY;
    private readonly float _directionX;
    private readonly float _directionY;
    private readonly float _steepness;
    private readonly float _flatness;
    private readonly float _reachX;
    private readonly float _reachY;
    private readonly float _reachBeside;

    /// <param name="segment">The segment.</param>
    /// <param name="shape">The shape whose boxes it looks at.</param>
    /// <param name="marginMetres">How far along x or y the segment may be off.</param>
    public SegmentProbe(in Segment segment, FrameShape shape, double marginMetres)
    {
        var (x, y) = (segment.MiddleX - shape.MiddleX, segment.MiddleY - shape.MiddleY);
        var margin = marginMetres + (Margin * ((shape.MaxX - shape.MinX) + (shape.MaxY - shape.MinY) + segment.Length + Math.Abs(x) + Math.Abs(y)));
        (_middleX, _middleY) = ((float)x, (float)y);
        (_directionX, _directionY) = ((float)segment.DirectionX, (float)segment.DirectionY);
        (_steepness, _flatness) = (Math.Abs(_directionY), Math.Abs(_directionX));
        _reachX = (float)((Math.Abs(segment.DirectionX) * segment.Length / 2) + margin);
        _reachY = (float)((Math.Abs(segment.DirectionY) * segment.Length / 2) + margin);
        _reachBeside = (float)(margin * (Math.Abs(segment.DirectionX) + Math.Abs(segment.DirectionY)));
    }

    /// <summary>One bit for each of sixteen boxes, given by their middles and half sides, that the segment meets.</summary>
    public ulong Meets(Vector512<float> boxX, Vector512<float> boxY, Vector512<float> halfX, Vector512<float> halfY)
    {
        // A segment misses a box where a line along x, along y or along the segment parts them.
        var fromX = boxX - Vector512.Create(_middleX);
        var fromY = boxY - Vector512.Create(_middleY);
        var beside = Vector512.MultiplyAddEstimate(fromY, Vector512.Create(_directionX), fromX * Vector512.Create(-_directionY));
        var reach = Vector512.MultiplyAddEstimate(halfX, Vector512.Create(_steepness), Vector512.Create(_reachBeside));
        reach = Vector512.MultiplyAddEstimate(halfY, Vector512.Create(_flatness), reach);
        return (Vector512.LessThanOrEqual(Vector512.Abs(beside), reach)
            & Vector512.LessThanOrEqual(Vector512.Abs(fromX), halfX + Vector512.Create(_reachX))
            & Vector512.LessThanOrEqual(Vector512.Abs(fromY), halfY + Vector512.Create(_reachY)))
            .ExtractMostSignificantBits();
    }
}
