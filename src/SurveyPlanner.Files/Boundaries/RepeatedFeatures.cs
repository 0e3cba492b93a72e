namespace SurveyPlanner.Files.Boundaries;

/// <summary>Finds features that hold the very same outlines as an earlier one: exported twice, they would count twice.</summary>
internal static class RepeatedFeatures
{
    /// <summary>The features without exact repeats. A repeat whose attributes differ is kept and told: which of the two is meant is not ours to say.</summary>
    public static List<WorkFeature> LeaveOut(List<WorkFeature> features, Frame frame, RepairLog log)
    {
        var kept = new List<WorkFeature>();
        var byPoints = new Dictionary<int, List<WorkFeature>>();
        foreach (var feature in features)
        {
            var key = Key(feature);
            byPoints.TryAdd(key, []);
            var twin = byPoints[key].Find(other => SamePoints(other, feature));
            if (twin is null)
            {
                byPoints[key].Add(feature);
                kept.Add(feature);
            }
            else if (twin.Raw.Attributes.SequenceEqual(feature.Raw.Attributes))
            {
                log.Repair(
                    "features that repeat an earlier one were left out",
                    $"feature {feature.Raw.Number} repeats feature {twin.Raw.Number}",
                    -feature.Parts.Sum(frame.Area));
            }
            else
            {
                log.Warn("features have the same outline but other attributes", $"features {twin.Raw.Number} and {feature.Raw.Number}");
                kept.Add(feature);
            }
        }

        return kept;
    }

    /// <summary>A number that does not depend on the order of points, so that another starting vertex or direction does not hide a repeat.</summary>
    private static int Key(WorkFeature feature)
    {
        var key = 0;
        foreach (var point in Points(feature))
        {
            key = unchecked(key + HashCode.Combine(point.X, point.Y));
        }

        return key;
    }

    private static bool SamePoints(WorkFeature a, WorkFeature b) => Sorted(a).SequenceEqual(Sorted(b));

    private static IEnumerable<FilePoint> Sorted(WorkFeature feature) => Points(feature).OrderBy(point => point.X).ThenBy(point => point.Y);

    private static IEnumerable<FilePoint> Points(WorkFeature feature)
        => feature.Parts.SelectMany(part => part.Holes.Prepend(part.Shell)).SelectMany(outline => outline.Points);
}
