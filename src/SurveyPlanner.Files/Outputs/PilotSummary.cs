using System.Text.Json;
using SurveyPlanner.Effort;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Files.Outputs;

/// <summary>The <c>pilot</c> parts of <c>summary.json</c>: encounter rates, detection fits, cluster size, and the precision they came to.</summary>
internal sealed class PilotSummary(Utf8JsonWriter json, EffortPlan plan)
{
    /// <summary>Key of an encounter rate, its unit in it.</summary>
    public string RateKey => plan.IsPoints ? "encounter_rate_per_visit" : "encounter_rate_per_km";

    private string EffectiveKey => plan.IsPoints ? "effective_radius_m" : "effective_half_width_m";

    /// <summary>The members of the survey's <c>pilot</c>.</summary>
    public void WritePilot(PilotFigures pilot)
    {
        WriteRate(pilot.Pooled);
        json.Number("truncation_m", pilot.TruncationMetres);
        if (pilot.TruncationMetres is not null)
        {
            json.WriteNumber("detections_beyond_truncation", pilot.BeyondTruncation);
        }

        if (pilot.ClusterSize is { } size)
        {
            json.Object("cluster_size", () =>
            {
                json.Number("mean", size.Mean);
                json.Number("standard_deviation", size.StandardDeviation);
                json.Number("detections", size.Detections);
            });
        }

        WriteDetection(pilot.Detection);
        json.Number("clusters_per_km2", plan.Density?.ClustersPerKm2);
        json.Number("animals_per_km2", plan.Density?.AnimalsPerKm2);
        if (plan.PilotCv is { } density)
        {
            json.Object("density", () => WriteDecomposition(density));
        }
    }

    /// <summary>The members of a stratum's <c>pilot</c>.</summary>
    public void WriteStratum(string stratum, EncounterRate rate)
    {
        WriteRate(rate);
        WriteDetection(plan.Pilot?.Strata.FirstOrDefault(one => one.Stratum == stratum)?.Detection);
    }

    /// <summary>The members that tell a precision and its parts.</summary>
    public void WriteDecomposition(CvDecomposition decomposition)
    {
        json.Number("cv", decomposition.Cv);
        json.Number("degrees_of_freedom", decomposition.DegreesOfFreedom);
        json.Number("interval_factor_95", decomposition.IntervalFactor);
        json.Array("components", decomposition.Components, component =>
        {
            json.WriteStartObject();
            json.WriteString("source", ChoiceWord.Of(component.Source));
            json.Number("cv", component.Cv);
            json.Number("degrees_of_freedom", component.DegreesOfFreedom);
            json.Number("share", component.Share);
            json.WriteEndObject();
        });
    }

    private void WriteRate(EncounterRate rate)
    {
        json.WriteNumber("transects", rate.Transects);
        json.Number(plan.IsPoints ? "visits" : "length_km", rate.Effort);
        json.WriteNumber("detections", rate.Count);
        json.Number(RateKey, rate.Rate);
        json.Number("variance", rate.Variance);
        json.Number("cv", rate.Cv);
        json.Number("degrees_of_freedom", rate.DegreesOfFreedom);
        json.Number("dispersion", rate.Dispersion);
    }

    private void WriteDetection(DetectionFits? fits)
    {
        if (fits is null)
        {
            return;
        }

        json.Object("detection", () =>
        {
            if (fits.Chosen is { } chosen)
            {
                json.WriteString("chosen", ChoiceWord.Of(chosen.Model));
            }

            json.Array("fits", fits.Fits, WriteFit);
            json.Array("histogram", fits.Histogram, bar =>
            {
                json.WriteStartObject();
                json.Number("from_m", bar.FromMetres);
                json.Number("to_m", bar.ToMetres);
                json.WriteNumber("detections", bar.Count);
                json.Number("height", bar.Height);
                json.WriteEndObject();
            });
        });
    }

    private void WriteFit(DetectionFit fit)
    {
        json.WriteStartObject();
        json.WriteString("model", ChoiceWord.Of(fit.Model));
        json.WriteString("status", ChoiceWord.Of(fit.Status));
        json.Text("explanation", fit.Explanation);
        json.WriteNumber("detections", fit.Detections);
        json.Array("parameters", fit.Parameters, parameter =>
        {
            json.WriteStartObject();
            json.Text("name", parameter.Name);
            json.Number("value", parameter.Value);
            json.Number("standard_error", parameter.StandardError);
            json.WriteEndObject();
        });
        json.Number("log_likelihood", fit.LogLikelihood);
        json.Number("aic", fit.Aic);
        json.Number(EffectiveKey, fit.EffectiveMetres);
        json.Number("effective_cv", fit.EffectiveCv);
        json.WriteEndObject();
    }
}
