using System.Text.Json;
using SurveyPlanner.Effort;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Files.Outputs;

/// <summary>The <c>effort</c> parts of <c>summary.json</c>. Effort is kilometres of line or visits to points, and the keys say which.</summary>
internal sealed class EffortSummary(Utf8JsonWriter json, EffortPlan plan)
{
    private const int Digits = 9;

    private string EffortKey => plan.IsPoints ? "points" : "length_km";

    private string RateKey => plan.IsPoints ? "encounter_rate_per_visit" : "encounter_rate_per_km";

    /// <summary>The members of the survey's <c>effort</c>.</summary>
    public void WriteWhole(EffortPrecision? delivered)
    {
        Number(RateKey, plan.EncounterRate);
        if (plan.Estimator is { } estimator)
        {
            json.WriteString("variance_estimator", Words.Kebab(estimator));
            json.Text("variance_estimator_reason", plan.EstimatorReason);
        }

        json.Object("b", WriteB);
        if (plan.Pilot is { } pilot)
        {
            json.Object("pilot", () => WritePilot(pilot));
        }

        if (plan.Required is { } required)
        {
            json.Object("required", () =>
            {
                Number("target_cv", required.TargetCv);
                WritePrecision(required.Precision);
            });
        }

        if (delivered is not null)
        {
            json.Object("delivered", () => WritePrecision(delivered));
        }

        json.Array("advice", plan.Advice, WriteAdvice);
    }

    /// <summary>The members of a stratum's <c>effort</c>.</summary>
    public void WriteStratum(StratumEffort stratum)
    {
        Number(RateKey, stratum.EncounterRate);
        Number("share", stratum.Share);
        Number(EffortKey, stratum.Effort);
        Number("expected_detections", stratum.ExpectedDetections);
        Number("cv", stratum.Cv);
        Number(EffortKey + "_for_own_target", stratum.EffortForOwnTarget);
        if (stratum.Pilot is { } pilot)
        {
            json.Object("pilot", () => WriteRate(pilot));
        }
    }

    private void WriteB()
    {
        Number("value", plan.B.Value);
        json.WriteString("origin", Words.Kebab(plan.B.Origin));
        Number("encounter_rate_part", plan.B.EncounterRatePart);
        Number("detection_part", plan.B.DetectionPart);
        Number("cluster_size_part", plan.B.ClusterSizePart);
        json.Text("explanation", plan.B.Explanation);
    }

    private void WritePilot(PilotFigures pilot)
    {
        WriteRate(pilot.Pooled);
        Number("truncation_m", pilot.TruncationMetres);
        if (pilot.TruncationMetres is not null)
        {
            json.WriteNumber("detections_beyond_truncation", pilot.BeyondTruncation);
        }

        if (pilot.ClusterSize is { } size)
        {
            json.Object("cluster_size", () =>
            {
                Number("mean", size.Mean);
                Number("standard_deviation", size.StandardDeviation);
                Number("detections", size.Detections);
            });
        }

        if (plan.PilotCv is { } density)
        {
            json.Object("density", () => WriteDecomposition(density));
        }
    }

    private void WriteRate(EncounterRate rate)
    {
        json.WriteNumber("transects", rate.Transects);
        Number(plan.IsPoints ? "visits" : "length_km", rate.Effort);
        json.WriteNumber("detections", rate.Count);
        Number(RateKey, rate.Rate);
        Number("variance", rate.Variance);
        Number("cv", rate.Cv);
        Number("degrees_of_freedom", rate.DegreesOfFreedom);
        Number("dispersion", rate.Dispersion);
    }

    private void WritePrecision(EffortPrecision precision)
    {
        Number(EffortKey, precision.Effort);
        Number("expected_detections", precision.ExpectedDetections);
        WriteDecomposition(precision.Decomposition);
    }

    private void WriteDecomposition(CvDecomposition decomposition)
    {
        Number("cv", decomposition.Cv);
        Number("degrees_of_freedom", decomposition.DegreesOfFreedom);
        Number("interval_factor_95", decomposition.IntervalFactor);
        json.Array("components", decomposition.Components, component =>
        {
            json.WriteStartObject();
            json.WriteString("source", Words.Kebab(component.Source));
            Number("cv", component.Cv);
            Number("degrees_of_freedom", component.DegreesOfFreedom);
            Number("share", component.Share);
            json.WriteEndObject();
        });
    }

    private void WriteAdvice(Advice advice)
    {
        json.WriteStartObject();
        json.Text("message", advice.Message);
        json.Text("source", advice.Source);
        json.WriteEndObject();
    }

    private void Number(string key, double? value)
    {
        if (value is { } number)
        {
            json.Figure(key, Figures.Significant(number, Digits));
        }
    }
}
