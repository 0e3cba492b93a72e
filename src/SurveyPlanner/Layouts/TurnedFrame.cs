using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>
/// The plane turned so that transects run along x. Turning is about the plane's origin; nothing is shifted or scaled.
/// </summary>
public readonly record struct TurnedFrame
{
    private readonly double _cos;
    private readonly double _sin;

    /// <param name="angleRadians">Direction of the frame's x axis in the plane, anticlockwise from plane east.</param>
    public TurnedFrame(double angleRadians)
    {
        AngleRadians = angleRadians;
        (_sin, _cos) = Math.SinCos(angleRadians);
    }

    public double AngleRadians { get; }

    /// <summary>Plane to frame.</summary>
    public (double X, double Y) ToFrame(double x, double y) => ((x * _cos) + (y * _sin), (y * _cos) - (x * _sin));

    /// <summary>Frame to plane.</summary>
    public PlanePoint ToPlane(double x, double y) => new((x * _cos) - (y * _sin), (x * _sin) + (y * _cos));
}
