using System.Globalization;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>The text of a <c>coordinates</c> element: tuples of longitude, latitude and perhaps height, parted by spaces.</summary>
internal static class KmlCoordinates
{
    public static List<FilePoint> Read(string text, string source, string place, VertexBudget budget)
    {
        var points = new List<FilePoint>();
        var rest = text.AsSpan();
        while (true)
        {
            rest = rest.TrimStart();
            if (rest.IsEmpty)
            {
                return points;
            }

            budget.Spend(1);
            var x = Number(ref rest);
            var y = Comma(ref rest) ? Number(ref rest) : double.NaN;
            if (double.IsNaN(x) || double.IsNaN(y) || (Comma(ref rest) && double.IsNaN(Number(ref rest))) || !(rest.IsEmpty || char.IsWhiteSpace(rest[0])))
            {
                throw FileBytes.Refusal(source, "the coordinates must be written longitude,latitude or longitude,latitude,height with a decimal point; correct them", Place.Vertex(place, points.Count + 1));
            }

            points.Add(new FilePoint(x, y));
        }
    }

    /// <summary>Takes a number off the front; NaN when there is none.</summary>
    private static double Number(ref ReadOnlySpan<char> rest)
    {
        var end = 0;
        while (end < rest.Length && (char.IsAsciiDigit(rest[end]) || rest[end] is '.' or '-' or '+' or 'e' or 'E'))
        {
            end++;
        }

        var isNumber = double.TryParse(rest[..end], NumberStyles.Float, CultureInfo.InvariantCulture, out var value) && double.IsFinite(value);
        rest = rest[end..];
        return isNumber ? value : double.NaN;
    }

    /// <summary>Takes a comma off the front. Some programs put spaces round it, which the standard forbids but nobody can misread.</summary>
    private static bool Comma(ref ReadOnlySpan<char> rest)
    {
        var next = rest.TrimStart();
        if (next.IsEmpty || next[0] != ',')
        {
            return false;
        }

        rest = next[1..].TrimStart();
        return true;
    }
}
