using SurveyPlanner.Layouts;
using SurveyPlanner.Pages.Words;

namespace SurveyPlanner.Pages.Maps;

/// <summary>The transects of a survey on a drawing.</summary>
/// <param name="Lines">Path and tooltip of each that is a line.</param>
/// <param name="Points">The same of each that is a point.</param>
/// <param name="Rings">Circles of the detection radius round points, where they are large enough to see.</param>
/// <param name="Chevrons">Where and which way (degrees clockwise from rightwards) lines are travelled.</param>
/// <param name="Ids">Ids that found room.</param>
/// <param name="IdsLeftOut">Number of transects of which no id found room.</param>
public sealed record TransectsDrawing(
    IReadOnlyList<(string Path, string Title)> Lines,
    IReadOnlyList<(string Path, string Title)> Points,
    string Rings,
    IReadOnlyList<(Pixel Place, double Turn)> Chevrons,
    IReadOnlyList<Label> Ids,
    int IdsLeftOut)
{
    public const double IdSize = 12;

    // Shorter pieces have no room for the mark, which is 10 pixels long.
    private const double LeastForChevron = 18;
    private const double LeastRingRadius = 4;

    internal static TransectsDrawing Of(IEnumerable<Layout> layouts, MapFrame frame, LabelPlacer placer)
    {
        var all = layouts.SelectMany(layout => layout.Transects, (layout, transect) => new Drawn(layout, transect, Pixels(transect, frame))).ToArray();
        var rings = new PathData();
        foreach (var point in all.Where(drawn => drawn.Transect.IsPoint))
        {
            placer.PlaceBox(point.Start, 4);
            if (point.Layout.Design.HalfWidthMetres / frame.MetresPerPixel is var radius && radius >= LeastRingRadius)
            {
                rings.Circle(point.Start, radius);
            }
        }

        var chevrons = all.Select(ChevronOf).OfType<(Pixel Place, double Turn)>()
            .Where(chevron => placer.TryPlaceBox(chevron.Place, 6)).ToArray();
        var meetings = Meetings(all);
        var ids = all.Select(drawn => IdLabels(drawn, meetings, placer)).ToArray();
        return new TransectsDrawing(
            Marks(ofPoints: false),
            Marks(ofPoints: true),
            rings.ToString(),
            chevrons,
            [.. ids.SelectMany(labels => labels)],
            ids.Count(labels => labels.Count == 0));

        (string, string)[] Marks(bool ofPoints)
            => [.. all.Where(drawn => drawn.Transect.IsPoint == ofPoints).Select(drawn => (drawn.Path, drawn.Title))];
    }

    private static Pixel[][] Pixels(Transect transect, MapFrame frame)
        => [.. transect.Pieces.Select(piece => piece.Plane.Select(frame.ToPixel).ToArray())];

    private static (int, int) Rounded(Pixel p) => ((int)Math.Round(p.X), (int)Math.Round(p.Y));

    // In the middle of the longest piece.
    private static (Pixel Place, double Turn)? ChevronOf(Drawn drawn)
    {
        var longest = drawn.Pieces.MaxBy(Length)!;
        var half = Length(longest) / 2;
        if (half < LeastForChevron / 2)
        {
            return null;
        }

        for (var i = 1; ; i++)
        {
            var (a, b) = (longest[i - 1], longest[i]);
            var leg = a.DistanceTo(b);
            if (half <= leg || i == longest.Length - 1)
            {
                var share = leg > 0 ? Math.Min(half / leg, 1) : 0;
                return (new Pixel(a.X + (share * (b.X - a.X)), a.Y + (share * (b.Y - a.Y))), Math.Atan2(b.Y - a.Y, b.X - a.X) * 180 / Math.PI);
            }

            half -= leg;
        }
    }

    private static double Length(Pixel[] piece)
    {
        var length = 0.0;
        for (var i = 1; i < piece.Length; i++)
        {
            length += piece[i - 1].DistanceTo(piece[i]);
        }

        return length;
    }

    private static List<Label> IdLabels(Drawn drawn, Dictionary<(int, int), (double X, double Y)> meetings, LabelPlacer placer)
    {
        var id = drawn.Transect.Id;
        IEnumerable<IEnumerable<Label>> ends = drawn.Transect.IsPoint
            ? [PointPlaces(id, drawn.Start)]
            :
            [
                LinePlaces(id, drawn.Start, drawn.Pieces[0][1], meetings),
                LinePlaces(id, drawn.End, drawn.Pieces[^1][^2], meetings),
            ];
        return [.. ends.Select(places => places.FirstOrDefault(label => placer.TryPlace(label, IdSize))).OfType<Label>()];
    }

    private static IEnumerable<Label> PointPlaces(string id, Pixel at) =>
    [
        new Label(id, new Pixel(at.X + 6, at.Y - 5), Anchor.Start),
        new Label(id, new Pixel(at.X + 6, at.Y + 13), Anchor.Start),
        new Label(id, new Pixel(at.X - 6, at.Y - 5), Anchor.End),
        new Label(id, new Pixel(at.X - 6, at.Y + 13), Anchor.End),
    ];

    // Beyond the end of the line, else beside it.
    private static IEnumerable<Label> LinePlaces(string id, Pixel end, Pixel next, Dictionary<(int, int), (double X, double Y)> meetings)
    {
        var (ux, uy) = Direction(next, end);
        var (halfWide, halfHigh) = (id.Length * IdSize * 0.3, IdSize * 0.42);
        var aside = 4 + (Math.Abs(uy) * halfWide) + (Math.Abs(ux) * halfHigh);
        if (meetings.TryGetValue(Rounded(end), out var inward))
        {
            // Where lines meet (the turns of a zigzag) a label beyond the end would not tell which is which:
            // along the line instead, a little way in, on the side away from the other.
            yield return Beside(Math.Sign((uy * inward.X) - (ux * inward.Y)), Math.Min(28, end.DistanceTo(next) / 3));
            yield break;
        }

        var beyond = 4 + (Math.Abs(ux) * halfWide) + (Math.Abs(uy) * halfHigh);
        yield return new Label(id, new Pixel(end.X + (beyond * ux), end.Y + (beyond * uy) + halfHigh));
        yield return Beside(1, Math.Min(8, end.DistanceTo(next) / 3));
        yield return Beside(-1, Math.Min(8, end.DistanceTo(next) / 3));

        Label Beside(int side, double back)
            => new(id, new Pixel(end.X - (back * ux) - (side * aside * uy), end.Y - (back * uy) + (side * aside * ux) + halfHigh));
    }

    // Places where ends of more than one line meet, with the sum of the directions in which the lines leave.
    private static Dictionary<(int, int), (double X, double Y)> Meetings(IEnumerable<Drawn> all) => all
        .Where(drawn => !drawn.Transect.IsPoint)
        .SelectMany(drawn => new[] { (At: drawn.Start, Next: drawn.Pieces[0][1]), (At: drawn.End, Next: drawn.Pieces[^1][^2]) })
        .GroupBy(end => Rounded(end.At), end => Direction(end.At, end.Next))
        .Where(group => group.Count() > 1)
        .ToDictionary(group => group.Key, group => (group.Sum(way => way.X), group.Sum(way => way.Y)));

    private static (double X, double Y) Direction(Pixel from, Pixel to)
    {
        var length = Math.Max(from.DistanceTo(to), 1e-9);
        return ((to.X - from.X) / length, (to.Y - from.Y) / length);
    }

    private sealed record Drawn(Layout Layout, Transect Transect, Pixel[][] Pieces)
    {
        public Pixel Start => Pieces[0][0];

        public Pixel End => Pieces[^1][^1];

        public string Path => string.Concat(Pieces.Select(piece => new PathData().Polyline(piece).ToString()));

        public string Title => Transect.IsPoint ? Transect.Id : $"{Transect.Id}, {Figures.Distance(Transect.LengthMetres)}";
    }
}
