using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Turns the pieces of one transect from the turned frame into positions on Earth. A line that is straight in the plane gets as many vertices
/// as it needs for someone who follows the shortest path from each to the next to stray by less than 2 % of the half-width.
/// </summary>
internal sealed class TransectBuilder(LayoutGenerator generator, EqualAreaProjection projection)
{
    private const double StraySharePerHalfWidth = 0.02;

    // Receivers take routes of 250 points.
    private const int MaxVertices = 250;

    private readonly TurnedFrame _frame = generator.Stratum.Frame;
    private readonly double _toleranceMetres = (StraySharePerHalfWidth * generator.Stratum.HalfWidthMetres) - generator.CurveStrayMetres;

    public Transect Build(string id, int order, IReadOnlyList<Piece> pieces)
    {
        if (generator.Design.IsPoints)
        {
            var point = _frame.ToPlane(pieces[0].FromX, pieces[0].FromY);
            return new Transect(id, order, [new TransectPiece([point], [projection.Unproject(point)])], 0, null);
        }

        var built = Stretches(pieces).Select(BuildStretch).ToImmutableArray();
        var first = built[0].Positions;
        return new Transect(
            id,
            order,
            built,
            built.Sum(piece => Geodesic.PathLength(piece.Positions.AsSpan())),
            Geodesic.Inverse(first[0], first[1]).StartBearing);
    }

    /// <summary>Pieces that go on from one another, together.</summary>
    private static IEnumerable<List<Piece>> Stretches(IReadOnlyList<Piece> pieces)
    {
        var stretch = new List<Piece>();
        foreach (var piece in pieces)
        {
            if (stretch.Count > 0 && !piece.GoesOnFrom(stretch[^1]))
            {
                yield return stretch;
                stretch = [];
            }

            stretch.Add(piece);
        }

        yield return stretch;
    }

    private TransectPiece BuildStretch(List<Piece> pieces)
    {
        var plane = ImmutableArray.CreateBuilder<PlanePoint>();
        plane.Add(_frame.ToPlane(pieces[0].FromX, pieces[0].FromY));
        foreach (var piece in pieces)
        {
            var (from, to) = (plane[^1], _frame.ToPlane(piece.ToX, piece.ToY));

            // A bent line cut into n strays by 1/n² of what the whole one does.
            var most = Math.Max(1, (MaxVertices - 1) / pieces.Count);
            var legs = Math.Clamp((int)Math.Ceiling(Math.Sqrt(Stray(from, to) / _toleranceMetres)), 1, most);
            for (var i = 1; i <= legs; i++)
            {
                plane.Add(Between(from, to, (double)i / legs));
            }
        }

        var points = plane.ToImmutable();
        return new TransectPiece(points, [.. points.Select(projection.Unproject)]);
    }

    /// <summary>How far the middle of the straight line in the plane lies from the shortest path on the ellipsoid, metres.</summary>
    private double Stray(PlanePoint from, PlanePoint to)
    {
        var (start, middle, end) = (projection.Unproject(from), projection.Unproject(Between(from, to, 0.5)), projection.Unproject(to));
        var (whole, _, _) = Geodesic.Inverse(start, end);
        var (first, _, arriving) = Geodesic.Inverse(start, middle);
        var (second, leaving, _) = Geodesic.Inverse(middle, end);
        return whole == 0 ? 0 : Math.Abs(first * second * Math.Sin((leaving - arriving) * Math.PI / 180) / whole);
    }

    private static PlanePoint Between(PlanePoint from, PlanePoint to, double share)
        => new(from.X + (share * (to.X - from.X)), from.Y + (share * (to.Y - from.Y)));
}
