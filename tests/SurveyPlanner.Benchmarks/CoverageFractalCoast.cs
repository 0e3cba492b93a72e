using SurveyPlanner.Numerics;

namespace SurveyPlanner.Benchmarks;

/// <summary>
/// An invented island with a rough coast: the distance from its middle is displaced at ever finer midpoints of the bearing, each time by
/// 2^-0.8 of the time before, so that its coast is as rough as a real one's at every scale (dimension about 1.2). Never crosses itself.
/// </summary>
internal static class CoverageFractalCoast
{
    private const double MeanRadiusMetres = 50_000;
    private const double FirstDisplacement = 0.25;
    private const double Roughness = 0.8;

    /// <summary>The vertices, anticlockwise, not closed, metres.</summary>
    /// <param name="vertices">Their number, at least 4.</param>
    /// <param name="seed">The same seed gives the same coast, ever more finely drawn.</param>
    public static (double X, double Y)[] Of(int vertices, ulong seed)
    {
        var radii = Radii(vertices, seed);
        return [.. Enumerable.Range(0, vertices).Select(i =>
        {
            // The finest level is a power of two and mostly finer than asked for: vertices are taken evenly from it.
            var radius = radii[(long)i * radii.Length / vertices];
            var (sin, cos) = Math.SinCos(2 * Math.PI * i / vertices);
            return (radius * cos, radius * sin);
        })];
    }

    private static double[] Radii(int vertices, ulong seed)
    {
        double[] radii = [MeanRadiusMetres, MeanRadiusMetres, MeanRadiusMetres, MeanRadiusMetres];
        var displacement = FirstDisplacement;
        for (var level = 0u; radii.Length < vertices; level++)
        {
            var random = new PhiloxStream(seed, RandomPurpose.Expectation, level, 0);
            var finer = new double[2 * radii.Length];
            for (var i = 0; i < radii.Length; i++)
            {
                var middle = (radii[i] + radii[(i + 1) % radii.Length]) / 2;
                finer[2 * i] = radii[i];
                finer[(2 * i) + 1] = middle * (1 + (displacement * ((2 * random.NextDouble()) - 1)));
            }

            radii = finer;
            displacement *= Math.Pow(2, -Roughness);
        }

        return radii;
    }
}
