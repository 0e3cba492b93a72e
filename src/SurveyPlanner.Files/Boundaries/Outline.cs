namespace SurveyPlanner.Files.Boundaries;

/// <summary>An outline at work: points in the file's own frame, not closed (the last joins the first).</summary>
internal sealed class Outline(string place, List<FilePoint> points)
{
    public string Place { get; } = place;

    public List<FilePoint> Points { get; set; } = points;

    /// <summary>True when the outline goes once round a pole: then its longitudes run through a full turn from the first point to the first again.</summary>
    public bool RoundPole { get; set; }

    public double MinX => Points.Min(point => point.X);

    public double MaxX => Points.Max(point => point.X);

    public void Shift(double degrees)
    {
        if (degrees != 0)
        {
            Points = [.. Points.Select(point => new FilePoint(point.X + degrees, point.Y))];
        }
    }
}

/// <summary>A shell with its holes.</summary>
internal sealed record Part(Outline Shell, List<Outline> Holes)
{
    public Part Map(Func<Outline, List<FilePoint>> map) => MapWhole(outline => new Outline(outline.Place, map(outline)));

    public Part MapWhole(Func<Outline, Outline> map) => new(map(Shell), [.. Holes.Select(map)]);
}

/// <summary>The parts of one feature of the file, at work.</summary>
internal sealed record WorkFeature(RawFeature Raw, List<Part> Parts);
