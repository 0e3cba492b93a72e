namespace SurveyPlanner.Pilots;

/// <summary>Detection models by their full names.</summary>
public enum DetectionModel
{
    /// <summary>Everything out to the truncation distance is seen.</summary>
    Strip,

    /// <summary>g(x) = exp(-x² / 2σ²).</summary>
    HalfNormal,

    /// <summary>g(x) = 1 - exp(-(x/σ)^-b).</summary>
    HazardRate,

    /// <summary>g(x) in proportion to 1 + Σ a_j cos(jπx / w).</summary>
    UniformCosine,
}
