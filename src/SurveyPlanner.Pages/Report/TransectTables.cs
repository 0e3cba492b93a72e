using SurveyPlanner.Layouts;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Report;

/// <summary>The table of transects, in the order of visit.</summary>
internal static class TransectTables
{
    /// <summary>A transect with its stratum and, where coverage was worked out, the coverage along it.</summary>
    private sealed record Row(string Stratum, Transect Transect, double? Coverage);

    /// <summary>At most so many of them.</summary>
    public static Table Of(SurveyPlan plan, int most)
    {
        var rows = plan.Strata.SelectMany(Rows).OrderBy(row => row.Transect.Order).Take(most).ToArray();
        return rows.All(row => row.Transect.IsPoint) ? OfPoints(rows, HasCoverage(plan)) : OfLines(rows, HasCoverage(plan));
    }

    /// <summary>Whether the table has the coverage of each transect.</summary>
    public static bool HasCoverage(SurveyPlan plan) => plan.Strata.Any(stratum => stratum.Coverage is { Transects.IsEmpty: false });

    private static IEnumerable<Row> Rows(StratumPlan stratum)
    {
        var coverage = (stratum.Coverage?.Transects ?? []).ToDictionary(one => one.TransectId, one => one.Mean);
        return stratum.Layout.Transects.Select(transect => new Row(stratum.Stratum.Name, transect, coverage.GetValueOrDefault(transect.Id)));
    }

    private static Table OfLines(IEnumerable<Row> rows, bool withCoverage) => new(
        "Transects in the order of visit; positions on WGS 84: latitude, longitude in degrees, and in degrees and minutes",
        [
            new("Id", false), new("Order"), new("Stratum", false), new("Start", false), new("End", false), new("Pieces"), new("Length, km"),
            new("Bearing at start, ° true"), .. withCoverage ? [new Column("Mean coverage")] : Array.Empty<Column>(),
        ],
        [.. rows.Select(row => (string[])[.. Line(row), .. Coverage(row, withCoverage)])]);

    private static string[] Line(Row row) =>
    [
        row.Transect.Id,
        Figures.Count(row.Transect.Order),
        row.Stratum,
        Position(row.Transect.Start),
        row.Transect.IsPoint ? Figures.None : Position(row.Transect.End),
        row.Transect.IsPoint ? Figures.None : Figures.Count(row.Transect.Pieces.Length),
        row.Transect.IsPoint ? Figures.None : Figures.Three(row.Transect.LengthMetres / 1000),
        Figures.Bearing(row.Transect.BearingDegrees),
    ];

    private static Table OfPoints(IEnumerable<Row> rows, bool withCoverage) => new(
        "Points in the order of visit; positions on WGS 84: latitude, longitude",
        [
            new("Id", false), new("Order"), new("Stratum", false), new("Position, degrees", false), new("Position, degrees and minutes", false),
            .. withCoverage ? [new Column("Coverage")] : Array.Empty<Column>(),
        ],
        [
            .. rows.Select(row => (string[])
            [
                row.Transect.Id,
                Figures.Count(row.Transect.Order),
                row.Stratum,
                Positions.Decimal(row.Transect.Start),
                Positions.Minutes(row.Transect.Start),
                .. Coverage(row, withCoverage),
            ]),
        ]);

    private static string[] Coverage(Row row, bool withCoverage) => withCoverage ? [Figures.Three(row.Coverage)] : [];

    private static string Position(LonLat position) => Positions.Decimal(position) + "\n" + Positions.Minutes(position);
}
