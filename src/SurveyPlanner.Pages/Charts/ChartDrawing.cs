using SurveyPlanner.Pages.Maps;

namespace SurveyPlanner.Pages.Charts;

/// <summary>A chart in pixels.</summary>
internal sealed class ChartDrawing
{
    public const double Width = 680;
    public const double Height = 360;
    public const double Left = 60;
    public const double Right = 20;
    public const double Top = 16;
    public const double Bottom = 48;
    private const double TextSize = 12;

    private readonly Chart _chart;
    private readonly LabelPlacer _placer = new(Width, Height);
    private readonly List<Label> _labels = [];

    public ChartDrawing(Chart chart)
    {
        _chart = chart;
        foreach (var level in chart.Levels)
        {
            Place(level.Label, Anchor.End, new(Width - Right, At(0, level.Y).Y - 5), new(Width - Right, At(0, level.Y).Y + 14));
        }

        foreach (var dot in chart.Dots)
        {
            var at = At(dot.X, dot.Y);
            _placer.TryPlaceBox(at, 5);
            Place(dot.Label, Anchor.Start, new(at.X + 9, at.Y - 7), new(at.X + 9, at.Y + 16));
            Place(dot.Label, Anchor.End, new(at.X - 9, at.Y - 7), new(at.X - 9, at.Y + 16));
        }

        foreach (var line in chart.Lines.Where(line => line.Points.Count > 0))
        {
            var end = At(line.Points[^1].X, line.Points[^1].Y);
            Place(line.Label, Anchor.End, new(end.X, end.Y - 8), new(end.X, end.Y + 18), new(end.X, end.Y - 24), new(end.X, end.Y + 34));
        }
    }

    public IReadOnlyList<Label> Labels => _labels;

    public IEnumerable<(double At, string Text)> XTicks => _chart.X.Ticks.Select(tick => (At(tick, _chart.Y.Min).X, _chart.X.Text(tick)));

    public IEnumerable<(double At, string Text)> YTicks => _chart.Y.Ticks.Select(tick => (At(_chart.X.Min, tick).Y, _chart.Y.Text(tick)));

    public Pixel At(double x, double y) => new(
        Left + ((x - _chart.X.Min) / (_chart.X.Max - _chart.X.Min) * (Width - Left - Right)),
        Height - Bottom - ((y - _chart.Y.Min) / (_chart.Y.Max - _chart.Y.Min) * (Height - Top - Bottom)));

    public string Path(Line line) => line.Points.Count == 0 ? "" : new PathData().Polyline([.. line.Points.Select(point => At(point.X, point.Y))]).ToString();

    public string Band(Line line) => line.Band.Count == 0
        ? ""
        : new PathData().Ring([.. line.Band.Select(b => At(b.X, b.High)), .. line.Band.Reverse().Select(b => At(b.X, b.Low))]).ToString();

    // Each label once: the second set of places is tried only where the first found no room.
    private void Place(string text, Anchor anchor, params Pixel[] places)
    {
        if (_labels.Any(label => label.Text == text))
        {
            return;
        }

        if (places.Select(place => new Label(text, place, anchor)).FirstOrDefault(label => _placer.TryPlace(label, TextSize)) is { } free)
        {
            _labels.Add(free);
        }
    }
}
