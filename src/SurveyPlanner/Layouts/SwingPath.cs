namespace SurveyPlanner.Layouts;

/// <summary>
/// A zigzag that follows a <see cref="SwingRule"/>: equal-angle (straight legs) or adjusted-angle (curved ones). The first turn on the left side
/// beyond the middle of the axis is spread over one period of the path, uniformly in crossings of the band; the path runs on from it both ways.
/// </summary>
internal sealed class SwingPath : ZigzagPath
{
    // Half of what a leg may stray from the design; the other half is for the straight lines between positions on Earth.
    private const double CurveStrayPerHalfWidth = 0.01;

    // Receivers take routes of 250 points; some are kept for long legs.
    private const int MaxChords = 200;

    private readonly ZigzagOutline _up;
    private readonly ZigzagOutline _down;
    private readonly SwingRule _rule;
    private readonly double _lowY;
    private readonly double _highY;
    private readonly double _crossings;
    private readonly double _mirroredCrossings;
    private readonly double _tolerance;

    /// <param name="band">The band to swing in.</param>
    /// <param name="rule">How steeply.</param>
    /// <param name="lowY">Lower end of the stratum.</param>
    /// <param name="highY">Upper end of the stratum.</param>
    /// <param name="halfWidthMetres">Half-width of the strip.</param>
    public SwingPath(ZigzagOutline band, SwingRule rule, double lowY, double highY, double halfWidthMetres)
    {
        (_up, _down, _rule, _lowY, _highY) = (band, band.Flipped(), rule, lowY, highY);
        _tolerance = CurveStrayPerHalfWidth * halfWidthMetres;
        Period = PeriodFrom(left: true);
        (_crossings, _mirroredCrossings) = (CrossingsOver(Period), CrossingsOver(PeriodFrom(left: false)));
        CurveStrayMetres = band.Sections.Any(section => rule.BendAt(section.WidthAt(section.AtY), section.WidthSlope) > 0) ? _tolerance : 0;
    }

    public override double Period { get; }

    public override double CurveStrayMetres { get; }

    private double Middle => (_lowY + _highY) / 2;

    public override void AddTurns(double share, bool mirrored, List<Turn> turns)
    {
        var first = turns.Count;
        var start = Start(share * (mirrored ? _mirroredCrossings : _crossings));
        var isLeft = !mirrored;
        var (y, left) = (start, isLeft);
        while (y > _lowY)
        {
            (y, left) = (-NextTurn(_down, -y, left), !left);
            turns.Add(TurnAt(y, left));
        }

        turns.Reverse(first, turns.Count - first);
        turns.Add(TurnAt(start, isLeft));
        (y, left) = (start, isLeft);
        while (y < _highY)
        {
            (y, left) = (NextTurn(_up, y, left), !left);
            turns.Add(TurnAt(y, left));
        }

        if (mirrored)
        {
            turns.Reverse(first, turns.Count - first);
        }
    }

    /// <summary>Where the path turns next, up the axis, after a turn at height y on the given side.</summary>
    public double NextTurn(double y, bool fromLeft) => NextTurn(_up, y, fromLeft);

    public override void AddLeg(Turn from, Turn to, int leg, SlantedLines output)
    {
        var rising = from.Y < to.Y;
        var (band, sign) = rising ? (_up, 1) : (_down, -1);
        var (y, x, end) = (sign * from.Y, from.X, sign * to.Y);
        var chords = CurveStrayMetres == 0 ? 1 : ChordsFor(band, y, end);
        var start = y;
        for (var chord = 1; chord <= chords; chord++)
        {
            var nextY = start + ((double)chord / chords * (end - start));
            var nextX = chord == chords ? to.X : x + ((from.IsLeft ? 1 : -1) * Sideways(band, y, nextY));
            output.Add(leg, x, sign * y, nextX, sign * nextY);
            (x, y) = (nextX, nextY);
        }
    }

    private Turn TurnAt(double y, bool left) => new(_up.SideAt(y, left), y, left);

    private double PeriodFrom(bool left) => NextTurn(_up, NextTurn(_up, Middle, left), !left) - Middle;

