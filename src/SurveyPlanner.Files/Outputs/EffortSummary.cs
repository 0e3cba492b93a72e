using System.Text.Json;
using SurveyPlanner.Effort;

namespace SurveyPlanner.Files.Outputs;

/// <summary>The <c>effort</c> parts of <c>summary.json</c>. Effort is kilometres of line or visits to points, and the keys say which.</summary>
internal sealed class EffortSummary(Utf8JsonWriter json, EffortPlan plan)
{
    private readonly PilotSummary _pilot = new(json, plan);

    private string EffortKey => plan.IsPoints ? "points" : "length_km";

    /// <summary>The members of the survey's <c>effort</c>.</summary>
    /// <param name="planned">How the plan shares effort among several strata.</param>
    /// <param name="delivered">What the drawn layout delivers; null where none is drawn.</param>
    public void WriteWhole(Allocation planned, EffortPrecision? delivered)
    {
        json.Number(_pilot.RateKey, plan.EncounterRate);
        if (plan.Strata.Length > 1)
        {
            json.WriteString("planned_allocation", ChoiceWord.Of(planned));
        }

        if (plan.Estimator is { } estimator)
        {
            json.WriteString("variance_estimator", ChoiceWord.Of(estimator));
            json.Text("variance_estimator_reason", plan.EstimatorReason);
        }

        json.Object("b", WriteB);
        if (plan.Pilot is { } pilot)
        {
            json.Object("pilot", () => _pilot.WritePilot(pilot));
        }

        if (plan.Uncertainty is { } uncertainty)
        {
            json.Object("uncertainty", () => WriteUncertainty(uncertainty));
        }

        if (plan.Required is { } required)
        {
            json.Object("required", () => WriteRequired(required));
        }

        if (delivered is not null)
        {
            json.Object("delivered", () => WritePrecision(delivered));
        }

        if (plan.Allocations.Length > 0)
        {
            json.Array("allocations", plan.Allocations, WriteAllocation);
        }

        json.Object("curves", WriteCurves);
        json.Array("advice", plan.Advice, WriteAdvice);
    }

    /// <summary>The members of a stratum's <c>effort</c>.</summary>
    public void WriteStratum(StratumEffort stratum)
    {
        json.Number(_pilot.RateKey, stratum.EncounterRate);
        json.Number("share", stratum.Share);
        json.Number(EffortKey, stratum.Effort);
        WriteLines(stratum.Transects);
        json.Number("expected_detections", stratum.ExpectedDetections);
        json.Number("cv", stratum.Cv);
        json.Number(EffortKey + "_for_own_target", stratum.EffortForOwnTarget);
        if (stratum.Pilot is { } rate)
        {
            json.Object("pilot", () => _pilot.WriteStratum(stratum.Name, rate));
        }
    }

    private void WriteB()
    {
        json.Number("value", plan.B.Value);
        json.WriteString("origin", ChoiceWord.Of(plan.B.Origin));
        json.Number("encounter_rate_part", plan.B.EncounterRatePart);
        json.Number("detection_part", plan.B.DetectionPart);
        json.Number("cluster_size_part", plan.B.ClusterSizePart);
        json.Text("explanation", plan.B.Explanation);
    }

    private void WriteUncertainty(EffortUncertainty uncertainty)
    {
        json.WriteNumber("draws", uncertainty.Draws);
        WriteInterval("factor_interval_95", uncertainty.Factors);
        WriteInterval("factor_interval_95_by_delta_method", uncertainty.DeltaFactors);
        json.Number("assured_factor", uncertainty.AssuredFactor);
        if (uncertainty.Measured is { } measured)
        {
            json.Object("measured", () =>
            {
                json.WriteNumber("simulated_pilots", MeasuredReliability.Pilots);
                json.WriteNumber("transects", measured.Transects);
                json.Number("detections_per_transect", measured.DetectionsPerTransect);
                json.Number("dispersion", measured.Dispersion);
                json.Number("share_of_intervals_that_held", measured.Coverage);
                json.Number("share_of_efforts_assured_at_0_8_that_were_enough", measured.Assured);
            });
        }
    }

    private void WriteRequired(RequiredEffort required)
    {
        json.Number("target_cv", required.TargetCv);
        WritePrecision(required.Precision);
        WriteInterval(EffortKey + "_interval_95", required.Interval);
        WriteInterval(EffortKey + "_interval_95_by_delta_method", required.DeltaInterval);
        json.Number("assurance", required.Assurance);
        json.Number(EffortKey + "_assured", required.AssuredEffort);
        json.Number(EffortKey + "_planned", required.Planned);
    }

    private void WriteAllocation(AllocationOption option)
    {
        json.WriteStartObject();
        json.WriteString("allocation", ChoiceWord.Of(option.Allocation));
        json.Number(EffortKey + "_required", option.RequiredEffort);
        json.Number("cost", option.Cost);
        WritePrecision(option.Precision);
        json.Array("strata", option.Strata, share =>
        {
            json.WriteStartObject();
            json.Text("name", share.Name);
            json.Number(EffortKey, share.Effort);
            WriteLines(share.Transects);
            json.Number("cost", share.Cost);
            json.WriteEndObject();
        });
        json.WriteEndObject();
    }

    // Points are their own effort; lines are counted beside theirs.
    private void WriteLines(int? transects)
    {
        if (!plan.IsPoints)
        {
            json.Number("lines", transects);
        }
    }

    private void WriteCurves()
    {
        json.Array("cv_against_" + EffortKey, plan.Curves.CvAgainstEffort, point =>
        {
            json.WriteStartObject();
            json.Number(EffortKey, point.Effort);
            json.Number("cv", point.Cv);
            json.Number("cv_lower_95", point.LowerCv);
            json.Number("cv_upper_95", point.UpperCv);
            json.WriteEndObject();
        });
        json.Array(EffortKey + "_against_target_cv", plan.Curves.EffortAgainstTarget, point =>
        {
            json.WriteStartObject();
            json.Number("target_cv", point.TargetCv);
            json.Number(EffortKey, point.Effort);
            WriteInterval(EffortKey + "_interval_95", point.Interval);
            json.WriteEndObject();
        });
    }

    private void WritePrecision(EffortPrecision precision)
    {
        json.Number(EffortKey, precision.Effort);
        json.Number("expected_detections", precision.ExpectedDetections);
        _pilot.WriteDecomposition(precision.Decomposition);
    }

    private void WriteInterval(string key, EffortInterval? interval)
    {
        if (interval is not null)
        {
            json.Object(key, () =>
            {
                json.Number("lower", interval.Lower);
                json.Number("upper", interval.Upper);
            });
        }
    }

    private void WriteAdvice(Advice advice)
    {
        json.WriteStartObject();
        json.Text("message", advice.Message);
        json.Text("source", advice.Source);
        json.WriteEndObject();
    }
}
