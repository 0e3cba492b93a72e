using System.Runtime.Intrinsics;

namespace SurveyPlanner.Layouts;

/// <summary>A straight line from a start, in a direction of length 1, so many metres long.</summary>
internal readonly record struct Segment(double StartX, double StartY, double DirectionX, double DirectionY, double Length)
{
    public double MiddleX => StartX + (DirectionX * Length / 2);

    public double MiddleY => StartY + (DirectionY * Length / 2);

    /// <summary>The place so far from its start.</summary>
    public (double X, double Y) At(double along) => (StartX + (along * DirectionX), StartY + (along * DirectionY));

    /// <summary>
    /// Heights of eight places over the infinite line, those on its left positive. To the same digits as <see cref="HeightOf"/>.
    /// </summary>
    public Vector512<double> HeightsOf(Vector512<double> x, Vector512<double> y)
        => ((y - Vector512.Create(StartY)) * DirectionX) - ((x - Vector512.Create(StartX)) * DirectionY);

    /// <summary>Whether it crosses an edge, how far from its start, and whether from the inside to the outside.</summary>
    public bool Crosses(in FrameShape.Edge edge, out double along, out bool leaves)
    {
        // "On or below" is decided once a vertex, so crossings pair up.
        var (low, high) = (HeightOf(edge.LowX, edge.LowY), HeightOf(edge.HighX, edge.HighY));
        var share = low / (low - high);
        var x = edge.LowX + (share * (edge.HighX - edge.LowX));
        var y = edge.LowY + (share * (edge.HighY - edge.LowY));
        along = ((x - StartX) * DirectionX) + ((y - StartY) * DirectionY);

        // An edge that comes up from below the line is met on its left side.
        leaves = low <= 0 == edge.InsideLeft;
        return low <= 0 != (high <= 0) && along > 0 && along < Length;
    }

    private double HeightOf(double x, double y) => ((y - StartY) * DirectionX) - ((x - StartX) * DirectionY);
}
