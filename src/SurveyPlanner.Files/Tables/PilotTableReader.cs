using System.Collections.Immutable;
using SurveyPlanner.Files.Units;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Files.Tables;

/// <summary>
/// Reads the tables of a pilot season: comma-separated, UTF-8, one header row, units in the column names.
/// Transects: <c>stratum</c> (optional), <c>transect</c>, <c>length_km</c> (or another unit) or <c>visits</c>, <c>count</c>.
/// Detections: <c>transect</c>, <c>distance_m</c> (or another unit), <c>size</c> (optional, 1 where absent).
/// </summary>
public static class PilotTableReader
{
    private static readonly Column Stratum = new("stratum");
    private static readonly Column Transect = new("transect");
    private static readonly Column Length = new("length", IsLength: true);
    private static readonly Column Visits = new("visits");
    private static readonly Column Count = new("count");
    private static readonly Column Distance = new("distance", IsLength: true);
    private static readonly Column Size = new("size");

    /// <param name="transectsPath">Table of transects.</param>
    /// <param name="detectionsPath">Table of detections; null when there is none.</param>
    /// <param name="files">The files of the run; unless given, of this reading alone.</param>
    /// <exception cref="InputException">Every row of both tables that cannot be read. What the rows mean together is judged by the core.</exception>
    /// <exception cref="IOException">A file is there and cannot be read.</exception>
    public static PilotTable Read(string transectsPath, string? detectionsPath, InputFiles? files = null)
    {
        files ??= new InputFiles();
        var problems = new List<Problem>();
        var transects = TextTable.Read(transectsPath, "table of transects", [Stratum, Transect, Length, Visits, Count], files.Under("pilot.transects"), problems);
        var isPoints = transects.Has(Visits);
        var rows = ReadTransects(transects, isPoints, problems);
        transects.Close();
        var detections = ImmutableArray<PilotDetection>.Empty;
        var notices = transects.Notices;
        if (detectionsPath is not null)
        {
            var table = TextTable.Read(detectionsPath, "table of detections", [Stratum, Transect, Distance, Size], files.Under("pilot.detections"), problems);
            detections = ReadDetections(table, problems);
            table.Close();
            notices.AddRange(table.Notices);
        }

        return problems.Count > 0
            ? throw new InputException(problems)
            : new PilotTable(isPoints, rows, detections, transectsPath) { DetectionsSource = detectionsPath, Notices = [.. notices] };
    }

    private static ImmutableArray<PilotTransect> ReadTransects(TextTable table, bool isPoints, List<Problem> problems)
    {
        if (table.Has(Length) && isPoints)
        {
            problems.Add(new Problem("has both a length and visits: lines have the one, points the other", table.File, 1));
        }

        var effort = isPoints ? Visits : Length;
        if (!HasAll(table, [Transect, effort, Count], problems))
        {
            return [];
        }

        if (table.Rows.Length == 0 && problems.Count == 0)
        {
            problems.Add(new Problem("has no rows below the header", table.File, 1));
        }

        var transects = ImmutableArray.CreateBuilder<PilotTransect>(table.Rows.Length);
        foreach (var row in table.Rows)
        {
            var stratum = table.Has(Stratum) ? table.Text(row, Stratum) : "";
            var id = table.Text(row, Transect);
            var amount = isPoints ? table.Whole(row, Visits, 1) : Kilometres(table, row);
            var count = table.Whole(row, Count, 0);
            if (stratum is not null && id is not null && amount is { } good && count is { } counted)
            {
                transects.Add(new PilotTransect(stratum, id, good, counted, row.Line));
            }
        }

        return transects.ToImmutable();
    }

    private static double? Kilometres(TextTable table, CsvRow row)
    {
        var metres = table.Number(row, Length) * table.MetresIn(Length);
        if (metres is null || (metres > 0 && double.IsFinite(metres.Value)))
        {
            return metres / 1000;
        }

        table.Complain(row, Length, "a length is more than 0: leave out transects that were not surveyed");
        return null;
    }

    private static ImmutableArray<PilotDetection> ReadDetections(TextTable table, List<Problem> problems)
    {
        if (!HasAll(table, [Transect, Distance], problems))
        {
            return [];
        }

        var detections = ImmutableArray.CreateBuilder<PilotDetection>(table.Rows.Length);
        foreach (var row in table.Rows)
        {
            var id = table.Text(row, Transect);
            var metres = table.Number(row, Distance) * table.MetresIn(Distance);
            if (metres is { } bad && (bad < 0 || !double.IsFinite(bad)))
            {
                table.Complain(row, Distance, "a distance is 0 or more");
                continue;
            }

            var size = table.Has(Size) ? table.Whole(row, Size, 1) : 1;
            if (id is not null && metres is { } distance && size is { } animals)
            {
                detections.Add(new PilotDetection(id, distance, animals, row.Line));
            }
        }

        return detections.ToImmutable();
    }

    private static bool HasAll(TextTable table, IReadOnlyList<Column> columns, List<Problem> problems)
    {
        // A file that could not be read at all has been reported, and so has a column under another name.
        var isReported = problems.Exists(problem => problem.File == table.File);
        var absent = columns.Where(column => !table.Has(column)).ToArray();
        if (absent.Length > 0 && !isReported)
        {
            problems.AddRange(absent.Select(column => new Problem(Absent(column), table.File, 1)));
        }

        return absent.Length == 0;
    }

    private static string Absent(Column column)
    {
        var names = column.Headers.Select(name => name.Header);
        return column == Length
            ? $"there is no column for the effort: {WordList.Or(names)} for lines, visits for points"
            : $"there is no column {WordList.Or(names)}";
    }
}
