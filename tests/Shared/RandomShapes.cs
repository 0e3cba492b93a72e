using CsCheck;
using SurveyPlanner.Regions;

namespace SurveyPlanner.TestShapes;

/// <summary>Random polygons for property tests: star-shaped outlines (convex and concave), with holes, of one or several parts.</summary>
internal static class RandomShapes
{
    /// <summary>One to three parts side by side, each with up to two holes; extents of kilometres.</summary>
    public static readonly Gen<Stratum> Strata =
        from parts in Gen.Int[1, 3]
        from rings in Ring(radius: 10_000, minShare: 0.3).Array[parts]
        from holes in Ring(radius: 1_000, minShare: 0.3).Array[2].Array[parts]
        from holeCounts in Gen.Int[0, 2].Array[parts]
        from turn in Gen.Double[0, 2 * Math.PI]
        select PlaneStrata.Of([.. Enumerable.Range(0, parts).Select(part => Part(part, rings[part], holes[part], holeCounts[part], turn))]);

    /// <summary>The same shapes on every run: CsCheck's own sampling fixes only the first, and a generator without a state takes one from the clock.</summary>
    public static IEnumerable<Stratum> Sample(int count)
    {
        var random = new PCG(1, 1);
        return Enumerable.Range(0, count).Select(_ => Strata.Generate(random, null, out var _)).ToList();
    }

    private static (double X, double Y)[][] Part(
        int part, (double X, double Y)[] shell, (double X, double Y)[][] holes, int holeCount, double turn)
    {
        // Parts stand 25 km apart, so that outlines of at most 10 km never meet; holes of at most 1 km lie 1.5 km from the middle.
        var placed = holes.Take(holeCount).Select((hole, i) => Shift(hole, i == 0 ? 1500 : -1500, 0));
        return [.. new[] { shell }.Concat(placed).Select(ring => Turn(Shift(ring, part * 25_000, 0), turn))];
    }

    private static Gen<(double X, double Y)[]> Ring(double radius, double minShare) =>
        from vertices in Gen.Int[5, 60]
        from shares in Gen.Double[minShare, 1].Array[vertices]
        select shares.Select((share, i) => (
            radius * share * Math.Cos(2 * Math.PI * i / vertices), radius * share * Math.Sin(2 * Math.PI * i / vertices))).ToArray();

    private static (double X, double Y)[] Shift((double X, double Y)[] ring, double dx, double dy)
        => [.. ring.Select(vertex => (vertex.X + dx, vertex.Y + dy))];

    private static (double X, double Y)[] Turn((double X, double Y)[] ring, double angle)
    {
        var (sin, cos) = Math.SinCos(angle);
        return [.. ring.Select(vertex => ((vertex.X * cos) - (vertex.Y * sin), (vertex.X * sin) + (vertex.Y * cos)))];
    }
}
