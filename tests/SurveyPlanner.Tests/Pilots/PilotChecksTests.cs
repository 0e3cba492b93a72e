using SurveyPlanner.Pilots;

namespace SurveyPlanner.Tests.Pilots;

public class PilotChecksTests
{
    private static readonly PilotTable Good = new(
        false,
        [new("bay", "T1", 2, 1, 2), new("bay", "T2", 3, 0, 3), new("sound", "T3", 1.5, 2, 4)],
        [new("T1", 12, 1, 2), new("T3", 30, 4, 3), new("T3", 0, 1, 4)],
        "transects.csv")
    {
        DetectionsSource = "detections.csv",
    };

    [Fact]
    public void A_good_table_has_no_problems() => Assert.Empty(PilotChecks.Problems(Good, ["bay", "sound"]));

    [Fact]
    public void Every_problem_is_told_at_once_with_file_and_line()
    {
        var bad = Good with
        {
            Transects =
            [
                new("bay", "T1", -2, 1, 2), new("bay", "T1", double.NaN, -1, 3), new("fjord", "T3", 1.5, 3, 4), new("", "", 1, 0, 5),
            ],
            Detections = [new("T9", -3, 1, 2), new("T3", double.NaN, 0, 3), new("T3", 1, 1, 4), new("T1", 1, 1, 5)],
        };

        var problems = PilotChecks.Problems(bad, ["bay", "sound"]).Select(problem => problem.ToString()).ToList();
        string[] expected =
        [
            "transects.csv:2: Transect 'T1' has a length of -2 km",
            "transects.csv:3: Transect 'T1' has a length of NaN km",
            "transects.csv:3: Transect 'T1' has a count of -1",
            "transects.csv:5: The transect has no name",
            "transects.csv:3: Transect 'T1' stands in the table twice (first in line 2)",
            "transects.csv:4: Transect 'T3' lies in stratum 'fjord', which the region lacks; it has 'bay', 'sound'",
            "transects.csv:5: Transect '' names no stratum although others do",
            "detections.csv:2: The detection was made on transect 'T9'",
            "detections.csv:2: The detection has a distance of -3 m",
            "detections.csv:3: The detection has a distance of NaN m",
            "detections.csv:3: The detection has a cluster size of 0",
            "transects.csv:3: Transect 'T1' has a count of -1, but 1 of the detections name it",
            "transects.csv:4: Transect 'T3' has a count of 3, but 2 of the detections name it",
        ];
        Assert.Equal(expected.Length, problems.Count);
        Assert.All(expected, start => Assert.Contains(problems, problem => problem.StartsWith(start, StringComparison.Ordinal)));
    }

    [Fact]
    public void A_pilot_without_detections_says_what_can_still_be_done()
    {
        var none = Good with { Transects = [new("", "T1", 2, 0), new("", "T2", 3, 0)], Detections = [] };
        var problem = Assert.Single(PilotChecks.Problems(none, ["bay"]));
        Assert.Contains("encounter rate and b from elsewhere", problem.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_stratum_that_the_region_lacks_is_one_problem_however_many_lie_in_it()
    {
        string Of(string[] named, params string[] region)
        {
            var pilot = Good with { Transects = [.. named.Select((name, i) => new PilotTransect(name, $"T{i}", 1, 1, i + 2))], Detections = [], DetectionsSource = null };
            return Assert.Single(PilotChecks.Problems(pilot, region)).ToString();
        }

        Assert.Equal(
            "transects.csv:3: Transect 'T1' and 2 others lie in stratum 'fjord', which the region lacks; it has 'bay', 'sound'.",
            Of(["bay", "fjord", "fjord", "fjord"], "bay", "sound"));
        Assert.Equal("transects.csv:2: Transect 'T0' lies in stratum 'BAY', which the region lacks; did you mean 'bay'?", Of(["BAY"], "bay", "sound"));
        Assert.Equal(
            "transects.csv:2: Transect 'T0' and 1 other lie in stratum 'bay', which the region lacks; it has 'region' alone: say with region.stratum_field which attribute of the boundary has these names, or leave the column out.",
            Of(["bay", "bay"], "region"));
    }

    [Fact]
    public void Detections_that_are_missing_altogether_are_told()
    {
        var problem = Assert.Single(PilotChecks.Problems(Good with { Detections = [] }, ["bay", "sound"]));
        Assert.StartsWith("detections.csv: There are no detections in it, although the transects count 3;", problem.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void A_pilot_without_transects_is_one_problem()
        => Assert.Single(PilotChecks.Problems(Good with { Transects = [], Detections = [] }, ["bay"]));

    [Fact]
    public void Points_with_lengths_are_refused()
    {
        var points = new PilotTable(true, [new("", "P1", 2.5, 1, 2)], []);
        Assert.Contains("is it a length?", Assert.Single(PilotChecks.Problems(points, ["bay"])).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Truncation_lowers_the_counts_with_the_detections()
    {
        var within = Good.Within(20);
        Assert.Equal([1, 0, 1], within.Transects.Select(transect => transect.Count));
        Assert.Equal(2, within.Detections.Length);
        Assert.Empty(PilotChecks.Problems(within, ["bay", "sound"]));
    }
}
