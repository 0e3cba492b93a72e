using System.Globalization;

namespace SurveyPlanner.Pages.Words;

/// <summary>Numbers as the pages show them, whatever the culture of the machine.</summary>
internal static class Figures
{
    /// <summary>Stands where there is no figure.</summary>
    public const string None = "–";

    // Below this a share or a coefficient of variation is rounding error of double arithmetic, not a finding.
    private const double Nothing = 1e-9;

    // Percent: a hundred-thousandth of the area, less than any cell that is looked at.
    private const double LeastShare = 0.001;

    /// <summary>Three significant figures, never in powers of ten; thousands set off by a narrow space.</summary>
    public static string Three(double? value)
    {
        if (value is not { } v || !double.IsFinite(v))
        {
            return None;
        }

        if (Math.Abs(v) < Nothing)
        {
            return "0";
        }

        // 9.996 rounds to 10.0, which then needs one decimal fewer.
        var rounded = RoundTo(v, DecimalsForThree(v));
        var decimals = DecimalsForThree(rounded);
        return decimals <= 0 ? Grouped(rounded) : rounded.ToString("F" + decimals, CultureInfo.InvariantCulture);
    }

    /// <summary>A share of one as a percentage with three significant figures and its sign.</summary>
    public static string Percent(double? share) => share is { } s && double.IsFinite(s) ? Three(s * 100) + "\u00a0%" : None;

    /// <summary>A share of an area in percent, without the sign; of slivers of cells at a boundary, only that they are there.</summary>
    public static string AreaShare(double share) => share * 100 is >= Nothing and < LeastShare ? "under 0.001" : Three(share * 100);

    /// <summary>A share of one that somebody chose, such as a target, as a percentage without digits that were not given.</summary>
    public static string ChosenPercent(double share) => (100 * share).ToString("0.####", CultureInfo.InvariantCulture) + "\u00a0%";

    /// <summary>A count, exact, thousands set off by a narrow space.</summary>
    public static string Count(long value) => Grouped(value);

    /// <summary>A bearing to a tenth of a degree, in [0, 360).</summary>
    public static string Bearing(double? degrees)
    {
        if (degrees is not { } d || !double.IsFinite(d))
        {
            return None;
        }

        var tenths = (long)Math.Round(d * 10) % 3600;
        return ((tenths < 0 ? tenths + 3600 : tenths) / 10.0).ToString("F1", CultureInfo.InvariantCulture);
    }

    /// <summary>A plain number with so many decimals.</summary>
    public static string Fixed(double value, int decimals) => value.ToString("F" + decimals, CultureInfo.InvariantCulture);

    /// <summary>A whole number of metres below one kilometre, kilometres above, three significant figures, with its unit.</summary>
    public static string Distance(double metres) => Math.Abs(metres) < 1000 ? Three(metres) + "\u00a0m" : Three(metres / 1000) + "\u00a0km";

    /// <summary>"1 line", "24 lines".</summary>
    public static string Counted(long count, string one, string many) => $"{Count(count)}\u00a0{(count == 1 ? one : many)}";

    private static double RoundTo(double v, int decimals)
        => decimals >= 0 ? Math.Round(v, Math.Min(decimals, 15)) : Math.Round(v / Math.Pow(10, -decimals)) * Math.Pow(10, -decimals);

    private static int DecimalsForThree(double v) => 2 - (int)Math.Floor(Math.Log10(Math.Abs(v)));

    private static string Grouped(double v)
        => v.ToString("#,0", CultureInfo.InvariantCulture).Replace(',', '\u202f');
}
