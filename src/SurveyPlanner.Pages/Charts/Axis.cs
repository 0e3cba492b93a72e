using System.Globalization;

namespace SurveyPlanner.Pages.Charts;

/// <summary>An axis of a chart in round numbers.</summary>
/// <param name="Title">What it counts, with its unit.</param>
/// <param name="Min">Where it begins.</param>
/// <param name="Max">Where it ends.</param>
/// <param name="Step">From tick to tick.</param>
public sealed record Axis(string Title, double Min, double Max, double Step)
{
    private const int MostTicks = 7;
    private static readonly int[] RoundFactors = [1, 2, 5, 10];

    /// <summary>Places of the ticks.</summary>
    public IEnumerable<double> Ticks
    {
        get
        {
            var first = (long)Math.Ceiling((Min / Step) - 1e-9);
            var last = (long)Math.Floor((Max / Step) + 1e-9);
            for (var i = first; i <= last; i++)
            {
                yield return i * Step;
            }
        }
    }

    /// <summary>An axis that holds both values, its ends and ticks round (1, 2 or 5 times a power of ten).</summary>
    public static Axis Covering(string title, double low, double high)
    {
        var span = high > low ? high - low : Math.Max(Math.Abs(high), 1);
        var power = Math.Pow(10, Math.Floor(Math.Log10(span / (MostTicks - 1))));
        var step = RoundFactors.Select(factor => factor * power).First(step => span / step <= MostTicks - 1);
        var (min, max) = (Math.Floor((low / step) + 1e-9) * step, Math.Ceiling((high / step) - 1e-9) * step);
        return new Axis(title, min, max > min ? max : min + step, step);
    }

    /// <summary>A tick in words: as many decimals as the step needs.</summary>
    public string Text(double tick)
    {
        var decimals = Math.Max(0, -(int)Math.Floor(Math.Log10(Step) + 1e-9));
        var text = (Math.Abs(tick) < Step / 2 ? 0 : tick).ToString("N" + Math.Min(decimals, 10), CultureInfo.InvariantCulture);
        return text.Replace(',', '\u202f').Replace('-', '−');
    }
}
