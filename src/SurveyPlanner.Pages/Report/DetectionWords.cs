using SurveyPlanner.Pages.Charts;
using SurveyPlanner.Pages.Words;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Pages.Report;

/// <summary>Detection fits in words, as a table and as a picture.</summary>
internal static class DetectionWords
{
    private const int Samples = 120;

    /// <summary>What was chosen, and how sure it is.</summary>
    public static string Finding(DetectionFits fits)
    {
        if (fits.Chosen is not { } chosen)
        {
            return "No detection function could be fitted; the table says why.";
        }

        var cv = chosen.EffectiveCv is { } known ? $", with a coefficient of variation of {Figures.Percent(known)}{(fits.IsPoints ? " of its square" : "")}" : ", its variance unknown";
        var smallest = fits.Fits.Any(fit => fit.Aic < chosen.Aic) ? $" has the smallest AIC of those of {fits.Fits.Length} models that did not stop at a bound and" : $" has the smallest AIC of {fits.Fits.Length} models and";
        var among = fits.Fits.Length > 1 ? smallest : "";
        return $"The {ChoiceWord.Of(chosen.Model)} model{among} gives an effective {(fits.IsPoints ? "radius" : "half-width")} of {Figures.Distance(chosen.EffectiveMetres ?? 0)}"
            + $"{cv}, from {Figures.Counted(chosen.Detections, "distance", "distances")} up to {Figures.Distance(fits.TruncationMetres)}.";
    }

    public static Table Table(DetectionFits fits) => new(
        "Detection functions fitted to the distances of the pilot, by maximum likelihood",
        [
            new("Model", false), new("AIC"), new("Above the smallest"), new(fits.IsPoints ? "Effective radius, m" : "Effective half-width, m"),
            new(fits.IsPoints ? "CV of its square, %" : "CV of that, %"), new("Parameters", false), new("How the fit ended", false),
        ],
        [
            .. fits.Fits.Select(fit => (string[])
            [
                ChoiceWord.Of(fit.Model) + (ReferenceEquals(fit, fits.Chosen) ? ", chosen" : ""),
                Decimal(fit.Aic),
                Decimal(fit.Aic - fits.Fits.Min(one => one.Aic)),
                Figures.Three(fit.EffectiveMetres),
                Figures.Three(100 * fit.EffectiveCv),
                string.Join('\n', fit.Parameters.Select(Parameter)),
                Ending(fit),
            ]),
        ]);

    /// <summary>The chosen fit over the histogram of distances; of radial distances the density, since places grow more with distance. Null where none was chosen.</summary>
    public static Chart? Chart(DetectionFits fits)
    {
        if (fits.Chosen is not { Function: { } function } chosen || fits.Histogram.IsEmpty)
        {
            return null;
        }

        var effective = function.EffectiveRadiusSquared(fits.TruncationMetres);
        Func<double, double> curve = fits.IsPoints ? r => 2 * r * function.ProbabilityAt(r) / effective : function.ProbabilityAt;
        Bar[] bars = [.. fits.Histogram.Select(bar => new Bar(
            bar.FromMetres, bar.ToMetres, fits.IsPoints ? bar.Count / (chosen.Detections * (bar.ToMetres - bar.FromMetres)) : bar.Height))];
        (double X, double Y)[] points = [.. Enumerable.Range(0, Samples + 1).Select(i => fits.TruncationMetres * i / Samples).Select(x => (x, curve(x)))];
        return new Chart(
            fits.IsPoints ? "Distances from the points with the chosen detection function" : "Distances from the line with the chosen detection function",
            Finding(fits) + " The table has all fits.",
            Axis.Covering(fits.IsPoints ? "Distance from the point, m" : "Perpendicular distance from the line, m", 0, fits.TruncationMetres),
            Axis.Covering(
                fits.IsPoints ? "Density of distances, per metre" : "Chance of being seen (bars: counts to scale)",
                0,
                Math.Max(bars.Max(bar => bar.Height), points.Max(point => point.Y))))
        {
            Bars = bars,
            Lines = [new Line(ChoiceWord.Of(chosen.Model), points)],
            Levels = chosen.EffectiveMetres is { } metres
                ? [new Level(metres, $"effective {(fits.IsPoints ? "radius" : "half-width")} {Figures.Distance(metres)}", IsUpright: true)]
                : [],
        };
    }


    // Differences between AICs count, so all of them have the same decimals, whatever their size.
    private static string Decimal(double? aic) => aic is { } value && double.IsFinite(value) ? Figures.Fixed(value, 1) : Figures.None;

    private static string Parameter(FittedParameter parameter)
    {
        var (name, unit) = parameter.Name.EndsWith("_m", StringComparison.Ordinal) ? (parameter.Name[..^2], " m") : (parameter.Name, "");
        return $"{name} = {Figures.Three(parameter.Value)}{(parameter.StandardError is { } error ? $" ± {Figures.Three(error)}" : "")}{unit}";
    }

    private static string Ending(DetectionFit fit) => fit.Status switch
    {
        FitStatus.Converged => fit.Explanation,
        FitStatus.OnBound => "At a bound: " + fit.Explanation,
        FitStatus.NotConverged => "Did not converge: " + fit.Explanation,
        _ => throw new ArgumentOutOfRangeException(nameof(fit), fit.Status, null),
    };
}