    private double CrossingsOver(double metres)
    {
        var (y, total) = (Middle, 0.0);
        for (var index = _up.IndexAt(y); y < Middle + metres; index++)
        {
            var section = _up.Sections[index];
            var until = Math.Min(section.HighY, Middle + metres);
            total += _rule.Crossings(section.WidthAt(y), section.WidthSlope, until - y);
            y = until;
        }

        return total;
    }

    /// <summary>The place after so many crossings from the middle.</summary>
    private double Start(double crossings)
    {
        var y = Middle;
        for (var index = _up.IndexAt(y); ; index++)
        {
            var section = _up.Sections[index];
            var inSection = double.IsFinite(section.HighY) ? _rule.Crossings(section.WidthAt(y), section.WidthSlope, section.HighY - y) : double.PositiveInfinity;
            if (inSection >= crossings)
            {
                return y + _rule.WayFor(section.WidthAt(y), section.WidthSlope, crossings);
            }

            (crossings, y) = (crossings - inSection, section.HighY);
        }
    }

    private double NextTurn(ZigzagOutline band, double y, bool fromLeft)
    {
        var index = band.IndexAt(y);
        var toGo = band.Sections[index].WidthAt(y);
        while (true)
        {
            var section = band.Sections[index];

            // How fast the side ahead moves away.
            var away = fromLeft ? section.RightSlope : -section.LeftSlope;
            var (width, height) = (section.WidthAt(y), section.HighY - y);
            if (double.IsFinite(height))
            {
                var left = toGo + (away * height) - _rule.Sideways(width, section.WidthSlope, height);
                if (left > 0)
                {
                    (toGo, y) = (left, section.HighY);
                    index++;
                    continue;
                }
            }

            return y + WayUntilReached(toGo, away, width, section.WidthSlope, height);
        }
    }

    /// <summary>Way along the axis until the side ahead is reached: Newton's method, kept within the section.</summary>
    private double WayUntilReached(double toGo, double away, double width, double widthSlope, double most)
    {
        var (low, high) = (0.0, most);
        var way = Math.Min(toGo / (_rule.TangentAt(width) - away), most);
        for (var round = 0; round < 60; round++)
        {
            var left = toGo + (away * way) - _rule.Sideways(width, widthSlope, way);
            (low, high) = left > 0 ? (way, high) : (low, way);
            var next = way + (left / (_rule.TangentAt(width + (widthSlope * way)) - away));
            if (Math.Abs(next - way) <= 1e-15 * way)
            {
                return next;
            }

            way = next > low && next < high ? next : (low + Math.Min(high, 4 * (low + way))) / 2;
        }

        return way;
    }

    private double Sideways(ZigzagOutline band, double fromY, double toY)
    {
        var total = 0.0;
        for (var index = band.IndexAt(fromY); fromY < toY; index++)
        {
            var section = band.Sections[index];
            var until = Math.Min(section.HighY, toY);
            total += _rule.Sideways(section.WidthAt(fromY), section.WidthSlope, until - fromY);
            fromY = until;
        }

        return total;
    }

    /// <summary>Chords that keep the path within the tolerance: one chord strays by bend · length² / 8, n of them by 1/n² of that.</summary>
    private int ChordsFor(ZigzagOutline band, double fromY, double toY)
    {
        var bend = 0.0;
        for (var index = band.IndexAt(fromY); index < band.Sections.Length && band.Sections[index].LowY < toY; index++)
        {
            var section = band.Sections[index];
            var (low, high) = (Math.Max(fromY, section.LowY), Math.Min(toY, section.HighY));

            // A leg that only touches a section by rounding does not bend there.
            if (high - low > 1e-6 * (toY - fromY))
            {
                bend = Math.Max(bend, _rule.BendAt(Math.Min(section.WidthAt(low), section.WidthAt(high)), section.WidthSlope));
            }
        }

        var stray = bend * (toY - fromY) * (toY - fromY) / 8;
        return Math.Clamp((int)Math.Ceiling(Math.Sqrt(stray / _tolerance)), 1, MaxChords);
    }
}
