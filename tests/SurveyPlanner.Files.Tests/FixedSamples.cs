using CsCheck;

namespace SurveyPlanner.Files.Tests;

/// <summary>
/// Samples that are the same in every run. (The library's own Sample takes a seed for its first sample only; the others differ from run to run.)
/// </summary>
internal static class FixedSamples
{
    public static void Check<T>(this Gen<T> gen, int count, Action<T> assert)
    {
        var random = new PCG(stream: 1, seed: 20270401);
        for (var i = 0; i < count; i++)
        {
            assert(gen.Generate(random, null!, out _));
        }
    }
}
