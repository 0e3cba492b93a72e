namespace SurveyPlanner.Files.Outputs;

/// <summary><c>coverage.csv</c>: coverage probability, a row a cell.</summary>
public static class CoverageCsv
{
    private const int Digits = 9;

    /// <summary>Null where no stratum's coverage was worked out.</summary>
    public static OutputFile? Write(SurveyPlan plan)
    {
        if (plan.Strata.All(stratum => stratum.Coverage is null))
        {
            return null;
        }

        var table = new CsvText("lon,lat,stratum,area_km2,exact,simulated,standard_error");
        foreach (var stratum in plan.Strata)
        {
            var name = CsvText.Cell(stratum.Stratum.Name);
            foreach (var cell in stratum.Coverage?.Cells ?? [])
            {
                table.Row(
                    Figures.Longitude(cell.Position.Lon),
                    Figures.Degrees(cell.Position.Lat),
                    name,
                    Figures.Area(cell.AreaKm2),
                    cell.Exact is { } exact ? Figures.Significant(exact, Digits) : "",
                    Figures.Significant(cell.Simulated, Digits),
                    Figures.Significant(cell.StandardError, Digits));
            }
        }

        return table.ToFile(OutputNames.Coverage);
    }
}
