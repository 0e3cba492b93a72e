namespace SurveyPlanner.Pilots;

/// <summary>The hazard-rate model, searched in ln σ and ln b. The start is at two thirds of the mean distance with a middling shape.</summary>
internal static class HazardRateFit
{
    /// <summary>
    /// Below this the function has a spike instead of a shoulder: without truncation it has no effective width at all, so that the width fitted
    /// would hang on the truncation distance alone.
    /// </summary>
    private const double LeastShapeOfLines = 1;

    /// <summary>The same for the effective radius, whose square is an integral of r g.</summary>
    private const double LeastShapeOfPoints = 2;

    /// <summary>
    /// At this shape g falls from 0.9 to 0.1 within a third of σ. Steeper ones only trace where a few distances happen to end: the function
    /// becomes a strip of width σ, whose best σ is the greatest distance, and neither AIC nor standard errors hold for that.
    /// </summary>
    private const double GreatestShape = 10;

    private const double WidestSigma = 10;
    private const double NarrowestSigma = 1e-3;

    public static DetectionFit Fit(DistanceSample data)
    {
        var n = data.Distances.Length;
        var mean = data.Distances.Average();
        var w = data.Truncation;
        var logs = data.Distances.Select(Math.Log).ToArray();
        double[] lower = [Math.Log(NarrowestSigma * w), Math.Log(data.IsPoints ? LeastShapeOfPoints : LeastShapeOfLines)];
        double[] upper = [Math.Log(WidestSigma * w), Math.Log(GreatestShape)];
        var fit = new BoxFit(
            DetectionModel.HazardRate,
            FunctionAt,
            lower,
            upper,
            point => point[1] >= upper[1]
                ? FormattableString.Invariant($"The distances end as if cut off at {Math.Exp(point[0]):0.#} m; if farther ones were not written down, make that the truncation distance.")
                : "The distances heap up near 0 without a shoulder, which leaves the width open; were they rounded to 0, or animals drawn near?");
        double[] start = [Math.Clamp(Math.Log((data.IsPoints ? 1 : 1.3) * mean), lower[0], upper[0]), Math.Log(3)];
        return fit.Fit(data, LogLikelihood, start);

        double LogLikelihood(double[] point)
        {
            var shape = Math.Exp(point[1]);
            var sum = 0.0;
            foreach (var log in logs)
            {
                // ln(1 - e^-t): for large distances t is small and 1 - e^-t loses digits, so its series takes over.
                var t = Math.Exp(-shape * (log - point[0]));
                sum += t > 1e-5 ? Math.Log(1 - Math.Exp(-t)) : Math.Log(t) - (t / 2);
            }

            return sum - (n * Math.Log(FunctionAt(point).Effective(w, data.IsPoints)));
        }
    }

    private static HazardRateDetection FunctionAt(double[] point) => new(Math.Exp(point[0]), Math.Exp(point[1]));
}
