using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>One detection part of b: a fit, or a value from theory.</summary>
/// <param name="Part">n cv² of what density is divided by.</param>
/// <param name="Fit">The fit it comes from; null for theory, which is taken as certain.</param>
internal sealed record DetectionSource(double Part, DetectionFit? Fit);

/// <summary>Where the detection parts of b come from.</summary>
/// <param name="Pooled">One for all strata; null where there is none, or each stratum has its own.</param>
/// <param name="Own">For each stratum its own; empty where detection is pooled.</param>
/// <param name="TruncationMetres">Truncation distance of the fits.</param>
/// <param name="Advice">Assumptions to tell.</param>
internal sealed record DetectionBasis(
    DetectionSource? Pooled, ImmutableArray<DetectionSource> Own, double TruncationMetres, ImmutableArray<Advice> Advice)
{
    /// <summary>A truncation distance of two σ, an ordinary one, where no distances say better.</summary>
    private const double OrdinaryTruncationInSigma = 2;

    public static readonly DetectionBasis None = new(null, [], 0, []);

    public double? PooledPart => Pooled?.Part;

    public double? OwnPart(int stratum) => Own.IsEmpty ? null : Own[stratum].Part;

    /// <summary>From the pilot's fits, or from theory where a model is asked for and cannot be fitted; none where detection is given or everything is seen.</summary>
    public static DetectionBasis Of(DetectionDesign design, PilotFigures figures, IReadOnlyList<EffortStratum> surveyed)
    {
        var asked = design.Models.Any(model => model != DetectionModel.Strip);
        if (design.GivenCv is not null || (figures.Detection is null && !asked))
        {
            return None;
        }

        var advice = new List<Advice>();
        var pooled = Source(figures.Detection, figures.IsPoints, "", advice);
        if (!design.ByStratum || figures.Strata[0].Stratum.Length == 0)
        {
            return new DetectionBasis(pooled, [], figures.TruncationMetres ?? 0, [.. advice]);
        }

        var own = surveyed.Select(stratum =>
            figures.Strata.FirstOrDefault(one => one.Stratum == stratum.Name)?.Detection is { Chosen: not null } fits
                ? Source(fits, figures.IsPoints, $" in stratum '{stratum.Name}'", advice)
                : pooled);
        return new DetectionBasis(null, [.. own], figures.TruncationMetres ?? 0, [.. advice]);
    }

    private static DetectionSource Source(DetectionFits? fits, bool isPoints, string where, List<Advice> advice)
    {
        if (fits?.Chosen is { RelativeVariance: { } part } chosen)
        {
            return new DetectionSource(part, chosen);
        }

        var (mean, variance) = HalfNormalFit.Moments(1 / OrdinaryTruncationInSigma, 1, isPoints);
        var theory = mean * mean / variance;
        var why = fits is null ? "The pilot has no distances" : $"No detection function could be fitted with a variance{where}";
        advice.Add(new Advice(
            FormattableString.Invariant($"{why}, so what detection adds to b is taken from half-normal theory: {theory:0.00}."),
            "Arithmetic of half-normal theory"));
        return new DetectionSource(theory, null);
    }
}
