namespace SurveyPlanner.Pages.Maps;

/// <summary>Where a label is anchored on its place.</summary>
public enum Anchor
{
    Start,
    Middle,
    End,
}

/// <summary>A text placed on a drawing; <paramref name="Place"/> is the anchor on the base line.</summary>
public sealed record Label(string Text, Pixel Place, Anchor Anchor = Anchor.Middle)
{
    public string AnchorWord => Anchor switch { Anchor.Start => "start", Anchor.End => "end", _ => "middle" };
}

/// <summary>Places labels one after the other and refuses those that would cover one placed before, or leave the drawing.</summary>
internal sealed class LabelPlacer(double width, double height)
{
    // Boxes by the squares of a coarse grid that they touch: ten thousand points are no slower to label than ten.
    private const double Square = 64;
    private readonly Dictionary<(int, int), List<Box>> _taken = [];

    /// <summary>Length of a text, estimated: 0.6 of its size a character (texts are short and mostly digits), the whole of it where the script is wide.</summary>
    public static double LengthOf(string text, double sizePixels) => text.Sum(c => IsWide(c) ? 1 : 0.6) * sizePixels;

    // Blocks of East Asian wide characters (Unicode Standard Annex 11; ranges from memory).
    private static bool IsWide(char c)
        => c is (>= '\u1100' and <= '\u115f') or (>= '\u2e80' and <= '\ua4cf') or (>= '\uac00' and <= '\ud7a3') or (>= '\uf900' and <= '\ufaff') or (>= '\uff00' and <= '\uff60');

    /// <summary>Whether there is room; if so it is taken.</summary>
    public bool TryPlace(Label label, double sizePixels)
    {
        return TryTake(BoxOf(label, sizePixels));
    }

    /// <summary>The same for a mark in a square of twice the half-side.</summary>
    public bool TryPlaceBox(Pixel centre, double half) => TryTake(Around(centre, half));

    /// <summary>Takes the room whatever lies there.</summary>
    public void Place(Label label, double sizePixels) => Take(BoxOf(label, sizePixels));

    /// <summary>The same for a mark in a square of twice the half-side.</summary>
    public void PlaceBox(Pixel centre, double half) => Take(Around(centre, half));

    private bool TryTake(Box box)
    {
        if (box.Left < 2 || box.Top < 2 || box.Right > width - 2 || box.Bottom > height - 2
            || Squares(box).Any(square => _taken.TryGetValue(square, out var boxes) && boxes.Any(box.Overlaps)))
        {
            return false;
        }

        Take(box);
        return true;
    }

    private void Take(Box box)
    {
        foreach (var square in Squares(box))
        {
            if (!_taken.TryGetValue(square, out var boxes))
            {
                _taken[square] = boxes = [];
            }

            boxes.Add(box);
        }
    }

    private static IEnumerable<(int, int)> Squares(Box box)
    {
        for (var x = (int)Math.Floor(box.Left / Square); x <= box.Right / Square; x++)
        {
            for (var y = (int)Math.Floor(box.Top / Square); y <= box.Bottom / Square; y++)
            {
                yield return (x, y);
            }
        }
    }

    private static Box Around(Pixel centre, double half) => new(centre.X - half, centre.Y - half, centre.X + half, centre.Y + half);

    /// <summary>The room that a label takes.</summary>
    public static (double Left, double Top, double Right, double Bottom) Extent(Label label, double sizePixels)
    {
        var length = LengthOf(label.Text, sizePixels);
        var left = label.Anchor switch { Anchor.Start => label.Place.X, Anchor.End => label.Place.X - length, _ => label.Place.X - (length / 2) };
        return (left - 2, label.Place.Y - (0.85 * sizePixels), left + length + 2, label.Place.Y + (0.25 * sizePixels));
    }

    private static Box BoxOf(Label label, double size)
    {
        var (left, top, right, bottom) = Extent(label, size);
        return new Box(left, top, right, bottom);
    }

    private readonly record struct Box(double Left, double Top, double Right, double Bottom)
    {
        public bool Overlaps(Box other) => Left < other.Right && other.Left < Right && Top < other.Bottom && other.Top < Bottom;
    }
}
