using System.Collections.Immutable;
using System.Globalization;

namespace SurveyPlanner.Layouts;

/// <summary>
/// The band for a zigzag that follows a <see cref="SwingRule"/>: the convex hull as far as the path can turn at its sides, and beyond that, at
/// the tips, a strip of the width reached there that holds the tip. So coverage goes on evenly into a tip, at the price of some path outside it.
/// </summary>
internal sealed class ZigzagBand
{
    // More than this share of the hull in its tips, and the zigzag is no longer what its name says.
    private const double MostInTips = 0.1;

    // Less is not worth a word.
    private const double LeastWorthSaying = 0.001;

    private readonly StratumFrame _stratum;
    private readonly string _turning;
    private readonly SwingRule _rule;
    private readonly ImmutableArray<ZigzagSection> _hull;
    private readonly double _hullArea;

    private ZigzagBand(StratumFrame stratum, HullSides hull, SwingRule rule, string turning)
    {
        (_stratum, _rule, _turning) = (stratum, rule, turning);
        _hull = hull.Sections();
        _hullArea = _hull.Sum(section => section.AreaSquareMetres);
        var (upper, upperTip) = HalfFromMiddle(_hull, up: true);
        var (lower, lowerTip) = HalfFromMiddle(new ZigzagOutline(_hull).Flipped().Sections, up: false);
        Outline = new ZigzagOutline([.. lower.AsEnumerable().Reverse().Select(section => section.Flipped()), .. upper]);
        var share = (upperTip.Area + lowerTip.Area) / _hullArea;
        if (share > MostInTips)
        {
            throw Refused(Where(lowerTip, upperTip), share);
        }

        Warning = share < LeastWorthSaying ? null : string.Create(
            CultureInfo.InvariantCulture,
            $"in stratum '{stratum.Stratum.Name}' the {turning} zigzag cannot turn at the sides of {Where(lowerTip, upperTip)}; there it swings in a strip of constant width that reaches beyond the hull ({100 * share:0.#} % of the hull's area)");
    }

    public ZigzagOutline Outline { get; }

    /// <summary>What a user should know of the tips; null when there is nothing to say.</summary>
    public string? Warning { get; }

    /// <exception cref="InputException">The zigzag does not exist in this stratum; says where along its axis.</exception>
    public static ZigzagBand For(StratumFrame stratum, HullSides hull, SwingRule rule, string turning) => new(stratum, hull, rule, turning);

    private double LowY => _hull[0].LowY;

    private double HighY => _hull[^1].HighY;

    /// <summary>From the middle of the axis up to where the path can no longer turn, and the strip from there on.</summary>
    private (List<ZigzagSection> Sections, Tip Tip) HalfFromMiddle(ImmutableArray<ZigzagSection> hull, bool up)
    {
        var reached = (hull[0].LowY + hull[^1].HighY) / 2;
        var kept = new List<ZigzagSection>();
        for (var i = new ZigzagOutline(hull).IndexAt(reached); ; i++)
        {
            var until = WorksUntil(hull[i], reached);
            if (until > reached)
            {
                kept.Add(hull[i] with { LowY = reached, HighY = until });
                reached = until;
            }

            if (until < hull[i].HighY || i == hull.Length - 1)
            {
                var tip = new Tip(hull[^1].HighY - reached, AreaAbove(hull, reached));
                if (kept.Count == 0 || !HoldsTip(hull[i], tip, reached))
                {
                    throw Refused(up ? Where(default, tip) : Where(tip, default), tip.Area / _hullArea);
                }

                kept.Add(Strip(hull[i], reached));
                return (kept, tip);
            }
        }
    }

    /// <summary>Up to which height of a section the path can turn at its sides; below the given height when it cannot even there.</summary>
    private double WorksUntil(ZigzagSection section, double from)
    {
        var narrowest = _rule.NarrowestFor(section.SideSlope);
        if (section.WidthAt(from) < narrowest)
        {
            return double.NegativeInfinity;
        }

        return section.WidthAt(section.HighY) >= narrowest
            ? section.HighY
            : Math.Clamp(section.AtY + ((narrowest - (section.Right - section.Left)) / section.WidthSlope), from, section.HighY);
    }

    /// <summary>The endless strip above a height: as wide as the hull there, leaning no more than it must to hold the rest of it.</summary>
    private static ZigzagSection Strip(ZigzagSection section, double y)
    {
        var lean = Math.Clamp(0, Math.Min(section.LeftSlope, section.RightSlope), Math.Max(section.LeftSlope, section.RightSlope));
        return new ZigzagSection(y, double.PositiveInfinity, y, section.SideAt(y, left: true), lean, section.SideAt(y, left: false), lean);
    }

    /// <summary>Whether the hull narrows from a height on, so that the strip holds its tip, and the path can turn in the strip.</summary>
    private bool HoldsTip(ZigzagSection section, Tip tip, double y)
    {
        var strip = Strip(section, y);
        return tip.Metres == 0 || (section.WidthSlope <= 0 && strip.WidthAt(y) * (1 + 1e-9) >= _rule.NarrowestFor(strip.SideSlope));
    }

    private static double AreaAbove(ImmutableArray<ZigzagSection> hull, double y)
        => hull.Where(section => section.HighY > y).Sum(section => (section with { LowY = Math.Max(section.LowY, y) }).AreaSquareMetres);

    private string Where(Tip lower, Tip upper)
    {
        static string Km(double metres) => (metres / 1000).ToString("0.##", CultureInfo.InvariantCulture);
        var parts = new List<string>();
        if (lower.Metres > 0)
        {
            parts.Add($"the first {Km(lower.Metres)} km");
        }

        if (upper.Metres > 0)
        {
            parts.Add($"the last {Km(upper.Metres)} km");
        }

        // The axis runs at right angles to the bearing, anticlockwise of it.
        var axis = ((_stratum.BearingDegrees + 270) % 360).ToString("0.#", CultureInfo.InvariantCulture);
        return $"{string.Join(" and ", parts)} of the {Km(HighY - LowY)} km of its axis (towards {axis}°)";
    }

    private InputException Refused(string where, double share) => new(new Problem(
        string.Create(
            CultureInfo.InvariantCulture,
            $"the {_turning} zigzag does not exist in stratum '{_stratum.Stratum.Name}': in {where}, {100 * share:0} % of its convex hull, the hull is too narrow or its sides lean too much for it to turn; choose a smaller spacing, another bearing, or turning = \"equal-spaced\""),
        Key: "layout.turning"));

    private readonly record struct Tip(double Metres, double Area);
}
