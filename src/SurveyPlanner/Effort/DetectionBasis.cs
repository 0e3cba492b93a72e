using System.Collections.Immutable;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Effort;

/// <summary>One detection part of b.</summary>
/// <param name="Part">n cv² of what density is divided by.</param>
/// <param name="Draws">What it may be instead; empty where it is taken as certain.</param>
internal sealed record DetectionSource(double Part, ImmutableArray<double> Draws);

/// <summary>Where the detection parts of b come from.</summary>
/// <param name="Pooled">One for all strata; null where there is none, or each stratum has its own.</param>
/// <param name="Own">For each stratum its own; empty where detection is pooled.</param>
/// <param name="Advice">Assumptions to tell.</param>
internal sealed record DetectionBasis(DetectionSource? Pooled, ImmutableArray<DetectionSource> Own, ImmutableArray<Advice> Advice)
{
    public static readonly DetectionBasis None = new(null, [], []);

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
        if (!design.ByStratum || figures.Strata[0].Stratum.Length == 0)
        {
            return new DetectionBasis(Source(figures.Detection, figures.IsPoints, "", advice), [], [.. advice]);
        }

        // Strata that have nothing to fit share the pooled source.
        var fits = surveyed.Select(stratum => figures.Strata.FirstOrDefault(one => one.Stratum == stratum.Name)?.Detection).ToList();
        var pooled = fits.All(one => one?.Chosen is not null) ? null : Source(figures.Detection, figures.IsPoints, "", advice);
        var own = surveyed.Select((stratum, i) =>
            fits[i]?.Chosen is null ? pooled! : Source(fits[i], figures.IsPoints, $" in stratum '{stratum.Name}'", advice));
        return new DetectionBasis(null, [.. own], [.. advice]);
    }

    /// <summary>
    /// A single model inside its bounds has its cv from the likelihood; where a model was chosen among several, or stopped at a bound, the
    /// bootstrap gives it; theory where nothing could be fitted.
    /// </summary>
    private static DetectionSource Source(DetectionFits? fits, bool isPoints, string where, List<Advice> advice)
    {
        if (fits?.Chosen is not { } chosen)
        {
            return Theory(fits is null ? "The pilot has no distances" : $"No detection function could be fitted{where}", isPoints, advice);
        }

        if (fits.Fits.All(fit => fit.Model == DetectionModel.Strip))
        {
            return new DetectionSource(0, []);
        }

        advice.AddRange(OfBounds(fits, chosen, where));
        if ((fits.Fits.Length == 1 ? chosen.RelativeVariance : null) is { } ofFit)
        {
            return new DetectionSource(ofFit, DetectionBootstrap.Of(fits, DetectionBootstrap.FewReplicates).FitParts);
        }

        var bootstrap = DetectionBootstrap.Of(fits);
        if (bootstrap.Part is not { } part)
        {
            return Theory($"The detection function{where} has no variance", isPoints, advice);
        }

        if (chosen.RelativeVariance is { } alone)
        {
            advice.Add(new Advice(
                FormattableString.Invariant($"Detection{where} adds {part:0.00} to b; by the {ChoiceWord.Of(chosen.Model)} fit alone it would be {alone:0.00}, but which of {fits.Fits.Length} models the distances choose varies too. ")
                    + "If the survey will be analysed with one model fixed beforehand, name that alone in the plan (detection.models).",
                "Simulated draws"));
        }

        // Relative to their mean, since each fit's own figure leaves out the choice of a model.
        var mean = bootstrap.FitParts.IsEmpty ? 1 : bootstrap.FitParts.Average();
        return new DetectionSource(part, [.. bootstrap.FitParts.Select(one => part * one / mean)]);
    }

    private static IEnumerable<Advice> OfBounds(DetectionFits fits, DetectionFit chosen, string where)
    {
        if (chosen.Status == FitStatus.OnBound)
        {
            yield return new Advice($"The {ChoiceWord.Of(chosen.Model)} fit{where} stopped at a bound, so its variance comes from simulated draws. {chosen.Explanation}");
        }
        else if (fits.Fits.FirstOrDefault(fit => fit.Aic < chosen.Aic) is { } passedOver)
        {
            yield return new Advice(
                $"The {ChoiceWord.Of(passedOver.Model)} fit{where} has a smaller AIC but stopped at a bound, so the {ChoiceWord.Of(chosen.Model)} fit is used. {passedOver.Explanation}");
        }
    }

    private static DetectionSource Theory(string why, bool isPoints, List<Advice> advice)
    {
        var theory = HalfNormalFit.OrdinaryPart(isPoints);
        advice.Add(new Advice(
            FormattableString.Invariant($"{why}, so what detection adds to b is taken from half-normal theory: {theory:0.00}."),
            "Arithmetic of half-normal theory"));
        return new DetectionSource(theory, []);
    }
}
