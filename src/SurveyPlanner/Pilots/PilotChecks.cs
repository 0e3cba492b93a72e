using System.Globalization;

namespace SurveyPlanner.Pilots;

/// <summary>
/// Finds everything that is wrong with a pilot table before anything is computed from it. What passes may still have too little in it for a
/// variance (a single transect): that is told with the figures, not here.
/// </summary>
public static class PilotChecks
{
    /// <summary>Every problem of the table, with file and line; empty when there is none.</summary>
    /// <param name="pilot">The table as read.</param>
    /// <param name="regionStrata">Names of the strata that the region has.</param>
    public static IReadOnlyList<Problem> Problems(PilotTable pilot, IReadOnlyCollection<string> regionStrata)
    {
        var problems = new List<Problem>();
        if (pilot.Transects.IsEmpty)
        {
            problems.Add(new Problem("The pilot has no transects; give one row for each transect, also for those without detections.", pilot.Source));
            return problems;
        }

        problems.AddRange(pilot.Transects.SelectMany(transect => TransectProblems(pilot, transect)));
        problems.AddRange(DuplicateProblems(pilot));
        problems.AddRange(StratumProblems(pilot, regionStrata));
        var ids = pilot.Transects.Select(transect => transect.Id).ToHashSet();
        problems.AddRange(pilot.Detections.SelectMany(detection => DetectionProblems(pilot, detection, ids)));
        problems.AddRange(CountProblems(pilot));
        if (pilot.Transects.All(transect => transect.Count == 0))
        {
            problems.Add(new Problem(
                "No transect of the pilot has a detection, so no encounter rate can be estimated; give a pilot with detections, or an encounter rate and b from elsewhere.",
                pilot.Source));
        }

        return problems;
    }

    private static IEnumerable<Problem> TransectProblems(PilotTable pilot, PilotTransect transect)
    {
        if (string.IsNullOrWhiteSpace(transect.Id))
        {
            yield return At("The transect has no name; give each transect its own.");
        }

        if (!double.IsFinite(transect.Effort) || transect.Effort <= 0)
        {
            yield return At(pilot.IsPoints
                ? $"Transect '{transect.Id}' has {Text(transect.Effort)} visits; give a whole number above 0."
                : $"Transect '{transect.Id}' has a length of {Text(transect.Effort)} km; give a length above 0.");
        }
        else if (pilot.IsPoints && transect.Effort != Math.Floor(transect.Effort))
        {
            yield return At($"Point '{transect.Id}' has {Text(transect.Effort)} visits, which is no whole number; is it a length? Points are counted in visits.");
        }

        if (transect.Count < 0)
        {
            yield return At($"Transect '{transect.Id}' has a count of {transect.Count}; give 0 or more.");
        }

        Problem At(string message) => new(message, pilot.Source, transect.Line);
    }

    private static IEnumerable<Problem> DuplicateProblems(PilotTable pilot)
        => pilot.Transects
            .GroupBy(transect => transect.Id)
            .SelectMany(group => group.Skip(1).Select(transect => new Problem(
                $"Transect '{transect.Id}' stands in the table twice{(group.First().Line is { } line ? $" (first in line {line})" : "")}; give each transect a name of its own, and add up repeated visits.",
                pilot.Source,
                transect.Line)));

    private static IEnumerable<Problem> StratumProblems(PilotTable pilot, IReadOnlyCollection<string> regionStrata)
    {
        if (pilot.Transects.All(transect => transect.Stratum.Length == 0))
        {
            yield break;
        }

        foreach (var transect in pilot.Transects.Where(transect => transect.Stratum.Length == 0))
        {
            yield return new Problem(
                $"Transect '{transect.Id}' names no stratum although others do; give its stratum.", pilot.Source, transect.Line);
        }

        // By name rather than by transect: they are wrong for one reason.
        foreach (var group in pilot.Transects.Where(transect => transect.Stratum.Length > 0).GroupBy(transect => transect.Stratum))
        {
            if (!regionStrata.Contains(group.Key))
            {
                var (first, others) = (group.First(), group.Count() - 1);
                var who = others == 0 ? $"Transect '{first.Id}' lies" : $"Transect '{first.Id}' and {others} other{(others == 1 ? "" : "s")} lie";
                yield return new Problem($"{who} in stratum '{group.Key}', which the region lacks; {InItsPlace(group.Key, regionStrata)}", pilot.Source, first.Line);
            }
        }
    }

    private static string InItsPlace(string name, IReadOnlyCollection<string> regionStrata)
    {
        if (regionStrata.FirstOrDefault(known => known.Equals(name.Trim(), StringComparison.OrdinalIgnoreCase)) is { } meant)
        {
            return $"did you mean '{meant}'?";
        }

        var has = $"it has {string.Join(", ", regionStrata.Select(known => $"'{known}'"))}";
        return regionStrata.Count > 1
            ? has + "."
            : $"{has} alone: say with region.stratum_field which attribute of the boundary has these names, or leave the column out.";
    }

    private static IEnumerable<Problem> DetectionProblems(PilotTable pilot, PilotDetection detection, HashSet<string> ids)
    {
        if (!ids.Contains(detection.TransectId))
        {
            yield return At($"The detection was made on transect '{detection.TransectId}', which the pilot's transects lack; mend the name or add the transect.");
        }

        if (!double.IsFinite(detection.DistanceMetres) || detection.DistanceMetres < 0)
        {
            yield return At($"The detection has a distance of {Text(detection.DistanceMetres)} m; give 0 or more (left and right of the line alike).");
        }

        if (detection.Size < 1)
        {
            yield return At($"The detection has a cluster size of {detection.Size}; give 1 or more.");
        }

        Problem At(string message) => new(message, pilot.DetectionsSource ?? pilot.Source, detection.Line);
    }

    private static IEnumerable<Problem> CountProblems(PilotTable pilot)
    {
        if (pilot.Detections.IsEmpty)
        {
            var counted = pilot.Transects.Sum(transect => (long)Math.Max(0, transect.Count));
            if (pilot.DetectionsSource is { } source && counted > 0)
            {
                yield return new Problem(
                    $"There are no detections in it, although the transects count {counted}; give one row for each, or take detections out of [pilot].", source);
            }

            yield break;
        }

        var listed = pilot.Detections.GroupBy(detection => detection.TransectId).ToDictionary(group => group.Key, group => group.Count());
        foreach (var transect in pilot.Transects)
        {
            var rows = listed.GetValueOrDefault(transect.Id);
            if (rows != transect.Count)
            {
                yield return new Problem(
                    $"Transect '{transect.Id}' has a count of {transect.Count}, but {rows} of the detections name it; make them agree, one row for each detection.",
                    pilot.Source,
                    transect.Line);
            }
        }
    }

    private static string Text(double value) => value.ToString("G6", CultureInfo.InvariantCulture);
}
