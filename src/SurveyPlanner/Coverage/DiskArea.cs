using SurveyPlanner.Layouts;

namespace SurveyPlanner.Coverage;

/// <summary>
/// Area that a disk shares with a shape, exactly: Green's theorem along the pieces of edges inside the disk and the arcs of the circle inside
/// the shape. Accuracy: 1e-12 of the disk's area, for edges that do not graze the circle.
/// </summary>
internal sealed class DiskArea(FrameShape shape, double radius)
{
    private readonly List<double> _angles = [];

    // The number of the disk that each edge was last looked at for: an edge stands in several tiles.
    private readonly int[] _lookedAt = new int[shape.Edges.Length];
    private int _disk;

    /// <summary>Square metres that the disk round (x, y), a place in the shape's bounding box, shares with the shape.</summary>
    public double At(double x, double y)
    {
        if (shape.Tiles.Clearance(x, y) > radius)
        {
            return shape.Contains(x, y) ? Math.PI * radius * radius : 0;
        }

        _angles.Clear();
        _disk++;
        var twice = 0.0;
        foreach (var number in shape.Tiles.In(x - radius, x + radius, y - radius, y + radius))
        {
            if (_lookedAt[number] != _disk)
            {
                _lookedAt[number] = _disk;
                twice += EdgeInside(shape.Edges[number], x, y);
            }
        }

        return (twice + (radius * radius * ArcsInside(x, y))) / 2;
    }

    /// <summary>Twice the signed area swept from the centre by the part of an edge inside the disk; notes where the edge meets the circle.</summary>
    private double EdgeInside(in FrameShape.Edge edge, double x, double y)
    {
        var (ax, ay, bx, by) = (edge.LowX - x, edge.LowY - y, edge.HighX - x, edge.HighY - y);
        var (dx, dy) = (bx - ax, by - ay);
        var a = (dx * dx) + (dy * dy);
        var b = (ax * dx) + (ay * dy);
        var root = (b * b) - (a * ((ax * ax) + (ay * ay) - (radius * radius)));
        if (root <= 0 || a == 0)
        {
            return 0;
        }

        root = Math.Sqrt(root);
        var (enter, leave) = ((-b - root) / a, (-b + root) / a);
        if (enter >= 1 || leave <= 0)
        {
            return 0;
        }

        Note(enter, ax, ay, dx, dy);
        Note(leave, ax, ay, dx, dy);
        var (from, to) = (Math.Max(0, enter), Math.Min(1, leave));
        var cross = ((ax + (from * dx)) * (ay + (to * dy))) - ((ax + (to * dx)) * (ay + (from * dy)));
        return edge.InsideLeft ? cross : -cross;
    }

    private void Note(double share, double ax, double ay, double dx, double dy)
    {
        if (share is > 0 and < 1)
        {
            _angles.Add(Math.Atan2(ay + (share * dy), ax + (share * dx)));
        }
    }

    /// <summary>Sum of the angles of the arcs inside the shape. Asked at the middle of the longest arc; sides alternate from there.</summary>
    private double ArcsInside(double x, double y)
    {
        if (_angles.Count < 2)
        {
            return shape.Contains(x + radius, y) ? 2 * Math.PI : 0;
        }

        _angles.Sort();
        var (longest, longestIndex) = (-1.0, 0);
        for (var i = 0; i < _angles.Count; i++)
        {
            var arc = Arc(i);
            if (arc > longest)
            {
                (longest, longestIndex) = (arc, i);
            }
        }

        var middle = _angles[longestIndex] + (longest / 2);
        var longestInside = shape.Contains(x + (radius * Math.Cos(middle)), y + (radius * Math.Sin(middle)));
        var total = 0.0;
        for (var i = 0; i < _angles.Count; i++)
        {
            var inside = longestInside == ((i - longestIndex) % 2 == 0);
            total += inside ? Arc(i) : 0;
        }

        return total;
    }

    private double Arc(int i) => i + 1 < _angles.Count ? _angles[i + 1] - _angles[i] : _angles[0] + (2 * Math.PI) - _angles[i];
}
