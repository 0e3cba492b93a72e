using System.Text;
using SurveyPlanner.Files.Tables;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Files.Tests.Tables;

public sealed class PilotTableReaderTests : IDisposable
{
    private readonly string folder = Directory.CreateTempSubdirectory("pilot").FullName;

    public void Dispose() => Directory.Delete(folder, recursive: true);

    private string Write(string name, string text) => Write(name, Encoding.UTF8.GetBytes(text));

    private string Write(string name, byte[] bytes)
    {
        var path = Path.Combine(folder, name);
        File.WriteAllBytes(path, bytes);
        return path;
    }

    private string[] ProblemsOf(string transects, string? detections = null)
    {
        var path = Write("t.csv", transects);
        var exception = Assert.Throws<InputException>(() => PilotTableReader.Read(path, detections is null ? null : Write("d.csv", detections)));
        return [.. exception.Problems.Select(problem => problem.ToString().Replace(folder + "/", "", StringComparison.Ordinal))];
    }

    [Fact]
    public void Lines_are_read_in_kilometres_with_their_rows()
    {
        var pilot = PilotTableReader.Read(
            Write("t.csv", "stratum,transect,length_km,count\ninner bay,A1,2.5,3\n\"outer, sound\",A2,1e1,0\n"),
            Write("d.csv", "transect,distance_m,size\nA1,20,1\nA1,0,4\nA1,31.5,2\n"));

        Assert.False(pilot.IsPoints);
        Assert.Equal([new PilotTransect("inner bay", "A1", 2.5, 3, 2), new PilotTransect("outer, sound", "A2", 10, 0, 3)], pilot.Transects);
        Assert.Equal([new PilotDetection("A1", 20, 1, 2), new PilotDetection("A1", 0, 4, 3), new PilotDetection("A1", 31.5, 2, 4)], pilot.Detections);
        Assert.Empty(pilot.Notices);
        Assert.Equal((Path.Combine(folder, "t.csv"), Path.Combine(folder, "d.csv")), (pilot.Source, pilot.DetectionsSource));
    }

    [Fact]
    public void Points_have_visits_and_no_stratum_is_no_problem()
    {
        var pilot = PilotTableReader.Read(Write("t.csv", "Transect,Visits,Count\nP1,2,3\n"), null);

        Assert.True(pilot.IsPoints);
        Assert.Equal([new PilotTransect("", "P1", 2, 3, 2)], pilot.Transects);
        Assert.Empty(pilot.Detections);
    }

    [Theory]
    [InlineData("length_m", 1500, 1.5)]
    [InlineData("length_nmi", 1, 1.852)]
    [InlineData("length_mi", 1, 1.609344)]
    [InlineData("length_ft", 1000, 0.3048)]
    [InlineData("length_yd", 1000, 0.9144)]
    public void The_unit_of_a_length_stands_in_the_name_of_its_column(string column, double length, double kilometres)
    {
        var text = string.Create(System.Globalization.CultureInfo.InvariantCulture, $"transect,{column},count\nA,{length},1\n");
        Assert.Equal(kilometres, PilotTableReader.Read(Write("t.csv", text), null).Transects[0].Effort, 12);
    }

    [Theory]
    [InlineData("\uFEFFtransect,length_km,count\r\nA,1,2\r\nB,1,2\r\n")]
    [InlineData("transect,length_km,count\rA,1,2\rB,1,2")]
    [InlineData("\"transect\",\"length_km\",\"count\"\n\"A\",\"1\",\"2\"\n\n,,\nB, 1 ,2 \n")]
    public void Byte_order_marks_line_ends_quotes_and_empty_rows_make_no_difference(string text)
    {
        var pilot = PilotTableReader.Read(Write("t.csv", text), null);
        Assert.Equal([("A", 1.0, 2), ("B", 1.0, 2)], pilot.Transects.Select(t => (t.Id, t.Effort, t.Count)));
    }

    [Fact]
    public void A_cell_in_quotes_may_hold_line_ends_and_quotes_and_the_lines_are_still_counted()
    {
        var pilot = PilotTableReader.Read(Write("t.csv", "transect,length_km,count\n\"A\n\"\"one\"\"\",1,2\nB,1,2\n"), null);
        Assert.Equal([("A\n\"one\"", 2), ("B", 4)], pilot.Transects.Select(t => (t.Id, t.Line!.Value)));
    }

    [Fact]
    public void A_column_that_is_not_used_is_told_and_one_that_is_misspelt_refused()
    {
        Assert.Equal(
            $"{Path.Combine(folder, "t.csv")}: the column \"observer\" is not used",
            Assert.Single(PilotTableReader.Read(Write("t.csv", "transect,length_km,count,observer\nA,1,2,Ada\n"), null).Notices).Message);
        Assert.Equal(["t.csv:1: there is no column \"lenght_km\": did you mean length_km?"], ProblemsOf("transect,lenght_km,count\nA,1,2\n"));
    }

