using CsCheck;

namespace SurveyPlanner.Files.Tests.Outputs;

/// <summary>The same random values on every run: CsCheck's own sampling fixes only the first of them.</summary>
internal static class FixedSample
{
    public static IEnumerable<T> Of<T>(Gen<T> values, int count)
    {
        var random = new PCG(1);
        return Enumerable.Range(0, count).Select(_ => values.Generate(random, null, out var _)).ToList();
    }
}
