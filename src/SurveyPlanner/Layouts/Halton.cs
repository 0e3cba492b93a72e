namespace SurveyPlanner.Layouts;

/// <summary>The Halton sequence: the digits of a whole number mirrored at the point, so that successive numbers fall far apart and fill in evenly.</summary>
internal static class Halton
{
    /// <summary>The number that has the digits of <paramref name="index"/> in reverse behind the point, in [0, 1).</summary>
    public static double RadicalInverse(uint radix, ulong index)
    {
        var (digits, scale) = (0UL, 1UL);
        for (; index > 0; index /= radix)
        {
            digits = (digits * radix) + (index % radix);
            scale *= radix;
        }

        return (double)digits / scale;
    }
}