    [Fact]
    public void Every_bad_row_is_told()
        => Assert.Equal(
            [
                "t.csv:2: length_km: a length is more than 0: leave out transects that were not surveyed",
                "t.csv:3: length_km: \"far\" is not a number",
                "t.csv:4: length_km: \"2,5\" has a comma: the decimal mark is a point, write 2.5",
                "t.csv:4: count: \"-1\" is not a whole number from 0 on",
                "t.csv:5: length_km: is empty",
                "t.csv:6: count: \"1.5\" is not a whole number from 0 on",
                "t.csv:8: transect: is empty",
                "t.csv:9: length_km: \"1e999\" is no finite number",
            ],
            ProblemsOf("transect,length_km,count\nA,-1,2\nB,far,2\nC,\"2,5\",-1\nD,,2\nE,1,1.5\nF,1,1\n,1,1\nG,1e999,1\n"));

    [Theory]
    [InlineData("transect,length_km,count\nA,1\nB,2,5,3\n", "t.csv:2: has 2 cells and the header 3|t.csv:3: has 4 cells and the header 3: the decimal mark is a point, and text with a comma stands in quotes")]
    [InlineData("", "t.csv:1:1: is empty: the first line of a table of transects names its columns")]
    [InlineData("transect,length_km,count\n", "t.csv:1: has no rows below the header")]
    [InlineData("transect,length,count\nA,1,1\n", "t.csv:1: the column \"length\" needs its unit in its name: length_m, length_km, length_ft, length_yd, length_mi or length_nmi")]
    [InlineData("transect,count\nA,1\n", "t.csv:1: there is no column for the effort: length_m, length_km, length_ft, length_yd, length_mi or length_nmi for lines, visits for points")]
    [InlineData("transect,length_km,length_m,count\nA,1,1000,1\n", "t.csv:1: the column length_m answers the same question as length_km: keep one of them")]
    [InlineData("transect,length_km,visits,count\nA,1,1,1\n", "t.csv:1: has both a length and visits: lines have the one, points the other")]
    [InlineData("transect;length_km;count\nA;1,5;1\n", "t.csv:1:1: the columns are parted by semicolons or tabs: save the table with commas, and with a point as decimal mark")]
    [InlineData("transect,length_km,count\n\"A,1,2\n", "t.csv:2:1: the quote that opens on this line is never closed")]
    [InlineData("transect,length_km,count\n\"A\"a,1,2\n", "t.csv:2:1: text stands after a closing quote: a quote inside a cell is written twice")]
    public void A_table_that_is_not_one_is_told_in_words(string text, string expected)
        => Assert.Equal(expected.Split('|'), ProblemsOf(text));

    [Fact]
    public void Detections_are_checked_as_well_and_both_tables_at_once()
        => Assert.Equal(
            [
                "t.csv:2: count: \"x\" is not a number",
                "d.csv:2: distance_m: a distance is 0 or more",
                "d.csv:3: size: \"0\" is not a whole number from 1 on",
            ],
            ProblemsOf("transect,length_km,count\nA,1,x\n", "transect,distance_m,size\nA,-3,1\nA,3,0\n"));

    [Fact]
    public void Many_broken_rows_are_counted_and_not_all_listed()
    {
        var problems = ProblemsOf("transect,length_km,count\n" + string.Concat(Enumerable.Repeat("A,x,y\n", 60)));
        Assert.Equal(101, problems.Length);
        Assert.Equal("t.csv: and 10 more rows have problems", problems[^1]);
    }

    [Fact]
    public void A_file_that_is_missing_or_not_UTF8_is_told()
    {
        var missing = Assert.Throws<InputException>(() => PilotTableReader.Read(Path.Combine(folder, "none.csv"), null));
        Assert.EndsWith("none.csv: there is no table of transects of this name", missing.Message);
        var latin = Assert.Throws<InputException>(() => PilotTableReader.Read(Write("l.csv", Encoding.Latin1.GetBytes("transect,length_km,count\nBjørn,1,1\n")), null));
        Assert.EndsWith("l.csv:2:3: holds a character that is not UTF-8: save the file as UTF-8", latin.Message);
        var wide = Assert.Throws<InputException>(() => PilotTableReader.Read(Write("w.csv", Encoding.Unicode.GetPreamble()), null));
        Assert.EndsWith("w.csv:1:1: is saved as UTF-16: save it as UTF-8", wide.Message);
    }
}
