using SurveyPlanner.Files.Plans;

namespace SurveyPlanner.Files.Tests.Plans;

public class SpellingTests
{
    /// <summary>Distances by hand; kitten to sitting (3) is the usual textbook example, "ca" to "abc" (3) the one that tells this distance from the unrestricted one (2).</summary>
    [Theory]
    [InlineData("kitten", "sitting", 3)]
    [InlineData("ca", "abc", 3)]
    [InlineData("zigzag", "zigzga", 1)]
    [InlineData("", "abc", 3)]
    [InlineData("same", "same", 0)]
    public void The_distance_counts_letters_inserted_deleted_replaced_or_swapped(string a, string b, int distance)
    {
        Assert.Equal(distance, Spelling.Distance(a, b));
        Assert.Equal(distance, Spelling.Distance(b, a));
    }

    [Theory]
    [InlineData("spacng", "spacing")]
    [InlineData("Spacing", "spacing")]
    [InlineData("halfwidth", "half_width")]
    [InlineData("half-width", "half_width")]
    [InlineData("width", "half_width")]
    [InlineData("colour", null)]
    [InlineData("", null)]
    public void The_nearest_word_is_offered_only_when_it_is_near(string word, string? expected)
        => Assert.Equal(expected, Spelling.Nearest(word, PlanKeys.Of("layout").Select(key => key.Name)));
}
