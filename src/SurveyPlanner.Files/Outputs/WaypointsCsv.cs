using System.Globalization;

namespace SurveyPlanner.Files.Outputs;

/// <summary><c>waypoints.csv</c>: the waypoints of <c>transects.gpx</c> as a table for spreadsheets and chart plotters.</summary>
public static class WaypointsCsv
{
    private const int Decimals = 6;

    public static OutputFile Write(SurveyPlan plan)
    {
        var table = new CsvText("name,lat,lon,desc,ddm,transect,stratum,order,end");
        foreach (var mark in FieldMarks.Of(plan).Marks)
        {
            table.Row(
                CsvText.Cell(mark.Name),
                Figures.Fixed(mark.Position.Lat, Decimals),
                Figures.Longitude(mark.Position.Lon, Decimals),
                CsvText.Cell(mark.Description),
                DegreesMinutes.Of(mark.Position),
                CsvText.Cell(mark.Planned.Transect.Id),
                CsvText.Cell(mark.Planned.StratumName),
                mark.Planned.Transect.Order.ToString(CultureInfo.InvariantCulture),
                EndWord(mark.End));
        }

        return table.ToFile(OutputNames.Waypoints);
    }

    private static string EndWord(MarkEnd end) => end switch
    {
        MarkEnd.Start => "start",
        MarkEnd.End => "end",
        MarkEnd.Reserve => "reserve",
        _ => "point",
    };
}
