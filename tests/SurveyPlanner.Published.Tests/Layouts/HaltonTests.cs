using SurveyPlanner.Layouts;

namespace SurveyPlanner.Published.Tests.Layouts;

/// <summary>First terms of the Halton sequence as printed in accounts of it: base 2, base 3, and the eleventh in base 3.</summary>
public class HaltonTests
{
    [Fact]
    public void Base_2() => Assert.Equal([0.5, 0.25, 0.75, 0.125, 0.625], First(2));

    [Fact]
    public void Base_3() => Assert.Equal([1 / 3.0, 2 / 3.0, 1 / 9.0, 4 / 9.0, 7 / 9.0], First(3));

    [Fact]
    public void Eleventh_in_base_3() => Assert.Equal(19 / 27.0, Halton.RadicalInverse(3, 11));

    private static double[] First(uint radix) => [.. Enumerable.Range(1, 5).Select(i => Halton.RadicalInverse(radix, (ulong)i))];
}
