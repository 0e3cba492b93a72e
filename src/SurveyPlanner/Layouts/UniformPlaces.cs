using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Draws places uniformly over a shape, three random numbers each however thin the shape: one chooses a trapezoid by its area, two a place in it.
/// </summary>
internal sealed class UniformPlaces
{
    private readonly Trapezoid[] _parts;
    private readonly double[] _areaUpTo;

    public UniformPlaces(FrameShape shape)
    {
        _parts = [.. Trapezoids.Of(shape)];
        _areaUpTo = new double[_parts.Length];
        var total = 0.0;
        for (var i = 0; i < _parts.Length; i++)
        {
            _areaUpTo[i] = total += _parts[i].AreaSquareMetres;
        }
    }

    public (double X, double Y) Draw(ref PhiloxStream random)
    {
        var index = Array.BinarySearch(_areaUpTo, random.NextDouble() * _areaUpTo[^1]);
        index = Math.Min(index >= 0 ? index + 1 : ~index, _parts.Length - 1);
        ref readonly var part = ref _parts[index];

        // The height by the inverse of the area below it, in the form that does not lose digits where the sides are nearly parallel.
        var (share, low, high) = (random.NextDouble(), part.LowWidth, part.HighWidth);
        var up = share * (low + high) / (low + Math.Sqrt((low * low) + (share * ((high * high) - (low * low)))));
        var across = random.NextDouble();
        var (left, right) = (part.LowLeft + (up * (part.HighLeft - part.LowLeft)), part.LowRight + (up * (part.HighRight - part.LowRight)));
        return (left + (across * (right - left)), part.LowY + (up * (part.HighY - part.LowY)));
    }
}
