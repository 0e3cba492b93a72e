namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Takes outlines from one kind of coordinates to another where straight edges become curves: edges are halved until no piece strays by
/// more than a tolerance. The same edge walked the other way gives the same points, so that neighbours stay neighbours.
/// </summary>
/// <param name="map">From the old coordinates to the new.</param>
/// <param name="distance">Metres between two points in the new coordinates.</param>
/// <param name="isTurn">True when x in the new coordinates is a longitude, which may jump by 360.</param>
/// <param name="toleranceMetres">How far a piece may stray.</param>
internal sealed class Densifier(Func<FilePoint, FilePoint> map, Func<FilePoint, FilePoint, double> distance, bool isTurn, double toleranceMetres)
{
    // A million pieces an edge: half the globe in steps of 20 m.
    private const int MostHalvings = 20;

    // Below this length the middle alone tells how an edge bends; a longer one may bend one way and then the other.
    private const double PlainMetres = 2000;

    /// <summary>An outline in new coordinates, without its last point: given from the first point back to the first, returned not closed.</summary>
    public List<FilePoint> Map(IReadOnlyList<FilePoint> closed)
    {
        var mapped = new List<FilePoint>(closed.Count);
        var next = map(closed[0]);
        for (var i = 1; i < closed.Count; i++)
        {
            var start = next;
            next = map(closed[i]);
            AddEdge(mapped, closed[i - 1], start, closed[i], next, MostHalvings);
        }

        return mapped;
    }

    /// <summary>Adds the start of an edge and what lies on it, but not its end.</summary>
    private void AddEdge(List<FilePoint> mapped, FilePoint from, FilePoint mappedFrom, FilePoint to, FilePoint mappedTo, int halvings)
    {
        var middle = Between(from, to, 0.5);
        var mappedMiddle = map(middle);
        if (halvings == 0 || IsStraight(from, mappedFrom, mappedMiddle, to, mappedTo))
        {
            mapped.Add(mappedFrom);
            return;
        }

        AddEdge(mapped, from, mappedFrom, middle, mappedMiddle, halvings - 1);
        AddEdge(mapped, middle, mappedMiddle, to, mappedTo, halvings - 1);
    }

    private bool IsStraight(FilePoint from, FilePoint mappedFrom, FilePoint mappedMiddle, FilePoint to, FilePoint mappedTo)
    {
        var end = Near(mappedTo, mappedFrom);
        if (distance(Near(mappedMiddle, mappedFrom), Between(mappedFrom, end, 0.5)) > toleranceMetres)
        {
            return false;
        }

        return distance(mappedFrom, end) <= PlainMetres
            || distance(Near(map(Between(from, to, 0.25)), mappedFrom), Between(mappedFrom, end, 0.25)) <= toleranceMetres;
    }

    private FilePoint Near(FilePoint point, FilePoint other)
        => isTurn ? new FilePoint(point.X - (360 * Math.Round((point.X - other.X) / 360)), point.Y) : point;

    private static FilePoint Between(FilePoint from, FilePoint to, double share)
        => share == 0.5
            ? new FilePoint((from.X + to.X) / 2, (from.Y + to.Y) / 2)
            : new FilePoint(from.X + (share * (to.X - from.X)), from.Y + (share * (to.Y - from.Y)));
}
