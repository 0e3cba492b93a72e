using SurveyPlanner.Numerics;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Balanced acceptance sampling: the Halton sequence with bases 2 and 3, laid over the stratum's bounding box from a random start, of which the
/// points inside the stratum are kept until there are enough. Any run of the list is spread out over the stratum.
/// Source: Robertson, Brown, McDonald, Jaksons 2013, BAS: balanced acceptance sampling of natural resources, Biometrics 69:776-784 (from memory).
/// A start whose first point lies outside is drawn again, so that every place is as likely as every other for each point of the list
/// (Robertson, McDonald, Price, Brown 2017, Statistics and Probability Letters 129:107-112, from memory; reason in docs/methods/layouts.md).
/// </summary>
internal sealed class BalancedPoints(StratumFrame stratum, LayoutDesign design)
    : ListedPoints(stratum, design, CountFor(stratum, design))
{
    // Starts are uniform over this many of the sequence: every cell of a billionth of the box along either axis is as likely.
    private const uint StartsOfBase2 = 1 << 30;
    private const uint StartsOfBase3 = 1_162_261_467;

    protected override void AddList(int passedOver, int count, ref PhiloxStream random, PieceBuffer output)
    {
        var clip = Stratum.Clip;
        double x, y;
        ulong start2, start3;
        do
        {
            (start2, start3) = (random.NextBelow(StartsOfBase2), random.NextBelow(StartsOfBase3));
            (x, y) = PlaceOf(start2, start3);
        }
        while (!clip.Contains(x, y));

        for (var (found, step) = (0, 0UL); found < passedOver + count; step++)
        {
            (x, y) = PlaceOf(start2 + step, start3 + step);
            if (!clip.Contains(x, y))
            {
                continue;
            }

            if (found >= passedOver)
            {
                output.Add(found - passedOver, x, y, x, y);
            }

            found++;
        }
    }

    private (double X, double Y) PlaceOf(ulong index2, ulong index3)
    {
        var clip = Stratum.Clip;
        return (
            clip.MinX + (Halton.RadicalInverse(2, index2) * (clip.MaxX - clip.MinX)),
            clip.MinY + (Halton.RadicalInverse(3, index3) * (clip.MaxY - clip.MinY)));
    }
}
