using System.Text;
using SurveyPlanner.Coverage;
using SurveyPlanner.Files.Tables;
using SurveyPlanner.Files.Tests.Folders;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Tables;

public sealed class CoverageAtTableTests : IDisposable
{
    private readonly TemporaryFolder _folder = new();

    public void Dispose() => _folder.Dispose();

    [Fact]
    public void What_is_found_out_is_added_and_the_rest_kept_as_it_is()
    {
        var table = Read("id,lon,lat,count,note\n7,-150.5,63.1,-3,\"=2+3\"\n8,209.5,63.2,4,\"seen, twice\"\n9,0,0,,\n");

        Assert.Equal([new LonLat(-150.5, 63.1), new LonLat(-150.5, 63.2), new LonLat(0, 0)], table.Positions);
        var written = Lines(
            table,
            new PositionCoverage(table.Positions[0], "Inner, bay", 0.25, 0.251, 0.252, 0.001),
            new PositionCoverage(table.Positions[1], "@outer", null, 0.125, 0.13, 0.002),
            new PositionCoverage(table.Positions[2], null));
        Assert.Equal("id,lon,lat,count,note,stratum,coverage,standard_error,times_covered,method", written[0]);
        Assert.Equal("7,-150.5,63.1,-3,'=2+3,\"Inner, bay\",0.25,,0.252,exact", written[1]);
        Assert.Equal("8,209.5,63.2,4,\"seen, twice\",'@outer,0.125,0.002,0.13,simulated", written[2]);
        Assert.Equal("9,0,0,,,,,,,outside", written[3]);
    }

    [Fact]
    public void Columns_that_are_there_already_are_not_written_over()
    {
        var table = Read("lat,lon,Stratum,stratum_2\n63.1,-150.5,mine,too\n");

        Assert.StartsWith("lat,lon,Stratum,stratum_2,stratum_3,coverage,", Lines(table)[0], StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("lon,count\n1,2\n", "lat")]
    [InlineData("lon,lat\n", "no rows")]
    [InlineData("lon,lat\n1,91\n", "\"91\" is not within -90 to 90 degrees")]
    [InlineData("lon,lat\n361,1\n", "\"361\" is not within -180 to 360 degrees")]
    [InlineData("lon,lat\nNaN,1\n", "NaN")]
    [InlineData("lon,lat\n\"1,5\",1\n", "comma")]
    [InlineData("lon,lat\n1\n", "1 cells and the header 2")]
    public void A_table_that_cannot_be_read_says_where_and_why(string text, string expected)
    {
        var problems = Assert.Throws<InputException>(() => Read(text)).Problems;

        Assert.Contains(problems, problem => problem.Message.Contains(expected, StringComparison.Ordinal) || problem.Key == expected);
        Assert.All(problems, problem => Assert.NotNull(problem.Line));
    }

    [Fact]
    public void Every_bad_row_is_reported_at_once()
        => Assert.Equal(3, Assert.Throws<InputException>(() => Read("lon,lat\nx,1\n1,y\n1,1\n999,2\n")).Problems.Count);

    private CoverageAtTable Read(string text)
    {
        var path = Path.Combine(_folder.Path, "points.csv");
        File.WriteAllText(path, text);
        return CoverageAtTable.Read(path);
    }

    private static string[] Lines(CoverageAtTable table, params PositionCoverage[] coverages)
        => Encoding.UTF8.GetString(table.Write("out.csv", coverages).Content.Span).TrimEnd('\n').Split('\n');
}
