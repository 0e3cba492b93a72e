using System.Collections.Immutable;

namespace SurveyPlanner.Layouts;

/// <summary>
/// A stretch of the band a zigzag swings in, between two heights of the turned frame, with straight sides.
/// </summary>
/// <param name="LowY">Lower end; the axis of the zigzag runs along y.</param>
/// <param name="HighY">Upper end.</param>
/// <param name="AtY">The height at which the sides are given.</param>
/// <param name="Left">x of the left side there.</param>
/// <param name="LeftSlope">Its change per metre of y.</param>
/// <param name="Right">x of the right side there.</param>
/// <param name="RightSlope">Its change per metre of y.</param>
internal readonly record struct ZigzagSection(
    double LowY, double HighY, double AtY, double Left, double LeftSlope, double Right, double RightSlope)
{
    public double WidthSlope => RightSlope - LeftSlope;

    /// <summary>The steeper of the two sides, whichever way it leans.</summary>
    public double SideSlope => Math.Max(Math.Abs(LeftSlope), Math.Abs(RightSlope));

    /// <summary>Area of a section that ends, square metres.</summary>
    public double AreaSquareMetres => (HighY - LowY) * (WidthAt(LowY) + WidthAt(HighY)) / 2;

    public double SideAt(double y, bool left)
        => left ? Left + ((y - AtY) * LeftSlope) : Right + ((y - AtY) * RightSlope);

    public double WidthAt(double y) => Right - Left + ((y - AtY) * WidthSlope);

    public ZigzagSection Flipped() => new(-HighY, -LowY, -AtY, Left, -LeftSlope, Right, -RightSlope);
}

/// <summary>
/// The band a zigzag swings in, from minus to plus infinity along its axis, in sections one above the other.
/// </summary>
internal sealed class ZigzagOutline(ImmutableArray<ZigzagSection> sections)
{
    public ImmutableArray<ZigzagSection> Sections { get; } = sections;

    /// <summary>Index of the section that holds a height; at a border, the upper one.</summary>
    public int IndexAt(double y)
    {
        var (low, high) = (0, Sections.Length - 1);
        while (low < high)
        {
            var middle = (low + high) / 2;
            (low, high) = y < Sections[middle].HighY ? (low, middle) : (middle + 1, high);
        }

        return low;
    }

    public double SideAt(double y, bool left) => Sections[IndexAt(y)].SideAt(y, left);

    /// <summary>Upside down: walking up it is walking down this one.</summary>
    public ZigzagOutline Flipped() => new([.. Sections.Reverse().Select(section => section.Flipped())]);
}
