using SurveyPlanner.Files.Units;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Files.Plans;

/// <summary>What must hold between keys of different tables. Each rule reports at the key that can be mended.</summary>
internal static class PlanRules
{
    public static IEnumerable<Problem> Check(PlanTables tables, PlanTable layout, IReadOnlyCollection<PlanTable> strata)
        =>
        [
            .. Region(tables["region"]),
            .. StrataNames(tables),
            .. Pilot(tables["pilot"], layout),
            .. Detection(tables["detection"], tables["pilot"], layout),
            .. Costs(strata),
            .. strata.Prepend(layout).SelectMany(table => SizeFromPrecision(table, tables)),
        ];

    private static IEnumerable<Problem> Region(PlanTable region)
    {
        if (!region.Has(PlanKeys.Boundary))
        {
            yield return region.ProblemAt(PlanKeys.Boundary, $"is missing: write boundary = {PlanKeys.Boundary.Example} under [region]");
        }

        if (region.Has(PlanKeys.ExclusionBuffer) && !region.Has(PlanKeys.Exclusions))
        {
            yield return region.ProblemAt(PlanKeys.ExclusionBuffer, "there are no exclusions to keep away from: add exclusions, or take the buffer out");
        }

        if (region.Has(PlanKeys.Strata) && !region.Has(PlanKeys.StratumField))
        {
            yield return region.ProblemAt(PlanKeys.Strata, $"needs stratum_field, the attribute of the boundary that holds these names: write stratum_field = {PlanKeys.StratumField.Example}");
        }
    }

    private static IEnumerable<Problem> StrataNames(PlanTables tables)
    {
        if (tables["region"].Value(PlanKeys.Strata) is not { } names)
        {
            yield break;
        }

        foreach (var (name, table) in tables.Strata)
        {
            if (!names.Contains(name))
            {
                yield return table.Place.Problem(
                    $"region.strata does not name this stratum{Spelling.Hint(name, names)}: add it there, or take this table out", table.Path.ToString());
            }
        }
    }

    private static IEnumerable<Problem> Pilot(PlanTable pilot, PlanTable layout)
    {
        if (pilot.Has(PlanKeys.Detections) && !pilot.Has(PlanKeys.Transects))
        {
            yield return pilot.ProblemAt(PlanKeys.Detections, $"needs the table of transects they were made from: write transects = {PlanKeys.Transects.Example}");
        }

        if (pilot.Has(PlanKeys.EncounterRate) && pilot.Has(PlanKeys.Transects))
        {
            yield return pilot.ProblemAt(PlanKeys.EncounterRate, "the table of transects gives it already: keep one of the two");
        }

        if (pilot.Has(PlanKeys.ClusterSizeSd) && !pilot.Has(PlanKeys.ClusterSize))
        {
            yield return pilot.ProblemAt(PlanKeys.ClusterSizeSd, $"needs the mean beside it: write cluster_size = {PlanKeys.ClusterSize.Example}");
        }

        if (pilot.Value(PlanKeys.EncounterRate) is { } rate && layout.Value(PlanKeys.Kind) is { } kind && rate.PerVisit != kind.IsPoints())
        {
            var right = kind.IsPoints() ? "\"1.5 /visit\"" : PlanKeys.EncounterRate.Example;
            yield return pilot.ProblemAt(PlanKeys.EncounterRate, $"does not suit the layout, which is {ChoiceWord.Of(kind)}: write encounter_rate = {right}");
        }
    }

    private static IEnumerable<Problem> Detection(PlanTable detection, PlanTable pilot, PlanTable layout)
    {
        var fitted = (detection.Value(PlanKeys.Models) ?? []).Where(model => model != DetectionModel.Strip).ToArray();
        if (fitted.Length > 0 && !pilot.Has(PlanKeys.Detections))
        {
            yield return detection.ProblemAt(PlanKeys.Models, $"there are no distances to fit {ChoiceWord.Of(fitted[0])} to: add detections = {PlanKeys.Detections.Example} under [pilot], or take the key out");
        }

        if (detection.Has(PlanKeys.DetectionDf) && !detection.Has(PlanKeys.DetectionCv))
        {
            yield return detection.ProblemAt(PlanKeys.DetectionDf, $"belongs to a given coefficient of variation: write cv = {PlanKeys.DetectionCv.Example} as well");
        }

        if (detection.Has(PlanKeys.EffectiveHalfWidth) && detection.Has(PlanKeys.EffectiveRadius))
        {
            yield return detection.ProblemAt(PlanKeys.EffectiveRadius, "effective_half_width is given as well: lines have the one, points the other, keep the one that suits the layout");
        }

        foreach (var key in new[] { PlanKeys.EffectiveHalfWidth, PlanKeys.EffectiveRadius })
        {
            if (detection.Has(key) && layout.Value(PlanKeys.Kind) is { } kind)
            {
                foreach (var problem in Effective(detection, key, layout, kind))
                {
                    yield return problem;
                }
            }
        }
    }

    private static IEnumerable<Problem> Effective(PlanTable detection, PlanKey<double> key, PlanTable layout, LayoutKind kind)
    {
        if ((key == PlanKeys.EffectiveRadius) != kind.IsPoints())
        {
            yield return detection.ProblemAt(key, $"does not suit the layout, which is {ChoiceWord.Of(kind)}: write {(kind.IsPoints() ? PlanKeys.EffectiveRadius : PlanKeys.EffectiveHalfWidth).Name}");
        }

        var limit = detection.Value(PlanKeys.Truncation) ?? layout.Value(PlanKeys.ReachOf(kind));
        if (detection.Value(key) > limit)
        {
            var name = detection.Has(PlanKeys.Truncation) ? "the truncation distance" : $"the {PlanKeys.ReachOf(kind).Name} of the layout";
            yield return detection.ProblemAt(key, $"cannot be more than {name}, {DecimalText.Write(limit!.Value)} m");
        }
    }

    private static IEnumerable<Problem> Costs(IEnumerable<PlanTable> strata)
    {
        string? common = null;
        foreach (var table in strata)
        {
            foreach (var key in new[] { PlanKeys.CostPerKm, PlanKeys.CostPerPoint })
            {
                if (table.Value(key) is not { } cost)
                {
                    continue;
                }

                common ??= cost.Currency;
                if (cost.Currency != common)
                {
                    yield return table.ProblemAt(key, $"is in {cost.Currency}, and another stratum's cost is in {common}: write all costs in one currency");
                }
            }
        }
    }

    private static IEnumerable<Problem> SizeFromPrecision(PlanTable table, PlanTables tables)
    {
        if (table.EntryOf(PlanKeys.SizeFrom) is not { } entry)
        {
            yield break;
        }

        // A stratum that inherits it would say the same again.
        if (table.Path.Segments.Length > 1 && !tables.Strata[table.Path.Segments[1]].Has(PlanKeys.SizeFrom))
        {
            yield break;
        }

        var key = table.Path.Add([PlanKeys.SizeFrom.Name]).ToString();
        if (!tables["precision"].Has(PlanKeys.TargetCv))
        {
            yield return entry.KeyPlace.Problem("needs a target: write target_cv = 0.20 under [precision]", key);
        }

        if (!tables["pilot"].Has(PlanKeys.Transects) && !tables["pilot"].Has(PlanKeys.EncounterRate))
        {
            yield return entry.KeyPlace.Problem($"needs to know how often animals are met: write transects = {PlanKeys.Transects.Example} or encounter_rate = {PlanKeys.EncounterRate.Example} under [pilot]", key);
        }
    }
}
