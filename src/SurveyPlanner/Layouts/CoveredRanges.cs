namespace SurveyPlanner.Layouts;

/// <summary>
/// The heights at which a shape has any part, with the gaps between parts closed up: positions from 0 to <see cref="Length"/>.
/// </summary>
internal sealed class CoveredRanges
{
    private readonly double[] _low;

    // Position of each range's lower end, and the whole length as last entry.
    private readonly double[] _positions;

    public CoveredRanges(FrameShape shape)
    {
        var ranges = new List<(double Low, double High)>();
        foreach (var (low, high) in shape.PartRanges.Order())
        {
            if (ranges.Count > 0 && low <= ranges[^1].High)
            {
                ranges[^1] = (ranges[^1].Low, Math.Max(high, ranges[^1].High));
            }
            else
            {
                ranges.Add((low, high));
            }
        }

        _low = [.. ranges.Select(range => range.Low)];
        _positions = new double[ranges.Count + 1];
        for (var i = 0; i < ranges.Count; i++)
        {
            _positions[i + 1] = _positions[i] + (ranges[i].High - ranges[i].Low);
        }
    }

    /// <summary>Length of all ranges together, metres.</summary>
    public double Length => _positions[^1];

    /// <summary>The height at a position.</summary>
    public double HeightAt(double position)
    {
        var i = Array.BinarySearch(_positions, 0, _low.Length, position);
        i = i >= 0 ? i : Math.Max(0, ~i - 1);
        return _low[i] + (position - _positions[i]);
    }

    /// <summary>The position of a height within a range.</summary>
    public double PositionOf(double height)
    {
        var i = Array.BinarySearch(_low, height);
        i = i >= 0 ? i : Math.Max(0, ~i - 1);
        return _positions[i] + (height - _low[i]);
    }
}
