using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>How a fit ended.</summary>
public enum FitStatus
{
    /// <summary>At a maximum of the likelihood.</summary>
    Converged,

    /// <summary>A parameter stopped at the edge of what the model allows; the likelihood would rise beyond it, so there are no standard errors.</summary>
    OnBound,

    /// <summary>No maximum was found; there are no figures.</summary>
    NotConverged,
}

/// <summary>A parameter of a detection function.</summary>
/// <param name="Name">Its name, with its unit if it has one.</param>
/// <param name="Value">Its estimate.</param>
/// <param name="StandardError">Null where the likelihood does not give one.</param>
public sealed record FittedParameter(string Name, double Value, double? StandardError);

/// <summary>One detection model fitted to the distances of a pilot by maximum likelihood.</summary>
/// <param name="Model">The model.</param>
/// <param name="Status">How the fit ended.</param>
/// <param name="Explanation">The same in a sentence, with what it means.</param>
/// <param name="Detections">Number of distances within the truncation distance.</param>
/// <param name="Function">The fitted function; null when not converged.</param>
/// <param name="Parameters">Its parameters; empty when not converged.</param>
/// <param name="LogLikelihood">Of the distances given that they were seen; at points without the constant Σ ln 2r, which all models share. Null when not converged.</param>
/// <param name="EffectiveMetres">Effective strip half-width, or effective radius; null when not converged.</param>
/// <param name="EffectiveCv">Coefficient of variation of what density is divided by: the effective half-width, or the square of the effective radius; null when unknown, as at a bound.</param>
public sealed record DetectionFit(
    DetectionModel Model,
    FitStatus Status,
    string Explanation,
    int Detections,
    DetectionFunction? Function,
    ImmutableArray<FittedParameter> Parameters,
    double? LogLikelihood,
    double? EffectiveMetres,
    double? EffectiveCv)
{
    /// <summary>g at the truncation distance from which on a function is as good as a strip.</summary>
    private const double LeastOfFlat = 0.99;

    internal const string FlatMeaning = "Detections do not fall off with distance; a strip describes them as well.";

    /// <summary>Akaike's information criterion, 2 k - 2 ln L.</summary>
    public double? Aic => (2 * Parameters.Length) - (2 * LogLikelihood);

    /// <summary>n cv²: what detection adds to b; null when unknown.</summary>
    public double? RelativeVariance => Detections * EffectiveCv * EffectiveCv;

    /// <summary>Detections less parameters.</summary>
    public int DegreesOfFreedom => Detections - Parameters.Length;

    /// <summary>Whether it stopped at the bound beyond which detection would rise with distance: it then is the strip, an adequate description.</summary>
    internal bool IsFlat { get; init; }

    internal static bool FallsOffNowhere(DetectionFunction function, double truncationMetres) => function.ProbabilityAt(truncationMetres) > LeastOfFlat;

    /// <summary>A fit that found nothing.</summary>
    internal static DetectionFit Failed(DetectionModel model, int detections, string explanation)
        => new(model, FitStatus.NotConverged, explanation, detections, null, [], null, null, null);
}

/// <summary>A bar of the histogram of distances, scaled so that the fitted function should run along its tops.</summary>
/// <param name="FromMetres">Its left edge.</param>
/// <param name="ToMetres">Its right edge.</param>
/// <param name="Count">Distances in it.</param>
/// <param name="Height">Count over the count expected if everything were seen, given the effective width; comparable with g.</param>
public sealed record HistogramBar(double FromMetres, double ToMetres, int Count, double Height);

/// <summary>All models fitted to the same distances.</summary>
/// <param name="IsPoints">Whether distances are radial from points.</param>
/// <param name="TruncationMetres">The distance beyond which detections were left out.</param>
/// <param name="Fits">Every fit, also those that failed, in the order asked for.</param>
/// <param name="Chosen">The one used, see <see cref="DetectionFitting"/>; null when none has figures.</param>
/// <param name="Histogram">The distances, scaled to the chosen fit; empty without one.</param>
public sealed record DetectionFits(
    bool IsPoints,
    double TruncationMetres,
    ImmutableArray<DetectionFit> Fits,
    DetectionFit? Chosen,
    ImmutableArray<HistogramBar> Histogram);
