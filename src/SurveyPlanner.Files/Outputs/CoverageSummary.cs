using System.Text.Json;
using SurveyPlanner.Coverage;

namespace SurveyPlanner.Files.Outputs;

/// <summary>The <c>coverage</c> of a stratum in <c>summary.json</c>.</summary>
internal static class CoverageSummary
{
    /// <summary>Its members.</summary>
    public static void Write(Utf8JsonWriter json, StratumCoverage coverage)
    {
        json.Number("nominal", coverage.Nominal);
        json.Number("mean", coverage.Mean);
        json.Number("min", coverage.Min);
        json.Number("max", coverage.Max);
        json.Number("cv", coverage.Cv);
        json.Number("simulated_mean", coverage.SimulatedMean);
        json.Number("max_abs_z", coverage.MaxAbsZ);
        json.Number("area_share_below_0_5_nominal", coverage.ShareBelow(0.5));
        json.Number("area_share_below_0_9_nominal", coverage.ShareBelow(0.9));
        json.Number("area_share_above_1_1_nominal", coverage.ShareAbove(1.1));
        if (coverage.Advice is { } advice)
        {
            json.Object("advice", () =>
            {
                json.WriteString("finding", ChoiceWord.Of(advice.Finding));
                json.Number("uneven_area_share", advice.UnevenShare);
                json.Number("never_covered_km2", advice.NeverCoveredKm2);
                json.Text("sentence", advice.Sentence);
            });
        }

        if (!coverage.EdgeProfile.IsEmpty)
        {
            json.Array("edge_profile", coverage.EdgeProfile, one => WriteEdgeClass(json, one));
        }

        if (!coverage.Transects.IsEmpty)
        {
            json.Array("transects", coverage.Transects, one => WriteTransect(json, one));
        }
    }

    private static void WriteEdgeClass(Utf8JsonWriter json, EdgeClass one)
    {
        json.WriteStartObject();
        json.Number("from_m", one.FromMetres);
        json.Number("to_m", one.ToMetres);
        json.Figure("area_km2", Figures.Area(one.AreaKm2));
        json.Number("mean_coverage", one.MeanCoverage);
        json.WriteEndObject();
    }

    private static void WriteTransect(Utf8JsonWriter json, TransectCoverage one)
    {
        json.WriteStartObject();
        json.Text("id", one.TransectId);
        json.Number("mean_coverage", one.Mean);
        json.WriteBoolean("is_exact", one.IsExact);
        json.WriteEndObject();
    }
}
