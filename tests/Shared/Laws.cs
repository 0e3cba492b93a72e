using CsCheck;

namespace SurveyPlanner.TestShapes;

/// <summary>
/// Laws checked on generated cases, the same ones in every run. (CsCheck's own Sample starts from the seed it is given and then goes on from
/// the clock, so a rare failure would come and go.)
/// </summary>
internal static class Laws
{
    /// <summary>Checks a law on a number of cases; a failure names the case.</summary>
    public static void Hold<T>(this Gen<T> gen, int cases, uint seed, Action<T> law)
    {
        for (var i = 0; i < cases; i++)
        {
            var value = gen.Generate(new PCG(seed, (ulong)i), null, out _);
            try
            {
                law(value);
            }
            catch (Exception failure)
            {
                throw new InvalidOperationException($"case {i} of seed {seed}: {failure.Message}", failure);
            }
        }
    }
}
