using System.Text;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// Builds the <c>d</c> of an SVG path to a tenth of a pixel, in relative steps (half the bytes of absolute ones; rounded places are kept, so that errors do not add up).
/// </summary>
internal sealed class PathData
{
    private readonly StringBuilder _text = new();
    private long _x;
    private long _y;

    public bool IsEmpty => _text.Length == 0;

    public PathData MoveTo(Pixel p)
    {
        (_x, _y) = (Tenths(p.X), Tenths(p.Y));
        _text.Append('M');
        Append(_x);
        AppendNext(_y);
        return this;
    }

    public PathData LineTo(Pixel p)
    {
        var (x, y) = (Tenths(p.X), Tenths(p.Y));
        _text.Append('l');
        Append(x - _x);
        AppendNext(y - _y);
        (_x, _y) = (x, y);
        return this;
    }

    public PathData Close()
    {
        _text.Append('z');
        return this;
    }

    public PathData Polyline(ReadOnlySpan<Pixel> points)
    {
        MoveTo(points[0]);
        if (points.Length == 1)
        {
            // With round caps a line of no length is a dot.
            _text.Append("h0");
        }

        foreach (var point in points[1..])
        {
            LineTo(point);
        }

        return this;
    }

    public PathData Ring(ReadOnlySpan<Pixel> points) => Polyline(points).Close();

    public PathData Circle(Pixel centre, double radius)
    {
        var (r, d) = (Tenths(radius), Tenths(2 * radius));
        MoveTo(new Pixel(centre.X - radius, centre.Y));
        foreach (var way in (ReadOnlySpan<int>)[1, -1])
        {
            _text.Append('a');
            Append(r);
            AppendNext(r);
            _text.Append(" 0 1 0 ");
            Append(way * d);
            _text.Append(" 0");
        }

        return Close();
    }

    public override string ToString() => _text.ToString();

    private static long Tenths(double v) => (long)Math.Round(v * 10);

    private void AppendNext(long tenths)
    {
        if (tenths >= 0)
        {
            _text.Append(' ');
        }

        Append(tenths);
    }

    private void Append(long tenths)
    {
        if (tenths < 0)
        {
            _text.Append('-');
            tenths = -tenths;
        }

        // Digits by hand: the same in every culture, and no strings in between.
        _text.Append((ulong)tenths / 10);
        if (tenths % 10 is not 0 and var rest)
        {
            _text.Append('.').Append((char)('0' + rest));
        }
    }
}
