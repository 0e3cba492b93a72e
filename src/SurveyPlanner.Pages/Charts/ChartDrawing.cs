using SurveyPlanner.Pages.Maps;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Charts;

/// <summary>A chart in pixels.</summary>
internal sealed class ChartDrawing
{
    public const double Width = 680;
    public const double Height = 360;
    public const double Top = 16;
    public const double Bottom = 48;
    private const double TextSize = 12;
    private const double TitleWidth = 24;
    private const double LabelStep = 17;
    private const double NamesMargin = 190;
    private const int LongestName = 18;

    private readonly Chart _chart;
    private readonly LabelPlacer _placer = new(Width, Height);
    private readonly List<Label> _labels = [];

    public ChartDrawing(Chart chart)
    {
        _chart = chart;
        Left = TitleWidth + LabelPlacer.LengthOf(chart.Y.Ticks.Select(chart.Y.Text).MaxBy(text => text.Length) ?? "", TextSize) + 12;
        var named = chart.Lines.Where(line => line.Points.Count > 0 && line.Label.Length > 0).ToArray();
        Right = named.Length > 1 ? NamesMargin : 20;
        PlaceLevels();
        PlaceDots();
        if (named.Length > 1)
        {
            Names = NamesBeside(named);
        }
        else if (named is [var line])
        {
            PlaceName(line);
        }
    }

    /// <summary>Margin on the left: room for the ticks and the axis title.</summary>
    public double Left { get; }

    /// <summary>Margin on the right: wide where the names of several lines stand in it.</summary>
    public double Right { get; }

    public double PlotWidth => Width - Left - Right;

    public static double PlotHeight => Height - Top - Bottom;

    public static double Base => Height - Bottom;

    public IReadOnlyList<Label> Labels => _labels;

    /// <summary>Names in the margin, each with its line's look, where that line ends, and the height of the name.</summary>
    public IReadOnlyList<LineName> Names { get; } = [];

    public IEnumerable<(double At, string Text)> XTicks => _chart.X.Ticks.Select(tick => (At(tick, _chart.Y.Min).X, _chart.X.Text(tick)));

    public IEnumerable<(double At, string Text)> YTicks => _chart.Y.Ticks.Select(tick => (At(_chart.X.Min, tick).Y, _chart.Y.Text(tick)));

    public Pixel At(double x, double y) => new(
        Left + ((x - _chart.X.Min) / (_chart.X.Max - _chart.X.Min) * PlotWidth),
        Base - ((y - _chart.Y.Min) / (_chart.Y.Max - _chart.Y.Min) * PlotHeight));

    public string Path(Line line) => line.Points.Count == 0 ? "" : new PathData().Polyline([.. line.Points.Select(point => At(point.X, point.Y))]).ToString();

    public string Band(Line line) => line.Band.Count == 0
        ? ""
        : new PathData().Ring([.. line.Band.Select(b => At(b.X, b.High)), .. line.Band.Reverse().Select(b => At(b.X, b.Low))]).ToString();

    public string Path(Level level)
        => (level.IsUpright
            ? new PathData().Polyline([new(At(level.At, 0).X, Base), new(At(level.At, 0).X, Top)])
            : new PathData().Polyline([new(Left, At(0, level.At).Y), new(Width - Right, At(0, level.At).Y)])).ToString();

    private void PlaceLevels()
    {
        foreach (var level in _chart.Levels)
        {
            var at = At(level.At, level.At);
            var (above, below, right) = (at.Y - 5, at.Y + 14, Width - Right);
            if (level.IsUpright)
            {
                Place(
                    level.Label,
                    (Anchor.Start, new(at.X + 6, Top + 10)), (Anchor.Start, new(at.X + 6, Top + 26)), (Anchor.End, new(at.X - 6, Top + 10)), (Anchor.End, new(at.X - 6, Top + 26)));
            }
            else
            {
                Place(
                    level.Label, (Anchor.End, new(right, above)), (Anchor.End, new(right, below)), (Anchor.Start, new(Left + 4, above)), (Anchor.Start, new(Left + 4, below)));
            }
        }
    }

    private void PlaceDots()
    {
        foreach (var dot in _chart.Dots)
        {
            var at = At(dot.X, dot.Y);
            _placer.TryPlaceBox(at, 5);
            Place(
                dot.Label,
                (Anchor.Start, new(at.X + 9, at.Y - 7)), (Anchor.Start, new(at.X + 9, at.Y + 16)), (Anchor.End, new(at.X - 9, at.Y - 7)), (Anchor.End, new(at.X - 9, at.Y + 16)));
        }
    }

    // At the end of the line, as near as there is room, inside the plot.
    private void PlaceName(Line line)
    {
        var end = End(line);
        var heights = new[] { -8, 18, -25, 35, -42, 52 }.Select(rise => end.Y + rise).Where(y => y > Top + 8 && y < Base - 4);
        Place(line.Label, [.. heights.Select(y => (Anchor.End, new Pixel(end.X, y)))]);
    }

    // In the order in which the lines end, pushed down where they would touch, then up again from the base.
    private List<LineName> NamesBeside(IEnumerable<Line> lines)
    {
        var names = lines.OrderBy(line => End(line).Y)
            .Select(line => new LineName(PlainText.Shorten(line.Label, LongestName), line.Look, End(line), End(line).Y)).ToList();
        for (var i = 1; i < names.Count; i++)
        {
            names[i] = names[i] with { Y = Math.Max(names[i].Y, names[i - 1].Y + LabelStep) };
        }

        for (var (i, lowest) = (names.Count - 1, Base); i >= 0; i--, lowest -= LabelStep)
        {
            names[i] = names[i] with { Y = Math.Min(names[i].Y, lowest) };
        }

        return names;
    }

    // Where the line is seen to end: it may run out of the plot above or below.
    private Pixel End(Line line)
    {
        var end = At(line.Points[^1].X, line.Points[^1].Y);
        return end with { Y = Math.Clamp(end.Y, Top, Base) };
    }

    // The first place that is free and that no line runs through; without one, the first that is free; without one, none.
    private void Place(string text, params (Anchor Anchor, Pixel At)[] places)
    {
        var labels = places.Select(place => new Label(text, place.At, place.Anchor)).ToArray();
        if (labels.OrderBy(IsCrossed).FirstOrDefault(label => _placer.TryPlace(label, TextSize)) is { } free)
        {
            _labels.Add(free);
        }
    }

    private bool IsCrossed(Label label)
    {
        var (left, top, right, bottom) = LabelPlacer.Extent(label, TextSize);
        return _chart.Lines.Where(line => line.Look != LineLook.Quiet).Any(line => line.Points.Zip(line.Points.Skip(1)).Any(leg =>
        {
            var (from, to) = (At(leg.First.X, leg.First.Y), At(leg.Second.X, leg.Second.Y));
            var steps = Math.Clamp((int)from.DistanceTo(to) / 4, 1, 500);
            return Enumerable.Range(0, steps + 1).Any(i =>
            {
                var (x, y) = (from.X + ((to.X - from.X) * i / steps), from.Y + ((to.Y - from.Y) * i / steps));
                return x > left && x < right && y > top && y < bottom;
            });
        }));
    }
}

/// <summary>A name in the margin.</summary>
/// <param name="Text">The name.</param>
/// <param name="Look">The look of its line.</param>
/// <param name="End">Where its line ends.</param>
/// <param name="Y">Height of the name's middle.</param>
internal sealed record LineName(string Text, LineLook Look, Pixel End, double Y);
