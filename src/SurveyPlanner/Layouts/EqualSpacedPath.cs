namespace SurveyPlanner.Layouts;

/// <summary>
/// Turns one spacing apart along the axis, on alternate sides of the convex hull; straight legs. Beyond the ends of the hull its sides go on straight
/// along the axis, and so they do from where they become flatter than the legs. The start is uniform over two spacings, so either side is as likely
/// at any place.
/// </summary>
internal sealed class EqualSpacedPath(HullSides hull, double spacingMetres) : ZigzagPath
{
    private readonly HullSides _sides = hull.WithoutFlatEnds(spacingMetres);

    public override double Period => 2 * spacingMetres;

    public override double CurveStrayMetres => 0;

    public override void AddTurns(double share, bool mirrored, List<Turn> turns)
    {
        var first = turns.Count;
        var start = _sides.MinY + ((share - 1) * Period);
        var (left, right) = (0, 0);
        for (var turn = 0; ; turn++)
        {
            var y = start + (turn * spacingMetres);
            var isLeft = (turn % 2 == 0) != mirrored;
            turns.Add(new Turn(isLeft ? _sides.Left(y, ref left) : _sides.Right(y, ref right), y, isLeft));
            if (y > _sides.MaxY)
            {
                break;
            }
        }

        if (mirrored)
        {
            turns.Reverse(first, turns.Count - first);
        }
    }

    public override void AddLeg(Turn from, Turn to, int leg, SlantedLines output) => output.Add(leg, from.X, from.Y, to.X, to.Y);
}
