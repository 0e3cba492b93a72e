using System.Text;
using SurveyPlanner.Files.Outputs;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Tests.Outputs;

public sealed class TablesTests
{
    [Fact]
    public void Waypoints_have_decimal_degrees_degrees_and_minutes_and_which_end()
    {
        var lines = Lines(WaypointsCsv.Write(TestPlans.TwoStrata()));

        Assert.Equal("name,lat,lon,desc,ddm,transect,stratum,order,end", lines[0]);
        Assert.Equal("A001S,63,-150.6,\"A001 Inner bay, start, bearing 000 true\",N63 00.000 W150 36.000,A001,Inner bay,1,start", lines[1]);
        Assert.Equal("A002BE,63,-150.5,\"A002 part 2 of 2 Inner bay, end\",N63 00.000 W150 30.000,A002,Inner bay,2,end", lines[6]);
        Assert.Equal(9, lines.Count);
    }

    [Fact]
    public void Names_that_a_spreadsheet_would_run_get_an_apostrophe_in_front()
    {
        var line = Lines(WaypointsCsv.Write(TestPlans.TwoStrata()))[7];

        Assert.EndsWith("B001,\"'=2+3,\"\"Høy\"\" <b>&  ]]>\",3,point", line, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("=1", "'=1")]
    [InlineData("+1", "'+1")]
    [InlineData("-1", "'-1")]
    [InlineData("@x", "'@x")]
    [InlineData("\t=1", "' =1")]
    [InlineData("\rx", "' x")]
    [InlineData(" =1", "' =1")]
    [InlineData("＝1", "'＝1")]
    [InlineData("a,b", "\"a,b\"")]
    [InlineData("a\"b", "\"a\"\"b\"")]
    [InlineData("a\nb", "a b")]
    [InlineData("a-b", "a-b")]
    [InlineData("", "")]
    public void A_cell_of_text_is_harmless(string text, string expected) => Assert.Equal(expected, CsvText.Cell(text));

    [Theory]
    [InlineData(63.1, -150.5, "N63 06.000 W150 30.000")]
    [InlineData(59.99999999, 9.99999999, "N60 00.000 E010 00.000")]
    [InlineData(-0.5, 0, "S00 30.000 E000 00.000")]
    [InlineData(0, 180, "N00 00.000 W180 00.000")]
    [InlineData(0, 179.99999999, "N00 00.000 W180 00.000")]
    [InlineData(-90, -0.000000001, "S90 00.000 E000 00.000")]
    public void Degrees_and_minutes_never_show_sixty_minutes(double lat, double lon, string expected) =>
        Assert.Equal(expected, DegreesMinutes.Of(new LonLat(lon, lat)));

    [Fact]
    public void Coverage_has_a_row_a_cell_and_an_empty_cell_where_no_closed_form_exists()
    {
        var lines = Lines(CoverageCsv.Write(TestPlans.TwoStrata())!);

        Assert.Equal("lon,lat,stratum,area_km2,exact,simulated,standard_error", lines[0]);
        Assert.Equal(9, lines.Count);
        Assert.EndsWith(",Inner bay,100,,0.1,0.0123", lines[1], StringComparison.Ordinal);
        Assert.EndsWith(",Inner bay,100,0.3,0.29,0.0123", lines[8], StringComparison.Ordinal);
    }

    [Fact]
    public void Without_coverage_there_is_no_such_file() => Assert.Null(CoverageCsv.Write(TestPlans.OneStratum(TestPlans.Centre)));

    private static List<string> Lines(OutputFile file)
    {
        var text = Encoding.UTF8.GetString(file.Content.Span);
        Assert.EndsWith("\n", text, StringComparison.Ordinal);
        Assert.DoesNotContain("\r", text, StringComparison.Ordinal);
        return [.. text.TrimEnd('\n').Split('\n')];
    }
}
