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
    private readonly List<(double Left, double Top, double Right, double Bottom)> _taken = [];

    /// <summary>Whether there is room; if so it is taken. Width of text is estimated: 0.6 of its size a character (the map's text is short and mostly digits).</summary>
    public bool TryPlace(Label label, double sizePixels)
    {
        return TryTake(BoxOf(label, sizePixels));
    }

    /// <summary>The same for a mark in a square of twice the half-side.</summary>
    public bool TryPlaceBox(Pixel centre, double half) => TryTake((centre.X - half, centre.Y - half, centre.X + half, centre.Y + half));

    private bool TryTake((double Left, double Top, double Right, double Bottom) box)
    {
        if (box.Left < 2 || box.Top < 2 || box.Right > width - 2 || box.Bottom > height - 2 || _taken.Any(other => Overlap(box, other)))
        {
            return false;
        }

        _taken.Add(box);
        return true;
    }

    /// <summary>Takes the room whatever lies there.</summary>
    public void Place(Label label, double sizePixels) => _taken.Add(BoxOf(label, sizePixels));

    private static (double Left, double Top, double Right, double Bottom) BoxOf(Label label, double size)
    {
        var length = label.Text.Length * size * 0.6;
        var left = label.Anchor switch { Anchor.Start => label.Place.X, Anchor.End => label.Place.X - length, _ => label.Place.X - (length / 2) };
        return (left - 2, label.Place.Y - (0.85 * size), left + length + 2, label.Place.Y + (0.25 * size));
    }

    private static bool Overlap((double L, double T, double R, double B) a, (double L, double T, double R, double B) b)
        => a.L < b.R && b.L < a.R && a.T < b.B && b.T < a.B;
}
