using System.Collections.Immutable;

namespace SurveyPlanner.Pilots;

/// <summary>
/// Fits detection functions to distances by maximum likelihood and chooses by AIC among those that did not stop at a bound; a flat function,
/// the strip, counts as such. A fit at another bound is chosen where nothing else comes within 10 of its AIC.
/// Assumptions: everything at distance 0 is seen, distances are exact, animals lie anywhere out to the truncation distance with equal chance
/// per area, detections are independent. Accuracy: half-normal to rounding; the others' parameters to about 1e-6.
/// References: Buckland and others 2001, Introduction to Distance Sampling, chapters 2 and 3 (from memory).
/// </summary>
public static class DetectionFitting
{
    /// <summary>A model this much above the smallest AIC has essentially no support (Burnham and Anderson 2002, Model Selection, section 2.6, from memory).</summary>
    private const double NoSupport = 10;

    private const int FewestBars = 5;
    private const int MostBars = 20;

    /// <summary>Fits each model to distances of at most the truncation distance, in metres.</summary>
    public static DetectionFits Fit(
        ImmutableArray<double> distancesMetres, double truncationMetres, bool isPoints, IEnumerable<DetectionModel> models)
    {
        var data = new DistanceSample(distancesMetres, truncationMetres, isPoints);
        var fits = models.Distinct().Select(model => FitOne(model, data)).ToImmutableArray();
        var chosen = Chosen(fits);
        return new DetectionFits(isPoints, truncationMetres, fits, chosen, chosen is null ? [] : Histogram(data, chosen));
    }

    /// <summary>One model. Add one: a file beside these, a word in the enumeration, a line here.</summary>
    internal static DetectionFit FitOne(DetectionModel model, DistanceSample data)
    {
        if (data.Distances.Length == 0)
        {
            return DetectionFit.Failed(model, 0, "There are no distances to fit.");
        }

        if (model != DetectionModel.Strip && data.Distances.All(distance => distance == 0))
        {
            return DetectionFit.Failed(model, data.Distances.Length, "All distances are 0, so no width can be estimated; were distances written down?");
        }

        return model switch
        {
            DetectionModel.Strip => StripFit(data),
            DetectionModel.HalfNormal => HalfNormalFit.Fit(data),
            DetectionModel.HazardRate => HazardRateFit.Fit(data),
            DetectionModel.UniformCosine => UniformCosineFit.Fit(data),
            _ => throw new ArgumentOutOfRangeException(nameof(model)),
        };
    }

    /// <summary>At a bound AIC and standard errors do not mean what they say, and the fits that end there are the wilder ones (docs/methods/detection.md).</summary>
    private static DetectionFit? Chosen(IEnumerable<DetectionFit> fits)
    {
        var byAic = fits.Where(fit => fit.Status != FitStatus.NotConverged).OrderBy(fit => fit.Aic).ToList();
        var adequate = byAic.FirstOrDefault(fit => fit.EffectiveCv is not null || fit.IsFlat);
        return adequate is null || byAic[0].Aic < adequate.Aic - NoSupport ? byAic.FirstOrDefault() : adequate;
    }

    private static DetectionFit StripFit(DistanceSample data)
        => new(
            DetectionModel.Strip, FitStatus.Converged, "Nothing to estimate: everything is taken as seen.", data.Distances.Length,
            new StripDetection(), [], data.LogLikelihood(new StripDetection()), data.Truncation, 0);

    /// <summary>About √n bars of equal width.</summary>
    private static ImmutableArray<HistogramBar> Histogram(DistanceSample data, DetectionFit fit)
    {
        var n = data.Distances.Length;
        var bars = Math.Clamp((int)Math.Round(Math.Sqrt(n)), FewestBars, MostBars);
        var width = data.Truncation / bars;
        var effective = fit.Function!.Effective(data.Truncation, data.IsPoints);
        return
        [
            .. Enumerable.Range(0, bars).Select(i =>
            {
                var (from, to) = (i * width, (i + 1) * width);
                var count = data.Distances.Count(x => Math.Min((int)(x / width), bars - 1) == i);
                var size = data.IsPoints ? (to * to) - (from * from) : width;
                return new HistogramBar(from, to, count, count * effective / (n * size));
            }),
        ];
    }
}

/// <summary>Distances to fit to.</summary>
internal sealed record DistanceSample(ImmutableArray<double> Distances, double Truncation, bool IsPoints)
{
    /// <summary>Σ ln g - n ln(effective), the log-likelihood without the constant Σ ln 2r of points.</summary>
    public double LogLikelihood(DetectionFunction function)
        => Distances.Sum(x => Math.Log(function.ProbabilityAt(x))) - (Distances.Length * Math.Log(function.Effective(Truncation, IsPoints)));
}
