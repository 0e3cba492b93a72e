namespace SurveyPlanner.Layouts;

/// <summary>A straight line from a start, in a direction of length 1, so many metres long.</summary>
internal readonly record struct Segment(double StartX, double StartY, double DirectionX, double DirectionY, double Length)
{
    /// <summary>The same as an edge, its lower end first.</summary>
    public FrameShape.Edge Upwards
    {
        get
        {
            var (endX, endY) = (StartX + (DirectionX * Length), StartY + (DirectionY * Length));
            return StartY <= endY
                ? new FrameShape.Edge(StartX, StartY, endX, endY, InsideLeft: false)
                : new FrameShape.Edge(endX, endY, StartX, StartY, InsideLeft: false);
        }
    }

    /// <summary>Whether it crosses an edge, and how far from its start.</summary>
    public bool Crosses(in FrameShape.Edge edge, out double along)
    {
        // Height of the edge's ends over the infinite line; "on or below" is decided once a vertex, so crossings pair up.
        var low = ((edge.LowY - StartY) * DirectionX) - ((edge.LowX - StartX) * DirectionY);
        var high = ((edge.HighY - StartY) * DirectionX) - ((edge.HighX - StartX) * DirectionY);
        along = 0;
        if ((low <= 0) == (high <= 0))
        {
            return false;
        }

        var share = low / (low - high);
        var x = edge.LowX + (share * (edge.HighX - edge.LowX));
        var y = edge.LowY + (share * (edge.HighY - edge.LowY));
        along = ((x - StartX) * DirectionX) + ((y - StartY) * DirectionY);
        return along > 0 && along < Length;
    }
}
